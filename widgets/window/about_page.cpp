#include "widgets/window/about_page.h"

#include "widgets/handover/caution_text.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/panel_frame.h"
#include "widgets/parts/text_label.h"

#include <QCoreApplication>
#include <QKeyEvent>
#include <QVBoxLayout>

namespace cornerwright {

namespace {

constexpr int pageWidth = 640;

TextLabel* paragraph(const QString& text, TextLabel::Kind kind, QWidget* parent) {
    auto* label = new TextLabel(text, kind, parent);
    label->setWordWrap(true);
    label->setTextInteractionFlags(Qt::TextSelectableByMouse);
    return label;
}

} // namespace

AboutPage::AboutPage(QWidget* parent) : QWidget(parent) {
    auto* panel = new PanelFrame(tr("About Cornerwright"), this);
    panel->setMaximumWidth(pageWidth);
    panel->setNote(tr("version %1").arg(QCoreApplication::applicationVersion()));
    auto* close = new LinkButton(tr("Back"), panel);
    panel->addToHead(close);
    connect(close, &LinkButton::clicked, this, &AboutPage::closed);

    panel->body()->setContentsMargins(12, 8, 12, 12);
    panel->body()->setSpacing(10);
    const auto add = [panel](const QString& text, TextLabel::Kind kind = TextLabel::Kind::body) {
        panel->body()->addWidget(paragraph(text, kind, panel));
    };
    add(tr("A workbench for closing feedback loops on real equipment: from a measured or modelled "
           "plant, over corners dragged into place, to the difference equation that the firmware "
           "runs, with every margin judged on every unit."));
    add(tr("Cautions"), TextLabel::Kind::strong);
    for (const QString& sentence : cautionSentences()) {
        add(sentence);
    }
    add(tr("Licence"), TextLabel::Kind::strong);
    add(tr("Free software under the GNU General Public License, version 3 or later. There is no "
           "warranty, to the extent permitted by law."));
    panel->body()->addStretch(1);

    auto* layout = new QVBoxLayout(this);
    layout->setContentsMargins(16, 16, 16, 16);
    layout->addWidget(panel, 0, Qt::AlignHCenter | Qt::AlignTop);
    setFocusProxy(close);
}

void AboutPage::keyPressEvent(QKeyEvent* event) {
    if (event->key() == Qt::Key_Escape) {
        Q_EMIT closed();
        return;
    }
    QWidget::keyPressEvent(event);
}

} // namespace cornerwright
