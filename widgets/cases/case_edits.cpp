#include "widgets/cases/case_edits.h"

namespace cornerwright {

namespace {

bool isTaken(const Project& project, const QString& name, std::size_t except) {
    for (std::size_t i = 0; i < project.plant_cases.size(); ++i) {
        if (i != except && QString::fromStdString(project.plant_cases[i].name) == name) {
            return true;
        }
    }
    return false;
}

} // namespace

QString freeCaseName(const Project& project, const QString& wanted, std::size_t except) {
    QString name = wanted;
    for (int number = 2; isTaken(project, name, except); ++number) {
        name = QStringLiteral("%1 %2").arg(wanted).arg(number);
    }
    return name;
}

Project withCaseAdded(const Project& project, const PlantCase& plantCase) {
    Project next = project;
    next.plant_cases.push_back(plantCase);
    return next;
}

Project withCaseRemoved(const Project& project, std::size_t index) {
    Project next = project;
    next.plant_cases.erase(next.plant_cases.begin() + static_cast<std::ptrdiff_t>(index));
    return next;
}

Project withCaseRenamed(const Project& project, std::size_t index, const QString& name) {
    Project next = project;
    next.plant_cases.at(index).name = freeCaseName(project, name, index).toStdString();
    return next;
}

} // namespace cornerwright
