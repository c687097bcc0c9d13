#include "widgets/document/measurement_paths.h"

#include "core/project/load_measurement.h"

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

Project pinnedAnew(const Project& project, const QString& folder) {
    Project pinned = project;
    for (PlantCase& plantCase : pinned.plant_cases) {
        auto* measurement = std::get_if<MeasurementSource>(&plantCase.source);
        if (measurement == nullptr || !measurement->response || measurement->sha256.empty()) {
            continue;
        }
        const QString file =
            QDir(folder).absoluteFilePath(QString::fromStdString(measurement->file));
        try {
            measurement->sha256 = sha256_of_file(std::filesystem::path(file.toStdU16String()));
        } catch (const InputError&) { // gone since it was read: the old pin says so next time
        }
    }
    return pinned;
}

} // namespace cornerwright
