#pragma once

#include "widgets/parts/glyphs.h"

#include <QAbstractButton>

namespace cornerwright {

/// A flat button that shows one sign. Its name is told by tool tip and to screen readers.
class GlyphButton : public QAbstractButton {
    Q_OBJECT

  public:
    GlyphButton(Glyph glyph, const QString& name, QWidget* parent = nullptr);

    void setGlyph(Glyph glyph);
    void setName(const QString& name);

    QSize sizeHint() const override;

  protected:
    void paintEvent(QPaintEvent* event) override;
    void enterEvent(QEnterEvent* event) override;
    void leaveEvent(QEvent* event) override;

  private:
    Glyph glyph_;
};

} // namespace cornerwright
