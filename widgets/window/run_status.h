#pragma once

#include <QTimer>
#include <QWidget>

namespace cornerwright {

class LinkButton;
class TextLabel;

/// The line at the foot of the window: what is running, with a way to stop it, and what the command
/// under the mouse does.
class RunStatus : public QWidget {
    Q_OBJECT

  public:
    explicit RunStatus(QWidget* parent = nullptr);

    /// Something runs; it is told once it takes longer than a moment.
    void begin(const QString& what);
    void end();
    void setHint(const QString& hint);
    /// What always stands at the right end.
    void setFacts(const QString& facts);
    QString text() const;

  Q_SIGNALS:
    void cancelAsked();

  private:
    void refresh();

    QString running_;
    QString hint_;
    bool told_ = false;
    QTimer patience_;
    TextLabel* line_;
    TextLabel* facts_;
    LinkButton* cancel_;
};

} // namespace cornerwright
