#include "app/window/demo_place.h"
#include "app/window/frame_times.h"
#include "app/window/picture.h"
#include "app/window/report_file.h"
#include "app/window/test_report.h"
#include "widgets/window/appearance.h"
#include "widgets/window/file_flow.h"
#include "widgets/window/language.h"
#include "widgets/window/main_window.h"

#include <QApplication>
#include <QCommandLineParser>
#include <QDir>
#include <QHashSeed>
#include <QIcon>
#include <QSettings>
#include <QStandardPaths>

#include <algorithm>
#include <cstdio>
#include <cstring>

namespace {

using namespace cornerwright;

constexpr int exitWriteFailed = 74;
constexpr int exitWrongUsage = 64;

struct Options {
    QCommandLineOption picture{
        QStringLiteral("picture"),
        QCoreApplication::translate("main",
                                    "Write a picture of the window to FILE (PNG) and leave."),
        QStringLiteral("FILE")};
    QCommandLineOption size{
        QStringLiteral("size"),
        QCoreApplication::translate("main", "Size of the window, such as 1600x950."),
        QStringLiteral("WxH"), QStringLiteral("1600x950")};
    QCommandLineOption dark{
        QStringLiteral("dark"),
        QCoreApplication::translate("main", "Dark ground, whatever the system says.")};
    QCommandLineOption light{
        QStringLiteral("light"),
        QCoreApplication::translate("main", "Light ground, whatever the system says.")};
    QCommandLineOption language{
        QStringLiteral("language"),
        QCoreApplication::translate("main", "Language of the window, en or de."),
        QStringLiteral("CODE")};
    QCommandLineOption report{
        QStringLiteral("report"),
        QCoreApplication::translate(
            "main", "Write the review report of the one project as PDF to FILE and leave."),
        QStringLiteral("FILE")};
    QCommandLineOption reportDate{
        QStringLiteral("report-date"),
        QCoreApplication::translate("main", "A date to print in the report."),
        QStringLiteral("DATE")};
    QCommandLineOption demo{QStringLiteral("demo"),
                            QCoreApplication::translate("main", "Open the first demo project.")};
    QCommandLineOption testReport{
        QStringLiteral("test-report"),
        QCoreApplication::translate(
            "main", "Keep a report of what the window shows in FILE (JSON), for tests."),
        QStringLiteral("FILE")};
};

std::optional<QSize> readSize(const QString& text) {
    const QStringList parts = text.split(QLatin1Char('x'));
    if (parts.size() != 2) {
        return std::nullopt;
    }
    const QSize size(parts[0].toInt(), parts[1].toInt());
    return size.isEmpty() ? std::nullopt : std::optional(size);
}

MainWindow::Places placesFor(bool picture) {
    // A picture shows the window of a first start and leaves no trace of itself.
    const QString state = QStandardPaths::writableLocation(QStandardPaths::AppDataLocation);
    const QString settings = QStandardPaths::writableLocation(QStandardPaths::AppConfigLocation);
    return {picture ? QStringLiteral("/dev/null") : settings + QStringLiteral("/window.ini"),
            (picture ? QDir::tempPath() : state) + QStringLiteral("/recovery")};
}

void openFirst(MainWindow& window, const QStringList& files, bool demo) {
    if (!files.isEmpty() && !demo) {
        window.files().take(files);
        return;
    }
    const QStringList recent = window.files().recentPaths();
    const QString first = demo || recent.isEmpty() ? firstDemo() : QString();
    if (!first.isEmpty()) {
        window.files().openDemo(first);
    } else if (!recent.isEmpty()) {
        window.files().open(recent.front());
    }
}

} // namespace

int main(int argc, char** argv) {
    const auto isGiven = [&](const char* option) {
        return std::any_of(argv + 1, argv + argc, [option](const char* argument) {
            return std::strncmp(argument, option, std::strlen(option)) == 0;
        });
    };
    const bool reports = isGiven("--report");
    if (reports || isGiven("--picture")) {
        qputenv("QT_QPA_PLATFORM", "offscreen"); // needs no screen, and shows nothing on one
    }
    if (reports) {
        QHashSeed::setDeterministicGlobalSeed(); // the same project gives the same bytes
    }
    QApplication application(argc, argv);
    QApplication::setApplicationName(QStringLiteral("cornerwright"));
    QApplication::setApplicationDisplayName(QStringLiteral("Cornerwright"));
    QApplication::setApplicationVersion(QStringLiteral(CORNERWRIGHT_VERSION));

    QApplication::setDesktopFileName(QStringLiteral("cornerwright"));
    QApplication::setWindowIcon(QIcon(QStringLiteral(":/icons/cornerwright.svg")));
    applyLanguage(
        rememberedLanguage(QSettings(placesFor(false).settingsFile, QSettings::IniFormat)));

    const Options options;
    QCommandLineParser parser;
    parser.setApplicationDescription(QCoreApplication::translate(
        "main", "A workbench for closing feedback loops on real equipment."));
    parser.addHelpOption();
    parser.addVersionOption();
    parser.addOptions({options.picture, options.size, options.dark, options.light, options.language,
                       options.demo, options.report, options.reportDate, options.testReport});
    parser.addPositionalArgument(
        QStringLiteral("file"),
        QCoreApplication::translate("main", "A project or measurement file."),
        QStringLiteral("[file...]"));
    parser.process(application);

    if (parser.isSet(options.report)) {
        if (parser.positionalArguments().size() != 1) {
            std::fputs("cornerwright: expected one project to report on\n", stderr);
            return exitWrongUsage;
        }
        return writeReportFile(parser.positionalArguments().front(), parser.value(options.report),
                               parser.value(options.reportDate));
    }
    const bool picture = parser.isSet(options.picture);
    if (picture || parser.isSet(options.language)) {
        applyLanguage(parser.value(options.language));
    }
    MainWindow window(placesFor(picture));
    applyAppearance(parser.isSet(options.dark)    ? Ground::dark
                    : parser.isSet(options.light) ? Ground::light
                                                  : window.rememberedGround());
    openFirst(window, parser.positionalArguments(), parser.isSet(options.demo));
    if (picture) {
        const std::optional<QSize> size = readSize(parser.value(options.size));
        if (!size) {
            std::fputs("cornerwright: expected a size such as 1600x950\n", stderr);
            return exitWrongUsage;
        }
        return writePicture(window, *size, parser.value(options.picture)) ? 0 : exitWriteFailed;
    }
    if (parser.isSet(options.testReport)) {
        new TestReport(window, parser.value(options.testReport)); // owned by the window
    }
    const QString frameTimes = qEnvironmentVariable("CORNERWRIGHT_FRAME_TIMES");
    if (!frameTimes.isEmpty()) {
        new FrameTimes(window, frameTimes); // owned by the window
    }
    window.files().offerRecovery();
    window.show();
    return QApplication::exec();
}
