#include "gesture_hand.h"

#include "core/engine/engine.h"
#include "sample_content.h"

#include <QApplication>
#include <QMouseEvent>
#include <QSignalSpy>
#include <QWheelEvent>

#include <algorithm>

namespace cornerwright {

namespace {

constexpr int longest_wait = 20000; // ms
constexpr int steps_of_drag = 5;

void send(const PlotPane& pane, QEvent::Type type, const QPointF& at, Qt::MouseButton button,
          Qt::MouseButtons buttons, Qt::KeyboardModifiers keys) {
    QWidget* plot = pane.plotWidget();
    QMouseEvent event(type, at, plot->mapToGlobal(at), button, buttons, keys);
    QApplication::sendEvent(plot, &event);
}

} // namespace

GestureTest::GestureTest() : original_(sample::servoProject()) {
    window.document().reset(original_, QString(), QString());
    window.resize(1600, 950);
    window.show();
    settle();
}

void GestureTest::settle() {
    QSignalSpy changed(&window.live(), &LiveContent::contentChanged);
    while (window.live().runner().isBusy())
        ASSERT_TRUE(changed.wait(longest_wait));
    QCoreApplication::processEvents();
    QCoreApplication::processEvents(); // replots are queued
}

PlotPane& GestureTest::pane(const QString& key) {
    if (!window.area().isShown(key))
        window.area().show(key, WorkArea::lower_centre);
    settle();
    auto* found = qobject_cast<PlotPane*>(window.area().pane(key));
    EXPECT_NE(found, nullptr) << key.toStdString();
    return *found;
}

Handle GestureTest::handle(const PlotPane& pane, const QString& name) {
    const auto& all = pane.handles();
    const auto found = std::find_if(
        all.begin(), all.end(), [&](const Handle& handle) { return handle.name.contains(name); });
    if (found != all.end())
        return *found;
    ADD_FAILURE() << "no handle " << name.toStdString() << " on " << pane.title().toStdString();
    return {};
}

void GestureTest::press(PlotPane& pane, const QPointF& at, Qt::KeyboardModifiers keys) {
    send(pane, QEvent::MouseButtonPress, at, Qt::LeftButton, Qt::LeftButton, keys);
}

void GestureTest::move(PlotPane& pane, const QPointF& to, Qt::KeyboardModifiers keys) {
    send(pane, QEvent::MouseMove, to, Qt::NoButton, Qt::LeftButton, keys);
}

void GestureTest::release(PlotPane& pane, const QPointF& at) {
    send(pane, QEvent::MouseButtonRelease, at, Qt::LeftButton, Qt::NoButton, {});
}

void GestureTest::wheel(PlotPane& pane, const QPointF& at, int notches,
                        Qt::KeyboardModifiers keys) {
    QWidget* plot = pane.plotWidget();
    constexpr int units_of_notch = 120;
    QWheelEvent event(at, plot->mapToGlobal(at), {}, QPoint(0, units_of_notch * notches),
                      Qt::NoButton, keys, Qt::NoScrollPhase, false);
    QApplication::sendEvent(plot, &event);
    settle();
}

void GestureTest::drag(PlotPane& pane, QPointF from, QPointF by, Qt::KeyboardModifiers keys) {
    press(pane, from, keys);
    for (int step = 1; step <= steps_of_drag; ++step) {
        move(pane, from + by * step / steps_of_drag, keys);
        QCoreApplication::processEvents();
    }
    release(pane, from + by);
    settle();
}

void GestureTest::expectFiguresFollow() {
    ASSERT_NE(window.live().content().assessment, nullptr);
    EXPECT_EQ(window.live().content().assessment->verdict, Engine().assess(project())->verdict);
}

void GestureTest::expectOneUndoStep() {
    ASSERT_TRUE(window.document().canUndo());
    EXPECT_NE(project(), original_);
    window.document().undo();
    EXPECT_EQ(project(), original_);
    EXPECT_FALSE(window.document().canUndo());
    settle();
    expectFiguresFollow();
}

} // namespace cornerwright
