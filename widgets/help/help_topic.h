#pragma once

#include <QString>

class QWidget;

namespace cornerwright {

/// Says what a widget, and everything in it without a topic of its own, is about: a name such as
/// "phase_margin" or "pane-step", under which the help texts tell it.
void setHelpTopic(QWidget& widget, const QString& topic);

/// The topic of the widget or of the nearest one around it; "window" where nobody says anything.
QString helpTopicOf(const QWidget* widget);

} // namespace cornerwright
