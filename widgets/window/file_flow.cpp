#include "widgets/window/file_flow.h"

#include "core/numerics/error.h"
#include "widgets/document/document.h"
#include "widgets/document/measurement_paths.h"
#include "widgets/window/notice_strip.h"

#include <QFileDialog>
#include <QFileInfo>
#include <QLocale>

namespace cornerwright {

namespace {

const QString projectSuffix = QStringLiteral(".cornerwright.json");
const QString fileTopic = QStringLiteral("file");
const QString unsavedTopic = QStringLiteral("unsaved");
const QString recoveryTopic = QStringLiteral("recovery");

} // namespace

FileFlow::FileFlow(Document& document, NoticeStrip& notices, QSettings& settings,
                   const QString& recoveryFolder, QWidget* window)
    : QObject(window),
      document_(document),
      notices_(notices),
      recent_(settings),
      recovery_(document, recoveryFolder),
      window_(window) {
    connect(&recovery_, &RecoveryCopy::failed, this, [this](const QString& why) {
        notices_.show(NoticeStrip::Kind::problem, why, QStringLiteral("recovery-failed"));
    });
}

void FileFlow::whenSafe(const QString& question, const std::function<void()>& next) {
    if (!document_.isModified()) {
        next();
        return;
    }
    notices_.show(NoticeStrip::Kind::question, question, unsavedTopic,
                  {{tr("Save"),
                    [this, next] {
                        if (save()) {
                            next();
                        }
                    }},
                   {tr("Discard changes"), next},
                   {tr("Stay"), [] {}}});
}

void FileFlow::open(const QString& path) {
    whenSafe(tr("%1 has unsaved changes. Save them before another project is opened?")
                 .arg(document_.displayName()),
             [this, path] { openNow(path); });
}

void FileFlow::openNow(const QString& path) {
    try {
        const QStringList told = document_.open(path);
        notices_.close(fileTopic);
        recent_.add(document_.filePath());
        for (const QString& sentence : told) {
            notices_.show(NoticeStrip::Kind::information, sentence);
        }
        if (!told.isEmpty()) {
            offerNewPins();
        }
    } catch (const InputError& error) {
        notices_.show(NoticeStrip::Kind::problem, QString::fromUtf8(error.what()), fileTopic);
    }
}

void FileFlow::offerNewPins() {
    const Project pinned = pinnedAnew(document_.project(), document_.folder());
    if (pinned == document_.project()) {
        return;
    }
    const auto accept = [this] {
        document_.apply(pinnedAnew(document_.project(), document_.folder()),
                        tr("Accept changed measurements"));
    };
    notices_.show(NoticeStrip::Kind::question,
                  tr("Shall the project go by the measurement files as they are now?"),
                  QStringLiteral("pins"),
                  {{tr("Accept changed measurements"), accept}, {tr("Ask again"), [] {}}});
}

void FileFlow::openDemo(const QString& path) {
    try {
        for (const QString& sentence : document_.openAsCopy(path)) {
            notices_.show(NoticeStrip::Kind::information, sentence);
        }
    } catch (const InputError& error) {
        notices_.show(NoticeStrip::Kind::problem, QString::fromUtf8(error.what()), fileTopic);
    }
}

void FileFlow::chooseAndOpen() {
    const QString path = QFileDialog::getOpenFileName(
        window_, tr("Open project"), document_.folder(),
        tr("Cornerwright projects (*%1);;All files (*)").arg(projectSuffix));
    if (!path.isEmpty()) {
        open(path);
    }
}

void FileFlow::newProject() {
    whenSafe(tr("%1 has unsaved changes. Save them before a new project is started?")
                 .arg(document_.displayName()),
             [this] {
                 Project empty;
                 empty.compensator.push_back(Section{});
                 document_.reset(std::move(empty), QString(), document_.folder());
             });
}

bool FileFlow::save() {
    return document_.filePath().isEmpty() ? saveAs() : saveTo(document_.filePath());
}

bool FileFlow::saveAs() {
    QString path = QFileDialog::getSaveFileName(
        window_, tr("Save project"),
        document_.filePath().isEmpty() ? document_.folder() : document_.filePath(),
        tr("Cornerwright projects (*%1)").arg(projectSuffix));
    if (path.isEmpty()) {
        return false;
    }
    if (!path.endsWith(projectSuffix)) {
        path += projectSuffix;
    }
    return saveTo(path);
}

bool FileFlow::saveTo(const QString& path) {
    try {
        document_.save(path);
    } catch (const WriteError& error) {
        notices_.show(NoticeStrip::Kind::problem, QString::fromUtf8(error.what()), fileTopic);
        return false;
    }
    notices_.close(fileTopic);
    notices_.close(unsavedTopic);
    recent_.add(document_.filePath());
    return true;
}

void FileFlow::chooseMeasurements() {
    const QStringList paths =
        QFileDialog::getOpenFileNames(window_, tr("Add measurements"), document_.folder(),
                                      tr("Measurements (*.csv *.txt *.dat *.tsv *.s?p *.ts *.uff "
                                         "*.unv *.58);;All files (*)"));
    if (!paths.isEmpty()) {
        Q_EMIT measurementsGiven(paths);
    }
}

void FileFlow::take(const QStringList& paths) {
    QStringList measurements;
    for (const QString& path : paths) {
        if (path.endsWith(QStringLiteral(".json"))) {
            open(path);
            return;
        }
        measurements << path;
    }
    if (!measurements.isEmpty()) {
        Q_EMIT measurementsGiven(measurements);
    }
}

void FileFlow::offerRecovery() {
    const std::vector<RecoverableProject> found = recovery_.leftBehind();
    // The newest is offered; the question comes again for the next once this one is settled.
    if (!found.empty()) {
        offer(found.front());
    }
}

void FileFlow::offer(const RecoverableProject& found) {
    const QString name = !found.originalPath.isEmpty() ? QFileInfo(found.originalPath).fileName()
                         : found.title.isEmpty()       ? tr("an unsaved project")
                                                       : found.title;
    const QString when = QLocale().toString(found.savedAt, QLocale::ShortFormat);
    notices_.show(NoticeStrip::Kind::question,
                  tr("The program did not end in order last time. Unsaved changes of %1 from %2 "
                     "were kept.")
                      .arg(name, when),
                  recoveryTopic,
                  {{tr("Recover"),
                    [this, found] {
                        try {
                            recovery_.recover(found);
                        } catch (const InputError& error) {
                            notices_.show(NoticeStrip::Kind::problem,
                                          QString::fromUtf8(error.what()), recoveryTopic);
                        }
                    }},
                   {tr("Discard"), [this, found] {
                        RecoveryCopy::discard(found);
                        offerRecovery();
                    }}});
}

} // namespace cornerwright
