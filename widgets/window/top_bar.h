#pragma once

#include <QStringList>
#include <QWidget>

class QAction;
class QHBoxLayout;
class QMenu;
class QToolButton;

namespace cornerwright {

class VerdictPill;
class WindowActions;

/// The bar: the commands at hand all day, which case is shown, and the verdict.
class TopBar : public QWidget {
    Q_OBJECT

  public:
    explicit TopBar(const WindowActions& actions, QWidget* parent = nullptr);

    void setHertz(bool on);
    void setCases(const QStringList& names, int shown);
    /// The menu behind the trial button, filled by whoever keeps the trials.
    QMenu* trialMenu() const { return trialMenu_; }
    void setTrialName(const QString& name);
    VerdictPill* pill() const { return pill_; }

  Q_SIGNALS:
    void caseChosen(int index);

  protected:
    void paintEvent(QPaintEvent* event) override;
    void changeEvent(QEvent* event) override;

  private:
    QToolButton* addButton(QHBoxLayout* row, QAction* action);
    void addLine(QHBoxLayout* row);
    void dress();

    QToolButton* hertz_;
    QToolButton* case_;
    QMenu* caseMenu_;
    QToolButton* trial_;
    QMenu* trialMenu_;
    VerdictPill* pill_;
};

} // namespace cornerwright
