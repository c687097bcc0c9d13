#include "app/window/menu_report.h"

#include <QApplication>
#include <QJsonObject>
#include <QMenu>
#include <QMenuBar>

#include <algorithm>
#include <vector>

namespace cornerwright {

namespace {

QJsonObject entryOf(const QAction& action, const QRect& place, const QWidget& within) {
    const QPoint corner = within.mapToGlobal(place.topLeft());
    QString text = action.text();
    return {{QStringLiteral("text"), text.remove(QLatin1Char('&'))},
            {QStringLiteral("enabled"), action.isEnabled()},
            {QStringLiteral("opens"), action.menu() != nullptr},
            {QStringLiteral("x"), corner.x()},
            {QStringLiteral("y"), corner.y()},
            {QStringLiteral("width"), place.width()},
            {QStringLiteral("height"), place.height()}};
}

bool isInside(const QMenu& menu, const QMenu& other) {
    for (const QAction* action : other.actions()) {
        if (action->menu() != nullptr &&
            (action->menu() == &menu || isInside(menu, *action->menu()))) {
            return true;
        }
    }
    return false;
}

} // namespace

QJsonArray menuBarReport(const QMenuBar& bar) {
    QJsonArray entries;
    for (QAction* action : bar.actions()) {
        entries.append(entryOf(*action, bar.actionGeometry(action), bar));
    }
    return entries;
}

QJsonArray openMenusReport() {
    std::vector<QMenu*> open;
    for (QWidget* widget : QApplication::topLevelWidgets()) {
        if (auto* menu = qobject_cast<QMenu*>(widget); menu != nullptr && menu->isVisible()) {
            open.push_back(menu);
        }
    }
    std::ranges::sort(
        open, [](const QMenu* outer, const QMenu* inner) { return isInside(*inner, *outer); });
    QJsonArray menus;
    for (QMenu* menu : open) {
        QJsonArray entries;
        for (QAction* action : menu->actions()) {
            if (!action->isSeparator()) {
                entries.append(entryOf(*action, menu->actionGeometry(action), *menu));
            }
        }
        menus.append(entries);
    }
    return menus;
}

} // namespace cornerwright
