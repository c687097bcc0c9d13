#include "app/window/frame_times.h"

#include "widgets/panes/plot_pane.h"
#include "widgets/window/main_window.h"
#include "widgets/window/work_area.h"

#include <QApplication>
#include <QInputEvent>
#include <QTextStream>

#include <algorithm>
#include <chrono>

namespace cornerwright {

namespace {

constexpr std::int64_t ns_of_ms = 1'000'000;
/// A stamp further back than this is of another clock.
constexpr std::int64_t longest_wait_ms = 10'000;

std::int64_t now_ns() {
    return std::chrono::duration_cast<std::chrono::nanoseconds>(
               std::chrono::steady_clock::now().time_since_epoch())
        .count();
}

QString kindOf(QEvent::Type type) {
    switch (type) {
    case QEvent::MouseMove:
        return QStringLiteral("move");
    case QEvent::MouseButtonPress:
        return QStringLiteral("press");
    case QEvent::MouseButtonRelease:
        return QStringLiteral("release");
    case QEvent::Wheel:
        return QStringLiteral("wheel");
    case QEvent::KeyPress:
        return QStringLiteral("key");
    default:
        return {};
    }
}

} // namespace

FrameTimes::FrameTimes(MainWindow& window, const QString& file)
    : QObject(&window), window_(window), file_(file) {
    if (file_.open(QIODevice::WriteOnly | QIODevice::Text))
        file_.write("kind,from_delivery_ms,from_stamp_ms,overtaken\n");
    qApp->installEventFilter(this);
    connect(&window.document(), &Document::projectChanged, this, &FrameTimes::takeChange);
    // After every pane has taken the content.
    connect(&window.live(), &LiveContent::contentChanged, this, &FrameTimes::takeContent);
}

bool FrameTimes::eventFilter(QObject* watched, QEvent* event) {
    const QString kind = watched->isWindowType() ? kindOf(event->type()) : QString();
    if (!kind.isEmpty())
        input_ = {kind, now_ns(),
                  static_cast<std::int64_t>(static_cast<QInputEvent*>(event)->timestamp())};
    const bool paints = event->type() == QEvent::UpdateRequest;
    if (paints && answered_ > 0 && !frameIsDue_ && panesAreUpToDate()) {
        // Called when this event, and with it the painting, has been dealt with.
        frameIsDue_ = true;
        QMetaObject::invokeMethod(this, &FrameTimes::framePainted, Qt::QueuedConnection);
    }
    return QObject::eventFilter(watched, event);
}

void FrameTimes::takeChange() {
    if (!input_.kind.isEmpty())
        waiting_.push_back({input_, window_.document().shared(), false});
    input_ = {};
}

void FrameTimes::takeContent() {
    const auto& assessed = window_.live().content().project;
    const auto found = std::find_if(waiting_.rbegin(), waiting_.rend(), [&](const Change& change) {
        return change.project == assessed;
    });
    if (found == waiting_.rend())
        return;
    const auto end = static_cast<std::size_t>(waiting_.rend() - found);
    for (std::size_t i = answered_; i + 1 < end; ++i)
        waiting_[i].overtaken = true;
    answered_ = std::max(answered_, end);
}

bool FrameTimes::panesAreUpToDate() const {
    const auto& panes = window_.area().panes();
    return std::all_of(panes.begin(), panes.end(), [](const auto& entry) {
        const auto* plot = qobject_cast<const PlotPane*>(entry.second);
        return plot == nullptr || !plot->isVisible() || plot->isUpToDate();
    });
}

void FrameTimes::framePainted() {
    frameIsDue_ = false;
    const std::int64_t now = now_ns();
    QTextStream out(&file_);
    for (std::size_t i = 0; i < answered_; ++i) {
        const Change& change = waiting_[i];
        const std::int64_t waited_ms = now / ns_of_ms - change.input.stamped_ms;
        const bool isSameClock = waited_ms >= 0 && waited_ms < longest_wait_ms;
        out << change.input.kind << ','
            << static_cast<double>(now - change.input.delivered_ns) / ns_of_ms << ','
            << (isSameClock ? QString::number(waited_ms) : QString()) << ','
            << (change.overtaken ? 1 : 0) << '\n';
    }
    out.flush();
    file_.flush();
    waiting_.erase(waiting_.begin(), waiting_.begin() + static_cast<std::ptrdiff_t>(answered_));
    answered_ = 0;
}

} // namespace cornerwright
