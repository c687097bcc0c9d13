#pragma once

#include "widgets/pane.h"
#include "widgets/panes/handle.h"
#include "widgets/panes/plot_canvas.h"

#include <functional>
#include <memory>
#include <optional>
#include <vector>

class QMenu;
class QMouseEvent;
class QPrinter;
class QWheelEvent;

namespace cornerwright {

class LegendWidget;

/// A pane with two axes: the plot, its zoom and pan, its handles and its export. A pane derived
/// from it says what to draw, which handles stand where and what a drag of one means.
///
/// Mouse: the wheel zooms sideways (shift: up and down), a drag on free ground or with the middle
/// button pans, ctrl-drag zooms into a box, a double click on free ground or the Home key fits.
/// Handles: drag, shift for a tenth, arrow keys nudge by 1 % (shift 0.1 %), tab goes from handle to
/// handle, Escape puts back, delete removes and space toggles the selected section.
class PlotPane : public Pane {
    Q_OBJECT

  public:
    PlotPane(ViewState& viewState, QWidget* parent);
    ~PlotPane() override;

    void setContent(const PaneContent& content) final;
    QWidget* headWidget() override;

    /// Shows everything that counts.
    void fit();
    /// The pane on white in the light colours, `scale` pixels for one of the screen.
    QImage picture(double scale = 2.0);
    /// PNG, PDF or SVG by the suffix. False where the file could not be written.
    bool savePicture(const QString& file);
    /// The same on paper, as large as the page allows. False where nothing could be printed.
    bool print(QPrinter& printer);
    void askAndPrint();
    /// What the pane shows as comma-separated values, units in the header.
    virtual QString csv() const = 0;

    /// Where the handles stand, in pixels of `plotWidget()`.
    const std::vector<Handle>& handles() const;
    QWidget* plotWidget() const { return canvas_.widget(); }
    bool isDragging() const { return drag_.has_value(); }
    /// The curves have been drawn since the content or the axes last changed.
    bool isUpToDate() const { return !curvesAreOld_; }
    PlotRanges ranges() const { return canvas_.ranges(); }
    /// Zooms to these ranges, as a hand would.
    void showRanges(const PlotRanges& ranges) { setRangesByHand(ranges); }
    /// The plot inside its axes, in pixels of `plotWidget()`.
    QRectF plotArea() const { return canvas_.area(); }
    /// Where the shown case's loop stands at a frequency, in pixels of `plotWidget()`; empty
    /// outside the curve and on panes that do not draw the loop.
    virtual std::optional<QPointF> pixelAtFrequency(double) const { return std::nullopt; }

  protected:
    // What a pane says of itself.
    virtual void contentChanged() {}
    /// Empty where there is nothing to show.
    virtual std::optional<PlotRanges> fittedRanges() const = 0;
    virtual void drawCurves(QPainter& painter) = 0;
    virtual void drawMarks(QPainter& painter) = 0;
    virtual std::vector<Handle> makeHandles() const { return {}; }
    /// What can be grabbed where no handle is: a curve.
    virtual std::optional<Handle> curveHandleAt(const QPointF&) const { return std::nullopt; }
    /// The project as a drag would have it; nothing where it changes nothing.
    virtual std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                           const Project& start) const;
    /// One arrow key: `direction` is one of (+-1, 0) and (0, +-1), +1 to the right and up; `share`
    /// is 0.01 or 0.001.
    virtual std::optional<Project> nudged(const HandleId& handle, const QPointF& direction,
                                          double share, const Project& project) const;
    virtual void dragBegins(const HandleId&) {}
    virtual void mouseAt(const QPointF&) {}
    virtual void mouseLeft() {}
    virtual void rangesChangedByHand() {}
    virtual void aboutToFit() {}
    virtual void fillMenu(QMenu& menu, const QPointF& pixel);
    /// Wheel and box act on both axes alike, and a unit is as long on both (planes).
    virtual bool zoomsBothAxes() const { return false; }

    const PaneContent& content() const { return content_; }
    const Project* project() const { return content_.project.get(); }
    /// The shown case of an assessment; null where there is none or nothing could be computed.
    const CaseAssessment* shownCase(const std::shared_ptr<const Assessment>& assessment) const;
    bool isHidden(std::size_t caseIndex) const;
    /// The loop of the shown case that the ledger led to; empty where it led nowhere here.
    std::optional<LoopName> followedLoop() const;

    void setAxes(const AxisStyle& x, const AxisStyle& y) { canvas_.setAxes(x, y); }
    void setRanges(const PlotRanges& ranges);
    AxisMap mapX() const { return canvas_.mapX(); }
    AxisMap mapY() const { return canvas_.mapY(); }

    const Theme& theme() const;
    LegendWidget& legend() { return *legend_; }
    bool isHovered(const HandleId& id) const { return hovered_ == id; }
    bool isSelected(const HandleId& id) const { return selected_ && selected_->id == id; }
    bool isDragged(const HandleId& id) const { return drag_ && drag_->handle.id == id; }
    bool isHighlighted(const HandleId& id) const { return isHovered(id) || isSelected(id); }
    bool isExporting() const { return exporting_; }
    /// A command of the pane, in its context menu and in its head's menu.
    QAction* addPaneAction(const QString& text, const std::function<void()>& run);

    void redraw();      ///< all, at the next repaint
    void redrawMarks(); ///< marks, handles and cursor only
    void refit();       ///< like fit, but leaves what was zoomed by hand

    bool eventFilter(QObject* watched, QEvent* event) override;
    void keyPressEvent(QKeyEvent* event) override;
    bool focusNextPrevChild(bool next) override;
    void changeEvent(QEvent* event) override;
    void contextMenuEvent(QContextMenuEvent* event) override;

  private:
    /// A press that moves a handle, the axes, or the corner of a box.
    struct Drag {
        enum class What { handle, axes, box };
        What what = What::axes;
        Handle handle;
        QPointF pressed;
        QPointF lastMouse;
        QPointF travel; ///< fine mode already worked in
        PlotRanges rangesAtPress;
        std::shared_ptr<const Project> start;
        bool begun = false;
    };

    bool mousePressed(const QMouseEvent& event);
    bool mouseMoved(const QMouseEvent& event);
    bool mouseReleased(const QMouseEvent& event);
    void wheelTurned(const QWheelEvent& event);
    void moveHandle(const QPointF& mouse, Qt::KeyboardModifiers modifiers);
    void zoomInto(const QRectF& box);
    void endDrag(bool keep);
    void hover(const QPointF& mouse);
    void nudge(const QPointF& direction, bool fine);
    void editSelectedSection(bool remove);
    std::optional<Handle> handleAt(const QPointF& pixel) const;
    void select(const std::optional<Handle>& handle);
    void setRangesByHand(const PlotRanges& ranges);
    void refitWhereNeeded();
    void keepShape();
    void showOnlyShownCase();
    void paintCurves(QPainter& painter);
    void paintMarks(QPainter& painter);
    void addExportActions();
    void copyPicture();
    void askAndSavePicture();
    void askAndSaveData();

    std::optional<Drag> drag_;
    PaneContent content_;
    mutable std::vector<Handle> handles_;
    mutable bool handlesAreOld_ = true;
    bool curvesAreOld_ = true;
    std::optional<HandleId> hovered_;
    std::optional<Handle> selected_;
    bool zoomedByHand_ = false;
    bool hasFitted_ = false;
    bool exporting_ = false;
    LegendWidget* legend_;
    PlotCanvas canvas_;
};

} // namespace cornerwright
