#pragma once

#include "core/engine/assessment.h"
#include "core/project/project.h"

#include <QWidget>

#include <memory>

namespace cornerwright {

class ViewState;

/// What a pane draws: one immutable assessment with the project it was made from.
struct PaneContent {
    std::shared_ptr<const Project> project;
    std::shared_ptr<const Assessment> assessment;
    std::shared_ptr<const RootLocus> locus; ///< of the shown case; null if not made
    /// The assessment at the start of the running drag (drawn as a ghost); null outside a drag.
    std::shared_ptr<const Assessment> ghost;
    /// A trial to compare with (drawn faint); null if none.
    std::shared_ptr<const Assessment> trial;
};

/// A view of the assessment. It draws and, where it has handles, turns the mouse into a proposed
/// project that it hands up; it never computes a figure and never calls another view.
class Pane : public QWidget {
    Q_OBJECT

  public:
    Pane(ViewState& viewState, QWidget* parent) : QWidget(parent), viewState_(viewState) {}

    /// Draws the content at the next repaint. Axes do not jump while a drag is on.
    virtual void setContent(const PaneContent& content) = 0;

    /// "Magnitude": the name in the pane's head and in menus.
    virtual QString title() const = 0;

    /// Legend and small switches for the right side of the pane's head, null if there are none.
    /// Made by the pane, taken into the layout of the head. The pane's commands (copy, save,
    /// what to show) are its QWidget::actions().
    virtual QWidget* headWidget() { return nullptr; }

  signals:
    /// A drag begins; `what` names the undo step ("Move zero of lead").
    void dragStarted(const QString& what);
    /// The project as it would be with the handle here. Sent at most once an event.
    void dragMoved(const std::shared_ptr<const cornerwright::Project>& proposed);
    /// The mouse let go: the last proposal stands as one undo step.
    void dragFinished();
    /// Escape: everything as before the drag.
    void dragCancelled();
    /// One edit without a drag (arrow key, delete, context menu), one undo step.
    void edited(const std::shared_ptr<const cornerwright::Project>& proposed, const QString& what);
    /// Something the pane was asked for did not work; a sentence for the user.
    void failed(const QString& why);

  protected:
    ViewState& viewState() const { return viewState_; }

  private:
    ViewState& viewState_;
};

} // namespace cornerwright
