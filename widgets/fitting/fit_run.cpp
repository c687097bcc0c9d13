#include "widgets/fitting/fit_run.h"

#include <exception>

namespace cornerwright {

FitRun::~FitRun() {
    stop_ = true;
    if (thread_.joinable()) {
        thread_.join();
    }
}

void FitRun::start(std::shared_ptr<const MeasuredResponse> measured, FitOptions options) {
    if (running_ || !measured) {
        return;
    }
    stop_ = false;
    running_ = true;
    thread_ = std::thread([this, measured = std::move(measured), options = std::move(options)] {
        work(*measured, options);
    });
}

void FitRun::cancel() {
    stop_ = true;
}

/// Back in the thread of this object: the run is over before anybody hears of it.
template <class Report>
void FitRun::end(Report report) {
    QMetaObject::invokeMethod(
        this,
        [this, report] {
            thread_.join();
            running_ = false;
            if (stop_) {
                Q_EMIT stopped();
            } else {
                report();
            }
        },
        Qt::QueuedConnection);
}

void FitRun::work(const MeasuredResponse& measured, FitOptions options) {
    options.proceed = [this](double share) {
        QMetaObject::invokeMethod(
            this, [this, share] { Q_EMIT progressed(share); }, Qt::QueuedConnection);
        return !stop_;
    };
    try {
        const FitResult result = fit_model(measured, options);
        end([this, result] { Q_EMIT finished(result); });
    } catch (const std::exception& error) {
        end([this, why = QString::fromUtf8(error.what())] { Q_EMIT failed(why); });
    }
}

} // namespace cornerwright
