#include "widgets/design/latest_worker.h"

#include <QThread>

#include <utility>

namespace cornerwright {

LatestWorker::LatestWorker(QObject* parent)
    : QObject(parent), thread_(QThread::create([this] { work(); })) {
    thread_->start(QThread::IdlePriority);
}

LatestWorker::~LatestWorker() {
    {
        const std::lock_guard lock(mutex_);
        stopping_ = true;
        waiting_.reset();
    }
    wake_.notify_one();
    thread_->wait();
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
