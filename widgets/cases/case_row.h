#pragma once

#include <QFrame>
#include <QString>

class QCheckBox;
class QLineEdit;

namespace cornerwright {

class TextLabel;

/// One plant case in the list: a check box that draws or hides it, its name and what is known of
/// it. Keys: Enter shows it, space draws or hides it, F2 renames it, F fits a model to a measured
/// one, delete removes it.
class CaseRow : public QFrame {
    Q_OBJECT

  public:
    explicit CaseRow(QWidget* parent = nullptr);

    void setCase(const QString& name, const QString& fact, bool binds);
    void setDrawn(bool drawn);
    void setShown(bool shown);
    /// Only a measured case has a model to be fitted.
    void setMeasured(bool measured) { measured_ = measured; }
    QString name() const { return nameText_; }
    QCheckBox* checkBox() const { return check_; }

  Q_SIGNALS:
    void drawnToggled(bool drawn);
    void showAsked();
    void renameAsked(const QString& name);
    void removeAsked();
    void fitAsked();

  protected:
    void paintEvent(QPaintEvent* event) override;
    void keyPressEvent(QKeyEvent* event) override;
    void mousePressEvent(QMouseEvent* event) override;
    void mouseDoubleClickEvent(QMouseEvent* event) override;
    void contextMenuEvent(QContextMenuEvent* event) override;
    void focusInEvent(QFocusEvent* event) override;
    void focusOutEvent(QFocusEvent* event) override;
    bool eventFilter(QObject* watched, QEvent* event) override;

  private:
    void tellName();
    void beginNaming();
    void endNaming(bool take);

    QString nameText_;
    QString factText_;
    bool shown_ = false;
    bool binds_ = false;
    bool measured_ = false;
    QCheckBox* check_;
    TextLabel* name_;
    QLineEdit* nameEdit_;
    TextLabel* fact_;
};

} // namespace cornerwright
