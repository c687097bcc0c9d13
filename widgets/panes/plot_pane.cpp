#include "widgets/panes/plot_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/followed_place.h"
#include "widgets/panes/legend_widget.h"
#include "widgets/view_state.h"

#include <QAction>
#include <QContextMenuEvent>
#include <QMenu>
#include <QMouseEvent>
#include <QPainter>
#include <QVBoxLayout>
#include <QWheelEvent>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

/// A press that travels less is a click.
constexpr double click_pixels = 3.0;
constexpr double fine_share = 0.1;
/// One notch of the wheel (15 degrees, 120 units) zooms by a quarter.
constexpr double zoom_of_notch = 0.8;
constexpr double smallest_box = 8.0;

/// Fitted ranges that hardly leave the present ones and fill enough of them leave the axes where
/// they are, so that an edit does not make them jump. Shares of the present width.
constexpr double least_fill = 0.35;
constexpr double most_excess = 0.1;

bool holds(const AxisRange& present, const AxisRange& wanted, bool logarithmic) {
    const auto scaled = [&](double value) { return logarithmic ? std::log(value) : value; };
    const double width = scaled(present.high) - scaled(present.low);
    const double slack = most_excess * width;
    return scaled(wanted.low) >= scaled(present.low) - slack &&
           scaled(wanted.high) <= scaled(present.high) + slack &&
           scaled(wanted.high) - scaled(wanted.low) > least_fill * width;
}

AxisRange shifted(const AxisMap& map, double pixels) {
    return {map.moved(map.range().low, pixels), map.moved(map.range().high, pixels)};
}

} // namespace

PlotPane::PlotPane(ViewState& state, QWidget* parent)
    : Pane(state, parent),
      legend_(new LegendWidget(this)),
      canvas_(
          this, [this](QPainter& painter) { paintCurves(painter); },
          [this](QPainter& painter) { paintMarks(painter); }) {
    auto* column = new QVBoxLayout(this);
    column->setContentsMargins(0, 0, 0, 0);
    column->addWidget(plotWidget());
    legend_->hide(); // until a head takes it
    plotWidget()->installEventFilter(this);
    // The menu is the pane's own, and the plot would keep the event from it.
    plotWidget()->setContextMenuPolicy(Qt::NoContextMenu);
    plotWidget()->setAttribute(Qt::WA_NoMousePropagation, false);
    setFocusPolicy(Qt::StrongFocus);
    plotWidget()->setFocusPolicy(Qt::NoFocus);
    canvas_.setTheme(theme());
    addExportActions();
    connect(&state, &ViewState::shownCaseChanged, this, [this] {
        contentChanged();
        refitWhereNeeded();
        redraw();
    });
    connect(&state, &ViewState::hiddenCasesChanged, this, [this] { redraw(); });
    connect(&state, &ViewState::unitChanged, this, [this] { redraw(); });
    connect(&state, &ViewState::followedChanged, this, [this] { redraw(); });
    connect(&state, &ViewState::selectedSectionChanged, this, [this] {
        const auto section = viewState().selectedSection();
        const bool isOther = selected_ &&
                             (selected_->id.kind == HandleKind::section_part ||
                              selected_->id.kind == HandleKind::section_root) &&
                             selected_->id.index != section;
        if (isOther)
            selected_.reset();
        redraw();
    });
}

PlotPane::~PlotPane() = default;

const Theme& PlotPane::theme() const {
    return exporting_ ? Theme::light() : Theme::of(palette());
}

QWidget* PlotPane::headWidget() {
    legend_->show();
    return legend_;
}

void PlotPane::setContent(const PaneContent& content) {
    const bool otherPlants = !content_.project || !content.project ||
                             content_.project->plant_cases != content.project->plant_cases;
    content_ = content;
    setAccessibleName(title());
    contentChanged();
    if (otherPlants) {
        hasFitted_ = false;
        zoomedByHand_ = false;
    }
    refitWhereNeeded();
    redraw();
}

const CaseAssessment*
PlotPane::shownCase(const std::shared_ptr<const Assessment>& assessment) const {
    const std::size_t index = viewState().shownCase();
    if (!assessment || index >= assessment->cases.size())
        return nullptr;
    const CaseAssessment& found = assessment->cases[index];
    return found.unusable.empty() ? &found : nullptr;
}

bool PlotPane::isHidden(std::size_t caseIndex) const {
    return viewState().hiddenCases().contains(caseIndex);
}

std::optional<LoopName> PlotPane::followedLoop() const {
    if (!content_.assessment)
        return std::nullopt;
    const Judgement* judgement = followedJudgement(viewState(), *content_.assessment);
    return judgement != nullptr ? std::optional(judgement->loop) : std::nullopt;
}

void PlotPane::showOnlyShownCase() {
    std::set<std::size_t> others;
    for (std::size_t i = 0; content_.assessment && i < content_.assessment->cases.size(); ++i)
        if (i != viewState().shownCase())
            others.insert(i);
    viewState().setHiddenCases(std::move(others));
}

void PlotPane::refitWhereNeeded() {
    const bool someoneDrags = drag_ || content_.ghost;
    if (hasFitted_ && (someoneDrags || zoomedByHand_))
        return;
    const auto wanted = fittedRanges();
    if (!wanted)
        return;
    const PlotRanges present = ranges();
    if (hasFitted_ && holds(present.x, wanted->x, mapX().isLogarithmic()) &&
        holds(present.y, wanted->y, mapY().isLogarithmic()))
        return;
    hasFitted_ = true;
    setRanges(*wanted);
}

void PlotPane::refit() {
    if (zoomedByHand_)
        return;
    hasFitted_ = false;
    refitWhereNeeded();
    redraw();
}

void PlotPane::fit() {
    zoomedByHand_ = false;
    aboutToFit();
    refit();
}

void PlotPane::setRanges(const PlotRanges& wanted) {
    if (wanted == ranges())
        return;
    canvas_.setRanges(wanted);
    redraw();
}

void PlotPane::setRangesByHand(const PlotRanges& wanted) {
    zoomedByHand_ = true;
    hasFitted_ = true;
    setRanges(wanted);
    rangesChangedByHand();
}

const std::vector<Handle>& PlotPane::handles() const {
    if (handlesAreOld_)
        handles_ = makeHandles();
    handlesAreOld_ = false;
    return handles_;
}

std::optional<Handle> PlotPane::handleAt(const QPointF& pixel) const {
    const Handle* best = nullptr;
    double nearest = 0.0;
    for (const Handle& handle : handles()) {
        const double distance = (handle.at - pixel).manhattanLength();
        if (handle.area.contains(pixel) && (best == nullptr || distance < nearest)) {
            best = &handle;
            nearest = distance;
        }
    }
    return best != nullptr ? std::optional(*best) : curveHandleAt(pixel);
}

void PlotPane::select(const std::optional<Handle>& handle) {
    selected_ = handle;
    const bool isOfSection = handle && (handle->id.kind == HandleKind::section_part ||
                                        handle->id.kind == HandleKind::section_root);
    if (isOfSection)
        viewState().setSelectedSection(handle->id.index);
    redrawMarks();
}

std::optional<Project> PlotPane::dragged(const HandleId&, const DragMotion&, const Project&) const {
    return std::nullopt;
}

std::optional<Project> PlotPane::nudged(const HandleId&, const QPointF&, double,
                                        const Project&) const {
    return std::nullopt;
}

bool PlotPane::mousePressed(const QMouseEvent& event) {
    setFocus(Qt::MouseFocusReason);
    if (drag_)
        return true;
    const bool left = event.button() == Qt::LeftButton;
    if (!left && event.button() != Qt::MiddleButton)
        return false;
    Drag drag;
    drag.pressed = drag.lastMouse = event.position();
    drag.rangesAtPress = ranges();
    const auto handle = handleAt(event.position());
    if (left && event.modifiers().testFlag(Qt::ControlModifier)) {
        drag.what = Drag::What::box;
    } else if (left && handle && content_.project) {
        drag.what = Drag::What::handle;
        drag.handle = *handle;
        drag.start = content_.project;
        select(handle);
    } else if (left) {
        select(std::nullopt);
    }
    drag_ = drag;
    return true;
}

bool PlotPane::mouseMoved(const QMouseEvent& event) {
    const QPointF mouse = event.position();
    mouseAt(mouse);
    if (!drag_) {
        hover(mouse);
        return true;
    }
    const bool hasTravelled = (mouse - drag_->pressed).manhattanLength() >= click_pixels;
    if (!drag_->begun && !hasTravelled)
        return true;
    switch (drag_->what) {
    case Drag::What::handle:
        moveHandle(mouse, event.modifiers());
        break;
    case Drag::What::axes: {
        drag_->begun = true;
        const QPointF step = mouse - drag_->lastMouse;
        setRangesByHand({shifted(mapX(), -step.x()), shifted(mapY(), -step.y())});
        break;
    }
    case Drag::What::box:
        drag_->begun = true;
        redrawMarks();
        break;
    }
    drag_->lastMouse = mouse;
    return true;
}

void PlotPane::moveHandle(const QPointF& mouse, Qt::KeyboardModifiers modifiers) {
    const bool shift = modifiers.testFlag(Qt::ShiftModifier);
    if (!drag_->begun) {
        drag_->begun = true;
        dragBegins(drag_->handle.id);
        Q_EMIT dragStarted(tr("Move %1").arg(drag_->handle.name));
    }
    const bool isFine = shift && drag_->handle.shiftIsFine;
    drag_->travel += (isFine ? fine_share : 1.0) * (mouse - drag_->lastMouse);
    const DragMotion motion{drag_->handle.at, drag_->handle.at + drag_->travel, shift};
    if (auto proposed = dragged(drag_->handle.id, motion, *drag_->start))
        Q_EMIT dragMoved(std::make_shared<const Project>(std::move(*proposed)));
}

bool PlotPane::mouseReleased(const QMouseEvent& event) {
    if (!drag_ || (event.button() != Qt::LeftButton && event.button() != Qt::MiddleButton))
        return false;
    if (drag_->what == Drag::What::box && drag_->begun)
        zoomInto(QRectF(drag_->pressed, event.position()).normalized());
    endDrag(true);
    hover(event.position());
    return true;
}

void PlotPane::endDrag(bool keep) {
    const bool movedHandle = drag_->begun && drag_->what == Drag::What::handle;
    if (!keep && drag_->what == Drag::What::axes && drag_->begun)
        setRangesByHand(drag_->rangesAtPress);
    drag_.reset();
    if (movedHandle && keep)
        Q_EMIT dragFinished();
    else if (movedHandle)
        Q_EMIT dragCancelled();
    redrawMarks();
}

void PlotPane::zoomInto(const QRectF& box) {
    if (box.width() < smallest_box || box.height() < smallest_box)
        return;
    QRectF inside = box.intersected(plotArea());
    if (zoomsBothAxes()) {
        // The smallest box of the plot's own shape about the one drawn.
        const double scale =
            std::max(inside.width() / plotArea().width(), inside.height() / plotArea().height());
        QRectF grown(QPointF(), scale * plotArea().size());
        grown.moveCenter(inside.center());
        inside = grown;
    }
    setRangesByHand({{mapX().toValue(inside.left()), mapX().toValue(inside.right())},
                     {mapY().toValue(inside.bottom()), mapY().toValue(inside.top())}});
}

void PlotPane::keepShape() {
    if (!zoomedByHand_) {
        hasFitted_ = false;
        refitWhereNeeded();
        return;
    }
    const PlotRanges present = ranges();
    const double perPixel = (present.x.high - present.x.low) / std::max(plotArea().width(), 1.0);
    const double half = 0.5 * perPixel * plotArea().height();
    const double middle = 0.5 * (present.y.low + present.y.high);
    setRanges({present.x, {middle - half, middle + half}});
}

void PlotPane::wheelTurned(const QWheelEvent& event) {
    if (drag_)
        return;
    // With shift some systems turn the wheel sideways.
    const QPoint turn = event.angleDelta();
    const double notches = (turn.y() != 0 ? turn.y() : turn.x()) / 120.0;
    const double factor = std::pow(zoom_of_notch, notches);
    const bool vertical = event.modifiers().testFlag(Qt::ShiftModifier);
    const AxisMap x = mapX();
    const AxisMap y = mapY();
    PlotRanges wanted = ranges();
    if (!vertical || zoomsBothAxes())
        wanted.x = zoomed(wanted.x, x.toValue(event.position().x()), factor, x.isLogarithmic());
    if (vertical || zoomsBothAxes())
        wanted.y = zoomed(wanted.y, y.toValue(event.position().y()), factor, y.isLogarithmic());
    setRangesByHand(wanted);
}

void PlotPane::hover(const QPointF& mouse) {
    const auto handle = handleAt(mouse);
    const auto id = handle ? std::optional(handle->id) : std::nullopt;
    plotWidget()->setCursor(handle ? handle->cursor : Qt::ArrowCursor);
    if (id == hovered_)
        return;
    hovered_ = id;
    redrawMarks();
}

bool PlotPane::eventFilter(QObject* watched, QEvent* event) {
    if (watched != plotWidget())
        return Pane::eventFilter(watched, event);
    switch (event->type()) {
    case QEvent::MouseButtonPress:
        return mousePressed(*static_cast<QMouseEvent*>(event));
    case QEvent::MouseMove:
        return mouseMoved(*static_cast<QMouseEvent*>(event));
    case QEvent::MouseButtonRelease:
        return mouseReleased(*static_cast<QMouseEvent*>(event));
    case QEvent::MouseButtonDblClick:
        if (!handleAt(static_cast<QMouseEvent*>(event)->position()))
            fit();
        return true;
    case QEvent::Wheel:
        wheelTurned(*static_cast<QWheelEvent*>(event));
        return true;
    case QEvent::Leave:
        hovered_.reset();
        mouseLeft();
        redrawMarks();
        return false;
    case QEvent::Resize:
        redraw();
        if (zoomsBothAxes()) // when the plot has taken its new size
            QMetaObject::invokeMethod(this, &PlotPane::keepShape, Qt::QueuedConnection);
        return false;
    default:
        return false;
    }
}

void PlotPane::keyPressEvent(QKeyEvent* event) {
    const bool fine = event->modifiers().testFlag(Qt::ShiftModifier);
    switch (event->key()) {
    case Qt::Key_Escape:
        if (!drag_)
            break;
        endDrag(false);
        return;
    case Qt::Key_Left:
        return nudge({-1.0, 0.0}, fine);
    case Qt::Key_Right:
        return nudge({1.0, 0.0}, fine);
    case Qt::Key_Up:
        return nudge({0.0, 1.0}, fine);
    case Qt::Key_Down:
        return nudge({0.0, -1.0}, fine);
    case Qt::Key_Home:
        return fit();
    case Qt::Key_Delete:
    case Qt::Key_Backspace:
        return editSelectedSection(true);
    case Qt::Key_Space:
        return editSelectedSection(false);
    default:
        break;
    }
    Pane::keyPressEvent(event);
}

void PlotPane::nudge(const QPointF& direction, bool fine) {
    constexpr double coarse_step = 0.01;
    constexpr double fine_step = 0.001;
    if (drag_ || !selected_ || !content_.project)
        return;
    if (auto proposed =
            nudged(selected_->id, direction, fine ? fine_step : coarse_step, *content_.project))
        Q_EMIT edited(std::make_shared<const Project>(std::move(*proposed)),
                      tr("Nudge %1").arg(selected_->name));
}

void PlotPane::editSelectedSection(bool remove) {
    const auto index = viewState().selectedSection();
    if (drag_ || !index || !content_.project || *index >= content_.project->compensator.size())
        return;
    Project proposed = *content_.project;
    const auto section = proposed.compensator.begin() + static_cast<std::ptrdiff_t>(*index);
    const QString name = sectionText(*section);
    if (remove)
        proposed.compensator.erase(section);
    else
        section->enabled = !section->enabled;
    const QString what = remove             ? tr("Remove %1").arg(name)
                         : section->enabled ? tr("Turn %1 on").arg(name)
                                            : tr("Turn %1 off").arg(name);
    if (remove)
        viewState().setSelectedSection(std::nullopt);
    Q_EMIT edited(std::make_shared<const Project>(std::move(proposed)), what);
}

bool PlotPane::focusNextPrevChild(bool next) {
    const auto& all = handles();
    const auto present = std::find_if(all.begin(), all.end(), [&](const Handle& handle) {
        return selected_ && handle.id == selected_->id;
    });
    if (next && present == all.end() && !all.empty()) {
        select(all.front());
        return true;
    }
    if (next && present != all.end() && present + 1 != all.end()) {
        select(*(present + 1));
        return true;
    }
    if (!next && present != all.end() && present != all.begin()) {
        select(*(present - 1));
        return true;
    }
    select(std::nullopt);
    return Pane::focusNextPrevChild(next);
}

void PlotPane::changeEvent(QEvent* event) {
    if (event->type() == QEvent::PaletteChange || event->type() == QEvent::FontChange ||
        event->type() == QEvent::StyleChange) {
        canvas_.setTheme(theme());
        contentChanged();
        redraw();
    }
    Pane::changeEvent(event);
}

void PlotPane::contextMenuEvent(QContextMenuEvent* event) {
    if (drag_)
        return;
    QMenu menu(this);
    fillMenu(menu, plotWidget()->mapFrom(this, event->pos()));
    if (!menu.isEmpty())
        menu.addSeparator();
    menu.addActions(actions());
    menu.exec(event->globalPos());
}

void PlotPane::fillMenu(QMenu&, const QPointF&) {}

void PlotPane::paintCurves(QPainter& painter) {
    drawCurves(painter);
    curvesAreOld_ = false;
}

void PlotPane::paintMarks(QPainter& painter) {
    drawMarks(painter);
    if (!drag_ || drag_->what != Drag::What::box || !drag_->begun)
        return;
    QColor fill = theme().colour(ColourRole::accent);
    painter.setPen(QPen(fill, 1.0));
    fill.setAlphaF(0.12F);
    painter.setBrush(fill);
    painter.drawRect(QRectF(drag_->pressed, drag_->lastMouse).normalized());
}

void PlotPane::redraw() {
    handlesAreOld_ = true;
    curvesAreOld_ = true;
    canvas_.redraw();
}

void PlotPane::redrawMarks() {
    // Everything is drawn anew soon: at the next repaint, or with the answer to the drag.
    if (curvesAreOld_ || content_.ghost)
        return;
    canvas_.redrawMarks();
}

} // namespace cornerwright
