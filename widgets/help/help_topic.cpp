#include "widgets/help/help_topic.h"

#include <QVariant>
#include <QWidget>

namespace cornerwright {

namespace {
constexpr const char* property = "helpTopic";
}

void setHelpTopic(QWidget& widget, const QString& topic) {
    widget.setProperty(property, topic);
}

QString helpTopicOf(const QWidget* widget) {
    for (; widget != nullptr; widget = widget->parentWidget()) {
        const QString topic = widget->property(property).toString();
        if (!topic.isEmpty()) {
            return topic;
        }
    }
    return QStringLiteral("window");
}

} // namespace cornerwright
