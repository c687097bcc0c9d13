#include "widgets/panes/case_choice.h"

#include <algorithm>

namespace cornerwright {

std::set<std::size_t> worstCases(const Assessment& assessment,
                                 std::initializer_list<Measure> measures) {
    std::set<std::size_t> worst;
    for (const RequirementResult& result : assessment.verdict.requirements) {
        if (std::find(measures.begin(), measures.end(), result.requirement.measure) ==
            measures.end())
            continue;
        for (std::size_t i = 0; i < assessment.cases.size(); ++i)
            if (assessment.cases[i].name == result.worst.case_name)
                worst.insert(i);
    }
    return worst;
}

} // namespace cornerwright
