#include "widgets/window/language.h"

#include <QCoreApplication>
#include <QLibraryInfo>
#include <QLocale>
#include <QSettings>
#include <QTranslator>

namespace cornerwright {

namespace {

const QString settingsKey = QStringLiteral("language");
const QString source = QStringLiteral("en"); // what the texts in the code are written in
QString spoken = source;

QString systemLanguage() {
    for (const QString& wanted : QLocale::system().uiLanguages()) {
        const QString language = wanted.section(QLatin1Char('-'), 0, 0);
        if (languages().contains(language)) {
            return language;
        }
    }
    return source;
}

/// One translator a catalogue, made once and kept: our own, and that of the toolkit for its
/// dialogs.
void install(QTranslator& translator, const QString& file, const QString& folder) {
    QCoreApplication::removeTranslator(&translator);
    if (spoken != source && translator.load(file, folder)) {
        QCoreApplication::installTranslator(&translator);
    }
}

} // namespace

QStringList languages() {
    return {source, QStringLiteral("de")};
}

QString rememberedLanguage(const QSettings& settings) {
    const QString language = settings.value(settingsKey).toString();
    return languages().contains(language) ? language : QString();
}

void rememberLanguage(QSettings& settings, const QString& language) {
    settings.setValue(settingsKey, language);
}

void applyLanguage(const QString& chosen) {
    static QTranslator ours;
    static QTranslator toolkit;
    spoken = languages().contains(chosen) ? chosen : systemLanguage();
    install(toolkit, QStringLiteral("qtbase_") + spoken,
            QLibraryInfo::path(QLibraryInfo::TranslationsPath));
    install(ours, QStringLiteral("cornerwright_") + spoken, QStringLiteral(":/translations"));
}

QString spokenLanguage() {
    return spoken;
}

} // namespace cornerwright
