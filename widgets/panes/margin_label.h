#pragma once

#include "widgets/panes/margin_marks.h"
#include "widgets/panes/painting.h"

namespace cornerwright {

/// What stands beside a margin that decides: "✗ Phase margin 41.9° · unmet", in the colour of its
/// state.
struct MarginLabel {
    QString text;
    LabelStyle style;
};

/// The label of `mark` on the loop it was taken from. `assessment` holds the verdict.
MarginLabel marginLabel(const MarginMark& mark, const MarkedLoop& loop,
                        const Assessment& assessment, const CaseAssessment& shown,
                        const Theme& theme, bool hertz);

/// The colour of the margin's bar: that of its state where it decides, else muted.
QColor marginColour(const MarginMark& mark, const MarkedLoop& loop, const Assessment& assessment,
                    const CaseAssessment& shown, const Theme& theme);

} // namespace cornerwright
