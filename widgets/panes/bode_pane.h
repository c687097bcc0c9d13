#pragma once

#include "widgets/panes/frequency_pane.h"
#include "widgets/panes/margin_marks.h"

namespace cornerwright {

class LabelPlacer;

/// What magnitude and phase have in common: the plant in graphite, the loops in ink, the other
/// cases faint, the start of the drag and the trial; and the sections' handles on the loop curve.
class BodePane : public FrequencyPane {
    Q_OBJECT

  public:
    using Curve = std::vector<double> LoopCurves::*;

    BodePane(ViewState& viewState, const AxisStyle& vertical, Curve plant, Curve loop,
             QWidget* parent);

    QString csv() const override;
    std::optional<QPointF> pixelAtFrequency(double w_rad_s) const override;

  protected:
    void contentChanged() override;
    void drawCurves(QPainter& painter) override;
    std::vector<Handle> makeHandles() const override;
    std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                   const Project& start) const override;
    std::optional<Project> nudged(const HandleId& handle, const QPointF& direction, double share,
                                  const Project& project) const override;

    /// Upward travel as decibels, for depth, ratio and damping.
    virtual double decibelsOf(double upwardPixels) const = 0;
    virtual QString unit() const = 0;

    /// Handles with their names where hovered or selected.
    void drawHandles(QPainter& painter, LabelPlacer& placer) const;
    /// The linked cursor with the values of the shown case.
    void drawReadings(QPainter& painter) const;
    /// The bar of a margin, and the figure beside the one that decides.
    void drawMargin(QPainter& painter, const MarginMark& mark, const MarkedLoop& loop,
                    LabelPlacer& placer) const;
    /// Where crossover lines stand: those of the loop whose phase margins are marked.
    void drawCrossovers(QPainter& painter, const MarkedLoop& loop) const;
    void drawReferenceLine(QPainter& painter, double value) const;
    /// A ring where the followed requirement is measured on the loop curve.
    void drawFollowed(QPainter& painter, LabelPlacer& placer) const;
    /// The names of the other cases that stand for a requirement measured here, at that place.
    void drawWorstNames(QPainter& painter, LabelPlacer& placer) const;
    /// Margins that this pane marks with their figure.
    virtual bool marksMargin(Measure measure) const = 0;
    /// Limits of the margins: short lines beside the margin's bar, which can be dragged.
    std::vector<Handle> limitHandles(const MarkedLoop& loop) const;
    void drawLimits(QPainter& painter, LabelPlacer& placer) const;
    Curve loopCurve() const { return loop_; }

  private:
    void drawCase(QPainter& painter, const LoopCurves& curves, const QPen& plant,
                  const QPen& loop) const;
    void drawGrip(QPainter& painter, std::size_t index, const Handle& grip,
                  const std::vector<Handle>& all) const;

    Curve plant_;
    Curve loop_;
};

} // namespace cornerwright
