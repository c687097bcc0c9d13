#pragma once

#include "core/project/project.h"

#include <QString>

#include <cstddef>
#include <deque>
#include <functional>
#include <memory>
#include <optional>

namespace cornerwright {

using ProjectPointer = std::shared_ptr<const Project>;

/// The values a project went through, each with the name of the step that made it. A step is undone
/// by going back to the value before it; nothing is ever replayed. The oldest steps are let go
/// beyond `maximumSteps`.
class UndoHistory {
  public:
    static constexpr std::size_t maximumSteps = 1000;

    explicit UndoHistory(ProjectPointer start);

    const ProjectPointer& current() const { return states_[index_].project; }

    /// Makes `next` the current value; steps that were undone are gone.
    void push(ProjectPointer next, const QString& what);

    bool canUndo() const { return index_ > 0; }
    bool canRedo() const { return index_ + 1 < states_.size(); }
    /// Name of the step that undo takes back, that redo does again; empty if there is none.
    QString undoText() const;
    QString redoText() const;
    void undo();
    void redo();

    /// The current value is what the file holds.
    void markClean() { clean_ = index_; }
    /// No value of this history is what the file holds (a recovered copy).
    void markNeverClean() { clean_.reset(); }
    bool isClean() const { return clean_ == index_; }

    /// Replaces every value, for a change that is none of the design: file names told from another
    /// folder.
    void rewrite(const std::function<ProjectPointer(const Project&)>& change);

  private:
    struct StateAndStep {
        ProjectPointer project;
        QString what; ///< the step that led here
    };

    std::deque<StateAndStep> states_;
    std::size_t index_ = 0;
    std::optional<std::size_t> clean_ = 0;
};

} // namespace cornerwright
