#include "widgets/document/measurement_paths.h"

#include <QDir>

namespace cornerwright {

Project rebased(const Project& project, const QString& oldFolder, const QString& newFolder) {
    Project moved = project;
    const QDir from(oldFolder);
    const QDir to(newFolder);
    for (PlantCase& plantCase : moved.plant_cases) {
        if (auto* measurement = std::get_if<MeasurementSource>(&plantCase.source)) {
            const QString file = QString::fromStdString(measurement->file);
            const QString absolute = QDir::cleanPath(from.absoluteFilePath(file));
            measurement->file = to.relativeFilePath(absolute).toStdString();
        }
    }
    return moved;
}

} // namespace cornerwright
