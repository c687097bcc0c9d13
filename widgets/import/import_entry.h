#pragma once

#include "widgets/document/undo_history.h"
#include "widgets/import/import_runner.h"

#include <QString>
#include <QStringList>

#include <vector>

namespace cornerwright {

/// One file on its way in.
struct ImportEntry {
    int id = 0;
    QString path;
    ImportChoices choices;
    ImportLookPointer look;    ///< null until it was read
    ProjectPointer measuredOn; ///< the project whose compensator stood for the look
};

/// The project with new cases, and what was written for them.
struct AcceptedImports {
    Project project;
    QStringList names;   ///< of the new cases
    QStringList written; ///< converted responses, full paths
};

/// A case for every entry that has a plant. File names are told from `folder`. What differs from
/// the file as it stands is written as a new table into `convertedFolder` (beside the measurement
/// where that is empty), never over another file. Throws WriteError; nothing is then left behind.
AcceptedImports acceptImports(const Project& project, const std::vector<ImportEntry>& entries,
                              const QString& folder, const QString& convertedFolder);

} // namespace cornerwright
