#pragma once

#include "widgets/panes/plot_pane.h"

namespace cornerwright {

/// A pane over frequency: its window and cursor are linked through the view state.
class FrequencyPane : public PlotPane {
    Q_OBJECT

  public:
    FrequencyPane(ViewState& viewState, const AxisStyle& vertical, QWidget* parent);

  protected:
    std::optional<PlotRanges> fittedRanges() const final;
    /// The vertical range that shows what counts between these frequencies.
    virtual std::optional<AxisRange> fittedVertical(const AxisRange& frequencies) const = 0;

    void mouseAt(const QPointF& pixel) override;
    void mouseLeft() override;
    void rangesChangedByHand() override;
    void aboutToFit() override;

    /// The linked cursor's line and, in a corner of the plot, `readings` at its frequency.
    void drawCursor(QPainter& painter, const QString& readings) const;
    /// Values of a curve between these frequencies, for fitting.
    static std::vector<double> within(const std::vector<double>& w, const std::vector<double>& y,
                                      const AxisRange& frequencies);

  private:
    /// All frequencies of all cases.
    std::optional<AxisRange> allFrequencies() const;
    void takeWindow();
};

} // namespace cornerwright
