#pragma once

#include "widgets/panes/bode_pane.h"

namespace cornerwright {

/// |P| and |L| in decibel, with the gain margins, the section handles and the gain by the curve
/// itself.
class MagnitudePane : public BodePane {
    Q_OBJECT

  public:
    explicit MagnitudePane(ViewState& viewState, QWidget* parent = nullptr);

    QString title() const override { return tr("Magnitude"); }

  protected:
    std::optional<AxisRange> fittedVertical(const AxisRange& frequencies) const override;
    void drawMarks(QPainter& painter) override;
    std::vector<Handle> makeHandles() const override;
    std::optional<Handle> curveHandleAt(const QPointF& pixel) const override;
    std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                   const Project& start) const override;
    std::optional<Project> nudged(const HandleId& handle, const QPointF& direction, double share,
                                  const Project& project) const override;
    void fillMenu(QMenu& menu, const QPointF& pixel) override;
    double decibelsOf(double upwardPixels) const override;
    bool marksMargin(Measure measure) const override {
        return measure == Measure::gain_margin || measure == Measure::gain_reduction_margin;
    }
    QString unit() const override { return QStringLiteral("db"); }

  private:
    void addSection(SectionKind kind, double w_rad_s);
    void drawStability(QPainter& painter, LabelPlacer& placer) const;
    void drawCrossoverName(QPainter& painter, const MarkedLoop& loop, LabelPlacer& placer) const;
};

} // namespace cornerwright
