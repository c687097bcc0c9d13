#include "widgets/help/help_panel.h"

#include "widgets/parts/glyph_button.h"
#include "widgets/theme.h"

#include <QApplication>
#include <QKeyEvent>
#include <QTextBrowser>
#include <QVBoxLayout>

namespace cornerwright {

HelpPanel::HelpPanel(const HelpTexts& texts, QWidget* parent)
    : PanelFrame(tr("Help"), parent), texts_(texts), page_(new QTextBrowser(this)) {
    auto* shut = new GlyphButton(Glyph::remove, tr("Close the help"), this);
    addToHead(shut);
    connect(shut, &GlyphButton::clicked, this, &HelpPanel::close);
    page_->setFrameShape(QFrame::NoFrame);
    page_->setAccessibleName(tr("Help text"));
    page_->setOpenLinks(false);
    body()->addWidget(page_);
    setFocusProxy(page_);
    fit();
    hide();
}

void HelpPanel::fit() {
    // As wide as a comfortable line, whatever the font and the scale.
    constexpr int lineLength = 46;
    setFixedWidth(lineLength * QFontMetrics(page_->font()).averageCharWidth());
}

void HelpPanel::explain(const QString& topic) {
    const QString known = texts_.markdown(topic).isEmpty() ? QStringLiteral("window") : topic;
    if (isVisible() && known == topic_) {
        close();
        return;
    }
    topic_ = known;
    page_->setMarkdown(texts_.markdown(known));
    if (!isVisible()) {
        focusBefore_ = QApplication::focusWidget();
        show();
    }
}

QString HelpPanel::text() const {
    return page_->toPlainText();
}

void HelpPanel::close() {
    const bool hadFocus = isAncestorOf(QApplication::focusWidget());
    hide();
    if (hadFocus && focusBefore_ != nullptr) {
        focusBefore_->setFocus(Qt::OtherFocusReason);
    }
}

void HelpPanel::keyPressEvent(QKeyEvent* event) {
    if (event->key() == Qt::Key_Escape) {
        close();
        return;
    }
    PanelFrame::keyPressEvent(event);
}

void HelpPanel::changeEvent(QEvent* event) {
    PanelFrame::changeEvent(event);
    if (event->type() == QEvent::FontChange || event->type() == QEvent::ApplicationFontChange) {
        fit();
    }
}

} // namespace cornerwright
