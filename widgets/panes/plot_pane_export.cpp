// The commands of a plot pane that carry it out of the window: clipboard and files.

#include "widgets/panes/plot_pane.h"
#include "widgets/view_state.h"

#include <QAction>
#include <QClipboard>
#include <QFileDialog>
#include <QFileInfo>
#include <QGuiApplication>
#include <QPrintDialog>
#include <QPrinter>
#include <QSaveFile>

namespace cornerwright {

QAction* PlotPane::addPaneAction(const QString& text, const std::function<void()>& run) {
    auto* action = new QAction(text, this);
    connect(action, &QAction::triggered, this, run);
    addAction(action);
    return action;
}

void PlotPane::addExportActions() {
    addPaneAction(tr("Show all"), [this] { fit(); });
    addPaneAction(tr("Hide the other cases"), [this] { showOnlyShownCase(); });
    addPaneAction(tr("Show every case"), [this] { viewState().setHiddenCases({}); });
    addPaneAction(tr("Copy as picture"), [this] { copyPicture(); });
    addPaneAction(tr("Save picture …"), [this] { askAndSavePicture(); });
    addPaneAction(tr("Save data as CSV …"), [this] { askAndSaveData(); });
    addPaneAction(tr("Print …"), [this] { askAndPrint(); });
}

QImage PlotPane::picture(double scale) {
    exporting_ = true;
    canvas_.setTheme(theme());
    QImage image = canvas_.picture(scale);
    exporting_ = false;
    canvas_.setTheme(theme());
    redraw();
    return image;
}

bool PlotPane::savePicture(const QString& file) {
    const QString suffix = QFileInfo(file).suffix().toLower();
    const bool isVector = suffix == QLatin1String("pdf") || suffix == QLatin1String("svg");
    if (!isVector)
        return picture().save(file, "PNG");
    exporting_ = true;
    canvas_.setTheme(theme());
    const bool saved = canvas_.saveVector(file, suffix == QLatin1String("svg"));
    exporting_ = false;
    canvas_.setTheme(theme());
    redraw();
    return saved;
}

bool PlotPane::print(QPrinter& printer) {
    exporting_ = true;
    canvas_.setTheme(theme());
    const bool printed = canvas_.print(printer);
    exporting_ = false;
    canvas_.setTheme(theme());
    redraw();
    return printed;
}

void PlotPane::askAndPrint() {
    QPrinter printer(QPrinter::HighResolution);
    printer.setPageOrientation(QPageLayout::Landscape);
    printer.setDocName(title());
    QPrintDialog dialog(&printer, this);
    dialog.setWindowTitle(tr("Print %1").arg(title()));
    if (dialog.exec() == QDialog::Accepted && !print(printer))
        Q_EMIT failed(tr("%1 could not be printed.").arg(title()));
}

void PlotPane::copyPicture() {
    QGuiApplication::clipboard()->setImage(picture());
}

void PlotPane::askAndSavePicture() {
    const QString file = QFileDialog::getSaveFileName(this, tr("Save picture of %1").arg(title()),
                                                      title().toLower() + QStringLiteral(".pdf"),
                                                      tr("PDF (*.pdf);;SVG (*.svg);;PNG (*.png)"));
    if (!file.isEmpty() && !savePicture(file))
        Q_EMIT failed(tr("%1 could not be written.").arg(file));
}

void PlotPane::askAndSaveData() {
    const QString file = QFileDialog::getSaveFileName(this, tr("Save data of %1").arg(title()),
                                                      title().toLower() + QStringLiteral(".csv"),
                                                      tr("Comma-separated values (*.csv)"));
    if (file.isEmpty())
        return;
    QSaveFile target(file);
    const QByteArray text = csv().toUtf8();
    const bool saved =
        target.open(QIODevice::WriteOnly) && target.write(text) == text.size() && target.commit();
    if (!saved)
        Q_EMIT failed(tr("%1 could not be written.").arg(file));
}

} // namespace cornerwright
