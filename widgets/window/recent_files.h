#pragma once

#include <QSettings>
#include <QStringList>

namespace cornerwright {

/// The project files opened last, newest first, kept in the settings.
class RecentFiles {
  public:
    static constexpr int most = 8;

    explicit RecentFiles(QSettings& settings) : settings_(settings) {}

    QStringList paths() const;
    void add(const QString& path);
    void remove(const QString& path);

  private:
    QSettings& settings_;
};

} // namespace cornerwright
