#pragma once

#include "widgets/panes/plot_pane.h"

namespace cornerwright {

class LabelPlacer;

/// The loop as a curve in a plane, frequency running along it (Nyquist, Nichols): the shown case
/// full, its realised loop dashed, the other cases faint, the start of the drag and the trial. The
/// curve itself dragged is the gain. The linked cursor is a point on the curve; the mouse near the
/// curve moves it.
class LoopPlanePane : public PlotPane {
    Q_OBJECT

  public:
    LoopPlanePane(ViewState& viewState, QWidget* parent);

    QString csv() const override;
    std::optional<QPointF> pixelAtFrequency(double w_rad_s) const override;

  protected:
    /// The points of L in the units of the axes, one for each frequency.
    virtual std::vector<QPointF> placesOf(const LoopCurves& curves) const = 0;
    /// What lies under the curves: contours, reference lines.
    virtual void drawGround(QPainter& painter) const = 0;
    /// Margins, limits and the critical point of the shown case.
    virtual void drawMargins(QPainter& painter, const CaseAssessment& shown,
                             LabelPlacer& placer) const = 0;
    /// Drawn after the shown case's curve, in its pen's faint form; nothing by default.
    virtual void drawMirrored(QPainter&, const LoopCurves&) const {}
    /// The factor on the gain that a drag of the curve from one pixel to another means.
    virtual double gainFactorOf(const QPointF& from, const QPointF& to) const = 0;

    void contentChanged() override;
    void drawCurves(QPainter& painter) final;
    void drawMarks(QPainter& painter) final;
    std::optional<Handle> curveHandleAt(const QPointF& pixel) const override;
    std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                   const Project& start) const override;
    std::optional<Project> nudged(const HandleId& handle, const QPointF& direction, double share,
                                  const Project& project) const override;
    void mouseAt(const QPointF& pixel) override;
    void mouseLeft() override;

    QPointF toPixel(const QPointF& place) const;
    QPointF toPlace(const QPointF& pixel) const;
    std::vector<QPointF> toPixels(std::vector<QPointF> places) const;
    /// Pixel on the curve at `w`; empty outside the curve.
    std::optional<QPointF> pixelAt(const LoopCurves& curves, double w_rad_s) const;

  private:
    struct Nearest {
        double w_rad_s = 0.0;
        double distance = 0.0; ///< pixels
    };
    std::optional<Nearest> nearestTo(const QPointF& pixel) const;
    void drawLoop(QPainter& painter, const LoopCurves& curves, const QPen& pen) const;
    void drawFollowed(QPainter& painter, const CaseAssessment& shown, LabelPlacer& placer) const;
    void drawCursor(QPainter& painter, const CaseAssessment& shown) const;
};

} // namespace cornerwright
