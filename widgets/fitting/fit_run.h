#pragma once

#include "core/fitting/fit.h"

#include <QObject>

#include <atomic>
#include <memory>
#include <thread>

namespace cornerwright {

/// A fit on a thread of its own, on points that nobody changes.
class FitRun : public QObject {
    Q_OBJECT

  public:
    using QObject::QObject;
    ~FitRun() override;

    bool isRunning() const { return running_; }
    /// Starts; does nothing while a run is on.
    void start(std::shared_ptr<const MeasuredResponse> measured, FitOptions options);
    /// Stops soon; the run ends with `stopped` and nothing is handed over.
    void cancel();

  Q_SIGNALS:
    void progressed(double share);
    void finished(const cornerwright::FitResult& result);
    void failed(const QString& why);
    void stopped();

  private:
    void work(const MeasuredResponse& measured, FitOptions options);
    template <class Report>
    void end(Report report);

    std::thread thread_;
    std::atomic<bool> stop_ = false;
    bool running_ = false;
};

} // namespace cornerwright
