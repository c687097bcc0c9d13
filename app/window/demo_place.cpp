#include "app/window/demo_place.h"

#include <QCoreApplication>
#include <QDir>
#include <QDirIterator>

namespace cornerwright {

namespace {

// The demo whose first drag shows most; any other stands in where it is missing.
const QString favourite = QStringLiteral("seedling-gantry");

QString projectIn(const QString& folder) {
    QDirIterator files(folder, {QStringLiteral("*.cornerwright.json")}, QDir::Files,
                       QDirIterator::Subdirectories);
    QStringList found;
    while (files.hasNext()) {
        found << files.next();
    }
    found.sort();
    return found.value(0);
}

} // namespace

QString firstDemo() {
    const QDir program(QCoreApplication::applicationDirPath());
    const QStringList places{program.absoluteFilePath(QStringLiteral(CORNERWRIGHT_INSTALLED_DEMOS)),
                             QStringLiteral(CORNERWRIGHT_SOURCE_DEMOS)};
    for (const QString& place : places) {
        for (const QString& folder : {place + QLatin1Char('/') + favourite, place}) {
            const QString project = projectIn(folder);
            if (!project.isEmpty()) {
                return QDir::cleanPath(project);
            }
        }
    }
    return {};
}

} // namespace cornerwright
