#include "widgets/trials/trial_book.h"

namespace cornerwright {

const Trial* TrialBook::comparedTrial() const {
    return compared_ ? &trials_[*compared_] : nullptr;
}

void TrialBook::keep(ProjectPointer project, std::shared_ptr<const Assessment> assessment) {
    trials_.push_back(
        {tr("trial %1").arg(nextNumber_++), std::move(project), std::move(assessment)});
    compared_ = trials_.size() - 1;
    Q_EMIT changed();
}

void TrialBook::rename(std::size_t index, const QString& name) {
    if (!name.isEmpty() && trials_.at(index).name != name) {
        trials_[index].name = name;
        Q_EMIT changed();
    }
}

void TrialBook::remove(std::size_t index) {
    trials_.erase(trials_.begin() + static_cast<std::ptrdiff_t>(index));
    if (compared_ == index) {
        compared_.reset();
    } else if (compared_ && *compared_ > index) {
        --*compared_;
    }
    Q_EMIT changed();
}

void TrialBook::compare(std::optional<std::size_t> index) {
    if (compared_ != index) {
        compared_ = index;
        Q_EMIT changed();
    }
}

void TrialBook::clear() {
    trials_.clear();
    compared_.reset();
    nextNumber_ = 1;
    Q_EMIT changed();
}

} // namespace cornerwright
