#include "widgets/window/notice_strip.h"

#include "widgets/parts/glyph_button.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"
#include "widgets/theme.h"

#include <QHBoxLayout>
#include <QPainter>

#include <algorithm>

namespace cornerwright {

namespace {

QString signOf(NoticeStrip::Kind kind) {
    switch (kind) {
    case NoticeStrip::Kind::problem:
        return QStringLiteral("✗");
    case NoticeStrip::Kind::question:
        return QStringLiteral("?");
    case NoticeStrip::Kind::information:
        break;
    }
    return QStringLiteral("i");
}

// Older notices than these give way: the strip must not push the work out of sight.
constexpr std::size_t mostNotices = 4;

} // namespace

class NoticeStrip::Notice : public QFrame {
  public:
    Notice(Kind kind, const QString& text, const QString& topic, QWidget* parent)
        : QFrame(parent),
          topic_(topic),
          kind_(kind),
          text_(new TextLabel(text, TextLabel::Kind::body, this)),
          row_(new QHBoxLayout(this)) {
        row_->setContentsMargins(10, 4, 6, 4);
        auto* sign = new TextLabel(signOf(kind), TextLabel::Kind::strong, this);
        text_->setWordWrap(true);
        text_->setTextInteractionFlags(Qt::TextSelectableByMouse);
        row_->addWidget(sign, 0, Qt::AlignTop);
        row_->addWidget(text_, 1);
        setAccessibleName(kind == Kind::problem ? NoticeStrip::tr("Problem")
                                                : NoticeStrip::tr("Notice"));
        setAccessibleDescription(text);
    }

    const QString& topic() const { return topic_; }
    QString text() const { return text_->text(); }
    void add(QWidget* widget) { row_->addWidget(widget, 0, Qt::AlignTop); }

  protected:
    void paintEvent(QPaintEvent*) override {
        const Theme& theme = Theme::of(palette());
        const ColourRole role = kind_ == Kind::problem ? ColourRole::unmet : ColourRole::accent;
        constexpr double tint = 0.09;
        QPainter painter(this);
        painter.setRenderHint(QPainter::Antialiasing);
        painter.setPen(theme.colour(role));
        painter.setBrush(theme.faint(role, tint));
        painter.drawRoundedRect(QRectF(rect()).adjusted(0.5, 0.5, -0.5, -0.5), 4.0, 4.0);
    }

  private:
    QString topic_;
    Kind kind_;
    TextLabel* text_;
    QHBoxLayout* row_;
};

NoticeStrip::NoticeStrip(QWidget* parent) : QWidget(parent), layout_(new QVBoxLayout(this)) {
    layout_->setContentsMargins(8, 4, 8, 0);
    layout_->setSpacing(3);
    hide();
}

void NoticeStrip::show(Kind kind, const QString& text, const QString& topic,
                       const std::vector<NoticeChoice>& choices) {
    if (!topic.isEmpty()) {
        close(topic);
    }
    auto* notice = new Notice(kind, text, topic, this);
    QWidget* first = nullptr;
    for (const NoticeChoice& choice : choices) {
        auto* button = new LinkButton(choice.text, notice);
        connect(button, &LinkButton::clicked, this, [this, notice, take = choice.take] {
            remove(notice);
            take();
        });
        notice->add(button);
        first = first == nullptr ? button : first;
    }
    auto* dismiss = new GlyphButton(Glyph::remove, tr("Close this notice"), notice);
    connect(dismiss, &GlyphButton::clicked, this, [this, notice] { remove(notice); });
    notice->add(dismiss);
    layout_->insertWidget(0, notice);
    notices_.insert(notices_.begin(), notice);
    while (notices_.size() > mostNotices) {
        remove(notices_.back());
    }
    QWidget::show();
    if (kind == Kind::question && first != nullptr) {
        first->setFocus(Qt::OtherFocusReason);
    }
}

void NoticeStrip::close(const QString& topic) {
    const auto found = std::ranges::find(notices_, topic, &Notice::topic);
    if (found != notices_.end()) {
        remove(*found);
    }
}

bool NoticeStrip::isShowing(const QString& topic) const {
    return std::ranges::find(notices_, topic, &Notice::topic) != notices_.end();
}

QStringList NoticeStrip::texts() const {
    QStringList all;
    for (const Notice* notice : notices_) {
        all << notice->text();
    }
    return all;
}

void NoticeStrip::remove(Notice* notice) {
    std::erase(notices_, notice);
    layout_->removeWidget(notice);
    notice->hide();
    notice->deleteLater();
    setVisible(!notices_.empty());
}

} // namespace cornerwright
