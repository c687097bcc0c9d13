#pragma once

#include "widgets/panes/loop_plane_pane.h"
#include "widgets/panes/margin_marks.h"
#include "widgets/panes/nyquist_plane.h"

namespace cornerwright {

/// L in the complex plane with the critical point -1, the unit circle, the margins where they are
/// measured and, where the sensitivity peak is limited, the circle about -1 that the curve has to
/// stay out of; that circle can be dragged.
class NyquistPane : public LoopPlanePane {
    Q_OBJECT

  public:
    explicit NyquistPane(ViewState& viewState, QWidget* parent = nullptr);

    QString title() const override { return tr("Nyquist"); }
    void setRadiusScale(RadiusScale scale);

  protected:
    std::optional<PlotRanges> fittedRanges() const override;
    std::vector<QPointF> placesOf(const LoopCurves& curves) const override;
    void drawGround(QPainter& painter) const override;
    void drawMirrored(QPainter& painter, const LoopCurves& curves) const override;
    void drawMargins(QPainter& painter, const CaseAssessment& shown,
                     LabelPlacer& placer) const override;
    double gainFactorOf(const QPointF& from, const QPointF& to) const override;
    std::vector<Handle> makeHandles() const override;
    std::optional<Handle> curveHandleAt(const QPointF& pixel) const override;
    std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                   const Project& start) const override;
    std::optional<Project> nudged(const HandleId& handle, const QPointF& direction, double share,
                                  const Project& project) const override;
    bool zoomsBothAxes() const override { return true; }

  private:
    QPointF pixelOf(Complex value) const;
    Complex valueAt(const QPointF& pixel) const;
    Handle circleHandle(std::size_t requirement, const QPointF& at) const;
    void drawMargin(QPainter& painter, const MarginMark& mark, const MarkedLoop& loop,
                    const CaseAssessment& shown, LabelPlacer& placer) const;
    void drawLimitCircles(QPainter& painter, const CaseAssessment& shown,
                          LabelPlacer& placer) const;
    void drawSensitivityPeak(QPainter& painter, const CaseAssessment& shown) const;

    RadiusScale scale_ = RadiusScale::compressed;
};

} // namespace cornerwright
