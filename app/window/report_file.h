#pragma once

#include <QString>

namespace cornerwright {

/// Writes the review report of a project as PDF, without a window. What went wrong goes to standard
/// error in a sentence; the exit status is returned: 0, 65 (the input is wrong), 74 (could not
/// write). The same project gives the same bytes unless a date is given to print.
int writeReportFile(const QString& project, const QString& file, const QString& date);

} // namespace cornerwright
