#include "widgets/window/design_commands.h"

#include "core/engine/kept_sample.h"
#include "core/numerics/error.h"
#include "widgets/chain/chain_panel.h"
#include "widgets/design/design_panel.h"
#include "widgets/design/tolerance_pane.h"
#include "widgets/design/uphill_watch.h"
#include "widgets/fleet/fleet_pane.h"
#include "widgets/window/file_flow.h"
#include "widgets/window/main_window.h"
#include "widgets/window/notice_strip.h"
#include "widgets/window/work_area.h"

#include <QAction>
#include <QKeySequence>
#include <QMenu>

#include <filesystem>

namespace cornerwright {

DesignCommands::DesignCommands(MainWindow& window)
    : QObject(&window), window_(window), uphill_(new UphillWatch(window.viewState(), this)) {
    const QString tips[design_kind_count] = {
        tr("One or two leads so that every case has the wanted phase margin"),
        tr("A lag or PI section for the error or rejection wanted"),
        tr("The gain for the steady-state error wanted"),
        tr("A notch wide enough for the resonance of every case"),
        tr("Poles for the attenuation wanted at high frequencies")};
    for (int i = 0; i < design_kind_count; ++i) {
        const auto kind = static_cast<DesignKind>(i);
        QAction* action =
            make(tr("%1 …").arg(nameOf(kind)),
                 QKeySequence(Qt::ALT | static_cast<Qt::Key>(Qt::Key_1 + i)), tips[i]);
        connect(action, &QAction::triggered, this, [this, kind] {
            window_.area().setWhole(nullptr);
            window_.chain().design().begin(kind);
        });
        designs_.push_back(action);
        window_.chain().designMenu()->addAction(action);
    }
    const std::pair<QString, QString> shown[] = {
        {QStringLiteral("room"), tr("&Room to move")},
        {QStringLiteral("tolerance"), tr("&Tolerance run")},
        {QStringLiteral("fleet"), tr("Judge a &fleet")},
    };
    const Qt::Key keys[] = {Qt::Key_R, Qt::Key_T, Qt::Key_F};
    const QString shownTips[] = {tr("How far each value may move before a requirement fails"),
                                 tr("Yield under spreads of plant and components"),
                                 tr("Every measured unit of a folder against this design")};
    for (std::size_t i = 0; i < std::size(keys); ++i) {
        QAction* action =
            make(shown[i].second, QKeySequence(Qt::CTRL | Qt::SHIFT | keys[i]), shownTips[i]);
        connect(action, &QAction::triggered, this, [this, key = shown[i].first] {
            window_.area().reveal(key, WorkArea::lower_right);
        });
        panes_.push_back(action);
    }
    connectTolerance();
    connectFleet();
}

QAction* DesignCommands::make(const QString& text, const QKeySequence& keys, const QString& tip) {
    auto* action = new QAction(text, this);
    action->setShortcut(keys);
    action->setToolTip(QStringLiteral("%1 (%2)").arg(tip, keys.toString(QKeySequence::NativeText)));
    action->setStatusTip(tip);
    window_.addAction(action);
    return action;
}

void DesignCommands::addTo(QMenu& menu) const {
    for (QAction* action : designs_) {
        menu.addAction(action);
    }
    menu.addSeparator();
    for (QAction* action : panes_) {
        menu.addAction(action);
    }
}

void DesignCommands::setContent(const PaneContent& content) {
    window_.chain().design().setContent(content);
    uphill_->setContent(content);
}

void DesignCommands::connectTolerance() {
    const auto* pane =
        qobject_cast<TolerancePane*>(window_.area().pane(QStringLiteral("tolerance")));
    connect(
        pane, &TolerancePane::keepAsked, this, [this](const LoopPlant& plant, const QString& name) {
            Document& document = window_.document();
            const std::filesystem::path folder(document.folder().toStdU16String());
            try {
                Project next = document.project();
                next.plant_cases.push_back(kept_case(next, plant, name.toStdString(), folder));
                document.apply(std::move(next), tr("Keep worst sample"));
            } catch (const WriteError& error) {
                window_.notices().show(NoticeStrip::Kind::problem, QString::fromUtf8(error.what()),
                                       QStringLiteral("tolerance"));
            }
        });
}

void DesignCommands::connectFleet() {
    const auto* pane = qobject_cast<FleetPane*>(window_.area().pane(QStringLiteral("fleet")));
    connect(pane, &FleetPane::unitAsked, this,
            [this](const QString& path) { window_.files().take({path}); });
}

} // namespace cornerwright
