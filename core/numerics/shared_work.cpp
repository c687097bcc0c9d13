#include "core/numerics/shared_work.h"

#include <algorithm>
#include <atomic>
#include <exception>
#include <mutex>
#include <thread>
#include <vector>

namespace cornerwright {
namespace {

class Crew {
  public:
    Crew(const SharedWork& work, const std::function<WorkOnIndex()>& hire)
        : work_(work), hire_(hire) {}

    bool run() {
        const auto cores = static_cast<int>(std::max(1U, std::thread::hardware_concurrency()));
        const auto wanted = static_cast<std::size_t>(work_.workers > 0 ? work_.workers : cores);
        std::vector<std::thread> others;
        for (std::size_t i = 1; i < std::min(wanted, work_.count); ++i)
            others.emplace_back([this] { toil(); });
        toil();
        for (std::thread& other : others)
            other.join();
        if (failure_)
            std::rethrow_exception(failure_);
        return !stopped_;
    }

  private:
    void toil() {
        try {
            const WorkOnIndex piece = hire_();
            for (std::size_t i = next_++; i < work_.count && !stopped_; i = next_++) {
                piece(i);
                tell();
            }
        } catch (...) {
            const std::lock_guard lock(mutex_);
            if (!failure_)
                failure_ = std::current_exception();
            stopped_ = true;
        }
    }

    void tell() {
        if (!work_.proceed)
            return;
        const std::lock_guard lock(mutex_);
        ++done_;
        if (!stopped_ && !work_.proceed(done_))
            stopped_ = true;
    }

    const SharedWork& work_;
    const std::function<WorkOnIndex()>& hire_;
    std::atomic<std::size_t> next_{0};
    std::atomic<bool> stopped_{false};
    std::mutex mutex_;
    std::size_t done_ = 0;
    std::exception_ptr failure_;
};

} // namespace

bool do_shared(const SharedWork& work, const std::function<WorkOnIndex()>& hire) {
    return Crew(work, hire).run();
}

} // namespace cornerwright
