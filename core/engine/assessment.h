#pragma once

#include "core/loop/loop_assessment.h"
#include "core/loop/root_locus.h"
#include "core/realisation/difference_equation.h"
#include "core/requirements/verdict.h"

#include <memory>
#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// What came out for one plant case.
struct CaseAssessment {
    std::string name;
    bool measured = false;
    bool fitted = false; ///< measured and a fit stands in for poles, locus and step
    std::string
        unusable; ///< why nothing could be computed (missing file, broken model); else empty
    LoopAssessment design;
    std::optional<LoopAssessment> realised;

    bool operator==(const CaseAssessment&) const = default;
};

/// Everything the panes, the ledger, the command line and the report show. Immutable once made.
struct Assessment {
    std::string title;
    std::vector<CaseAssessment> cases; ///< in the order of the project
    Verdict verdict;
    std::optional<DifferenceEquation>
        equation; ///< as realised, where the project has a realisation
    std::string
        realisation_problem; ///< why there is no difference equation though one is asked for

    bool operator==(const Assessment&) const = default;
};

} // namespace cornerwright
