#pragma once

#include "widgets/design/design_wish.h"
#include "widgets/design/latest_worker.h"
#include "widgets/pane.h"

#include <QFrame>

#include <vector>

class QComboBox;
class QFormLayout;
class QVBoxLayout;

namespace cornerwright {

class Document;
class LinkButton;
class QuantityField;
class TextLabel;

/// A section design in the making, on the chain: what is wanted, what it would do (the design is
/// shown on all panes as if it were taken, with the present one as the ghost), why it cannot where
/// it cannot, and the choice. Taken it is one undo step; Escape, undo or Leave put everything back.
class DesignPanel : public QFrame {
    Q_OBJECT

  public:
    DesignPanel(Document& document, ViewState& viewState, QWidget* parent = nullptr);

    /// Opens the panel for a design, with first wishes from the project.
    void begin(DesignKind kind);
    bool isOpen() const { return open_; }
    const DesignWish& wish() const { return wish_; }
    /// Asks for something else.
    void setWish(const DesignWish& wish);
    /// The proposal stands as one undo step, if it is possible.
    void take();
    void leave();

    void setContent(const PaneContent& content);
    bool isPossible() const { return proposal_.possible; }
    bool isBusy() const { return worker_.isBusy(); }
    /// What the design does, or why it cannot, as shown.
    QString words() const;
    const std::vector<QuantityField*>& fields() const { return fields_; }
    LinkButton* takeButton() const { return take_; }

  Q_SIGNALS:
    /// A proposal came, or the panel opened or closed.
    void changed();

  protected:
    void paintEvent(QPaintEvent* event) override;
    void keyPressEvent(QKeyEvent* event) override;

  private:
    void buildForm();
    void addField(const WishField& part);
    void addChoice(const WishChoice& part);
    void request();
    void show(const SectionProposal& proposal);
    void preview();
    void endPreview();
    void close();
    void followDocument();
    void noteForeignDrag();

    Document& document_;
    ViewState& viewState_;
    PaneContent content_;
    DesignWish wish_;
    SectionProposal proposal_;
    std::shared_ptr<const Project> base_; ///< what the design is worked out from
    bool open_ = false;
    bool previewing_ = false;  ///< the running drag of the document is this panel's
    bool ownChange_ = false;   ///< the document's signals come from this panel
    bool interrupted_ = false; ///< somebody else ended the preview
    TextLabel* name_;
    QFormLayout* form_;
    TextLabel* words_;
    TextLabel* changes_;
    TextLabel* problem_;
    LinkButton* take_;
    std::vector<QuantityField*> fields_;
    LatestWorker worker_; ///< last: its thread ends before anything it might call
};

} // namespace cornerwright
