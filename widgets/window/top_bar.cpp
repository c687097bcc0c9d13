#include "widgets/window/top_bar.h"

#include "widgets/theme.h"
#include "widgets/window/verdict_pill.h"
#include "widgets/window/window_actions.h"

#include <QEvent>
#include <QHBoxLayout>
#include <QMenu>
#include <QPainter>
#include <QToolButton>

namespace cornerwright {

namespace {
constexpr int longestCaseName = 24;

QString shortened(const QString& text) {
    return text.size() <= longestCaseName ? text : text.left(longestCaseName - 1) + QChar(0x2026);
}

/// A hairline between groups of commands.
class DividingLine : public QWidget {
  public:
    explicit DividingLine(QWidget* parent) : QWidget(parent) { setFixedWidth(1); }

  protected:
    void paintEvent(QPaintEvent*) override {
        QPainter(this).fillRect(rect(), Theme::of(palette()).colour(ColourRole::hairline));
    }
};

} // namespace

TopBar::TopBar(const WindowActions& actions, QWidget* parent)
    : QWidget(parent),
      case_(new QToolButton(this)),
      caseMenu_(new QMenu(this)),
      trial_(new QToolButton(this)),
      trialMenu_(new QMenu(this)),
      pill_(new VerdictPill(this)) {
    auto* row = new QHBoxLayout(this);
    row->setContentsMargins(8, 4, 10, 4);
    row->setSpacing(1);
    addButton(row, actions.open);
    addButton(row, actions.save);
    addLine(row);
    addButton(row, actions.undo);
    addButton(row, actions.redo);
    addLine(row);
    hertz_ = addButton(row, actions.hertz);
    hertz_->setFont(fontOf(FontRole::strong));
    addLine(row);
    for (QToolButton* button : {case_, trial_}) {
        button->setAutoRaise(true);
        button->setToolButtonStyle(Qt::ToolButtonTextOnly);
        button->setFocusPolicy(Qt::TabFocus);
    }
    case_->setToolTip(tr("The case drawn full, with the handles on its curve"));
    trial_->setToolTip(tr("A kept trial to compare with"));
    // Not as the buttons' own menus: those draw a small mark over the text.
    for (const auto& [button, menu] :
         {std::pair(case_, caseMenu_), std::pair(trial_, trialMenu_)}) {
        connect(button, &QToolButton::clicked, menu, [button = button, menu = menu] {
            menu->popup(button->mapToGlobal(QPoint(0, button->height())));
        });
    }
    row->addWidget(case_);
    addLine(row);
    row->addWidget(trial_);
    addButton(row, actions.keepTrial);
    addLine(row);
    addButton(row, actions.place);
    addButton(row, actions.showHandover);
    addButton(row, actions.writeReport);
    row->addStretch(1);
    row->addWidget(pill_, 0);
    dress();
    setHertz(true);
    setTrialName({});
    setCases({}, 0);
}

void TopBar::changeEvent(QEvent* event) {
    QWidget::changeEvent(event);
    if (event->type() == QEvent::PaletteChange) {
        dress();
    }
}

void TopBar::dress() {
    // The unit counts for every number on the screen, so it stands out.
    const Theme& theme = Theme::of(palette());
    constexpr double tint = 0.1;
    hertz_->setStyleSheet(QStringLiteral("QToolButton { color: %1; background: %2; border: 1px "
                                         "solid %1; border-radius: 4px; padding: 3px 8px; }"
                                         "QToolButton:focus { border-width: 2px; }")
                              .arg(theme.colour(ColourRole::accent).name(),
                                   theme.faint(ColourRole::accent, tint).name()));
}

QToolButton* TopBar::addButton(QHBoxLayout* row, QAction* action) {
    auto* button = new QToolButton(this);
    button->setDefaultAction(action);
    button->setAutoRaise(true);
    button->setToolButtonStyle(Qt::ToolButtonTextOnly);
    button->setFocusPolicy(Qt::TabFocus);
    button->setAccessibleName(action->iconText());
    row->addWidget(button);
    return button;
}

void TopBar::addLine(QHBoxLayout* row) {
    auto* line = new DividingLine(this);
    row->addSpacing(5);
    row->addWidget(line);
    row->addSpacing(5);
}

void TopBar::setHertz(bool on) {
    // Written on the button itself: the action's own text says what switching does.
    hertz_->defaultAction()->setIconText(on ? tr("Hz") : tr("rad/s"));
    hertz_->setAccessibleName(on ? tr("Frequencies in Hz; switch to rad/s")
                                 : tr("Frequencies in rad/s; switch to Hz"));
}

void TopBar::setCases(const QStringList& names, int shown) {
    caseMenu_->clear();
    for (int i = 0; i < names.size(); ++i) {
        QAction* action = caseMenu_->addAction(names[i], this, [this, i] { Q_EMIT caseChosen(i); });
        action->setCheckable(true);
        action->setChecked(i == shown);
    }
    const QString name = shown >= 0 && shown < names.size() ? names[shown] : tr("no case");
    case_->setText(tr("Case: %1 ▾").arg(shortened(name)));
    case_->setAccessibleName(tr("Case shown: %1").arg(name));
    case_->setEnabled(!names.isEmpty());
}

void TopBar::setTrialName(const QString& name) {
    trial_->setText(name.isEmpty() ? tr("Trial: none ▾") : tr("Trial: %1 ▾").arg(shortened(name)));
    trial_->setAccessibleName(name.isEmpty() ? tr("Compared trial: none")
                                             : tr("Compared trial: %1").arg(name));
}

void TopBar::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    constexpr double share = 0.6;
    painter.fillRect(rect(), theme.faint(ColourRole::paper, share));
    painter.setPen(theme.colour(ColourRole::hairline));
    painter.drawLine(rect().bottomLeft(), rect().bottomRight());
}

} // namespace cornerwright
