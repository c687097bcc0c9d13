#pragma once

#include "core/requirements/verdict.h"
#include "widgets/uphill.h"

#include <QObject>

#include <cstddef>
#include <optional>
#include <set>
#include <utility>
#include <vector>

namespace cornerwright {

/// A requirement followed to where it is measured: on which loop of which case.
struct FollowedRequirement {
    std::size_t requirement = 0; ///< index into the verdict's requirements
    std::size_t case_index = 0;
    LoopName loop = LoopName::design;

    bool operator==(const FollowedRequirement&) const = default;
};

/// What the views share and no project file holds: the linked cursor, the frequency window, the
/// unit of frequency, which cases are shown and what is selected. Setters compare and emit only on
/// a change.
class ViewState : public QObject {
    Q_OBJECT

  public:
    using QObject::QObject;

    /// Frequencies are shown in Hz (true) or rad/s.
    bool showsHertz() const { return showsHertz_; }
    void setShowsHertz(bool on);

    /// The linked cursor, rad/s; empty while the mouse is on no frequency axis.
    std::optional<double> cursorRadS() const { return cursorRadS_; }
    void setCursorRadS(std::optional<double> w);

    /// The frequencies that magnitude, phase and the sensitivity family show, rad/s; empty: fit.
    std::optional<std::pair<double, double>> frequencyWindowRadS() const { return window_; }
    void setFrequencyWindowRadS(std::optional<std::pair<double, double>> window);

    /// The case drawn full, with handles on its curve; index into the project's plant cases.
    std::size_t shownCase() const { return shownCase_; }
    void setShownCase(std::size_t index);

    /// Cases switched off in the list are not drawn (they are judged all the same).
    const std::set<std::size_t>& hiddenCases() const { return hiddenCases_; }
    void setHiddenCases(std::set<std::size_t> indices);

    /// The section whose card and handles are highlighted, index into the chain.
    std::optional<std::size_t> selectedSection() const { return selectedSection_; }
    void setSelectedSection(std::optional<std::size_t> index);

    /// The place that the ledger last led to; the panes mark it as long as its case is shown.
    const std::optional<FollowedRequirement>& followed() const { return followed_; }
    void setFollowed(std::optional<FollowedRequirement> followed);

    /// Which way every number of the chain raises the smallest headroom, of the latest project for
    /// which that is known; empty where there is no such way.
    const std::vector<UphillPull>& uphill() const { return uphill_; }
    void setUphill(std::vector<UphillPull> pulls);

  signals:
    void unitChanged();
    void cursorChanged();
    void frequencyWindowChanged();
    void shownCaseChanged();
    void hiddenCasesChanged();
    void selectedSectionChanged();
    void uphillChanged();
    void followedChanged();

  private:
    bool showsHertz_ = true;
    std::optional<double> cursorRadS_;
    std::optional<std::pair<double, double>> window_;
    std::size_t shownCase_ = 0;
    std::set<std::size_t> hiddenCases_;
    std::optional<std::size_t> selectedSection_;
    std::vector<UphillPull> uphill_;
    std::optional<FollowedRequirement> followed_;
};

} // namespace cornerwright
