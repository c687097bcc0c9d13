#pragma once

#include "widgets/panes/plot_pane.h"
#include "widgets/window/main_window.h"
#include "widgets/window/work_area.h"

#include <QTemporaryDir>
#include <gtest/gtest.h>

namespace cornerwright {

/// A hand on the panes of a real window (off screen) with the servo project, its figures settled.
class GestureTest : public testing::Test {
  protected:
    GestureTest();

    /// Waits until every edit is assessed and drawn.
    void settle();
    /// Brings a pane into the lower centre (or leaves it where it is shown) and gives it.
    PlotPane& pane(const QString& key);
    /// The handle whose name contains `name`; fails the test where there is none.
    Handle handle(const PlotPane& pane, const QString& name);

    void press(PlotPane& pane, const QPointF& at, Qt::KeyboardModifiers keys = {});
    void move(PlotPane& pane, const QPointF& to, Qt::KeyboardModifiers keys = {});
    void release(PlotPane& pane, const QPointF& at);
    void wheel(PlotPane& pane, const QPointF& at, int notches, Qt::KeyboardModifiers keys = {});
    /// Press, some moves on the straight way, release; then everything is settled.
    void drag(PlotPane& pane, QPointF from, QPointF by, Qt::KeyboardModifiers keys = {});

    const Project& project() { return window.document().project(); }
    const Project& original() const { return original_; }
    const Section& section(std::size_t index) { return project().compensator.at(index); }
    /// The ledger shows what a fresh engine says of the present project.
    void expectFiguresFollow();
    /// One undo leads back to the original, and there is no step before it.
    void expectOneUndoStep();

    QTemporaryDir folder;
    MainWindow window{{folder.filePath(QStringLiteral("window.ini")),
                       folder.filePath(QStringLiteral("recovery"))}};

  private:
    Project original_;
};

} // namespace cornerwright
