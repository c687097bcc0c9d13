#include "widgets/document/recovery_copy.h"

#include "core/numerics/error.h"

#include <QDateTime>
#include <QDir>
#include <QFile>
#include <QFileInfo>
#include <QSaveFile>
#include <QUuid>

#include <algorithm>
#include <chrono>

namespace cornerwright {

namespace {

// Well below the second that is promised, so that a slow disk still keeps it.
constexpr std::chrono::milliseconds editAge{500};
const QString copySuffix = QStringLiteral(".recovery.json");
const QString originSuffix = QStringLiteral(".origin");
const QString lockSuffix = QStringLiteral(".lock");

QString baseOf(const QString& copyPath) {
    return copyPath.chopped(copySuffix.size());
}

bool write(const QString& path, const QByteArray& bytes) {
    QSaveFile file(path);
    return file.open(QIODevice::WriteOnly) && file.write(bytes) == bytes.size() && file.commit();
}

QByteArray readAll(const QString& path) {
    QFile file(path);
    return file.open(QIODevice::ReadOnly) ? file.readAll() : QByteArray();
}

/// False where the run that wrote the copy still holds its lock.
bool isLeftBehind(const QString& copyPath) {
    QLockFile lock(baseOf(copyPath) + lockSuffix);
    lock.setStaleLockTime(0);
    if (!lock.tryLock(0)) {
        return false;
    }
    lock.unlock();
    return true;
}

} // namespace

RecoveryCopy::RecoveryCopy(Document& document, const QString& folder, QObject* parent)
    : QObject(parent), document_(document), folder_(folder) {
    QDir().mkpath(folder_);
    const QString base = QDir(folder_).filePath(QUuid::createUuid().toString(QUuid::WithoutBraces));
    copyPath_ = base + copySuffix;
    lock_ = std::make_unique<QLockFile>(base + lockSuffix);
    lock_->setStaleLockTime(0);
    lock_->tryLock(0);
    timer_.setSingleShot(true);
    timer_.setInterval(editAge);
    connect(&timer_, &QTimer::timeout, this, &RecoveryCopy::writeNow);
    connect(&document_, &Document::projectChanged, this, &RecoveryCopy::update);
    connect(&document_, &Document::historyChanged, this, &RecoveryCopy::update);
}

RecoveryCopy::~RecoveryCopy() {
    removeCopy();
    lock_->unlock();
}

void RecoveryCopy::update() {
    if (!document_.isModified()) {
        timer_.stop();
        removeCopy();
    } else if (!timer_.isActive()) {
        // Not restarted by later edits: a hand that never rests must not keep the copy from being
        // written.
        timer_.start();
    }
}

void RecoveryCopy::writeNow() {
    timer_.stop();
    if (!document_.isModified() || written_ == document_.shared()) {
        return;
    }
    const QByteArray origin =
        (document_.filePath() + QLatin1Char('\n') + document_.folder() + QLatin1Char('\n') +
         QString::fromStdString(document_.project().title).simplified())
            .toUtf8();
    const QByteArray text = QByteArray::fromStdString(to_text(document_.project()));
    const bool done = write(baseOf(copyPath_) + originSuffix, origin) && write(copyPath_, text);
    if (done) {
        written_ = document_.shared();
    } else if (!failing_) {
        Q_EMIT failed(tr("The recovery copy could not be written to %1.").arg(folder_));
    }
    failing_ = !done;
}

void RecoveryCopy::removeCopy() {
    if (written_) {
        QFile::remove(copyPath_);
        QFile::remove(baseOf(copyPath_) + originSuffix);
        written_.reset();
    }
}

std::vector<RecoverableProject> RecoveryCopy::leftBehind() const {
    std::vector<RecoverableProject> found;
    const QFileInfoList copies =
        QDir(folder_).entryInfoList({QLatin1Char('*') + copySuffix}, QDir::Files);
    for (const QFileInfo& copy : copies) {
        const QString path = copy.absoluteFilePath();
        if (path == copyPath_ || !isLeftBehind(path)) {
            continue;
        }
        const QStringList origin =
            QString::fromUtf8(readAll(baseOf(path) + originSuffix)).split(QLatin1Char('\n'));
        found.push_back(
            {path, origin.value(0), origin.value(1), origin.value(2), copy.lastModified()});
    }
    std::ranges::sort(found, std::ranges::greater(), &RecoverableProject::savedAt);
    return found;
}

void RecoveryCopy::recover(const RecoverableProject& found) {
    const std::string text = readAll(found.copyPath).toStdString();
    LoadedProject loaded = parse_project(text, found.copyPath.toStdString(),
                                         std::filesystem::path(found.folder.toStdU16String()),
                                         MissingFiles::are_notices);
    document_.resetRecovered(std::move(loaded.project), found.originalPath, found.folder);
    writeNow(); // ours stands before theirs goes
    discard(found);
}

void RecoveryCopy::discard(const RecoverableProject& found) {
    QFile::remove(found.copyPath);
    QFile::remove(baseOf(found.copyPath) + originSuffix);
    QFile::remove(baseOf(found.copyPath) + lockSuffix);
}

} // namespace cornerwright
