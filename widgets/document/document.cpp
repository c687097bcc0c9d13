#include "widgets/document/document.h"

#include "core/numerics/error.h"
#include "widgets/document/measurement_paths.h"

#include <QDir>
#include <QFileInfo>

#include <filesystem>

namespace cornerwright {

namespace {

std::filesystem::path toPath(const QString& path) {
    return std::filesystem::path(path.toStdU16String());
}

QStringList toStrings(const std::vector<std::string>& sentences) {
    QStringList strings;
    for (const std::string& sentence : sentences) {
        strings << QString::fromStdString(sentence);
    }
    return strings;
}

} // namespace

Document::Document(QObject* parent)
    : QObject(parent), history_(std::make_shared<const Project>()), folder_(QDir::currentPath()) {}

QString Document::displayName() const {
    if (!filePath_.isEmpty()) {
        return QFileInfo(filePath_).fileName();
    }
    const QString title = QString::fromStdString(project().title);
    return title.isEmpty() ? tr("untitled") : title;
}

void Document::reset(Project project, const QString& filePath, const QString& folder) {
    replace(std::move(project), filePath, folder, true);
}

void Document::resetRecovered(Project project, const QString& filePath, const QString& folder) {
    replace(std::move(project), filePath, folder, false);
}

void Document::replace(Project project, const QString& filePath, const QString& folder,
                       bool clean) {
    endDrag();
    history_ = UndoHistory(std::make_shared<const Project>(std::move(project)));
    if (!clean) {
        history_.markNeverClean();
    }
    filePath_ = filePath;
    folder_ = folder;
    Q_EMIT projectReplaced();
    Q_EMIT projectChanged();
    Q_EMIT historyChanged();
    Q_EMIT fileChanged();
}

QStringList Document::open(const QString& path) {
    LoadedProject loaded = load_project(toPath(path), MissingFiles::are_notices);
    const QFileInfo info(path);
    reset(std::move(loaded.project), info.absoluteFilePath(), info.absolutePath());
    return toStrings(loaded.notices);
}

QStringList Document::openAsCopy(const QString& path) {
    LoadedProject loaded = load_project(toPath(path), MissingFiles::are_notices);
    reset(std::move(loaded.project), QString(), QFileInfo(path).absolutePath());
    return toStrings(loaded.notices);
}

void Document::save(const QString& path) {
    cancelDrag(); // a proposal that nobody took is not saved
    const QFileInfo info(path);
    const QString folder = info.absolutePath();
    if (folder == folder_) {
        save_project(project(), toPath(path));
    } else {
        save_project(rebased(project(), folder_, folder), toPath(path));
        history_.rewrite([&](const Project& value) {
            return std::make_shared<const Project>(rebased(value, folder_, folder));
        });
    }
    const bool moved = folder != folder_;
    folder_ = folder;
    filePath_ = info.absoluteFilePath();
    history_.markClean();
    if (moved) {
        Q_EMIT projectChanged();
    }
    Q_EMIT historyChanged();
    Q_EMIT fileChanged();
}

bool Document::apply(Project next, const QString& what) {
    cancelDrag();
    if (next == *history_.current()) {
        return false;
    }
    history_.push(std::make_shared<const Project>(std::move(next)), what);
    Q_EMIT projectChanged();
    Q_EMIT historyChanged();
    return true;
}

void Document::beginDrag(const QString& what) {
    cancelDrag();
    dragStep_ = what;
    Q_EMIT dragBegan();
}

void Document::previewDrag(ProjectPointer proposed) {
    if (!isDragging() || !proposed || *proposed == project()) {
        return;
    }
    preview_ = std::move(proposed);
    Q_EMIT projectChanged();
}

void Document::commitDrag() {
    if (!isDragging()) {
        return;
    }
    const bool changed = preview_ && !(*preview_ == *history_.current());
    if (changed) {
        history_.push(preview_, *dragStep_);
    }
    endDrag();
    if (changed) {
        Q_EMIT historyChanged();
    }
}

void Document::cancelDrag() {
    if (!isDragging()) {
        return;
    }
    const bool changed = preview_ != nullptr;
    endDrag();
    if (changed) {
        Q_EMIT projectChanged();
    }
}

void Document::endDrag() {
    preview_.reset();
    if (dragStep_) {
        dragStep_.reset();
        Q_EMIT dragEnded();
    }
}

void Document::undo() {
    if (isDragging()) {
        cancelDrag();
        return;
    }
    if (canUndo()) {
        history_.undo();
        Q_EMIT projectChanged();
        Q_EMIT historyChanged();
    }
}

void Document::redo() {
    cancelDrag();
    if (canRedo()) {
        history_.redo();
        Q_EMIT projectChanged();
        Q_EMIT historyChanged();
    }
}

} // namespace cornerwright
