#pragma once

#include "core/project/project.h"

#include <QString>

namespace cornerwright {

/// The same project told from `newFolder`: every measurement's file name, relative to `oldFolder`
/// before, is relative to `newFolder` after.
Project rebased(const Project& project, const QString& oldFolder, const QString& newFolder);

/// The same project with every pinned measurement pinned to its file as it stands in `folder` now.
/// Files that cannot be read keep their pin.
Project pinnedAnew(const Project& project, const QString& folder);

} // namespace cornerwright
