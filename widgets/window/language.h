#pragma once

#include <QString>
#include <QStringList>

class QSettings;

namespace cornerwright {

/// The languages the program speaks: "en", "de".
QStringList languages();

/// What was chosen in the window: one of `languages()`, or empty to follow the system.
QString rememberedLanguage(const QSettings& settings);
void rememberLanguage(QSettings& settings, const QString& language);

/// Lets the program speak `chosen`, or the system's language where that is empty (English where it
/// is none of ours). To be called before the first window is made: texts already shown stay.
void applyLanguage(const QString& chosen);

/// The language that is spoken now.
QString spokenLanguage();

} // namespace cornerwright
