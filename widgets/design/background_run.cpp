#include "widgets/design/background_run.h"

#include <exception>
#include <utility>

namespace cornerwright {

BackgroundRun::~BackgroundRun() {
    stop_ = true;
    if (thread_.joinable()) {
        thread_.join();
    }
}

void BackgroundRun::start(Task task) {
    if (running_) {
        return;
    }
    running_ = true;
    stop_ = false;
    told_ = -1;
    thread_ = std::thread([this, task = std::move(task)] { work(task); });
}

bool BackgroundRun::proceed(double part) {
    constexpr int steps = 200; // finer progress than a person sees would only fill the event queue
    const int now = static_cast<int>(steps * part);
    if (told_.exchange(now) != now) {
        QMetaObject::invokeMethod(
            this, [this, part] { Q_EMIT progressed(part); }, Qt::QueuedConnection);
    }
    return !stop_;
}

void BackgroundRun::work(const Task& task) {
    std::function<void()> result;
    try {
        result = task([this](double part) { return proceed(part); });
    } catch (const std::exception& error) {
        const QString why = QString::fromUtf8(error.what());
        result = [this, why] { Q_EMIT failed(why); };
    }
    QMetaObject::invokeMethod(
        this, [this, result] { finish(result); }, Qt::QueuedConnection);
}

void BackgroundRun::finish(const std::function<void()>& result) {
    thread_.join();
    running_ = false;
    result();
    Q_EMIT ended();
}

} // namespace cornerwright
