#pragma once

#include <QLabel>

namespace cornerwright {

/// Text in one of the few ways in which the window writes, following theme and scale.
class TextLabel : public QLabel {
    Q_OBJECT

  public:
    enum class Kind {
        body,    ///< ink
        strong,  ///< heads and names
        muted,   ///< labels and notes, small
        problem, ///< what could not be taken, small
    };

    TextLabel(const QString& text, Kind kind, QWidget* parent = nullptr);

    void setKind(Kind kind);

  protected:
    void changeEvent(QEvent* event) override;

  private:
    void dress();

    Kind kind_;
    bool dressing_ = false;
};

} // namespace cornerwright
