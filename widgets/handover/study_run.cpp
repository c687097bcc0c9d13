#include "widgets/handover/study_run.h"

#include "core/numerics/error.h"

namespace cornerwright {

namespace {

constexpr int restBeforeWork = 300; // ms without a further edit

LimitedStep stepOf(const StudyWish& wish) {
    const Assessment& assessment = *wish.assessment;
    if (!assessment.equation || wish.shown_case >= assessment.cases.size()) {
        return {};
    }
    return limited_step(*wish.project, assessment, wish.shown_case);
}

} // namespace

StudyRun::StudyRun(QObject* parent) : QObject(parent) {
    rest_.setSingleShot(true);
    rest_.setInterval(restBeforeWork);
    connect(&rest_, &QTimer::timeout, this, &StudyRun::begin);
}

StudyRun::~StudyRun() {
    stop_ = true;
    if (thread_.joinable()) {
        thread_.join();
    }
}

void StudyRun::want(StudyWish wish) {
    wish_ = std::move(wish);
    stop_ = true;
    rest_.start();
}

void StudyRun::stop() {
    wish_.reset();
    stop_ = true;
    rest_.stop();
}

void StudyRun::begin() {
    if (running_ || !wish_) {
        return; // the end of the running one begins the next
    }
    stop_ = false;
    running_ = true;
    thread_ = std::thread([this, wish = *wish_] { work(wish); });
    wish_.reset();
}

void StudyRun::end() {
    thread_.join();
    running_ = false;
    if (wish_ && !rest_.isActive()) {
        begin();
    }
}

template <class Result>
void StudyRun::deliver(std::shared_ptr<const Result> result,
                       void (StudyRun::*signal)(const std::shared_ptr<const Result>&)) {
    QMetaObject::invokeMethod(
        this,
        [this, result = std::move(result), signal] {
            if (!stop_) {
                Q_EMIT(this->*signal)(result);
            }
        },
        Qt::QueuedConnection);
}

void StudyRun::work(const StudyWish& wish) {
    try {
        deliver(std::make_shared<const LimitedStep>(stepOf(wish)), &StudyRun::stepReady);
        deliver(std::make_shared<const RealisationStudy>(
                    study_realisation(*wish.project, [this] { return !stop_; })),
                &StudyRun::studyReady);
    } catch (const InputError&) {
        // A case without a usable plant: the assessment already says so where it stands.
    }
    QMetaObject::invokeMethod(
        this, [this] { end(); }, Qt::QueuedConnection);
}

} // namespace cornerwright
