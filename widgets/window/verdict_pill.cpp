#include "widgets/window/verdict_pill.h"

#include "widgets/figure_text.h"
#include "widgets/ledger/ledger_text.h"
#include "widgets/theme.h"

#include <QPainter>

namespace cornerwright {

namespace {
constexpr int padding = 14;
constexpr int leastCharacters = 22;
} // namespace

VerdictPill::VerdictPill(QWidget* parent) : QAbstractButton(parent) {
    setFont(fontOf(FontRole::strong));
    setSizePolicy(QSizePolicy::Preferred, QSizePolicy::Fixed);
    setFocusPolicy(Qt::TabFocus);
    setVerdict(nullptr, true);
}

void VerdictPill::setVerdict(const Verdict* verdict, bool hertz) {
    state_ = verdict == nullptr ? State::undetermined : verdict->state;
    const QString text = verdict == nullptr ? tr("not assessed yet") : verdictText(*verdict, hertz);
    setText(text);
    setToolTip(text);
    setAccessibleName(tr("Verdict: %1").arg(stateText(state_)));
    setAccessibleDescription(text);
    updateGeometry();
    update();
}

QSize VerdictPill::sizeHint() const {
    const QFontMetrics metrics = fontMetrics();
    // A character to spare: the mark may come from another font, whose advance is rounded
    // elsewhere.
    return {metrics.horizontalAdvance(markOf(state_) + QStringLiteral("  ") + text()) +
                metrics.averageCharWidth() + 2 * padding,
            metrics.height() + 12};
}

QSize VerdictPill::minimumSizeHint() const {
    return {leastCharacters * fontMetrics().averageCharWidth(), sizeHint().height()};
}

void VerdictPill::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    const QColor colour = theme.state(state_);
    const ColourRole role = state_ == State::met     ? ColourRole::met
                            : state_ == State::unmet ? ColourRole::unmet
                                                     : ColourRole::muted;
    constexpr double tint = 0.09;
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    const QRectF frame = QRectF(rect()).adjusted(1.0, 1.0, -1.0, -1.0);
    painter.setPen(QPen(colour, hasFocus() ? 2.0 : 1.2));
    painter.setBrush(theme.faint(role, tint));
    painter.drawRoundedRect(frame, frame.height() / 2.0, frame.height() / 2.0);
    painter.setPen(colour);
    const QRect box = rect().adjusted(padding, 0, -padding, 0);
    const QString line = markOf(state_) + QStringLiteral("  ") + text();
    painter.drawText(box, Qt::AlignCenter,
                     fontMetrics().elidedText(line, Qt::ElideRight, box.width()));
}

} // namespace cornerwright
