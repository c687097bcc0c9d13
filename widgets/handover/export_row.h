#pragma once

#include "core/handover/handover.h"

#include <QWidget>

class QLineEdit;

namespace cornerwright {

class TextLabel;

/// What firmware and reviewers receive: one button for each form, the name the files carry, and the
/// caution that goes with every coefficient that leaves the program.
class ExportRow : public QWidget {
    Q_OBJECT

  public:
    explicit ExportRow(QWidget* parent = nullptr);

    /// Exports are possible where there is a difference equation; what is unmet is said plainly.
    void setAssessment(const Assessment* assessment);
    QString name() const;

  Q_SIGNALS:
    void exportAsked(cornerwright::HandoverForm form, const QString& name);
    void reportAsked();

  private:
    QLineEdit* name_;
    TextLabel* warning_;
    std::vector<QWidget*> exports_;
};

} // namespace cornerwright
