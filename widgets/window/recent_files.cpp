#include "widgets/window/recent_files.h"

namespace cornerwright {

namespace {
const QString settingsKey = QStringLiteral("recent");
}

QStringList RecentFiles::paths() const {
    return settings_.value(settingsKey).toStringList();
}

void RecentFiles::add(const QString& path) {
    QStringList all = paths();
    all.removeAll(path);
    all.prepend(path);
    settings_.setValue(settingsKey, all.mid(0, most));
}

void RecentFiles::remove(const QString& path) {
    QStringList all = paths();
    all.removeAll(path);
    settings_.setValue(settingsKey, all);
}

} // namespace cornerwright
