#pragma once

#include "core/engine/assessment.h"
#include "core/project/project.h"

#include <string>
#include <vector>

namespace cornerwright {

/// What the review report is made from.
struct ReportInput {
    const Project* project = nullptr;       ///< not owned
    const Assessment* assessment = nullptr; ///< not owned, of that project
    const RootLocus* locus = nullptr;       ///< of the worst case (`worst_case_of`); may be null
    std::string project_sha256;             ///< of the project file; empty: not saved
    std::string date;                       ///< printed only where given, so that the same input
                                            ///< gives the same bytes
};

/// A stretch of the report: HTML markup, then a picture where there is one.
struct ReportPart {
    std::string markup;
    std::string svg;
};

/// The design review document: verdict, requirements on every case and loop, curves, plant cases
/// with their hashes, sections, coefficients, what was not determined, definitions, cautions.
std::vector<ReportPart> review_report(const ReportInput& input);

/// One self-contained HTML file, pictures inline.
std::string report_html(const ReportInput& input);

/// The style sheet of the report, for whoever renders the parts otherwise.
std::string report_style();

} // namespace cornerwright
