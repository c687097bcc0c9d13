#pragma once

#include "widgets/panes/loop_plane_pane.h"
#include "widgets/panes/margin_marks.h"
#include "widgets/panes/nichols_contours.h"

namespace cornerwright {

/// The loop's magnitude over its phase, with contours of the closed loop's magnitude and phase and
/// the margins about the critical points at 0 dB and odd multiples of 180 degrees. The limits of
/// the margins are short lines that can be dragged.
class NicholsPane : public LoopPlanePane {
    Q_OBJECT

  public:
    explicit NicholsPane(ViewState& viewState, QWidget* parent = nullptr);

    QString title() const override { return tr("Nichols"); }

  protected:
    std::optional<PlotRanges> fittedRanges() const override;
    std::vector<QPointF> placesOf(const LoopCurves& curves) const override;
    void drawGround(QPainter& painter) const override;
    void drawMargins(QPainter& painter, const CaseAssessment& shown,
                     LabelPlacer& placer) const override;
    double gainFactorOf(const QPointF& from, const QPointF& to) const override;
    std::vector<Handle> makeHandles() const override;
    std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                   const Project& start) const override;
    std::optional<Project> nudged(const HandleId& handle, const QPointF& direction, double share,
                                  const Project& project) const override;

  private:
    /// Draws a contour in every period that shows; gives the pixels of the last one drawn.
    void drawContour(QPainter& painter, const NicholsContour& contour, const QPen& pen) const;
    void drawContourNames(QPainter& painter) const;
    void drawMargin(QPainter& painter, const MarginMark& mark, const MarkedLoop& loop,
                    const CaseAssessment& shown, LabelPlacer& placer) const;
    void drawLimits(QPainter& painter, LabelPlacer& placer) const;
    void addLimitHandles(std::vector<Handle>& handles, const MarkedLoop& loop) const;
};

} // namespace cornerwright
