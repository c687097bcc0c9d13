#pragma once

#include "core/project/project.h"

#include <QString>

namespace cornerwright {

/// A small project file of three modelled cases, five sections and eight requirements.
inline QString smallProjectPath() {
    return QStringLiteral(CORNERWRIGHT_TEST_DATA "/widgets/data/small.cornerwright.json");
}

inline Project smallProject() {
    return load_project(smallProjectPath().toStdString()).project;
}

/// The project with the zero of its lead at another place.
inline Project withLeadZero(Project project, double w_rad_s) {
    project.compensator.at(1).zero_rad_s = w_rad_s;
    return project;
}

} // namespace cornerwright
