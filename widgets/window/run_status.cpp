#include "widgets/window/run_status.h"

#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"

#include <QHBoxLayout>

#include <chrono>

namespace cornerwright {

namespace {
// What is done sooner needs no telling; text that comes and goes with every drag would only
// flicker.
constexpr std::chrono::milliseconds patience{300};
} // namespace

RunStatus::RunStatus(QWidget* parent)
    : QWidget(parent),
      line_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      facts_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      cancel_(new LinkButton(tr("Cancel"), this)) {
    auto* row = new QHBoxLayout(this);
    row->setContentsMargins(14, 0, 14, 4);
    row->addWidget(line_);
    row->addWidget(cancel_);
    row->addStretch(1);
    row->addWidget(facts_);
    cancel_->hide();
    patience_.setSingleShot(true);
    patience_.setInterval(patience);
    connect(&patience_, &QTimer::timeout, this, [this] {
        told_ = true;
        refresh();
    });
    connect(cancel_, &LinkButton::clicked, this, &RunStatus::cancelAsked);
}

void RunStatus::begin(const QString& what) {
    running_ = what;
    if (told_) {
        refresh();
    }
    if (!patience_.isActive() && !told_) {
        patience_.start();
    }
}

void RunStatus::end() {
    patience_.stop();
    running_.clear();
    told_ = false;
    refresh();
}

void RunStatus::setHint(const QString& hint) {
    hint_ = hint;
    refresh();
}

void RunStatus::setFacts(const QString& facts) {
    facts_->setText(facts);
}

QString RunStatus::text() const {
    return line_->text();
}

void RunStatus::refresh() {
    line_->setText(told_ ? running_ : hint_);
    cancel_->setVisible(told_);
}

} // namespace cornerwright
