#include "widgets/document/assessment_runner.h"

#include "core/engine/engine.h"

#include <exception>

namespace cornerwright {

AssessmentRunner::AssessmentRunner(QObject* parent)
    : QObject(parent), thread_([this] { work(); }) {}

AssessmentRunner::~AssessmentRunner() {
    {
        const std::lock_guard lock(mutex_);
        stopping_ = true;
        waiting_.reset();
    }
    wake_.notify_one();
    thread_.join();
}

void AssessmentRunner::request(ProjectPointer project, std::size_t locusCase) {
    const bool wasBusy = isBusy();
    ++asked_;
    {
        const std::lock_guard lock(mutex_);
        waiting_ = Request{asked_, std::move(project), locusCase};
    }
    wake_.notify_one();
    if (!wasBusy) {
        Q_EMIT busyChanged(true);
    }
}

void AssessmentRunner::cancel() {
    {
        const std::lock_guard lock(mutex_);
        waiting_.reset();
    }
    const bool wasBusy = isBusy();
    cancelled_ = asked_;
    delivered_ = asked_;
    if (wasBusy) {
        Q_EMIT busyChanged(false);
    }
}

void AssessmentRunner::work() {
    Engine engine;
    while (true) {
        Request request;
        {
            std::unique_lock lock(mutex_);
            wake_.wait(lock, [this] { return stopping_ || waiting_; });
            if (stopping_) {
                return;
            }
            request = std::move(*waiting_);
            waiting_.reset();
        }
        const quint64 number = request.number;
        try {
            AssessedProject result;
            result.project = request.project;
            result.assessment = engine.assess(*request.project);
            result.locusCase = request.locusCase;
            if (request.locusCase < request.project->plant_cases.size()) {
                result.locus = engine.locus(*request.project, request.locusCase);
            }
            QMetaObject::invokeMethod(
                this, [this, number, result] { deliver(number, result); }, Qt::QueuedConnection);
        } catch (const std::exception& error) {
            const QString why = QString::fromUtf8(error.what());
            QMetaObject::invokeMethod(
                this, [this, number, why] { deliverFailure(number, why); }, Qt::QueuedConnection);
            engine = Engine(); // whatever broke may have left its memory half written
        }
    }
}

bool AssessmentRunner::accept(quint64 number) {
    if (number <= cancelled_) {
        return false;
    }
    delivered_ = number;
    return true;
}

void AssessmentRunner::deliver(quint64 number, const AssessedProject& result) {
    if (accept(number)) {
        Q_EMIT assessed(result);
        if (!isBusy()) {
            Q_EMIT busyChanged(false);
        }
    }
}

void AssessmentRunner::deliverFailure(quint64 number, const QString& why) {
    if (accept(number)) {
        Q_EMIT failed(why);
        if (!isBusy()) {
            Q_EMIT busyChanged(false);
        }
    }
}

} // namespace cornerwright
