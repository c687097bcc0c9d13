#include "app/window/report_file.h"

#include "core/engine/engine.h"
#include "core/handover/report_plots.h"
#include "core/numerics/error.h"
#include "core/numerics/write_file.h"
#include "core/project/load_measurement.h"
#include "core/project/project.h"
#include "widgets/handover/report_document.h"

#include <cstdio>
#include <filesystem>

namespace cornerwright {

namespace {

constexpr int exitInputWrong = 65;
constexpr int exitWriteFailed = 74;

std::filesystem::path toPath(const QString& path) {
    return std::filesystem::path(path.toStdU16String());
}

QByteArray reportOf(const std::filesystem::path& file, const QString& date) {
    const LoadedProject loaded = load_project(file);
    for (const std::string& notice : loaded.notices) {
        std::fprintf(stderr, "%s\n", notice.c_str());
    }
    Engine engine;
    const auto assessment = engine.assess(loaded.project);
    std::shared_ptr<const RootLocus> locus;
    if (!assessment->cases.empty()) {
        locus = engine.locus(loaded.project, worst_case_of(*assessment));
    }
    return reportPdf(
        {&loaded.project, assessment.get(), locus.get(), sha256_of_file(file), date.toStdString()});
}

} // namespace

int writeReportFile(const QString& project, const QString& file, const QString& date) {
    try {
        write_file(toPath(file), reportOf(toPath(project), date).toStdString());
        return 0;
    } catch (const InputError& error) {
        std::fprintf(stderr, "cornerwright: %s\n", error.what());
        return exitInputWrong;
    } catch (const WriteError& error) {
        std::fprintf(stderr, "cornerwright: %s\n", error.what());
        return exitWriteFailed;
    }
}

} // namespace cornerwright
