#pragma once

#include "widgets/panes/bode_pane.h"

namespace cornerwright {

/// arg P and arg L in degrees, unwrapped, with the phase margins and the same section handles as
/// the magnitude.
class PhasePane : public BodePane {
    Q_OBJECT

  public:
    explicit PhasePane(ViewState& viewState, QWidget* parent = nullptr);

    QString title() const override { return tr("Phase"); }

  protected:
    std::optional<AxisRange> fittedVertical(const AxisRange& frequencies) const override;
    void drawMarks(QPainter& painter) override;
    std::vector<Handle> makeHandles() const override;
    double decibelsOf(double upwardPixels) const override;
    bool marksMargin(Measure measure) const override { return measure == Measure::phase_margin; }
    QString unit() const override { return QStringLiteral("deg"); }
};

} // namespace cornerwright
