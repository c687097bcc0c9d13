#include "widgets/design/uphill_watch.h"

#include "core/engine/placement_problem.h"
#include "core/placement/free_parameters.h"
#include "core/placement/placement.h"
#include "widgets/view_state.h"

#include <exception>

namespace cornerwright {

namespace {

/// None where nothing can be judged: a compensator that cannot be realised has no direction.
std::vector<double> slopesOf(const Project& project) {
    try {
        return headroom_slopes(placement_problem_of(project));
    } catch (const std::exception&) {
        return {};
    }
}

} // namespace

UphillWatch::UphillWatch(ViewState& viewState, QObject* parent)
    : QObject(parent), viewState_(viewState), worker_(LatestWorker::Haste::behind) {}

void UphillWatch::setContent(const PaneContent& content) {
    if (!content.project || content.project == asked_) {
        return;
    }
    asked_ = content.project;
    worker_.request([this, project = asked_] {
        const std::vector<double> slopes = slopesOf(*project);
        return [this, project, slopes] { take(project, slopes); };
    });
}

void UphillWatch::take(const std::shared_ptr<const Project>& project,
                       const std::vector<double>& slopes) {
    std::vector<UphillPull> pulls;
    const std::vector<FreeParameter> parameters = free_parameters(project->compensator);
    for (std::size_t i = 0; i < parameters.size() && i < slopes.size(); ++i) {
        pulls.push_back({parameters[i].section, parameters[i].parameter.value, slopes[i]});
    }
    viewState_.setUphill(std::move(pulls));
}

} // namespace cornerwright
