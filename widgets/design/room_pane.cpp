#include "widgets/design/room_pane.h"

#include "core/engine/placement_problem.h"
#include "widgets/design/run_row.h"
#include "widgets/figure_text.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"
#include "widgets/view_state.h"

#include <QHeaderView>
#include <QTableWidget>
#include <QVBoxLayout>

#include <cmath>

namespace cornerwright {

namespace {

enum Column { section, value, now, down, downEnds, up, upEnds, columnCount };

constexpr int coefficientDigits = 6;

/// "−12.3 %"; "free" where nothing fails.
QString changeText(const ValueReach& reach) {
    if (reach.end == RoomEnd::none) {
        return RoomPane::tr("free");
    }
    const double percent = 100.0 * (reach.factor - 1.0);
    const QString sign = percent > 0.0 ? QStringLiteral("+") : QString();
    return RoomPane::tr("%1 %").arg(sign + numberText(percent));
}

QString endText(const ValueReach& reach, const Project& project, bool hertz) {
    QString what;
    switch (reach.end) {
    case RoomEnd::none:
        return {};
    case RoomEnd::requirement:
        what = requirementText(project.requirements[reach.requirement], hertz);
        break;
    case RoomEnd::stability:
        what = RoomPane::tr("stability");
        break;
    case RoomEnd::realisation:
        return RoomPane::tr("section or realisation ends");
    }
    return RoomPane::tr("%1, %2").arg(what, QString::fromStdString(reach.case_name));
}

QString valueName(const std::string& key) {
    if (key == "gain") {
        return RoomPane::tr("gain");
    }
    if (key == "corner_rad_s") {
        return RoomPane::tr("corner");
    }
    if (key == "zero_rad_s") {
        return RoomPane::tr("zero");
    }
    if (key == "pole_rad_s") {
        return RoomPane::tr("pole");
    }
    if (key == "damping") {
        return RoomPane::tr("damping");
    }
    if (key == "zero_damping") {
        return RoomPane::tr("damping of zeros");
    }
    if (key == "pole_damping") {
        return RoomPane::tr("damping of poles");
    }
    return QString::fromStdString(key);
}

} // namespace

RoomPane::RoomPane(ViewState& viewState, QWidget* parent)
    : Pane(viewState, parent),
      table_(new QTableWidget(0, columnCount, this)),
      leftOut_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      row_(new RunRow(tr("Work out"), this)) {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(10, 2, 10, 6);
    whole->setSpacing(4);
    whole->addWidget(row_);
    whole->addWidget(table_, 1);
    whole->addWidget(leftOut_);
    leftOut_->setWordWrap(true);
    table_->setAccessibleName(tr("Room of every value"));
    table_->setHorizontalHeaderLabels({tr("section"), tr("value"), tr("is"), tr("down"),
                                       tr("then fails"), tr("up"), tr("then fails")});
    table_->verticalHeader()->hide();
    table_->setFrameShape(QFrame::NoFrame);
    table_->setShowGrid(false);
    table_->setEditTriggers(QAbstractItemView::NoEditTriggers);
    table_->setSelectionBehavior(QAbstractItemView::SelectRows);
    table_->setTabKeyNavigation(false);
    table_->horizontalHeader()->setStretchLastSection(true);
    row_->setNote(tr("How far each value may move alone before a requirement fails"));
    setFocusProxy(row_->startButton());
    connect(row_, &RunRow::startAsked, this, &RoomPane::start);
    connect(&viewState, &ViewState::unitChanged, this, &RoomPane::showRooms);
}

void RoomPane::setContent(const PaneContent& content) {
    content_ = content;
    tellAge();
}

void RoomPane::start() {
    if (!content_.project || row_->run().isRunning()) {
        return;
    }
    row_->start([this, project = content_.project](const BackgroundRun::Proceed& proceed) {
        SensitivityOptions options;
        options.proceed = proceed;
        const Sensitivity result = sensitivity(placement_problem_of(*project), options);
        return [this, project, result] { take(project, result); };
    });
}

void RoomPane::take(const std::shared_ptr<const Project>& project, Sensitivity result) {
    judged_ = project;
    result_ = std::move(result);
    showRooms();
    tellAge();
}

void RoomPane::showRooms() {
    if (!judged_) {
        return;
    }
    table_->setRowCount(0);
    for (const ValueRoom& room : result_.values) {
        addRow(room);
    }
    for (const ValueRoom& room : result_.coefficients) {
        addRow(room);
    }
    table_->resizeColumnsToContents();
    QStringList names;
    for (const std::size_t index : result_.left_out) {
        names << requirementText(judged_->requirements[index], viewState().showsHertz());
    }
    leftOut_->setText(
        names.isEmpty()
            ? QString()
            : tr("Left out, since not met now: %1").arg(names.join(QStringLiteral(", "))));
}

void RoomPane::addRow(const ValueRoom& room) {
    const bool hertz = viewState().showsHertz();
    const int row = table_->rowCount();
    table_->insertRow(row);
    const auto put = [this, row](Column column, const QString& text) {
        table_->setItem(row, column, new QTableWidgetItem(text));
    };
    const bool isFrequency = !room.is_coefficient && room.key.ends_with("_rad_s");
    put(section, room.is_coefficient ? tr("run section %1").arg(room.section + 1)
                                     : sectionText(judged_->compensator[room.section]));
    put(value, valueName(room.key));
    put(now, isFrequency ? frequencyText(room.value, hertz)
                         : numberText(room.value, room.is_coefficient ? coefficientDigits : 3));
    put(down, changeText(room.down));
    put(downEnds, endText(room.down, *judged_, hertz));
    put(up, changeText(room.up));
    put(upEnds, endText(room.up, *judged_, hertz));
}

void RoomPane::tellAge() {
    if (!judged_ || row_->run().isRunning()) {
        return;
    }
    const bool isOld = content_.project && !(*content_.project == *judged_);
    row_->setNote(isOld             ? tr("of an earlier design")
                  : result_.stopped ? tr("stopped: the values looked at so far")
                                    : QString());
}

} // namespace cornerwright
