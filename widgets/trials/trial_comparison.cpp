#include "widgets/trials/trial_comparison.h"

#include "widgets/figure_text.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

/// The same question in both designs, whatever the limit: what is asked is compared, not how much.
bool asksTheSame(const Requirement& a, const Requirement& b) {
    return a.measure == b.measure && a.input == b.input && a.band_percent == b.band_percent &&
           a.up_to_rad_s == b.up_to_rad_s && a.from_rad_s == b.from_rad_s;
}

QString changeText(double change, MeasureUnit unit, bool hertz) {
    const QString size = valueText(std::abs(change), unit, hertz);
    if (change == 0.0) {
        return size;
    }
    return (change > 0.0 ? QStringLiteral("+") : QStringLiteral("\u2212")) + size;
}

} // namespace

std::vector<TrialDifference> differencesOf(const Verdict& then, const Verdict& now, bool hertz) {
    std::vector<TrialDifference> all;
    for (const RequirementResult& present : now.requirements) {
        const MeasureUnit unit = unit_of(present.requirement.measure);
        TrialDifference difference;
        difference.measure = requirementText(present.requirement, hertz);
        difference.limit = limitText(present.requirement, hertz);
        difference.now = figureText(present.worst.value, unit, hertz);
        difference.stateNow = present.worst.state;
        const auto found =
            std::ranges::find_if(then.requirements, [&present](const RequirementResult& old) {
                return asksTheSame(old.requirement, present.requirement);
            });
        if (found != then.requirements.end()) {
            const Judgement& old = found->worst;
            difference.then = figureText(old.value, unit, hertz);
            difference.stateThen = old.state;
            if (old.value.is_value() && present.worst.value.is_value()) {
                difference.change =
                    changeText(present.worst.value.value() - old.value.value(), unit, hertz);
            }
            if (old.share.is_determined() && present.worst.share.is_determined()) {
                const double a = old.share.value();
                const double b = present.worst.share.value();
                difference.better = b > a ? 1 : b < a ? -1 : 0;
            }
        }
        all.push_back(difference);
    }
    return all;
}

} // namespace cornerwright
