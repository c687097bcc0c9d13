#pragma once

#include <QJsonArray>

class QMenuBar;

namespace cornerwright {

/// The entries of the menu bar and where they stand on the screen.
QJsonArray menuBarReport(const QMenuBar& bar);

/// Every menu that is open, from the outermost inwards, with its entries: text, place, whether it
/// can be taken, whether it opens another menu.
QJsonArray openMenusReport();

} // namespace cornerwright
