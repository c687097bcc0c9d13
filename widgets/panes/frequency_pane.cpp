#include "widgets/panes/frequency_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/axis_styles.h"
#include "widgets/panes/painting.h"
#include "widgets/view_state.h"

#include <algorithm>

namespace cornerwright {

FrequencyPane::FrequencyPane(ViewState& state, const AxisStyle& vertical, QWidget* parent)
    : PlotPane(state, parent) {
    setAxes(frequencyAxis(state), vertical);
    setRanges({{1.0, 1000.0}, ranges().y});
    connect(&state, &ViewState::cursorChanged, this, [this] { redrawMarks(); });
    connect(&state, &ViewState::uphillChanged, this, [this] { redrawMarks(); });
    connect(&state, &ViewState::frequencyWindowChanged, this, [this] { takeWindow(); });
}

std::optional<AxisRange> FrequencyPane::allFrequencies() const {
    std::optional<AxisRange> all;
    if (!content().assessment)
        return all;
    for (const CaseAssessment& item : content().assessment->cases) {
        const std::vector<double>& w = item.design.curves.w_rad_s;
        if (w.size() < 2)
            continue;
        if (!all)
            all = AxisRange{w.front(), w.back()};
        all->low = std::min(all->low, w.front());
        all->high = std::max(all->high, w.back());
    }
    return all;
}

std::optional<PlotRanges> FrequencyPane::fittedRanges() const {
    auto frequencies = allFrequencies();
    if (const auto window = viewState().frequencyWindowRadS())
        frequencies = AxisRange{window->first, window->second};
    if (!frequencies)
        return std::nullopt;
    const auto vertical = fittedVertical(*frequencies);
    if (!vertical)
        return std::nullopt;
    return PlotRanges{*frequencies, *vertical};
}

void FrequencyPane::takeWindow() {
    const auto window = viewState().frequencyWindowRadS();
    if (!window) {
        if (const auto all = allFrequencies())
            setRanges({*all, ranges().y});
        return;
    }
    setRanges({{window->first, window->second}, ranges().y});
}

void FrequencyPane::rangesChangedByHand() {
    const AxisRange shown = ranges().x;
    if (shown == allFrequencies())
        viewState().setFrequencyWindowRadS(std::nullopt);
    else
        viewState().setFrequencyWindowRadS(std::pair(shown.low, shown.high));
}

void FrequencyPane::aboutToFit() {
    viewState().setFrequencyWindowRadS(std::nullopt);
}

void FrequencyPane::mouseAt(const QPointF& pixel) {
    if (plotArea().contains(pixel))
        viewState().setCursorRadS(mapX().toValue(pixel.x()));
    else
        viewState().setCursorRadS(std::nullopt);
}

void FrequencyPane::mouseLeft() {
    viewState().setCursorRadS(std::nullopt);
}

void FrequencyPane::drawCursor(QPainter& painter, const QString& readings) const {
    const auto w = viewState().cursorRadS();
    if (!w || isExporting())
        return;
    const QRectF area = plotArea();
    const double x = mapX().toPixel(*w);
    if (x < area.left() || x > area.right())
        return;
    painter.setPen(QPen(theme().colour(ColourRole::accent), 1.0));
    painter.drawLine(QPointF(x, area.top()), QPointF(x, area.bottom()));
    const QString text = frequencyText(*w, viewState().showsHertz()) + readings;
    const LabelStyle style{theme().colour(ColourRole::ink), fontOf(FontRole::small),
                           LabelGround::pane};
    const QSizeF size = labelSize(text, style.font);
    const QPointF corner(area.left() + 4.0, area.bottom() - size.height() - 4.0);
    drawLabel(painter, QRectF(corner, size), text, style, theme());
}

std::vector<double> FrequencyPane::within(const std::vector<double>& w,
                                          const std::vector<double>& y,
                                          const AxisRange& frequencies) {
    if (w.size() != y.size())
        return {};
    const auto from = std::lower_bound(w.begin(), w.end(), frequencies.low) - w.begin();
    const auto to = std::upper_bound(w.begin(), w.end(), frequencies.high) - w.begin();
    return {y.begin() + from, y.begin() + std::max(from, to)};
}

} // namespace cornerwright
