#pragma once

#include <QWidget>

namespace cornerwright {

/// What the program is, and the cautions that go with every closed loop; stands in place of the
/// panes until it is closed.
class AboutPage : public QWidget {
    Q_OBJECT

  public:
    explicit AboutPage(QWidget* parent = nullptr);

  Q_SIGNALS:
    void closed();

  protected:
    void keyPressEvent(QKeyEvent* event) override;
};

} // namespace cornerwright
