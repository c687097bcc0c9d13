#pragma once

#include "widgets/document/document.h"

#include <QDateTime>
#include <QLockFile>
#include <QObject>
#include <QTimer>

#include <memory>
#include <optional>
#include <vector>

namespace cornerwright {

/// A project left behind by a run that did not end in order.
struct RecoverableProject {
    QString copyPath;     ///< the recovery copy
    QString originalPath; ///< the file it belongs to; empty if it never had one
    QString folder;       ///< where its measurements are told from
    QString title;
    QDateTime savedAt;
};

/// Writes a copy of the modified project before an edit is a second old, and takes it away when the
/// file is saved or the program ends in order. A lock file beside the copy tells whether the run
/// that wrote it is still alive.
class RecoveryCopy : public QObject {
    Q_OBJECT

  public:
    /// `folder` holds the copies of all runs (created where it is missing).
    RecoveryCopy(Document& document, const QString& folder, QObject* parent = nullptr);
    ~RecoveryCopy() override;

    /// Copies left by runs that are no longer alive, the newest first.
    std::vector<RecoverableProject> leftBehind() const;
    /// Takes a copy in as the present project, and removes it. Throws InputError.
    void recover(const RecoverableProject& found);
    /// Removes a copy that is not wanted.
    static void discard(const RecoverableProject& found);

    /// Writes the copy now where one is due.
    void writeNow();
    QString copyPath() const { return copyPath_; }

  Q_SIGNALS:
    /// The copy could not be written; a sentence for the user. Sent once until it works again.
    void failed(const QString& why);

  private:
    void update();
    void removeCopy();

    Document& document_;
    QString folder_;
    QString copyPath_;
    std::unique_ptr<QLockFile> lock_;
    QTimer timer_;
    ProjectPointer written_; ///< what the copy holds; null if there is none
    bool failing_ = false;
};

} // namespace cornerwright
