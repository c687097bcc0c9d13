#include "widgets/document/undo_history.h"

namespace cornerwright {

UndoHistory::UndoHistory(ProjectPointer start) {
    states_.push_back({std::move(start), {}});
}

void UndoHistory::push(ProjectPointer next, const QString& what) {
    states_.resize(index_ + 1);
    if (clean_ && *clean_ > index_) {
        clean_.reset();
    }
    states_.push_back({std::move(next), what});
    ++index_;
    if (states_.size() > maximumSteps + 1) {
        states_.pop_front();
        --index_;
        if (clean_) {
            clean_ = *clean_ == 0 ? std::nullopt : std::optional(*clean_ - 1);
        }
    }
}

QString UndoHistory::undoText() const {
    return canUndo() ? states_[index_].what : QString();
}

QString UndoHistory::redoText() const {
    return canRedo() ? states_[index_ + 1].what : QString();
}

void UndoHistory::undo() {
    if (canUndo()) {
        --index_;
    }
}

void UndoHistory::redo() {
    if (canRedo()) {
        ++index_;
    }
}

void UndoHistory::rewrite(const std::function<ProjectPointer(const Project&)>& change) {
    for (StateAndStep& state : states_) {
        state.project = change(*state.project);
    }
}

} // namespace cornerwright
