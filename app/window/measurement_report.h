#pragma once

#include <QJsonArray>
#include <QJsonObject>

class QWidget;

namespace cornerwright {

struct Assessment;
class FitPanel;
class ImportPanel;
struct Project;

/// Where a widget stands on the screen.
QJsonObject placeOf(const QWidget& widget);

/// The import panel: its files, what they gave, and where its boxes and buttons stand.
QJsonObject importReport(const ImportPanel& panel);
/// The fit panel likewise.
QJsonObject fitReport(const FitPanel& panel);
/// Every plant case with the ends of its drawn plant curve and what the step drawing says.
QJsonArray caseReport(const Project& project, const Assessment* assessment);

} // namespace cornerwright
