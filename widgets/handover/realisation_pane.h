#pragma once

#include "widgets/pane.h"

#include <functional>

class QCheckBox;
class QComboBox;
class QGridLayout;

namespace cornerwright {

class ExportRow;
class LimitedStepView;
class QuantityField;
class StudyRun;
class StudyView;
class TextLabel;

/// Sampling and realisation, changed in place: rate, delay, method, structure and number format.
/// The realised loop follows at once; what the other choices would cost follows when the design has
/// rested for a moment.
class RealisationPane : public Pane {
    Q_OBJECT

  public:
    RealisationPane(ViewState& viewState, QWidget* parent = nullptr);

    void setContent(const PaneContent& content) override;
    QString title() const override { return tr("Handover"); }

    ExportRow& exports() const { return *exports_; }
    const StudyView& study() const { return *study_; }
    const LimitedStepView& limitedStep() const { return *limitedStep_; }

  protected:
    void showEvent(QShowEvent* event) override;

  private:
    void build();
    void buildFields(QGridLayout& grid);
    void connectStudy();
    void connectLimits();
    void changeLimits();
    void wantStudy();
    void addRow(QGridLayout& grid, const QString& label, QWidget* field);
    void connectFields();
    void refresh();
    void change(const QString& what, const std::function<void(Project&)>& edit);

    PaneContent content_;
    QuantityField* period_;
    QuantityField* delay_;
    QCheckBox* includesHold_;
    QCheckBox* realise_;
    QComboBox* method_;
    TextLabel* matchLabel_ = nullptr;
    QuantityField* match_;
    QComboBox* structure_;
    QComboBox* format_;
    QComboBox* wordBits_;
    QuantityField* fractionBits_;
    QCheckBox* limits_;
    QuantityField* lowest_;
    QuantityField* highest_;
    TextLabel* outcome_;
    TextLabel* problem_;
    ExportRow* exports_;
    StudyView* study_;
    LimitedStepView* limitedStep_;
    TextLabel* limitedSentence_;
    StudyRun* run_;
};

} // namespace cornerwright
