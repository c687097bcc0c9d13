#include "widgets/design/verdict_change.h"

#include "widgets/figure_text.h"
#include "widgets/theme.h"

#include <QCoreApplication>

#include <algorithm>

namespace cornerwright {

QString verdictText(const Verdict& verdict) {
    const auto count = [&verdict](State state) {
        return static_cast<int>(std::ranges::count(
            verdict.requirements, state, [](const RequirementResult& r) { return r.worst.state; }));
    };
    const auto all = static_cast<int>(verdict.requirements.size());
    switch (verdict.state) {
    case State::met:
        return QCoreApplication::translate("VerdictChange", "all met");
    case State::unmet:
        return QCoreApplication::translate("VerdictChange", "%1 of %2 unmet")
            .arg(count(State::unmet))
            .arg(all);
    case State::undetermined:
        break;
    }
    return QCoreApplication::translate("VerdictChange", "%1 of %2 not determined")
        .arg(count(State::undetermined))
        .arg(all);
}

QStringList changesOf(const Verdict& before, const Verdict& after, bool hertz) {
    QStringList changes{QStringLiteral("%1 → %2").arg(verdictText(before), verdictText(after))};
    const std::size_t count = std::min(before.requirements.size(), after.requirements.size());
    for (std::size_t i = 0; i < count; ++i) {
        const Judgement& then = before.requirements[i].worst;
        const Judgement& now = after.requirements[i].worst;
        if (then.state == now.state) {
            continue;
        }
        const Requirement& requirement = after.requirements[i].requirement;
        const MeasureUnit unit = unit_of(requirement.measure);
        changes << QStringLiteral("%1 %2: %3 → %4, %5")
                       .arg(markOf(now.state), requirementText(requirement, hertz),
                            figureText(then.value, unit, hertz), figureText(now.value, unit, hertz),
                            stateText(now.state));
    }
    return changes;
}

} // namespace cornerwright
