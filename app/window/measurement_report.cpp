#include "app/window/measurement_report.h"

#include "core/engine/assessment.h"
#include "core/project/project.h"
#include "widgets/fitting/fit_panel.h"
#include "widgets/import/column_table.h"
#include "widgets/import/import_panel.h"
#include "widgets/import/response_preview.h"

#include <QComboBox>
#include <QFileInfo>
#include <QListWidget>
#include <QPushButton>

namespace cornerwright {

namespace {

QJsonArray endsOf(const std::vector<double>& values) {
    return values.empty() ? QJsonArray() : QJsonArray{values.front(), values.back()};
}

} // namespace

QJsonObject placeOf(const QWidget& widget) {
    const QPoint corner = widget.mapToGlobal(QPoint(0, 0));
    return {{QStringLiteral("x"), corner.x()},
            {QStringLiteral("y"), corner.y()},
            {QStringLiteral("width"), widget.width()},
            {QStringLiteral("height"), widget.height()},
            {QStringLiteral("visible"), widget.isVisible()}};
}

QJsonObject importReport(const ImportPanel& panel) {
    QJsonArray files;
    for (const ImportEntry& entry : panel.entries()) {
        const bool ready = entry.look && entry.look->plant;
        files.append(
            QJsonObject{{QStringLiteral("file"), QFileInfo(entry.path).fileName()},
                        {QStringLiteral("points"),
                         ready ? static_cast<qint64>(entry.look->plant->w_rad_s.size()) : 0},
                        {QStringLiteral("problem"), entry.look ? entry.look->problem : QString()}});
    }
    QJsonArray units;
    for (int column = 1; column <= panel.table().columnCount(); ++column) {
        if (const QComboBox* box = panel.table().unitBox(column)) {
            QJsonObject place = placeOf(*box);
            place[QStringLiteral("shown")] = box->currentText();
            units.append(place);
        }
    }
    QJsonArray ends;
    for (const PreviewCurve& curve : panel.preview().curves()) {
        ends.append(endsOf(curve.db));
    }
    QJsonObject report = placeOf(panel);
    report[QStringLiteral("busy")] = panel.isBusy();
    report[QStringLiteral("files")] = files;
    report[QStringLiteral("units")] = units;
    report[QStringLiteral("preview_db")] = ends;
    report[QStringLiteral("list")] = placeOf(panel.list());
    report[QStringLiteral("take")] = placeOf(*panel.takeButton());
    return report;
}

QJsonObject fitReport(const FitPanel& panel) {
    QJsonObject report = placeOf(panel);
    report[QStringLiteral("running")] = panel.isRunning();
    report[QStringLiteral("order")] = panel.result() ? panel.result()->order : 0;
    report[QStringLiteral("take")] = placeOf(*panel.takeButton());
    return report;
}

QJsonArray caseReport(const Project& project, const Assessment* assessment) {
    QJsonArray cases;
    for (std::size_t i = 0; i < project.plant_cases.size(); ++i) {
        const PlantCase& plantCase = project.plant_cases[i];
        QJsonObject told{{QStringLiteral("name"), QString::fromStdString(plantCase.name)}};
        if (assessment != nullptr && i < assessment->cases.size() &&
            assessment->cases[i].name == plantCase.name) {
            const LoopAssessment& design = assessment->cases[i].design;
            told[QStringLiteral("fitted")] = assessment->cases[i].fitted;
            told[QStringLiteral("plant_db")] = endsOf(design.curves.plant_db);
            told[QStringLiteral("step_points")] = static_cast<qint64>(design.step.y.size());
            told[QStringLiteral("step_note")] = QString::fromStdString(design.step.note);
        }
        cases.append(told);
    }
    return cases;
}

} // namespace cornerwright
