#pragma once

#include "widgets/document/assessment_runner.h"
#include "widgets/document/document.h"
#include "widgets/pane.h"
#include "widgets/view_state.h"

#include <QObject>

namespace cornerwright {

/// Closes the circle: watches the document, has every new value assessed, and holds what the panes
/// and the ledger draw. Also keeps the indices of the view state inside the project.
class LiveContent : public QObject {
    Q_OBJECT

  public:
    LiveContent(Document& document, ViewState& viewState, QObject* parent = nullptr);

    /// The latest assessment with its project; both null until the first one is there.
    const PaneContent& content() const { return content_; }
    AssessmentRunner& runner() { return runner_; }

    /// A kept trial to compare with, null for none.
    void setTrial(std::shared_ptr<const Assessment> trial);

  Q_SIGNALS:
    void contentChanged();

  private:
    void requestAssessment();
    void take(const AssessedProject& result);
    void keepIndicesInside();

    Document& document_;
    ViewState& viewState_;
    PaneContent content_;
    AssessmentRunner runner_;
};

} // namespace cornerwright
