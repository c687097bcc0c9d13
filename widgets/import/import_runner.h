#pragma once

#include "widgets/document/undo_history.h"
#include "widgets/import/import_look.h"

#include <QObject>

#include <atomic>
#include <condition_variable>
#include <deque>
#include <map>
#include <memory>
#include <mutex>
#include <thread>

namespace cornerwright {

using ImportLookPointer = std::shared_ptr<const ImportLook>;

/// Reads measurement files on a thread of its own. The latest request for a file wins; an older one
/// is dropped, or stopped where it runs.
class ImportRunner : public QObject {
    Q_OBJECT

  public:
    explicit ImportRunner(QObject* parent = nullptr);
    ~ImportRunner() override;

    void request(int entry, const QString& path, const ImportChoices& choices,
                 ProjectPointer project);
    /// Drops everything.
    void cancel();
    bool isBusy() const { return !wanted_.empty(); }

  Q_SIGNALS:
    void looked(int entry, const cornerwright::ImportLookPointer& look);

  private:
    struct Request {
        quint64 number = 0;
        int entry = 0;
        QString path;
        ImportChoices choices;
        ProjectPointer project;
    };

    void work();
    void deliver(quint64 number, int entry, const ImportLookPointer& look);

    quint64 asked_ = 0;             ///< this object's thread only
    std::map<int, quint64> wanted_; ///< the newest request of each entry; this object's thread only

    std::mutex mutex_;
    std::condition_variable wake_;
    std::deque<Request> waiting_; ///< under the mutex
    int running_ = -1;            ///< the entry at work; under the mutex
    bool ending_ = false;         ///< under the mutex
    std::atomic<bool> stop_ = false;
    std::thread thread_;
};

} // namespace cornerwright
