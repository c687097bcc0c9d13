#pragma once

#include <QPushButton>

namespace cornerwright {

/// A quiet button that is only its words, in the accent colour.
class LinkButton : public QPushButton {
    Q_OBJECT

  public:
    explicit LinkButton(const QString& text, QWidget* parent = nullptr);

    QSize sizeHint() const override;

  protected:
    void paintEvent(QPaintEvent* event) override;
};

} // namespace cornerwright
