#pragma once

#include <QFrame>

class QHBoxLayout;
class QMenu;
class QToolButton;
class QVBoxLayout;

namespace cornerwright {

class GlyphButton;
class Pane;
class TextLabel;

/// The place of one pane: its head (name as a menu of other panes, the pane's own small switches,
/// whole-window button) and the pane below.
class PaneSlot : public QFrame {
    Q_OBJECT

  public:
    PaneSlot(bool canSwitch, QWidget* parent = nullptr);

    Pane* pane() const { return pane_; }
    /// Shows the pane; the one before stays alive, hidden, without a place.
    void setPane(Pane* pane);
    /// Takes the pane out, so that another slot can have it.
    Pane* takePane();
    void setWhole(bool whole);
    /// Opens the menu of panes.
    void openMenu();

  Q_SIGNALS:
    /// The menu of panes is about to show: whoever owns the panes fills it.
    void menuAsked(QMenu* menu);
    void wholeAsked();
    void helpAsked();

  protected:
    void paintEvent(QPaintEvent* event) override;
    void contextMenuEvent(QContextMenuEvent* event) override;

  private:
    Pane* pane_ = nullptr;
    QWidget* headWidget_ = nullptr;
    QToolButton* name_;
    QMenu* menu_ = nullptr;
    GlyphButton* help_;
    GlyphButton* whole_;
    QHBoxLayout* head_;
    QVBoxLayout* body_;
};

} // namespace cornerwright
