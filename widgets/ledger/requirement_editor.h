#pragma once

#include "core/requirements/requirement.h"

#include <QWidget>

class QComboBox;

namespace cornerwright {

class GlyphButton;
class QuantityField;
class TextLabel;

/// One requirement in a line of fields below the ledger: measure, limits, and the number that some
/// measures carry (band, frequency, input). Every change counts at once, as one undo step.
class RequirementEditor : public QWidget {
    Q_OBJECT

  public:
    explicit RequirementEditor(QWidget* parent = nullptr);

    void setRequirement(const Requirement& requirement);
    void setShowsHertz(bool on);
    /// Moves the focus to the limit.
    void begin();
    QuantityField* atLeastField() const { return atLeast_; }
    QuantityField* atMostField() const { return atMost_; }

  Q_SIGNALS:
    void edited(const cornerwright::Requirement& next);
    void removeAsked();
    void closed();

  protected:
    void keyPressEvent(QKeyEvent* event) override;

  private:
    void refresh();
    void propose(const Requirement& next);
    void showProblem(const QString& problem);
    void chooseMeasure();
    void enterExtra(double value);

    Requirement requirement_;
    QComboBox* measure_;
    QuantityField* atLeast_;
    QuantityField* atMost_;
    TextLabel* extraLabel_;
    QuantityField* extra_;
    QComboBox* input_;
    TextLabel* problem_;
};

} // namespace cornerwright
