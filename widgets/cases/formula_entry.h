#pragma once

#include <QWidget>

class QLineEdit;

namespace cornerwright {

class TextLabel;

/// In place below the list: a name and a formula in s for a new plant case. What is wrong with the
/// formula is said while it is typed.
class FormulaEntry : public QWidget {
    Q_OBJECT

  public:
    explicit FormulaEntry(QWidget* parent = nullptr);

    /// Empties the fields and takes the focus.
    void open();

  Q_SIGNALS:
    void entered(const QString& name, const QString& formula);

  protected:
    void keyPressEvent(QKeyEvent* event) override;

  private:
    QString problem() const;
    void take();

    QLineEdit* name_;
    QLineEdit* formula_;
    TextLabel* problem_;
};

} // namespace cornerwright
