#pragma once

#include "widgets/import/import_look.h"

#include <QWidget>

class QCheckBox;
class QComboBox;
class QFormLayout;
class QLineEdit;
class QSpinBox;

namespace cornerwright {

class QuantityField;

/// What is settled about one file besides its columns: its name as a case, whether it holds a
/// response or a time record, what was measured, sign, delay, and what a measurement cannot tell.
class ImportForm : public QWidget {
    Q_OBJECT

  public:
    explicit ImportForm(QWidget* parent = nullptr);

    void setEntry(const ImportChoices& choices, const ImportLook& look);
    /// `start` with what stands in the form.
    ImportChoices choicesFrom(ImportChoices start) const;

  Q_SIGNALS:
    /// The person settled something that changes the curves.
    void changed();
    void nameChanged();

  private:
    void addCommonRows();
    void addRecordRows();
    void addPlantRows();
    void setChannels(const ImportChoices& choices, const ImportLook& look);
    void showRows(const ImportChoices& choices, const ImportLook& look);
    void setShown(QWidget* field, bool shown);

    QFormLayout* form_;
    QLineEdit* name_;
    QComboBox* holds_;
    QComboBox* parameter_;
    QComboBox* excitation_;
    QComboBox* response_;
    QuantityField* samplePeriod_;
    QComboBox* method_;
    QSpinBox* averages_;
    QComboBox* window_;
    QComboBox* trend_;
    QComboBox* quantity_;
    QCheckBox* sign_;
    QuantityField* delay_;
    QuantityField* coherence_;
    QSpinBox* integrators_;
    QSpinBox* unstablePoles_;
};

} // namespace cornerwright
