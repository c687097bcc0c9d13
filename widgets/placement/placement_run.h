#pragma once

#include "widgets/document/undo_history.h"

#include <QObject>
#include <QStringList>

#include <atomic>
#include <thread>

namespace cornerwright {

/// Placement on a thread of its own, on a copy of the project. What it finds is handed over, never
/// written into a design that somebody is working on.
class PlacementRun : public QObject {
    Q_OBJECT

  public:
    using QObject::QObject;
    ~PlacementRun() override;

    bool isRunning() const { return running_; }
    /// Starts on this project; does nothing while a run is on.
    void start(ProjectPointer project);
    /// Stops soon; the best found so far is handed over all the same.
    void cancel();

  Q_SIGNALS:
    void progressed(double share);
    /// `start` is the project the run began with, `placed` the same with other corners.
    void finished(const cornerwright::ProjectPointer& start,
                  const cornerwright::ProjectPointer& placed, const QStringList& words);
    void failed(const QString& why);

  private:
    void work(const ProjectPointer& project);
    void end();

    std::thread thread_;
    std::atomic<bool> stop_ = false;
    bool running_ = false;
};

} // namespace cornerwright
