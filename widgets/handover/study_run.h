#pragma once

#include "core/engine/assessment.h"
#include "core/handover/realisation_study.h"
#include "core/project/project.h"

#include <QObject>
#include <QTimer>

#include <atomic>
#include <memory>
#include <optional>
#include <thread>

namespace cornerwright {

/// What is to be studied: a project as it was assessed, and the case whose limited step is shown.
struct StudyWish {
    std::shared_ptr<const Project> project;
    std::shared_ptr<const Assessment> assessment;
    std::size_t shown_case = 0;
};

/// What a realisation costs, found on a thread of its own once the design has rested for a moment.
/// A newer wish ends the work on an older one.
class StudyRun : public QObject {
    Q_OBJECT

  public:
    explicit StudyRun(QObject* parent);
    ~StudyRun() override;

    void want(StudyWish wish);
    /// Nothing is wanted any more.
    void stop();

  Q_SIGNALS:
    void stepReady(const std::shared_ptr<const cornerwright::LimitedStep>& step);
    void studyReady(const std::shared_ptr<const cornerwright::RealisationStudy>& study);

  private:
    void begin();
    void end();
    void work(const StudyWish& wish);
    template <class Result>
    void deliver(std::shared_ptr<const Result> result,
                 void (StudyRun::*signal)(const std::shared_ptr<const Result>&));

    QTimer rest_;
    std::optional<StudyWish> wish_;
    std::thread thread_;
    std::atomic<bool> stop_ = false;
    bool running_ = false;
};

} // namespace cornerwright
