#include "widgets/help/help_texts.h"

#include <QDir>
#include <QFile>

namespace cornerwright {

HelpTexts::HelpTexts(const QString& language) {
    QDir folder(QStringLiteral(":/help/") + language);
    if (!folder.exists()) {
        folder.setPath(QStringLiteral(":/help/en"));
    }
    for (const QString& name : folder.entryList(QDir::Files)) {
        read(folder.filePath(name));
    }
}

void HelpTexts::read(const QString& file) {
    QFile source(file);
    if (!source.open(QIODevice::ReadOnly)) {
        return;
    }
    const QString start = QStringLiteral("# ");
    QString topic;
    for (const QString& line : QString::fromUtf8(source.readAll()).split(QLatin1Char('\n'))) {
        if (line.startsWith(start)) {
            topic = line.mid(start.size()).trimmed();
        } else {
            texts_[topic] += line + QLatin1Char('\n');
        }
    }
}

} // namespace cornerwright
