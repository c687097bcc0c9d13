#pragma once

#include "widgets/panes/frequency_pane.h"

class QLabel;

namespace cornerwright {

/// How far each measurement can be trusted, over frequency: its coherence, its random error, or how
/// far the fitted model is from it; and in words what the file says.
class QualityPane : public FrequencyPane {
    Q_OBJECT

  public:
    enum class Quality { coherence, random_error, misfit };

    explicit QualityPane(ViewState& viewState, QWidget* parent = nullptr);

    QString title() const override { return tr("Measurement quality"); }
    QString csv() const override;
    void showQuality(Quality quality);
    /// What is told of the shown case.
    QString words() const;

  protected:
    void contentChanged() override;
    std::optional<AxisRange> fittedVertical(const AxisRange& frequencies) const override;
    void drawCurves(QPainter& painter) override;
    void drawMarks(QPainter& painter) override;

  private:
    /// The qualities of one case; an empty list where one is not known.
    struct CaseQuality {
        std::shared_ptr<const MeasuredResponse> response; ///< null for a model
        std::optional<FittedModel> fit;
        std::vector<double> coherence;
        std::vector<double> random_error_percent;
        std::vector<double> misfit_db;
    };
    static CaseQuality qualityOf(const PlantCase& plantCase);
    void refreshQualities();
    const std::vector<double>& shownOf(const CaseQuality& quality) const;
    void drawCase(QPainter& painter, const CaseQuality& quality, const QPen& pen) const;
    QString valueText(double value) const;

    Quality quality_ = Quality::coherence;
    std::vector<CaseQuality> qualities_; ///< in the order of the plant cases
    QLabel* words_;
};

} // namespace cornerwright
