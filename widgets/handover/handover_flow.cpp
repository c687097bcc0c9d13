#include "widgets/handover/handover_flow.h"

#include "core/handover/report.h"
#include "core/numerics/error.h"
#include "core/numerics/sha256.h"
#include "core/numerics/write_file.h"
#include "widgets/handover/report_document.h"

#include <QFile>
#include <QFileDialog>
#include <QFileInfo>

namespace cornerwright {

namespace {

std::filesystem::path toPath(const QString& path) {
    return std::filesystem::path(path.toStdU16String());
}

} // namespace

HandoverFlow::HandoverFlow(QWidget* window) : QObject(window), window_(window) {}

std::string HandoverFlow::projectHash() const {
    QFile file(projectFile_);
    if (projectFile_.isEmpty() || !file.open(QIODevice::ReadOnly)) {
        return {};
    }
    return sha256_hex(file.readAll().toStdString());
}

void HandoverFlow::chooseAndExport(HandoverForm form, const QString& name) {
    const QString folder = QFileDialog::getExistingDirectory(
        window_, tr("Folder for the handover"), QFileInfo(projectFile_).absolutePath());
    if (!folder.isEmpty()) {
        exportTo(form, name, folder);
    }
}

void HandoverFlow::exportTo(HandoverForm form, const QString& name, const QString& folder) {
    if (!content_.project || !content_.assessment) {
        return;
    }
    try {
        const std::vector<HandoverFile> files = handover_files(
            {content_.project.get(), content_.assessment.get(), projectHash(), name.toStdString()},
            form);
        write_handover(files, toPath(folder));
        QStringList names;
        for (const HandoverFile& file : files) {
            names << QString::fromStdString(file.name);
        }
        Q_EMIT done(tr("Written to %1: %2.").arg(folder, names.join(QStringLiteral(", "))));
    } catch (const std::runtime_error& error) { // InputError, WriteError: sentences for the user
        Q_EMIT failed(QString::fromUtf8(error.what()));
    }
}

void HandoverFlow::chooseAndReport() {
    QString path = QFileDialog::getSaveFileName(window_, tr("Write the review report"),
                                                QFileInfo(projectFile_).absolutePath(),
                                                tr("HTML (*.html);;PDF (*.pdf)"));
    if (path.isEmpty()) {
        return;
    }
    if (QFileInfo(path).suffix().isEmpty()) {
        path += QStringLiteral(".html");
    }
    reportTo(path);
}

void HandoverFlow::reportTo(const QString& path) {
    if (!content_.project || !content_.assessment) {
        return;
    }
    try {
        const ReportInput input{content_.project.get(), content_.assessment.get(),
                                content_.locus.get(), projectHash(), std::string()};
        const bool pdf = path.endsWith(QStringLiteral(".pdf"), Qt::CaseInsensitive);
        write_file(toPath(path), pdf ? reportPdf(input).toStdString() : report_html(input));
        Q_EMIT done(tr("Report written to %1.").arg(path));
    } catch (const std::runtime_error& error) { // InputError, WriteError: sentences for the user
        Q_EMIT failed(QString::fromUtf8(error.what()));
    }
}

} // namespace cornerwright
