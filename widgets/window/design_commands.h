#pragma once

#include "widgets/pane.h"

#include <QObject>

#include <vector>

class QAction;
class QMenu;

namespace cornerwright {

class MainWindow;
class UphillWatch;

/// The commands that lead from a requirement to corners, and what connects them: section design on
/// the chain, room, tolerance and fleet, and the arrows on the handles.
class DesignCommands : public QObject {
    Q_OBJECT

  public:
    explicit DesignCommands(MainWindow& window);

    void addTo(QMenu& menu) const;
    void setContent(const PaneContent& content);
    const std::vector<QAction*>& designs() const { return designs_; }
    const UphillWatch& uphill() const { return *uphill_; }

  private:
    QAction* make(const QString& text, const QKeySequence& keys, const QString& tip);
    void connectTolerance();
    void connectFleet();

    MainWindow& window_;
    std::vector<QAction*> designs_; ///< in the order of DesignKind
    std::vector<QAction*> panes_;
    UphillWatch* uphill_;
};

} // namespace cornerwright
