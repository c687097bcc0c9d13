#pragma once

#include "widgets/panes/plot_pane.h"

#include <set>

namespace cornerwright {

class LabelPlacer;

/// Unit step on the reference (output or controller output) or on the disturbance. On the output
/// the overshoot and settling requirements are lines that can be dragged.
class StepPane : public PlotPane {
    Q_OBJECT

  public:
    enum class Signal { output, control, disturbance };

    explicit StepPane(ViewState& viewState, QWidget* parent = nullptr);

    QString title() const override { return tr("Step response"); }
    QString csv() const override;
    void showSignal(Signal signal);

  protected:
    void contentChanged() override;
    std::optional<PlotRanges> fittedRanges() const override;
    void drawCurves(QPainter& painter) override;
    void drawMarks(QPainter& painter) override;
    std::vector<Handle> makeHandles() const override;
    std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                   const Project& start) const override;
    std::optional<Project> nudged(const HandleId& handle, const QPointF& direction, double share,
                                  const Project& project) const override;
    void mouseAt(const QPointF& pixel) override;
    void mouseLeft() override;

  private:
    const std::vector<double>& signalOf(const StepCurves& curves) const;
    /// The shown signal at a time, empty outside the curve.
    std::optional<double> valueAt(const StepCurves& step, double t_s) const;
    /// Where the output of the shown case ends up; nothing on an unstable loop.
    std::optional<double> finalValue() const;
    /// The measures whose worst case is drawn full beside the shown one.
    std::set<std::size_t> worstHere() const;
    /// A ring where overshoot or settling time of the followed requirement is read off.
    void drawFollowed(QPainter& painter, LabelPlacer& placer) const;
    /// Widens what is fitted so that the limits can be seen, and so dragged.
    void addLimits(std::vector<double>& values, double& end) const;
    void drawNote(QPainter& painter) const;
    void drawReading(QPainter& painter) const;

    Signal signal_ = Signal::output;
    std::optional<double> cursor_; ///< s
};

} // namespace cornerwright
