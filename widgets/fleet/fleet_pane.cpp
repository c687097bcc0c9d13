#include "widgets/fleet/fleet_pane.h"

#include "core/numerics/error.h"
#include "widgets/design/run_row.h"
#include "widgets/figure_text.h"
#include "widgets/fleet/fleet_figures.h"
#include "widgets/parts/histogram_view.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"
#include "widgets/view_state.h"

#include <QComboBox>
#include <QDir>
#include <QFileDialog>
#include <QHBoxLayout>
#include <QHeaderView>
#include <QListWidget>
#include <QTableWidget>
#include <QVBoxLayout>

namespace cornerwright {

namespace {

enum Column { file, requirement, share, columnCount };
constexpr int unreadableLines = 3;

std::filesystem::path pathOf(const QString& folder) {
    return std::filesystem::path(folder.toStdU16String());
}

} // namespace

FleetPane::FleetPane(ViewState& viewState, QWidget* parent)
    : Pane(viewState, parent),
      folderLabel_(new TextLabel(tr("no folder chosen"), TextLabel::Kind::muted, this)),
      counts_(new TextLabel(QString(), TextLabel::Kind::body, this)),
      figure_(new QComboBox(this)),
      histogram_(new HistogramView(this)),
      worst_(new QTableWidget(0, columnCount, this)),
      takeButton_(new LinkButton(tr("Take as plant case"), this)),
      unreadableHead_(
          new TextLabel(tr("Files that could not be read"), TextLabel::Kind::strong, this)),
      unreadable_(new QListWidget(this)),
      row_(new RunRow(tr("Judge the fleet"), this)) {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(10, 2, 10, 6);
    whole->setSpacing(4);
    auto* choose = new LinkButton(tr("Choose folder"), this);
    auto* head = new QHBoxLayout;
    head->addWidget(choose);
    head->addWidget(folderLabel_, 1);
    whole->addLayout(head);
    whole->addWidget(row_);
    auto* chosen = new QHBoxLayout;
    chosen->addWidget(figure_);
    chosen->addWidget(counts_, 1);
    whole->addLayout(chosen);
    whole->addWidget(histogram_, 2);
    whole->addWidget(worst_, 2);
    whole->addWidget(takeButton_, 0, Qt::AlignLeft);
    whole->addWidget(unreadableHead_);
    whole->addWidget(unreadable_);

    folderLabel_->setSizePolicy(QSizePolicy::Ignored, QSizePolicy::Preferred);
    counts_->setWordWrap(true);
    figure_->setAccessibleName(tr("Figure of the histogram"));
    worst_->setAccessibleName(tr("Worst units"));
    worst_->setHorizontalHeaderLabels({tr("worst units"), tr("requirement"), tr("headroom share")});
    worst_->verticalHeader()->hide();
    worst_->setFrameShape(QFrame::NoFrame);
    worst_->setShowGrid(false);
    worst_->setEditTriggers(QAbstractItemView::NoEditTriggers);
    worst_->setSelectionBehavior(QAbstractItemView::SelectRows);
    worst_->setSelectionMode(QAbstractItemView::SingleSelection);
    worst_->setTabKeyNavigation(false);
    worst_->horizontalHeader()->setStretchLastSection(true);
    unreadable_->setAccessibleName(unreadableHead_->text());
    unreadable_->setMaximumHeight(unreadableLines * 2 * fontMetrics().height());
    unreadable_->setWordWrap(true);
    unreadable_->hide();
    unreadableHead_->hide();
    takeButton_->setEnabled(false);
    setFocusProxy(choose);

    connect(choose, &LinkButton::clicked, this, &FleetPane::chooseFolder);
    connect(row_, &RunRow::startAsked, this, &FleetPane::start);
    connect(figure_, &QComboBox::currentIndexChanged, this, &FleetPane::showFigure);
    connect(&viewState, &ViewState::unitChanged, this, &FleetPane::showFigure);
    connect(takeButton_, &LinkButton::clicked, this, &FleetPane::takeSelected);
    connect(worst_, &QTableWidget::itemActivated, this, &FleetPane::takeSelected);
    connect(worst_, &QTableWidget::itemSelectionChanged, this,
            [this] { takeButton_->setEnabled(worst_->currentRow() >= 0); });
}

void FleetPane::setContent(const PaneContent& content) {
    content_ = content;
    tellAge();
}

void FleetPane::setFolder(const QString& folder) {
    folder_ = folder;
    folderLabel_->setText(QDir::toNativeSeparators(folder));
    folderLabel_->setToolTip(folderLabel_->text());
}

void FleetPane::chooseFolder() {
    auto* dialog = new QFileDialog(this, tr("Folder of measured units"), folder_);
    dialog->setFileMode(QFileDialog::Directory);
    dialog->setAttribute(Qt::WA_DeleteOnClose);
    connect(dialog, &QFileDialog::fileSelected, this, [this](const QString& folder) {
        setFolder(folder);
        start();
    });
    dialog->open();
}

void FleetPane::start() {
    if (folder_.isEmpty()) {
        chooseFolder();
        return;
    }
    if (!content_.project || row_->run().isRunning()) {
        return;
    }
    row_->start([this, project = content_.project,
                 folder = pathOf(folder_)](const BackgroundRun::Proceed& proceed) {
        FleetOptions options;
        declare_as_first_case(*project, options);
        Result result;
        options.proceed = [&](std::size_t done, std::size_t of) {
            const bool goesOn = proceed(static_cast<double>(done) / static_cast<double>(of));
            result.stopped = !goesOn;
            return goesOn;
        };
        const auto files = fleet_files(folder);
        if (files.empty()) {
            throw InputError({folder.string(), {}, {}}, "measurement files", "none");
        }
        result.units = run_fleet(*project, files, options);
        result.requirements = project->requirements;
        result.summary = summary_of(result.requirements, result.units);
        return [this, project, result] { take(project, result); };
    });
}

void FleetPane::take(const std::shared_ptr<const Project>& project, Result result) {
    judged_ = project;
    result_ = std::move(result);
    fillFigures();
    showUnits();
    tellAge();
}

void FleetPane::fillFigures() {
    const QString before = figure_->currentText();
    const QSignalBlocker blocker(figure_);
    figure_->clear();
    for (const FleetFigureChoice& choice : figureChoices(result_.units)) {
        figure_->addItem(choice.name);
    }
    figure_->setCurrentIndex(std::max(0, figure_->findText(before)));
    showFigure();
}

void FleetPane::showFigure() {
    const std::vector<FleetFigureChoice> choices = figureChoices(result_.units);
    const auto index = static_cast<std::size_t>(std::max(0, figure_->currentIndex()));
    if (index >= choices.size()) {
        histogram_->setValues({}, {}, [](double) { return QString(); });
        return;
    }
    const MeasureUnit unit = unit_of(measureOf(choices[index]));
    const bool hertz = viewState().showsHertz();
    histogram_->setValues(valuesOf(result_.units, choices[index]),
                          limitOf(result_.requirements, choices[index]),
                          [unit, hertz](double value) { return valueText(value, unit, hertz); });
}

void FleetPane::showUnits() {
    const FleetSummary& summary = result_.summary;
    counts_->setText(tr("%1 units: %2 met, %3 unmet, %4 not determined, %5 unreadable")
                         .arg(summary.units)
                         .arg(summary.met)
                         .arg(summary.unmet)
                         .arg(summary.undetermined)
                         .arg(summary.unreadable));
    worst_->setRowCount(static_cast<int>(summary.worst.size()));
    for (int row = 0; row < worst_->rowCount(); ++row) {
        const WorstUnit& unit = summary.worst[static_cast<std::size_t>(row)];
        const QString shareText = unit.share.is_value()
                                      ? numberText(unit.share.value())
                                      : figureText(unit.share, MeasureUnit::plain, false);
        worst_->setItem(row, file, new QTableWidgetItem(QString::fromStdString(unit.file)));
        worst_->setItem(row, requirement, new QTableWidgetItem(measureText(unit.measure)));
        worst_->setItem(row, share, new QTableWidgetItem(shareText));
    }
    worst_->resizeColumnsToContents();
    unreadable_->clear();
    for (const FleetUnit& unit : result_.units) {
        if (!unit.problem.empty()) {
            unreadable_->addItem(QString::fromStdString(unit.problem));
        }
    }
    unreadable_->setVisible(unreadable_->count() > 0);
    unreadableHead_->setVisible(unreadable_->count() > 0);
}

void FleetPane::tellAge() {
    if (!judged_ || row_->run().isRunning()) {
        return;
    }
    const bool isOld = content_.project && !(content_.project->compensator == judged_->compensator);
    row_->setNote(isOld             ? tr("of an earlier design")
                  : result_.stopped ? tr("stopped: the units judged so far")
                                    : QString());
}

void FleetPane::takeSelected() {
    const int row = worst_->currentRow();
    if (row >= 0 && !folder_.isEmpty()) {
        Q_EMIT unitAsked(QDir(folder_).filePath(worst_->item(row, file)->text()));
    }
}

} // namespace cornerwright
