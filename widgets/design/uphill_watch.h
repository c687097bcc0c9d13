#pragma once

#include "widgets/design/latest_worker.h"
#include "widgets/pane.h"

namespace cornerwright {

/// Keeps the uphill directions in the view state up to date: after every assessment they are worked
/// out anew beside the hand's work, and the latest wins.
class UphillWatch : public QObject {
    Q_OBJECT

  public:
    UphillWatch(ViewState& viewState, QObject* parent = nullptr);

    void setContent(const PaneContent& content);
    bool isBusy() const { return worker_.isBusy(); }

  private:
    void take(const std::shared_ptr<const Project>& project, const std::vector<double>& slopes);

    ViewState& viewState_;
    std::shared_ptr<const Project> asked_;
    LatestWorker worker_; ///< last: its thread ends before anything it might call
};

} // namespace cornerwright
