#include "widgets/panes/phase_pane.h"

#include "widgets/panes/axis_styles.h"
#include "widgets/panes/painting.h"

#include <algorithm>

namespace cornerwright {

namespace {

/// Fitting leaves out the endless fall of dead time.
constexpr AxisRange useful_degrees{-390.0, 120.0};
constexpr AxisRange least_degrees{-210.0, -90.0};
/// One pixel up counts as so many decibel for depth and ratio, which this pane does not show.
constexpr double db_of_pixel = 0.1;

} // namespace

PhasePane::PhasePane(ViewState& state, QWidget* parent)
    : BodePane(state, degreeAxis(), &LoopCurves::plant_phase_deg, &LoopCurves::loop_phase_deg,
               parent) {
    setAccessibleName(title());
    setRanges({ranges().x, {-300.0, -60.0}});
}

std::optional<AxisRange> PhasePane::fittedVertical(const AxisRange& frequencies) const {
    std::vector<double> values{least_degrees.low, least_degrees.high};
    for (const CaseAssessment& item : content().assessment->cases)
        for (const double degrees :
             within(item.design.curves.w_rad_s, item.design.curves.loop_phase_deg, frequencies))
            values.push_back(std::clamp(degrees, useful_degrees.low, useful_degrees.high));
    return rangeOf(values, 0.04, 1.0);
}

double PhasePane::decibelsOf(double upwardPixels) const {
    return db_of_pixel * upwardPixels;
}

std::vector<Handle> PhasePane::makeHandles() const {
    std::vector<Handle> handles = BodePane::makeHandles();
    if (const CaseAssessment* shown = shownCase(content().assessment); shown && project()) {
        auto limits = limitHandles(phaseMargins(*shown, followedLoop()));
        std::move(limits.begin(), limits.end(), std::back_inserter(handles));
    }
    return handles;
}

void PhasePane::drawMarks(QPainter& painter) {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr || project() == nullptr) {
        drawReadings(painter);
        return;
    }
    LabelPlacer placer(plotArea());
    const MarkedLoop phase = phaseMargins(*shown, followedLoop());
    drawReferenceLine(painter, -180.0);
    for (const MarginMark& mark : phase.marks)
        if (mark.from != -180.0)
            drawReferenceLine(painter, mark.from);
    drawCrossovers(painter, phase);
    for (const Handle& handle : handles())
        placer.block(touchArea(handle.at, handleSize()));
    for (const MarginMark& mark : phase.marks)
        drawMargin(painter, mark, phase, placer);
    drawLimits(painter, placer);
    drawHandles(painter, placer);
    drawFollowed(painter, placer);
    drawWorstNames(painter, placer);
    drawReadings(painter);
}

} // namespace cornerwright
