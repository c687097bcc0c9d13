#pragma once

#include "core/placement/sensitivity.h"
#include "widgets/pane.h"

class QTableWidget;

namespace cornerwright {

class RunRow;
class TextLabel;

/// How far every corner, damping, gain and coefficient may move alone before a requirement fails.
class RoomPane : public Pane {
    Q_OBJECT

  public:
    RoomPane(ViewState& viewState, QWidget* parent = nullptr);

    void setContent(const PaneContent& content) override;
    QString title() const override { return tr("Room to move"); }

    void start();
    RunRow& row() const { return *row_; }
    QTableWidget* table() const { return table_; }

  private:
    void take(const std::shared_ptr<const Project>& project, Sensitivity result);
    void showRooms();
    void addRow(const ValueRoom& room);
    void tellAge();

    PaneContent content_;
    std::shared_ptr<const Project> judged_; ///< the project of the result
    Sensitivity result_;
    QTableWidget* table_;
    TextLabel* leftOut_;
    RunRow* row_;
};

} // namespace cornerwright
