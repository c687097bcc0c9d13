#pragma once

#include "widgets/document/undo_history.h"

#include <QObject>
#include <QString>
#include <QStringList>

#include <optional>

namespace cornerwright {

/// The project on the bench: its present value, how it came about (undo), the file it belongs to,
/// and a drag in the making. Everything else in the window watches it.
class Document : public QObject {
    Q_OBJECT

  public:
    explicit Document(QObject* parent = nullptr);

    /// The present value; during a drag the last proposal.
    const Project& project() const { return *shared(); }
    const ProjectPointer& shared() const { return preview_ ? preview_ : history_.current(); }

    /// The file that Save writes; empty for a project that was never saved (a new one, a demo).
    QString filePath() const { return filePath_; }
    /// The folder from which the project's measurement files are told.
    QString folder() const { return folder_; }
    /// "belt.cornerwright.json", or the title of an unsaved project.
    QString displayName() const;

    /// Takes a project in, with a new history. `filePath` may be empty.
    void reset(Project project, const QString& filePath, const QString& folder);
    /// The same for a copy recovered after a crash: it counts as modified until saved.
    void resetRecovered(Project project, const QString& filePath, const QString& folder);

    /// Reads a project file; its measurements may be missing. Throws InputError, and then changes
    /// nothing. Returns what the user must be told.
    QStringList open(const QString& path);
    /// Opens a project whose file is not to be overwritten (a demo): Save asks for a place.
    QStringList openAsCopy(const QString& path);
    /// Writes the present value, after a running drag is put back. Throws WriteError; the old file
    /// then stands as it was.
    void save(const QString& path);

    /// One undo step, unless `next` equals the present value. Ends a drag by putting it back first.
    bool apply(Project next, const QString& what);

    /// A drag is one undo step however many proposals it takes.
    void beginDrag(const QString& what);
    void previewDrag(ProjectPointer proposed);
    void commitDrag();
    void cancelDrag();
    bool isDragging() const { return dragStep_.has_value(); }

    bool isModified() const { return !history_.isClean() || preview_ != nullptr; }
    bool canUndo() const { return history_.canUndo(); }
    bool canRedo() const { return history_.canRedo(); }
    QString undoText() const { return history_.undoText(); }
    QString redoText() const { return history_.redoText(); }
    void undo();
    void redo();

  Q_SIGNALS:
    /// The present value is another one.
    void projectChanged();
    /// Another project altogether was taken in (emitted before `projectChanged`).
    void projectReplaced();
    /// What undo and redo would do, or whether the file is up to date, has changed.
    void historyChanged();
    void fileChanged();
    void dragBegan();
    void dragEnded();

  private:
    void replace(Project project, const QString& filePath, const QString& folder, bool clean);
    void endDrag();

    UndoHistory history_;
    ProjectPointer preview_;
    std::optional<QString> dragStep_;
    QString filePath_;
    QString folder_;
};

} // namespace cornerwright
