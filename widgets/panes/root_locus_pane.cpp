#include "widgets/panes/root_locus_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/axis_styles.h"
#include "widgets/panes/csv_table.h"
#include "widgets/panes/legend_widget.h"
#include "widgets/panes/painting.h"
#include "widgets/panes/section_edit.h"
#include "widgets/view_state.h"

#include <QPainterPath>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

/// Fitting shows poles up to so many times the highest crossover.
constexpr double fitted_crossovers = 4.0;
constexpr double ghost_share = 0.5;

} // namespace

RootLocusPane::RootLocusPane(ViewState& state, QWidget* parent) : PlotPane(state, parent) {
    setAccessibleName(title());
    // Both axes are in rad/s; said once, where there is room for it.
    setAxes(linearAxis(QStringLiteral("rad/s")), linearAxis({}));
    connect(&state, &ViewState::cursorChanged, this, [this] { redrawMarks(); });
}

void RootLocusPane::contentChanged() {
    if (!content().ghost)
        ghost_.reset();
    else if (!ghost_)
        ghost_ = content().locus;
    const QColor ink = theme().colour(ColourRole::ink);
    std::vector<LegendWidget::Entry> entries{{tr("branches"), curvePen(ink)}};
    if (ghost_)
        entries.push_back({tr("before"), curvePen(theme().faint(ColourRole::muted, ghost_share))});
    legend().setEntries(std::move(entries));
}

QPointF RootLocusPane::toPixel(Complex s) const {
    return {mapX().toPixel(s.real()), mapY().toPixel(s.imag())};
}

Complex RootLocusPane::toPlane(const QPointF& pixel) const {
    return {mapX().toValue(pixel.x()), mapY().toValue(pixel.y())};
}

std::optional<std::size_t> RootLocusPane::present(const RootLocus& locus) {
    const auto found = std::find(locus.factors.begin(), locus.factors.end(), 1.0);
    if (found == locus.factors.end())
        return std::nullopt;
    return static_cast<std::size_t>(found - locus.factors.begin());
}

std::optional<PlotRanges> RootLocusPane::fittedRanges() const {
    if (!content().locus)
        return std::nullopt;
    double reach = 0.0;
    if (const CaseAssessment* shown = shownCase(content().assessment))
        for (const double w : shown->design.figures.frequency.crossovers_rad_s)
            reach = std::max(reach, fitted_crossovers * w);
    if (reach == 0.0)
        for (const Complex& pole : content().locus->closed_loop_poles)
            reach = std::max(reach, 1.2 * std::abs(pole));
    if (reach == 0.0)
        return std::nullopt;
    // The same pixels per rad/s both ways, so that angles are dampings.
    const double aspect = plotArea().height() / std::max(plotArea().width(), 1.0);
    const AxisRange real{-1.3 * reach, 0.5 * reach};
    const double half = 0.5 * aspect * (real.high - real.low);
    return PlotRanges{real, {-half, half}};
}

void RootLocusPane::drawDampingRays(QPainter& painter) const {
    const QPointF origin = toPixel(0.0);
    painter.setPen(QPen(theme().colour(ColourRole::grid), 1.0));
    painter.setFont(fontOf(FontRole::small));
    const double length = plotArea().width() + plotArea().height();
    for (const double damping : {0.2, 0.4, 0.6, 0.8})
        for (const double side : {-1.0, 1.0}) {
            const Complex far(-damping, side * std::sqrt(1.0 - damping * damping));
            const QPointF step = toPixel(far * mapX().range().high) - origin;
            const double size = std::hypot(step.x(), step.y());
            if (size > 0.0)
                painter.drawLine(origin, origin + step * (length / size));
        }
}

void RootLocusPane::drawCurves(QPainter& painter) {
    drawDampingRays(painter);
    painter.setPen(QPen(theme().faint(ColourRole::graphite, 0.75), 1.0));
    const QRectF area = plotArea();
    const QPointF origin = toPixel(0.0);
    painter.drawLine(QPointF(origin.x(), area.top()), QPointF(origin.x(), area.bottom()));
    painter.drawLine(QPointF(area.left(), origin.y()), QPointF(area.right(), origin.y()));
    if (ghost_ && ghost_ != content().locus)
        drawBranches(painter, *ghost_, curvePen(theme().faint(ColourRole::muted, ghost_share)));
    if (content().locus)
        drawBranches(painter, *content().locus, curvePen(theme().colour(ColourRole::ink)));
}

void RootLocusPane::drawBranches(QPainter& painter, const RootLocus& locus, const QPen& pen) const {
    const AxisMap x = mapX();
    const AxisMap y = mapY();
    std::vector<QPointF> pixels;
    for (const LocusBranch& branch : locus.branches) {
        pixels.clear();
        for (const Complex& s : branch.poles)
            pixels.emplace_back(x.toPixel(s.real()), y.toPixel(s.imag()));
        drawPath(painter, pen, pixels, plotArea());
    }
}

void RootLocusPane::mouseAt(const QPointF& pixel) {
    underMouse_.reset();
    if (plotArea().contains(pixel)) {
        underMouse_ = toPlane(pixel);
        viewState().setCursorRadS(std::abs(*underMouse_));
        redrawMarks();
    } else {
        viewState().setCursorRadS(std::nullopt);
    }
}

void RootLocusPane::mouseLeft() {
    underMouse_.reset();
    viewState().setCursorRadS(std::nullopt);
}

void RootLocusPane::drawCursor(QPainter& painter) const {
    const auto w = viewState().cursorRadS();
    if (!w || isExporting())
        return;
    const QPointF origin = toPixel(0.0);
    const QPointF reach = toPixel({*w, *w}) - origin;
    painter.setPen(QPen(theme().colour(ColourRole::accent), 1.0));
    painter.setBrush(Qt::NoBrush);
    const QRectF circle(origin - QPointF(std::abs(reach.x()), std::abs(reach.y())),
                        2.0 * QSizeF(std::abs(reach.x()), std::abs(reach.y())));
    constexpr int quarter = 90 * 16; // angles of QPainter are in sixteenths of a degree
    constexpr double largest = 1e5;  // pixels
    if (circle.width() < largest)
        painter.drawArc(circle, quarter, 2 * quarter);
    QString text = QStringLiteral("|s| ") + frequencyText(*w, viewState().showsHertz());
    if (underMouse_ && *w > 0.0)
        text +=
            QStringLiteral("   s ") + numberText(underMouse_->real()) +
            (underMouse_->imag() < 0.0 ? QStringLiteral(" \u2212 j ") : QStringLiteral(" + j ")) +
            numberText(std::abs(underMouse_->imag())) + QStringLiteral(" rad/s   ") +
            tr("damping %1").arg(numberText(-underMouse_->real() / *w, 2));
    const LabelStyle style{theme().colour(ColourRole::ink), fontOf(FontRole::small),
                           LabelGround::pane};
    const QSizeF room = labelSize(text, style.font);
    drawLabel(painter, QRectF(plotArea().topLeft() + QPointF(4.0, 4.0), room), text, style,
              theme());
}

std::vector<Handle> RootLocusPane::makeHandles() const {
    std::vector<Handle> handles;
    if (project() == nullptr || !content().locus)
        return handles;
    const auto add = [&](HandleId id, Complex s, const QString& name) {
        const QPointF at = toPixel(s);
        if (plotArea().contains(at))
            handles.push_back({id, at, touchArea(at), name, Qt::SizeAllCursor});
    };
    const Chain& chain = project()->compensator;
    for (std::size_t i = 0; i < chain.size(); ++i) {
        if (!chain[i].enabled)
            continue;
        const auto roots = draggableRootsOf(chain[i]);
        for (std::size_t k = 0; k < roots.size(); ++k) {
            const QString name = roots[k].is_zero ? tr("zero of %1") : tr("pole of %1");
            add({HandleKind::section_root, i, roots[k].part, static_cast<int>(k)}, roots[k].root,
                name.arg(sectionText(chain[i])));
        }
    }
    if (const auto now = present(*content().locus))
        for (std::size_t b = 0; b < content().locus->branches.size(); ++b)
            add({HandleKind::closed_loop_pole, b, SectionPart::corner, 0},
                content().locus->branches[b].poles[*now], tr("closed-loop pole"));
    return handles;
}

void RootLocusPane::dragBegins(const HandleId&) {
    startLocus_ = content().locus;
}

std::optional<Project> RootLocusPane::dragged(const HandleId& handle, const DragMotion& motion,
                                              const Project& start) const {
    if (handle.kind == HandleKind::section_root) {
        if (handle.index >= start.compensator.size())
            return std::nullopt;
        const Section& section = start.compensator[handle.index];
        const auto roots = draggableRootsOf(section);
        const auto root = static_cast<std::size_t>(handle.sub);
        if (root >= roots.size())
            return std::nullopt;
        return withSection(start, handle.index,
                           withRootAt(section, roots[root], toPlane(motion.to)));
    }
    if (!startLocus_ || handle.index >= startLocus_->branches.size())
        return std::nullopt;
    // The place on the branch nearest to the hand, between the points of the branch.
    const ComplexVector& poles = startLocus_->branches[handle.index].poles;
    double nearest = HUGE_VAL;
    double factor = 1.0;
    for (std::size_t i = 0; i + 1 < poles.size(); ++i) {
        const QPointF from = toPixel(poles[i]);
        const QPointF step = toPixel(poles[i + 1]) - from;
        const double length = QPointF::dotProduct(step, step);
        const double share =
            length > 0.0
                ? std::clamp(QPointF::dotProduct(motion.to - from, step) / length, 0.0, 1.0)
                : 0.0;
        const QPointF away = motion.to - from - share * step;
        const double distance = QPointF::dotProduct(away, away);
        if (distance < nearest) {
            nearest = distance;
            factor = std::lerp(startLocus_->factors[i], startLocus_->factors[i + 1], share);
        }
    }
    return factor > 0.0 ? std::optional(withLoopGain(start, factor)) : std::nullopt;
}

std::optional<Project> RootLocusPane::nudged(const HandleId& handle, const QPointF& direction,
                                             double share, const Project& start) const {
    if (handle.kind == HandleKind::closed_loop_pole)
        return withLoopGain(start, std::pow(1.0 + share, direction.x() + direction.y()));
    if (handle.kind != HandleKind::section_root || handle.index >= start.compensator.size())
        return std::nullopt;
    const Section& section = start.compensator[handle.index];
    const auto roots = draggableRootsOf(section);
    const auto root = static_cast<std::size_t>(handle.sub);
    if (root >= roots.size())
        return std::nullopt;
    const Complex step = std::abs(roots[root].root) * share * Complex(direction.x(), direction.y());
    return withSection(start, handle.index,
                       withRootAt(section, roots[root], roots[root].root + step));
}

void RootLocusPane::drawRoot(QPainter& painter, const QPointF& at, bool isZero,
                             const QColor& colour, double size) const {
    painter.setPen(QPen(colour, 2.0));
    painter.setBrush(Qt::NoBrush);
    if (isZero) {
        painter.drawEllipse(at, size, size);
        return;
    }
    painter.drawLine(at - QPointF(size, size), at + QPointF(size, size));
    painter.drawLine(at - QPointF(size, -size), at + QPointF(size, -size));
}

void RootLocusPane::drawPlantRoots(QPainter& painter) const {
    const std::size_t index = viewState().shownCase();
    if (index >= project()->plant_cases.size())
        return;
    // All roots of the loop in graphite; those of the compensator are painted over in colour.
    const double size = 0.75 * handleSize();
    const QColor graphite = theme().colour(ColourRole::graphite);
    for (const Complex& zero : content().locus->zeros)
        drawRoot(painter, toPixel(zero), true, graphite, size);
    for (const Complex& pole : content().locus->poles)
        drawRoot(painter, toPixel(pole), false, graphite, size);
}

void RootLocusPane::drawDrop(QPainter& painter, std::size_t branch, double size) const {
    const auto now = present(*content().locus);
    const ComplexVector& poles = content().locus->branches[branch].poles;
    const QPointF at = toPixel(poles[*now]);
    // The tail lies towards the smaller gain.
    QPointF tail(0.0, -1.0);
    for (std::size_t i = *now; i-- > 0;) {
        const QPointF step = toPixel(poles[i]) - at;
        const double length = std::hypot(step.x(), step.y());
        if (length > 2.0) {
            tail = step / length;
            break;
        }
    }
    const QPointF aside(-tail.y(), tail.x());
    QPainterPath drop(at + 2.0 * size * tail);
    drop.quadTo(at + 0.9 * size * tail + 0.5 * size * aside, at + 0.6 * size * aside);
    drop.quadTo(at - 1.1 * size * tail + 0.9 * size * aside, at - 0.75 * size * tail);
    drop.quadTo(at - 1.1 * size * tail - 0.9 * size * aside, at - 0.6 * size * aside);
    drop.quadTo(at + 0.9 * size * tail - 0.5 * size * aside, at + 2.0 * size * tail);
    painter.setPen(QPen(theme().colour(ColourRole::pane), 1.0));
    painter.setBrush(theme().colour(ColourRole::accent));
    painter.drawPath(drop);
}

void RootLocusPane::drawCrossings(QPainter& painter) const {
    LabelPlacer placer(plotArea());
    for (const AxisCrossing& crossing : content().locus->crossings) {
        const QPointF at = toPixel({0.0, crossing.w_rad_s});
        if (!plotArea().contains(at) || crossing.w_rad_s == 0.0)
            continue;
        painter.setPen(QPen(theme().colour(ColourRole::muted), 1.5));
        painter.drawLine(at - QPointF(6.0, 0.0), at + QPointF(6.0, 0.0));
        const QString text = QStringLiteral("× %1 · ").arg(numberText(crossing.factor)) +
                             frequencyText(crossing.w_rad_s, viewState().showsHertz());
        const LabelStyle style{theme().colour(ColourRole::muted), fontOf(FontRole::small),
                               LabelGround::pane};
        const QSizeF room = labelSize(text, style.font);
        drawLabel(painter,
                  placer.place(room, {at + QPointF(8.0, -0.5 * room.height()),
                                      at + QPointF(8.0, 4.0), at + QPointF(8.0, -20.0)}),
                  text, style, theme());
    }
}

void RootLocusPane::drawMarks(QPainter& painter) {
    if (!content().locus || project() == nullptr)
        return;
    painter.save();
    painter.setClipRect(plotArea().adjusted(-8.0, -8.0, 8.0, 8.0), Qt::IntersectClip);
    drawPlantRoots(painter);
    const double size = 0.75 * handleSize();
    const Chain& chain = project()->compensator;
    for (std::size_t i = 0; i < chain.size(); ++i) {
        if (!chain[i].enabled)
            continue;
        for (const SectionRoot& root : draggableRootsOf(chain[i]))
            for (const Complex& twin : {root.root, std::conj(root.root)})
                drawRoot(painter, toPixel(twin), root.is_zero, theme().section(i), size);
    }
    if (present(*content().locus))
        for (std::size_t b = 0; b < content().locus->branches.size(); ++b)
            drawDrop(painter, b, handleSize());
    for (const Handle& handle : handles())
        if (isHighlighted(handle.id)) {
            painter.setPen(QPen(theme().colour(ColourRole::accent), 1.5));
            painter.setBrush(Qt::NoBrush);
            painter.drawEllipse(handle.at, 2.0 * handleSize(), 2.0 * handleSize());
        }
    drawCrossings(painter);
    drawCursor(painter);
    painter.restore();
    const QString note = QString::fromStdString(content().locus->note);
    painter.setFont(fontOf(FontRole::small));
    painter.setPen(theme().colour(ColourRole::muted));
    painter.drawText(plotArea().adjusted(6.0, 4.0, -6.0, -4.0),
                     Qt::AlignLeft | Qt::AlignBottom | Qt::TextWordWrap, note);
}

QString RootLocusPane::csv() const {
    CsvTable table({tr("branch"), QStringLiteral("gain_factor"), QStringLiteral("real_rad_s"),
                    QStringLiteral("imaginary_rad_s")});
    if (!content().locus)
        return table.text();
    const RootLocus& locus = *content().locus;
    for (std::size_t b = 0; b < locus.branches.size(); ++b)
        for (std::size_t i = 0; i < locus.branches[b].poles.size(); ++i)
            table.addRow({QString::number(b + 1)},
                         {locus.factors[i], locus.branches[b].poles[i].real(),
                          locus.branches[b].poles[i].imag()});
    return table.text();
}

} // namespace cornerwright
