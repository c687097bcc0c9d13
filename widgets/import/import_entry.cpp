#include "widgets/import/import_entry.h"

#include "core/measurement/write_response.h"
#include "core/project/load_measurement.h"
#include "widgets/cases/case_edits.h"

#include <QDir>
#include <QFile>
#include <QFileInfo>

#include <filesystem>

namespace cornerwright {

namespace {

std::filesystem::path toPath(const QString& path) {
    return std::filesystem::path(path.toStdU16String());
}

QString freeFileName(const QString& folder, const QString& base) {
    QString path = QDir(folder).filePath(base + QStringLiteral(".csv"));
    for (int number = 2; QFile::exists(path); ++number) {
        path = QDir(folder).filePath(QStringLiteral("%1-%2.csv").arg(base).arg(number));
    }
    return path;
}

std::vector<std::string> toStrings(const QStringList& texts) {
    std::vector<std::string> strings;
    for (const QString& text : texts) {
        strings.push_back(text.toStdString());
    }
    return strings;
}

/// Writes the plant of an entry and takes it in as a later opening of the project will.
void convert(const ImportEntry& entry, const QString& folder, MeasurementSource& source,
             QString& file) {
    file =
        freeFileName(folder, QFileInfo(entry.path).completeBaseName() + QStringLiteral("-plant"));
    write_response(
        *entry.look->plant, toPath(file),
        toStrings(conversionRemarks(entry.path, entry.choices, *entry.look, *entry.measuredOn)));
    ReadResult read = read_measurement(toPath(file));
    source.reading = std::make_shared<const ReadingRecord>(record_of(read));
    source.response = std::make_shared<const MeasuredResponse>(std::move(read.response));
    source.sha256 = sha256_of_file(toPath(file));
}

} // namespace

AcceptedImports acceptImports(const Project& project, const std::vector<ImportEntry>& entries,
                              const QString& folder, const QString& convertedFolder) {
    AcceptedImports accepted;
    accepted.project = project;
    try {
        for (const ImportEntry& entry : entries) {
            if (!entry.look || !entry.look->plant) {
                continue;
            }
            MeasurementSource source;
            source.integrators = entry.choices.integrators;
            source.unstable_poles = entry.choices.unstablePoles;
            const QFileInfo info(entry.path);
            QString file = info.absoluteFilePath();
            if (needsOwnFile(entry.choices)) {
                convert(entry, convertedFolder.isEmpty() ? info.absolutePath() : convertedFolder,
                        source, file);
                accepted.written << file;
            } else {
                source.reading = entry.look->reading;
                source.response = entry.look->plant;
                source.sha256 = entry.look->sha256;
            }
            source.file = QDir(folder).relativeFilePath(file).toStdString();
            const QString wanted =
                entry.choices.name.isEmpty() ? info.completeBaseName() : entry.choices.name;
            const QString name = freeCaseName(accepted.project, wanted);
            accepted.project =
                withCaseAdded(accepted.project, {name.toStdString(), std::move(source)});
            accepted.names << name;
        }
    } catch (const WriteError&) {
        for (const QString& file : accepted.written) {
            QFile::remove(file);
        }
        throw;
    }
    return accepted;
}

} // namespace cornerwright
