#pragma once

#include <QObject>
#include <QString>

#include <atomic>
#include <functional>
#include <thread>

namespace cornerwright {

/// One long computation on a thread of its own, with progress and cancel.
class BackgroundRun : public QObject {
    Q_OBJECT

  public:
    /// Told the part done, 0 to 1, from any thread; false: stop soon.
    using Proceed = std::function<bool(double)>;
    /// Runs on the thread; what it returns is called on the owner's thread.
    using Task = std::function<std::function<void()>(const Proceed&)>;

    using QObject::QObject;
    ~BackgroundRun() override;

    bool isRunning() const { return running_; }
    /// Does nothing while a run is on.
    void start(Task task);
    /// Stops soon; what was found so far is handed over all the same.
    void cancel() { stop_ = true; }

  Q_SIGNALS:
    void progressed(double part);
    /// After the result was handed over, or after `failed`.
    void ended();
    void failed(const QString& why);

  private:
    void work(const Task& task);
    bool proceed(double part);
    void finish(const std::function<void()>& result);

    std::thread thread_;
    std::atomic<bool> stop_ = false;
    std::atomic<int> told_ = -1; ///< progress last told, in thousandths
    bool running_ = false;
};

} // namespace cornerwright
