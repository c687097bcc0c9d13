#include "widgets/cases/case_edits.h"

#include "core/measurement/read_measurement.h"
#include "core/numerics/sha256.h"
#include "core/project/load_measurement.h"

#include <QCoreApplication>
#include <QDir>
#include <QFile>
#include <QFileInfo>

namespace cornerwright {

namespace {

QString tr(const char* text) {
    return QCoreApplication::translate("PlantCases", text);
}

std::string hashOf(const QString& path) {
    constexpr qint64 blockSize = 1 << 20;
    QFile file(path);
    Sha256 hash;
    if (file.open(QIODevice::ReadOnly)) {
        while (!file.atEnd()) {
            const QByteArray block = file.read(blockSize);
            hash.add(std::string_view(block.constData(), static_cast<std::size_t>(block.size())));
        }
    }
    return hash.hex();
}

bool isTaken(const Project& project, const QString& name, std::size_t except) {
    for (std::size_t i = 0; i < project.plant_cases.size(); ++i) {
        if (i != except && QString::fromStdString(project.plant_cases[i].name) == name) {
            return true;
        }
    }
    return false;
}

QStringList remarksOf(const ReadResult& read) {
    QStringList remarks;
    for (const std::string& warning : read.warnings) {
        remarks << QString::fromStdString(warning);
    }
    if (!read.skipped.empty()) {
        const SkippedRow& first = read.skipped.front();
        remarks << tr("%1 rows skipped, the first in line %2: %3.")
                       .arg(read.skipped.size())
                       .arg(first.line)
                       .arg(QString::fromStdString(first.why));
    }
    return remarks;
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

TakenMeasurement takeMeasurement(const QString& path, const QString& folder) {
    ReadResult read = read_measurement(std::filesystem::path(path.toStdU16String()));
    TakenMeasurement taken;
    taken.remarks = remarksOf(read);
    taken.plantCase.name = QFileInfo(path).completeBaseName().toStdString();
    MeasurementSource source;
    source.file = QDir(folder).relativeFilePath(QFileInfo(path).absoluteFilePath()).toStdString();
    source.sha256 = hashOf(path);
    source.reading = std::make_shared<const ReadingRecord>(record_of(read));
    source.response = std::make_shared<const MeasuredResponse>(std::move(read.response));
    taken.plantCase.source = std::move(source);
    return taken;
}

} // namespace cornerwright
