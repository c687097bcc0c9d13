#pragma once

#include "widgets/pane.h"

#include <functional>

class QCheckBox;
class QComboBox;
class QGridLayout;

namespace cornerwright {

class ExportRow;
class QuantityField;
class TextLabel;

/// Sampling and realisation, changed in place: rate, delay, method, structure and number format.
/// The realised loop follows at once.
class RealisationPane : public Pane {
    Q_OBJECT

  public:
    RealisationPane(ViewState& viewState, QWidget* parent = nullptr);

    void setContent(const PaneContent& content) override;
    QString title() const override { return tr("Handover"); }

    ExportRow& exports() const { return *exports_; }

  private:
    void build();
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
    TextLabel* outcome_;
    TextLabel* problem_;
    ExportRow* exports_;
};

} // namespace cornerwright
