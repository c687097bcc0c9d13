#include "widgets/window/about_page.h"

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
    add(tr("Closing a loop on real equipment can move, heat or energise it without warning. First "
           "close it with limited effort, an independent stop, and nobody in reach."));
    add(tr("These figures rest on the plant data given. They say nothing of saturation, faults or "
           "what was not measured."));
    add(tr("Local codes, the machine's risk assessment and licensed practice decide."));
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
