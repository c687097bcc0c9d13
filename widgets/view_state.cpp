#include "widgets/view_state.h"

namespace cornerwright {

void ViewState::setShowsHertz(bool on) {
    if (showsHertz_ == on)
        return;
    showsHertz_ = on;
    Q_EMIT unitChanged();
}

void ViewState::setCursorRadS(std::optional<double> w) {
    if (cursorRadS_ == w)
        return;
    cursorRadS_ = w;
    Q_EMIT cursorChanged();
}

void ViewState::setFrequencyWindowRadS(std::optional<std::pair<double, double>> window) {
    if (window_ == window)
        return;
    window_ = window;
    Q_EMIT frequencyWindowChanged();
}

void ViewState::setShownCase(std::size_t index) {
    if (shownCase_ == index)
        return;
    shownCase_ = index;
    Q_EMIT shownCaseChanged();
}

void ViewState::setHiddenCases(std::set<std::size_t> indices) {
    if (hiddenCases_ == indices)
        return;
    hiddenCases_ = std::move(indices);
    Q_EMIT hiddenCasesChanged();
}

void ViewState::setSelectedSection(std::optional<std::size_t> index) {
    if (selectedSection_ == index)
        return;
    selectedSection_ = index;
    Q_EMIT selectedSectionChanged();
}

void ViewState::setFollowed(std::optional<FollowedRequirement> followed) {
    if (followed_ == followed)
        return;
    followed_ = followed;
    Q_EMIT followedChanged();
}

void ViewState::setUphill(std::vector<UphillPull> pulls) {
    if (uphill_ == pulls)
        return;
    uphill_ = std::move(pulls);
    Q_EMIT uphillChanged();
}

} // namespace cornerwright
