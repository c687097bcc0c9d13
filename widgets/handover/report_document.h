#pragma once

#include "core/handover/report.h"

#include <QByteArray>

namespace cornerwright {

/// The review report as a PDF file of A4 pages, plots as vectors. The same input gives the same
/// bytes on one machine (fonts are the machine's).
QByteArray reportPdf(const ReportInput& input);

} // namespace cornerwright
