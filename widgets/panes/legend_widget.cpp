#include "widgets/panes/legend_widget.h"

#include "widgets/theme.h"

#include <QAction>
#include <QHBoxLayout>
#include <QPainter>
#include <QToolButton>

#include <cmath>

namespace cornerwright {

namespace {

constexpr double sample_width = 22.0;
constexpr double sample_gap = 5.0;
constexpr double entry_gap = 14.0;

} // namespace

/// The samples themselves: names that do not fit are left out from the right.
class LegendWidget::Samples : public QWidget {
  public:
    explicit Samples(LegendWidget* parent) : QWidget(parent), legend_(*parent) {
        setSizePolicy(QSizePolicy::Preferred, QSizePolicy::Preferred);
        setMinimumWidth(0);
    }

    QSize sizeHint() const override {
        const QFontMetricsF metrics(fontOf(FontRole::small));
        double width = 0.0;
        for (const Entry& entry : legend_.entries_)
            width += widthOf(entry, metrics);
        return {static_cast<int>(std::ceil(width)),
                static_cast<int>(std::ceil(metrics.height() + 4.0))};
    }
    QSize minimumSizeHint() const override { return {0, sizeHint().height()}; }

  protected:
    void paintEvent(QPaintEvent*) override {
        QPainter painter(this);
        painter.setRenderHint(QPainter::Antialiasing);
        painter.setFont(fontOf(FontRole::small));
        const QFontMetricsF metrics(painter.font());
        const Theme& theme = Theme::of(palette());
        double x = 0.0;
        for (const Entry& entry : legend_.entries_) {
            const double needed = widthOf(entry, metrics) - entry_gap;
            if (x + needed > width() + 1.0)
                break;
            const double middle = 0.5 * height();
            painter.setPen(entry.pen);
            painter.drawLine(QPointF(x, middle), QPointF(x + sample_width, middle));
            painter.setPen(theme.colour(ColourRole::muted));
            painter.drawText(QRectF(x + sample_width + sample_gap, 0.0, needed, height()),
                             Qt::AlignLeft | Qt::AlignVCenter, entry.name);
            x += needed + entry_gap;
        }
    }

  private:
    static double widthOf(const Entry& entry, const QFontMetricsF& metrics) {
        return sample_width + sample_gap + metrics.horizontalAdvance(entry.name) + entry_gap;
    }
    const LegendWidget& legend_;
};

LegendWidget::LegendWidget(QWidget* parent)
    : QWidget(parent), samples_(new Samples(this)), row_(new QHBoxLayout(this)) {
    row_->setContentsMargins(0, 0, 0, 0);
    row_->addWidget(samples_);
    setAccessibleName(tr("Legend"));
}

void LegendWidget::setEntries(std::vector<Entry> entries) {
    if (entries == entries_)
        return;
    entries_ = std::move(entries);
    QStringList names;
    for (const Entry& entry : entries_)
        names.append(entry.name);
    samples_->setAccessibleName(names.join(QStringLiteral(", ")));
    samples_->updateGeometry();
    samples_->update();
}

void LegendWidget::addSwitch(QAction* action) {
    auto* button = new QToolButton(this);
    button->setDefaultAction(action);
    button->setAutoRaise(true);
    button->setToolButtonStyle(Qt::ToolButtonTextOnly);
    button->setAccessibleName(action->text());
    row_->addWidget(button);
}

} // namespace cornerwright
