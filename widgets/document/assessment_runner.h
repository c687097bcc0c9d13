#pragma once

#include "core/engine/assessment.h"
#include "widgets/document/undo_history.h"

#include <QObject>

#include <condition_variable>
#include <cstddef>
#include <memory>
#include <mutex>
#include <optional>
#include <thread>

namespace cornerwright {

/// What came out for one project, and the project it belongs to.
struct AssessedProject {
    ProjectPointer project;
    std::shared_ptr<const Assessment> assessment;
    std::size_t locusCase = 0;
    std::shared_ptr<const RootLocus> locus; ///< of `locusCase`; null where none could be made
};

/// Keeps an engine on a thread of its own and assesses what it is asked for. The latest request
/// wins: one that was overtaken before its turn came is never computed, so that a fast hand costs
/// no more than a slow one. Results come as signals in the thread of this object.
class AssessmentRunner : public QObject {
    Q_OBJECT

  public:
    explicit AssessmentRunner(QObject* parent = nullptr);
    ~AssessmentRunner() override;

    /// Asks for the assessment of `project` and the root locus of its case `locusCase`.
    void request(ProjectPointer project, std::size_t locusCase);
    /// Drops what waits and the result of what runs.
    void cancel();
    /// A request waits, runs, or its result is on the way.
    bool isBusy() const { return delivered_ != asked_; }

  Q_SIGNALS:
    void assessed(const cornerwright::AssessedProject& result);
    /// Something broke that is not the user's input; a sentence for the user.
    void failed(const QString& why);
    void busyChanged(bool busy);

  private:
    struct Request {
        quint64 number = 0;
        ProjectPointer project;
        std::size_t locusCase = 0;
    };

    void work();
    void deliver(quint64 number, const AssessedProject& result);
    void deliverFailure(quint64 number, const QString& why);
    /// True where the answer to this request is still wanted; then it counts as delivered.
    bool accept(quint64 number);

    quint64 asked_ = 0;     ///< number of the last request; this object's thread only
    quint64 delivered_ = 0; ///< number of the last answer; this object's thread only
    quint64 cancelled_ = 0; ///< answers up to this number are dropped; this object's thread only

    std::mutex mutex_;
    std::condition_variable wake_;
    std::optional<Request> waiting_; ///< under the mutex
    bool stopping_ = false;          ///< under the mutex
    std::thread thread_;
};

} // namespace cornerwright
