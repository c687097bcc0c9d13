#include "widgets/panes/magnitude_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/axis_styles.h"
#include "widgets/panes/painting.h"
#include "widgets/panes/section_edit.h"
#include "widgets/panes/uphill_marks.h"
#include "widgets/view_state.h"

#include <QMenu>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

/// How near the curve a press takes the gain.
constexpr double curve_reach = 7.0;
/// Fitting leaves out what lies far from 0 dB; nobody designs there.
constexpr AxisRange useful_db{-90.0, 70.0};
constexpr AxisRange least_db{-20.0, 20.0};

} // namespace

MagnitudePane::MagnitudePane(ViewState& state, QWidget* parent)
    : BodePane(state, linearAxis(QStringLiteral("dB")), &LoopCurves::plant_db, &LoopCurves::loop_db,
               parent) {
    setAccessibleName(title());
    setRanges({ranges().x, {-60.0, 40.0}});
}

std::optional<AxisRange> MagnitudePane::fittedVertical(const AxisRange& frequencies) const {
    std::vector<double> values{least_db.low, least_db.high};
    for (const CaseAssessment& item : content().assessment->cases)
        for (const double db :
             within(item.design.curves.w_rad_s, item.design.curves.loop_db, frequencies))
            values.push_back(std::clamp(db, useful_db.low, useful_db.high));
    return rangeOf(values, 0.04, 1.0);
}

double MagnitudePane::decibelsOf(double upwardPixels) const {
    return mapY().toValue(0.0) - mapY().toValue(upwardPixels);
}

std::vector<Handle> MagnitudePane::makeHandles() const {
    std::vector<Handle> handles = BodePane::makeHandles();
    if (const CaseAssessment* shown = shownCase(content().assessment); shown && project()) {
        auto limits = limitHandles(gainMargins(*shown, followedLoop()));
        std::move(limits.begin(), limits.end(), std::back_inserter(handles));
    }
    return handles;
}

std::optional<Handle> MagnitudePane::curveHandleAt(const QPointF& pixel) const {
    if (project() == nullptr || !plotArea().contains(pixel))
        return std::nullopt;
    // On a steep flank the curve is near sideways before it is near upwards.
    for (double aside = -curve_reach; aside <= curve_reach; aside += 1.0) {
        const auto at = pixelAtFrequency(mapX().toValue(pixel.x() + aside));
        if (!at || std::hypot(aside, at->y() - pixel.y()) > curve_reach)
            continue;
        Handle handle;
        handle.id.kind = HandleKind::gain_curve;
        handle.at = pixel;
        handle.area = touchArea(pixel);
        handle.name = tr("gain");
        handle.cursor = Qt::SizeVerCursor;
        return handle;
    }
    return std::nullopt;
}

std::optional<Project> MagnitudePane::dragged(const HandleId& handle, const DragMotion& motion,
                                              const Project& start) const {
    if (handle.kind != HandleKind::gain_curve)
        return BodePane::dragged(handle, motion, start);
    const double db = decibelsOf(motion.from.y() - motion.to.y());
    return withLoopGain(start, std::pow(10.0, db / 20.0));
}

std::optional<Project> MagnitudePane::nudged(const HandleId& handle, const QPointF& direction,
                                             double share, const Project& start) const {
    if (handle.kind != HandleKind::gain_curve)
        return BodePane::nudged(handle, direction, share, start);
    if (direction.y() == 0.0)
        return std::nullopt;
    return withLoopGain(start, std::pow(1.0 + share, direction.y()));
}

void MagnitudePane::fillMenu(QMenu& menu, const QPointF& pixel) {
    if (project() == nullptr || !plotArea().contains(pixel))
        return;
    const double w = mapX().toValue(pixel.x());
    menu.addSection(tr("Add at %1").arg(frequencyText(w, viewState().showsHertz())));
    for (const SectionKind kind : all_section_kinds())
        menu.addAction(kindText(kind), this, [this, kind, w] { addSection(kind, w); });
}

void MagnitudePane::addSection(SectionKind kind, double w_rad_s) {
    Project proposed = *project();
    proposed.compensator.push_back(newSection(kind, w_rad_s));
    const std::size_t index = proposed.compensator.size() - 1;
    Q_EMIT edited(std::make_shared<const Project>(std::move(proposed)),
                  tr("Add %1").arg(kindText(kind)));
    viewState().setSelectedSection(index);
}

void MagnitudePane::drawStability(QPainter& painter, LabelPlacer& placer) const {
    const CaseAssessment* shown = shownCase(content().assessment);
    QStringList sentences;
    const auto tell = [&](const LoopAssessment& loop, const QString& name) {
        const std::optional<bool> stable = loop.figures.stability.stable;
        if (stable == true)
            return;
        sentences.append(stable
                             ? markOf(State::unmet) + QLatin1Char(' ') + tr("%1 unstable").arg(name)
                             : markOf(State::undetermined) + QLatin1Char(' ') +
                                   tr("%1: stability not determined").arg(name));
    };
    tell(shown->design, tr("design loop"));
    if (shown->realised)
        tell(*shown->realised, tr("realised loop"));
    for (const QString& sentence : sentences) {
        const LabelStyle style{theme().colour(ColourRole::unmet), fontOf(FontRole::strong),
                               LabelGround::tinted};
        const QSizeF room = labelSize(sentence, style.font);
        const QPointF corner(plotArea().right() - room.width() - 4.0, plotArea().top() + 4.0);
        const QPointF below = corner + QPointF(0.0, room.height() + 4.0);
        drawLabel(painter, placer.place(room, {corner, below}), sentence, style, theme());
    }
}

void MagnitudePane::drawCrossoverName(QPainter& painter, const MarkedLoop& loop,
                                      LabelPlacer& placer) const {
    for (const MarginMark& mark : loop.marks) {
        if (!mark.decides)
            continue;
        const QString text =
            tr("crossover %1").arg(frequencyText(mark.w_rad_s, viewState().showsHertz()));
        const LabelStyle style{theme().colour(ColourRole::muted), fontOf(FontRole::small),
                               LabelGround::pane};
        const QSizeF room = labelSize(text, style.font);
        const QPointF at(mapX().toPixel(mark.w_rad_s), mapY().toPixel(0.0));
        if (!plotArea().contains(at))
            continue;
        drawLabel(painter,
                  placer.place(room, {at + QPointF(-6.0 - room.width(), 4.0),
                                      at + QPointF(6.0, -4.0 - room.height()),
                                      at + QPointF(-6.0 - room.width(), 24.0)}),
                  text, style, theme());
    }
}

void MagnitudePane::drawMarks(QPainter& painter) {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr || project() == nullptr) {
        drawReadings(painter);
        return;
    }
    LabelPlacer placer(plotArea());
    const MarkedLoop phase = phaseMargins(*shown, followedLoop());
    const MarkedLoop gain = gainMargins(*shown, followedLoop());
    drawReferenceLine(painter, 0.0);
    drawCrossovers(painter, phase);
    for (const Handle& handle : handles())
        placer.block(touchArea(handle.at, handleSize()));
    for (const MarginMark& mark : gain.marks)
        drawMargin(painter, mark, gain, placer);
    drawCrossoverName(painter, phase, placer);
    drawStability(painter, placer);
    drawLimits(painter, placer);
    drawHandles(painter, placer);
    for (const MarginMark& mark : phase.marks)
        if (mark.decides)
            drawUphillUpright(painter, QPointF(mapX().toPixel(mark.w_rad_s), mapY().toPixel(0.0)),
                              handleSize(),
                              uphillOfGain(viewState().uphill(), project()->compensator), theme());
    drawFollowed(painter, placer);
    drawWorstNames(painter, placer);
    drawReadings(painter);
}

} // namespace cornerwright
