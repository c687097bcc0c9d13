#include "widgets/parts/link_button.h"

#include "widgets/theme.h"

#include <QPainter>

namespace cornerwright {

namespace {
constexpr int padding = 6;
}

LinkButton::LinkButton(const QString& text, QWidget* parent) : QPushButton(text, parent) {
    setFlat(true);
    setCursor(Qt::PointingHandCursor);
    setFont(fontOf(FontRole::strong));
    setSizePolicy(QSizePolicy::Fixed, QSizePolicy::Fixed);
}

QSize LinkButton::sizeHint() const {
    return fontMetrics().size(Qt::TextShowMnemonic, text()) + QSize(2 * padding, padding);
}

void LinkButton::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    const QRectF frame = QRectF(rect()).adjusted(1.0, 1.0, -1.0, -1.0);
    if (isDown() || underMouse()) {
        painter.setPen(Qt::NoPen);
        painter.setBrush(theme.colour(ColourRole::grid));
        painter.drawRoundedRect(frame, 4.0, 4.0);
    }
    if (hasFocus()) {
        painter.setPen(QPen(theme.colour(ColourRole::accent), 1.5));
        painter.setBrush(Qt::NoBrush);
        painter.drawRoundedRect(frame, 4.0, 4.0);
    }
    painter.setPen(theme.colour(isEnabled() ? ColourRole::accent : ColourRole::muted));
    painter.drawText(rect(), Qt::AlignCenter | Qt::TextShowMnemonic, text());
}

} // namespace cornerwright
