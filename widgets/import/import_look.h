#pragma once

#include "core/measurement/preview_measurement.h"
#include "core/project/project.h"
#include "widgets/import/import_choices.h"

#include <QString>
#include <QStringList>

#include <functional>
#include <memory>
#include <optional>

namespace cornerwright {

/// What one file gives under the choices made so far.
struct ImportLook {
    Preview preview;
    QStringList channels; ///< columns of a time record, by which they are chosen
    std::shared_ptr<const MeasuredResponse> plant; ///< null where something is wrong or open
    std::shared_ptr<const ReadingRecord> reading;
    QStringList understood; ///< columns, units, rows used and left out, whatever was assumed
    QString problem;        ///< one sentence why there is no plant; empty where there is one
    bool isOpen = false;    ///< the problem is a question that the panel can settle
    std::string sha256;     ///< of the file as it was read
};

/// Reads and converts. `project` gives the compensator for a loop gain or a closed loop. Never
/// throws for what a file holds; made to run beside the window. `proceed` returns false to stop.
ImportLook lookAt(const QString& path, const ImportChoices& choices, const Project& project,
                  const std::function<bool()>& proceed);

/// What was done to the numbers of a file, one sentence each, for the head of a converted table.
QStringList conversionRemarks(const QString& path, const ImportChoices& choices,
                              const ImportLook& look, const Project& project);

} // namespace cornerwright
