#pragma once

#include "core/handover/limited_step.h"
#include "core/realisation/realisation.h"

#include <QWidget>

#include <memory>

namespace cornerwright {

/// The unit step with the output limits in force: y above, u with its limits below, and what it
/// comes to in a sentence.
class LimitedStepView : public QWidget {
    Q_OBJECT

  public:
    explicit LimitedStepView(QWidget* parent = nullptr);

    void setStep(std::shared_ptr<const LimitedStep> step, const OutputLimits& limits);
    void clear();
    /// "With the limits, the shown case: overshoot 4.1 %, ..."
    QString sentence() const;

  protected:
    void paintEvent(QPaintEvent* event) override;

  private:
    void drawSignal(QPainter& painter, const QRectF& area, const std::vector<double>& values,
                    const QString& name, const std::vector<double>& levels) const;

    std::shared_ptr<const LimitedStep> step_;
    OutputLimits limits_;
};

} // namespace cornerwright
