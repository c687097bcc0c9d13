#pragma once

#include "widgets/panes/frequency_pane.h"

#include <array>

namespace cornerwright {

class LabelPlacer;

/// |S|, |T|, |CS| and |PS| in decibel with the limits that requirements put on them; limits are
/// dragged up and down.
class SensitivityPane : public FrequencyPane {
    Q_OBJECT

  public:
    explicit SensitivityPane(ViewState& viewState, QWidget* parent = nullptr);

    QString title() const override { return tr("Sensitivity"); }
    QString csv() const override;

  protected:
    void contentChanged() override;
    std::optional<AxisRange> fittedVertical(const AxisRange& frequencies) const override;
    void drawCurves(QPainter& painter) override;
    void drawMarks(QPainter& painter) override;
    std::vector<Handle> makeHandles() const override;
    std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                   const Project& start) const override;
    std::optional<Project> nudged(const HandleId& handle, const QPointF& direction, double share,
                                  const Project& project) const override;

  private:
    struct Member {
        std::vector<double> (*decibels)(const LoopCurves& curves);
        ColourRole colour;
        double width;
        QString name;
    };
    static std::array<Member, 4> members();
    void drawLoop(QPainter& painter, const LoopCurves& curves, double share, Qt::PenStyle style,
                  double width) const;
    void drawNames(QPainter& painter, const LoopCurves& curves, LabelPlacer& placer) const;
    /// A ring on the member that the followed requirement is measured on.
    void drawFollowed(QPainter& painter, const CaseAssessment& shown, LabelPlacer& placer) const;
    QString readings(const CaseAssessment& shown, double w_rad_s) const;
    /// The frequencies over which a requirement limits its curve; empty for other measures.
    std::optional<AxisRange> limitedFrequencies(const Requirement& requirement) const;
};

} // namespace cornerwright
