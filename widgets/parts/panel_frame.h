#pragma once

#include <QFrame>

class QHBoxLayout;
class QLabel;
class QVBoxLayout;

namespace cornerwright {

/// A white panel on the paper ground: a head with title, muted note and room for buttons on its
/// right, and a body.
class PanelFrame : public QFrame {
    Q_OBJECT

  public:
    PanelFrame(const QString& title, QWidget* parent = nullptr);

    void setTitle(const QString& title);
    void setNote(const QString& note);
    /// Puts a widget at the right end of the head.
    void addToHead(QWidget* widget);
    QVBoxLayout* body() const { return body_; }

  protected:
    void paintEvent(QPaintEvent* event) override;

  private:
    QLabel* title_;
    QLabel* note_;
    QHBoxLayout* head_;
    QVBoxLayout* body_;
};

} // namespace cornerwright
