#include "app/window/test_report.h"

#include "app/window/measurement_report.h"
#include "app/window/menu_report.h"
#include "widgets/chain/chain_panel.h"
#include "widgets/chain/section_card.h"
#include "widgets/design/design_panel.h"
#include "widgets/design/run_row.h"
#include "widgets/design/tolerance_pane.h"
#include "widgets/fitting/fit_panel.h"
#include "widgets/help/help_panel.h"
#include "widgets/import/import_panel.h"
#include "widgets/ledger/ledger_model.h"
#include "widgets/ledger/ledger_panel.h"
#include "widgets/panes/plot_pane.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/placement/placement_run.h"
#include "widgets/window/main_window.h"
#include "widgets/window/measurement_flow.h"
#include "widgets/window/notice_strip.h"
#include "widgets/window/work_area.h"

#include <QApplication>
#include <QCryptographicHash>
#include <QJsonArray>
#include <QJsonDocument>
#include <QJsonObject>
#include <QMenuBar>
#include <QSaveFile>

namespace cornerwright {

namespace {

QJsonValue figureOf(const Figure& figure) {
    return figure.is_value() ? QJsonValue(figure.value()) : QJsonValue();
}

QJsonArray ledgerOf(const LedgerModel& model) {
    QJsonArray rows;
    for (int row = 0; row < model.rowCount(); ++row) {
        const RequirementResult& result = model.result(row);
        const std::string_view measure = name_of(result.requirement.measure);
        const std::string_view state = name_of(result.worst.state);
        rows.append(QJsonObject{
            {QStringLiteral("measure"), QString::fromUtf8(measure.data(), std::ssize(measure))},
            {QStringLiteral("state"), QString::fromUtf8(state.data(), std::ssize(state))},
            {QStringLiteral("case"), QString::fromStdString(result.worst.case_name)},
            {QStringLiteral("worst"), figureOf(result.worst.value)},
            {QStringLiteral("headroom"), figureOf(result.worst.headroom)},
            {QStringLiteral("shown"), model.index(row, LedgerModel::worst).data().toString()}});
    }
    return rows;
}

QJsonArray handlesOf(const PlotPane& pane) {
    QJsonArray handles;
    for (const Handle& handle : pane.handles()) {
        const QPoint at = pane.plotWidget()->mapToGlobal(handle.at.toPoint());
        handles.append(QJsonObject{{QStringLiteral("name"), handle.name},
                                   {QStringLiteral("x"), at.x()},
                                   {QStringLiteral("y"), at.y()}});
    }
    return handles;
}

QJsonArray noticesOf(const NoticeStrip& strip) {
    QJsonArray notices;
    for (const QFrame* notice :
         strip.findChildren<QFrame*>(QString(), Qt::FindDirectChildrenOnly)) {
        if (!notice->isVisible()) {
            continue;
        }
        QJsonArray choices;
        for (const LinkButton* button : notice->findChildren<LinkButton*>()) {
            QJsonObject choice = placeOf(*button);
            choice[QStringLiteral("text")] = button->text();
            choices.append(choice);
        }
        notices.append(QJsonObject{{QStringLiteral("text"), notice->accessibleDescription()},
                                   {QStringLiteral("choices"), choices}});
    }
    return notices;
}

TolerancePane& tolerancePaneOf(MainWindow& window) {
    return *qobject_cast<TolerancePane*>(window.area().pane(QStringLiteral("tolerance")));
}

QJsonObject designOf(const DesignPanel& panel) {
    return {{QStringLiteral("open"), panel.isOpen()},
            {QStringLiteral("busy"), panel.isBusy()},
            {QStringLiteral("possible"), panel.isPossible()},
            {QStringLiteral("words"), panel.words()}};
}

} // namespace

TestReport::TestReport(MainWindow& window, const QString& file)
    : QObject(&window), window_(window), file_(file) {
    // Written when the event loop has come to rest, so that layout and painting are done.
    later_.setSingleShot(true);
    later_.setInterval(50);
    connect(&later_, &QTimer::timeout, this, &TestReport::write);
    const auto soon = [this] { later_.start(); };
    connect(&window.live(), &LiveContent::contentChanged, this, soon);
    connect(&window.document(), &Document::historyChanged, this, soon);
    connect(&window.document(), &Document::fileChanged, this, soon);
    connect(&window.chain().design(), &DesignPanel::changed, this, soon);
    connect(&window.placement(), &PlacementRun::finished, this, soon);
    connect(&window.placement(), &PlacementRun::failed, this, soon);
    connect(&tolerancePaneOf(window).row().run(), &BackgroundRun::ended, this, soon);
    connect(&window.measurements().importPanel(), &ImportPanel::refreshed, this, soon);
    connect(&window.measurements().importPanel(), &ImportPanel::closed, this, soon);
    connect(&window.measurements().fitPanel(), &FitPanel::refreshed, this, soon);
    connect(&window.measurements().fitPanel(), &FitPanel::closed, this, soon);
    connect(&window.area(), &WorkArea::layoutChanged, this, soon);
    connect(&window.viewState(), &ViewState::hiddenCasesChanged, this, soon);
    qApp->installEventFilter(this);
    soon();
}

bool TestReport::eventFilter(QObject* watched, QEvent* event) {
    const bool comesOrGoes = event->type() == QEvent::Show || event->type() == QEvent::Hide;
    if (comesOrGoes && watched->isWidgetType()) {
        later_.start();
    }
    return false;
}

void TestReport::write() {
    QJsonObject report;
    report[QStringLiteral("number")] = ++number_;
    report[QStringLiteral("busy")] = window_.live().runner().isBusy();
    report[QStringLiteral("modified")] = window_.document().isModified();
    report[QStringLiteral("placing")] = window_.placement().isRunning();
    report[QStringLiteral("can_undo")] = window_.document().canUndo();
    report[QStringLiteral("file")] = window_.document().filePath();
    report[QStringLiteral("project")] = QString::fromLatin1(
        QCryptographicHash::hash(QByteArray::fromStdString(to_text(window_.document().project())),
                                 QCryptographicHash::Sha256)
            .toHex());
    const QWidget* dialog = QApplication::activeModalWidget();
    report[QStringLiteral("dialog")] = dialog == nullptr ? QString() : dialog->windowTitle();
    report[QStringLiteral("menu_bar")] = menuBarReport(*window_.menuBar());
    report[QStringLiteral("open_menus")] = openMenusReport();
    report[QStringLiteral("help")] =
        window_.help().isVisible() ? window_.help().topic() : QString();
    report[QStringLiteral("window")] = placeOf(window_);
    report[QStringLiteral("ledger")] = ledgerOf(*window_.ledger().model());
    report[QStringLiteral("design")] = designOf(window_.chain().design());
    report[QStringLiteral("tolerance")] = tolerancePaneOf(window_).yieldText();
    report[QStringLiteral("notices")] = noticesOf(window_.notices());
    const PaneContent& content = window_.live().content();
    report[QStringLiteral("import")] = importReport(window_.measurements().importPanel());
    report[QStringLiteral("fit")] = fitReport(window_.measurements().fitPanel());
    report[QStringLiteral("cases")] =
        caseReport(window_.document().project(), content.assessment.get());
    report[QStringLiteral("locus")] = content.locus && !content.locus->branches.empty();
    QJsonObject panes;
    for (const auto& [key, pane] : window_.area().panes()) {
        QJsonObject entry = placeOf(*pane);
        if (const auto* plot = qobject_cast<const PlotPane*>(pane)) {
            entry[QStringLiteral("handles")] = handlesOf(*plot);
        }
        panes[key] = entry;
    }
    report[QStringLiteral("panes")] = panes;
    QJsonArray cards;
    for (const SectionCard* card : window_.chain().cards()) {
        QJsonObject entry = placeOf(*card);
        QJsonArray fields;
        for (const QuantityField* field : card->fields()) {
            QJsonObject shown = placeOf(*field);
            shown[QStringLiteral("name")] = field->accessibleName();
            shown[QStringLiteral("value")] = field->value().value_or(0.0);
            fields.append(shown);
        }
        entry[QStringLiteral("fields")] = fields;
        cards.append(entry);
    }
    report[QStringLiteral("cards")] = cards;
    QSaveFile out(file_);
    if (out.open(QIODevice::WriteOnly)) {
        out.write(QJsonDocument(report).toJson());
        out.commit();
    }
}

} // namespace cornerwright
