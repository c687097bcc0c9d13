#include "widgets/parts/text_label.h"

#include "widgets/theme.h"

#include <QEvent>

namespace cornerwright {

namespace {

ColourRole roleOf(TextLabel::Kind kind) {
    switch (kind) {
    case TextLabel::Kind::muted:
        return ColourRole::muted;
    case TextLabel::Kind::problem:
        return ColourRole::unmet;
    default:
        return ColourRole::ink;
    }
}

FontRole fontRoleOf(TextLabel::Kind kind) {
    switch (kind) {
    case TextLabel::Kind::strong:
        return FontRole::strong;
    case TextLabel::Kind::muted:
    case TextLabel::Kind::problem:
        return FontRole::small;
    default:
        return FontRole::body;
    }
}

} // namespace

TextLabel::TextLabel(const QString& text, Kind kind, QWidget* parent)
    : QLabel(text, parent), kind_(kind) {
    setTextFormat(Qt::PlainText);
    dress();
}

void TextLabel::setKind(Kind kind) {
    if (kind_ != kind) {
        kind_ = kind;
        dress();
    }
}

void TextLabel::changeEvent(QEvent* event) {
    QLabel::changeEvent(event);
    if (event->type() == QEvent::PaletteChange || event->type() == QEvent::ApplicationFontChange) {
        dress();
    }
}

void TextLabel::dress() {
    if (dressing_) {
        return;
    }
    dressing_ = true;
    setFont(fontOf(fontRoleOf(kind_)));
    QPalette colours;
    colours.setColor(QPalette::WindowText, Theme::of(palette()).colour(roleOf(kind_)));
    setPalette(colours);
    dressing_ = false;
}

} // namespace cornerwright
