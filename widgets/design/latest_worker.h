#pragma once

#include <QObject>

#include <condition_variable>
#include <functional>
#include <mutex>
#include <optional>
#include <thread>

namespace cornerwright {

/// A thread on which the latest task wins: one that is overtaken before its turn is never run, and
/// what an overtaken one found is thrown away.
class LatestWorker : public QObject {
    Q_OBJECT

  public:
    /// Runs on the thread; what it returns is called on the owner's thread.
    using Task = std::function<std::function<void()>()>;

    enum class Haste {
        usual,
        behind, ///< after everything else that wants a processor, so that no frame waits for it
    };

    explicit LatestWorker(Haste haste = Haste::usual, QObject* parent = nullptr);
    ~LatestWorker() override;

    void request(Task task);
    /// Drops what waits and what runs.
    void cancel();
    bool isBusy() const { return asked_ != delivered_; }

  private:
    void work();
    void deliver(quint64 number, const std::function<void()>& result);

    quint64 asked_ = 0;
    quint64 delivered_ = 0;
    std::mutex mutex_;
    std::condition_variable wake_;
    std::optional<std::pair<quint64, Task>> waiting_;
    bool stopping_ = false;
    std::thread thread_;
};

} // namespace cornerwright
