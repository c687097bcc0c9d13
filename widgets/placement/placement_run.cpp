#include "widgets/placement/placement_run.h"

#include "core/engine/placement_problem.h"
#include "core/placement/placement.h"

#include <exception>

namespace cornerwright {

PlacementRun::~PlacementRun() {
    stop_ = true;
    if (thread_.joinable()) {
        thread_.join();
    }
}

void PlacementRun::start(ProjectPointer project) {
    if (running_) {
        return;
    }
    stop_ = false;
    running_ = true;
    thread_ = std::thread([this, project = std::move(project)] { work(project); });
}

void PlacementRun::cancel() {
    stop_ = true;
}

void PlacementRun::work(const ProjectPointer& project) {
    PlacementOptions options;
    options.proceed = [this](double share, double) {
        QMetaObject::invokeMethod(
            this, [this, share] { Q_EMIT progressed(share); }, Qt::QueuedConnection);
        return !stop_;
    };
    try {
        const PlacementResult result = place(placement_problem_of(*project), options);
        auto placed = std::make_shared<Project>(*project);
        placed->compensator = result.compensator;
        QStringList words;
        for (const std::string& word : result.words) {
            words << QString::fromStdString(word);
        }
        QMetaObject::invokeMethod(
            this,
            [this, project, placed, words] {
                end();
                Q_EMIT finished(project, placed, words);
            },
            Qt::QueuedConnection);
    } catch (const std::exception& error) {
        const QString why = QString::fromUtf8(error.what());
        QMetaObject::invokeMethod(
            this,
            [this, why] {
                end();
                Q_EMIT failed(why);
            },
            Qt::QueuedConnection);
    }
}

void PlacementRun::end() {
    thread_.join();
    running_ = false;
}

} // namespace cornerwright
