#include "widgets/import/import_runner.h"

#include <exception>

namespace cornerwright {

ImportRunner::ImportRunner(QObject* parent) : QObject(parent), thread_([this] { work(); }) {}

ImportRunner::~ImportRunner() {
    {
        const std::lock_guard lock(mutex_);
        ending_ = true;
        waiting_.clear();
        stop_ = true;
    }
    wake_.notify_one();
    thread_.join();
}

void ImportRunner::request(int entry, const QString& path, const ImportChoices& choices,
                           ProjectPointer project) {
    wanted_[entry] = ++asked_;
    {
        const std::lock_guard lock(mutex_);
        std::erase_if(waiting_, [entry](const Request& other) { return other.entry == entry; });
        waiting_.push_back({asked_, entry, path, choices, std::move(project)});
        if (running_ == entry) {
            stop_ = true;
        }
    }
    wake_.notify_one();
}

void ImportRunner::cancel() {
    wanted_.clear();
    const std::lock_guard lock(mutex_);
    waiting_.clear();
    stop_ = true;
}

void ImportRunner::work() {
    while (true) {
        Request request;
        {
            std::unique_lock lock(mutex_);
            running_ = -1;
            wake_.wait(lock, [this] { return ending_ || !waiting_.empty(); });
            if (ending_) {
                return;
            }
            request = std::move(waiting_.front());
            waiting_.pop_front();
            running_ = request.entry;
            stop_ = false;
        }
        auto look = std::make_shared<ImportLook>();
        try {
            *look =
                lookAt(request.path, request.choices, *request.project, [this] { return !stop_; });
        } catch (const std::exception& error) {
            look->problem = QString::fromUtf8(error.what());
        }
        QMetaObject::invokeMethod(
            this,
            [this, number = request.number, entry = request.entry,
             done = ImportLookPointer(std::move(look))] { deliver(number, entry, done); },
            Qt::QueuedConnection);
    }
}

void ImportRunner::deliver(quint64 number, int entry, const ImportLookPointer& look) {
    const auto wanted = wanted_.find(entry);
    if (wanted != wanted_.end() && wanted->second == number) {
        wanted_.erase(wanted);
        Q_EMIT looked(entry, look);
    }
}

} // namespace cornerwright
