#include "widgets/design/latest_worker.h"

#include <sys/resource.h>
#include <unistd.h>
#include <utility>

namespace cornerwright {

namespace {

/// A tenth of a busy processor at most, yet never nothing: a thread that gets nothing at all could
/// hold a lock that a frame waits for.
void standBehind() {
    constexpr int niceness = 10;
    // Where the system refuses, the thread runs like any other.
    setpriority(PRIO_PROCESS, static_cast<id_t>(gettid()), niceness);
}

} // namespace

LatestWorker::LatestWorker(Haste haste, QObject* parent)
    : QObject(parent), thread_([this, haste] {
          if (haste == Haste::behind) {
              standBehind();
          }
          work();
      }) {}

LatestWorker::~LatestWorker() {
    {
        const std::lock_guard lock(mutex_);
        stopping_ = true;
        waiting_.reset();
    }
    wake_.notify_one();
    thread_.join();
}

void LatestWorker::request(Task task) {
    ++asked_;
    {
        const std::lock_guard lock(mutex_);
        waiting_ = {asked_, std::move(task)};
    }
    wake_.notify_one();
}

void LatestWorker::cancel() {
    {
        const std::lock_guard lock(mutex_);
        waiting_.reset();
    }
    delivered_ = ++asked_;
}

void LatestWorker::work() {
    while (true) {
        std::pair<quint64, Task> next;
        {
            std::unique_lock lock(mutex_);
            wake_.wait(lock, [this] { return stopping_ || waiting_; });
            if (stopping_) {
                return;
            }
            next = std::move(*waiting_);
            waiting_.reset();
        }
        const std::function<void()> result = next.second();
        QMetaObject::invokeMethod(
            this, [this, number = next.first, result] { deliver(number, result); },
            Qt::QueuedConnection);
    }
}

void LatestWorker::deliver(quint64 number, const std::function<void()>& result) {
    if (number == asked_ && number > delivered_) {
        delivered_ = number;
        result();
    }
}

} // namespace cornerwright
