#include "widgets/ledger/ledger_delegate.h"

#include "widgets/ledger/ledger_model.h"
#include "widgets/ledger/ledger_order.h"
#include "widgets/theme.h"

#include <QPainter>

namespace cornerwright {

namespace {

constexpr int padding = 6;
constexpr int rowPadding = 6;
// The limit stands at a third of the bar's cell: there is more room above than short of it.
constexpr double limitAt = 1.0 / 3.0;

State stateOf(const QModelIndex& index) {
    return static_cast<State>(index.data(LedgerModel::stateRole).toInt());
}

} // namespace

void LedgerDelegate::paint(QPainter* painter, const QStyleOptionViewItem& option,
                           const QModelIndex& index) const {
    const Theme& theme = Theme::of(option.palette);
    painter->save();
    painter->setRenderHint(QPainter::Antialiasing);
    constexpr double band = 0.35;
    constexpr double selection = 0.12;
    if (option.state.testFlag(QStyle::State_Selected)) {
        painter->fillRect(option.rect, theme.faint(ColourRole::accent, selection));
    } else if (index.row() % 2 == 0) {
        painter->fillRect(option.rect, theme.faint(ColourRole::grid, band));
    }
    if (index.column() == LedgerModel::headroom) {
        paintBar(*painter, option, index);
    } else {
        paintText(*painter, option, index);
    }
    painter->restore();
}

void LedgerDelegate::paintText(QPainter& painter, const QStyleOptionViewItem& option,
                               const QModelIndex& index) const {
    const Theme& theme = Theme::of(option.palette);
    const State state = stateOf(index);
    bool strong = false;
    QColor colour = theme.colour(ColourRole::ink);
    switch (index.column()) {
    case LedgerModel::mark:
    case LedgerModel::worst:
    case LedgerModel::state:
        strong = true;
        colour = theme.state(state);
        break;
    case LedgerModel::measure:
        strong = state == State::unmet;
        break;
    case LedgerModel::distance:
        colour = theme.state(state);
        break;
    case LedgerModel::where:
        colour = theme.colour(ColourRole::muted);
        break;
    default:
        break;
    }
    painter.setFont(fontOf(strong ? FontRole::strong : FontRole::body));
    painter.setPen(colour);
    const QRect box = option.rect.adjusted(padding, 0, -padding, 0);
    const QString text =
        painter.fontMetrics().elidedText(index.data().toString(), Qt::ElideRight, box.width());
    painter.drawText(box, Qt::AlignLeft | Qt::AlignVCenter, text);
}

void LedgerDelegate::paintBar(QPainter& painter, const QStyleOptionViewItem& option,
                              const QModelIndex& index) const {
    const Theme& theme = Theme::of(option.palette);
    const QRectF cell = QRectF(option.rect).adjusted(padding, 3.0, -padding, -3.0);
    const double zero = cell.left() + limitAt * cell.width();
    const auto xOf = [&](double share) {
        const double place = barPosition(share);
        return zero + place * (place < 0.0 ? limitAt : 1.0 - limitAt) * cell.width();
    };
    const QVariant share = index.data(LedgerModel::shareRole);
    if (share.isValid()) {
        const double end = xOf(share.toDouble());
        const QRectF bar(QPointF(std::min(zero, end), cell.top() + 2.0),
                         QPointF(std::max(zero, end), cell.bottom() - 2.0));
        painter.setPen(Qt::NoPen);
        constexpr float strength = 0.8F;
        QColor fill = theme.state(stateOf(index));
        fill.setAlphaF(strength);
        painter.setBrush(fill);
        painter.drawRoundedRect(bar, 1.5, 1.5);
    }
    painter.setPen(QPen(theme.colour(ColourRole::graphite), 1.0));
    painter.drawLine(QPointF(zero, cell.top()), QPointF(zero, cell.bottom()));
    const QVariant start = index.data(LedgerModel::startShareRole);
    if (start.isValid()) {
        const double x = xOf(start.toDouble());
        painter.setPen(QPen(theme.colour(ColourRole::ink), 1.6));
        painter.drawLine(QPointF(x, cell.top()), QPointF(x, cell.bottom()));
    }
}

QSize LedgerDelegate::sizeHint(const QStyleOptionViewItem& option, const QModelIndex& index) const {
    const bool strong =
        index.column() != LedgerModel::where && index.column() != LedgerModel::limit;
    const QFontMetrics metrics(fontOf(strong ? FontRole::strong : FontRole::body));
    return {metrics.horizontalAdvance(index.data().toString()) + 2 * padding,
            option.fontMetrics.height() + rowPadding};
}

} // namespace cornerwright
