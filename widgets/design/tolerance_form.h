#pragma once

#include "core/placement/tolerance.h"

#include <QWidget>

#include <vector>

class QComboBox;

namespace cornerwright {

class QuantityField;

/// The stated spreads and the size of a tolerance run.
class ToleranceForm : public QWidget {
    Q_OBJECT

  public:
    explicit ToleranceForm(QWidget* parent = nullptr);

    /// What is asked; workers and progress are left open.
    const ToleranceOptions& options() const { return options_; }
    void setOptions(const ToleranceOptions& options);
    /// Takes what is typed and not yet entered.
    void takeTyped();
    const std::vector<QuantityField*>& fields() const { return fields_; }

  Q_SIGNALS:
    /// What is wrong with the typed text, or nothing any more.
    void problemChanged(const QString& problem);

  private:
    void addPercent(const QString& label, double Spreads::*part);
    QuantityField* addField(const QString& label, int row, int column);

    ToleranceOptions options_;
    std::vector<double Spreads::*> parts_;
    std::vector<QuantityField*> fields_; ///< the spreads, then samples and seed
    QComboBox* shape_;
    QuantityField* samples_;
    QuantityField* seed_;
};

} // namespace cornerwright
