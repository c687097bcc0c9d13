#pragma once

#include <QStyledItemDelegate>

namespace cornerwright {

/// Paints the cells of the ledger: text in the colour of its state, and the headroom bar with the
/// place where it stood when the running drag began.
class LedgerDelegate : public QStyledItemDelegate {
    Q_OBJECT

  public:
    using QStyledItemDelegate::QStyledItemDelegate;

    void paint(QPainter* painter, const QStyleOptionViewItem& option,
               const QModelIndex& index) const override;
    QSize sizeHint(const QStyleOptionViewItem& option, const QModelIndex& index) const override;

  private:
    void paintText(QPainter& painter, const QStyleOptionViewItem& option,
                   const QModelIndex& index) const;
    void paintBar(QPainter& painter, const QStyleOptionViewItem& option,
                  const QModelIndex& index) const;
};

} // namespace cornerwright
