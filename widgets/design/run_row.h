#pragma once

#include "widgets/design/background_run.h"

#include <QWidget>

class QProgressBar;

namespace cornerwright {

class LinkButton;
class TextLabel;

/// Start, cancel, progress and a note for a long run, in one line.
class RunRow : public QWidget {
    Q_OBJECT

  public:
    RunRow(const QString& startText, QWidget* parent = nullptr);

    BackgroundRun& run() { return run_; }
    LinkButton* startButton() const { return start_; }
    LinkButton* cancelButton() const { return cancel_; }
    /// What stands beside the buttons while nothing runs; a problem is marked as one.
    void setNote(const QString& note);
    void setProblem(const QString& problem);
    QString note() const;
    /// Starts the task and shows its progress.
    void start(BackgroundRun::Task task);

  Q_SIGNALS:
    void startAsked();

  private:
    void showRunning(bool on);

    LinkButton* start_;
    LinkButton* cancel_;
    QProgressBar* bar_;
    TextLabel* note_;
    BackgroundRun run_; ///< last: its thread ends before anything it might call
};

} // namespace cornerwright
