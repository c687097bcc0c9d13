#pragma once

#include "widgets/document/recovery_copy.h"
#include "widgets/window/recent_files.h"

#include <QObject>

#include <functional>

class QSettings;

namespace cornerwright {

class Document;
class NoticeStrip;

/// Everything about files: open, save, the question about unsaved changes, recent files, the
/// recovery copy, which measurement files are wanted. Trouble is told in the notice strip, nothing
/// is lost.
class FileFlow : public QObject {
    Q_OBJECT

  public:
    FileFlow(Document& document, NoticeStrip& notices, QSettings& settings,
             const QString& recoveryFolder, QWidget* window);

    /// Opens a project file, after the question about unsaved changes where one is due.
    void open(const QString& path);
    /// Opens a project that Save must not overwrite.
    void openDemo(const QString& path);
    void chooseAndOpen();
    void newProject();
    /// Saves where the project came from, or asks for a place. False where it was not saved.
    bool save();
    bool saveAs();
    bool saveTo(const QString& path);

    void chooseMeasurements();
    /// Files dropped on the window: projects are opened, anything else is taken for measurements.
    void take(const QStringList& paths);

    /// Runs `next` now, or once the person has decided about unsaved changes; not at all where they
    /// stay.
    void whenSafe(const QString& question, const std::function<void()>& next);
    /// Offers what a crashed run left behind.
    void offerRecovery();

    QStringList recentPaths() const { return recent_.paths(); }
    RecoveryCopy& recovery() { return recovery_; }

  Q_SIGNALS:
    /// The person wants to take these measurement files in.
    void measurementsGiven(const QStringList& paths);

  private:
    void openNow(const QString& path);
    /// A measurement that changed since it was taken in: accepting it is the user's choice.
    void offerNewPins();
    void offer(const RecoverableProject& found);

    Document& document_;
    NoticeStrip& notices_;
    RecentFiles recent_;
    RecoveryCopy recovery_;
    QWidget* window_;
};

} // namespace cornerwright
