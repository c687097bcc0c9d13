#pragma once

#include "core/compensator/section.h"
#include "widgets/chain/card_fields.h"

#include <QFrame>

#include <vector>

class QLineEdit;

namespace cornerwright {

class GlyphButton;
class QuantityField;
class TextLabel;

/// One section of the chain: its colour, its name, its numbers for exact entry, and the switches.
/// Keys on the card itself: space turns the section off and on, delete removes it, L locks it, F2
/// names it, alt+up and alt+down move it, Enter goes to the first number.
class SectionCard : public QFrame {
    Q_OBJECT

  public:
    SectionCard(std::size_t index, const Section& section, QWidget* parent = nullptr);

    const Section& section() const { return section_; }
    void setSection(const Section& section);
    void setShowsHertz(bool on);
    void setSelected(bool on);
    /// The number fields in the order of the card, for tests and for the keyboard.
    const std::vector<QuantityField*>& fields() const { return fields_; }

  Q_SIGNALS:
    /// The person gave the section another value; `what` names the undo step.
    void edited(const cornerwright::Section& next, const QString& what);
    void removeAsked();
    /// One place up (-1) or down (+1).
    void moveAsked(int by);
    /// The card was clicked or reached with the keyboard.
    void picked();
    /// The grip is held: the card should stand where the mouse is; `dropped` with the last one.
    void gripMoved(const QPoint& global, bool dropped);

  protected:
    void paintEvent(QPaintEvent* event) override;
    void keyPressEvent(QKeyEvent* event) override;
    void mousePressEvent(QMouseEvent* event) override;
    void mouseDoubleClickEvent(QMouseEvent* event) override;
    void focusInEvent(QFocusEvent* event) override;
    void focusOutEvent(QFocusEvent* event) override;
    void contextMenuEvent(QContextMenuEvent* event) override;
    bool eventFilter(QObject* watched, QEvent* event) override;

  private:
    void build();
    void refresh();
    void showProblem(const QString& problem);
    void enter(std::size_t field, double value);
    void toggleEnabled();
    void toggleLocked();
    void beginNaming();
    void endNaming(bool take);

    std::size_t index_;
    Section section_;
    bool hertz_ = true;
    bool selected_ = false;
    std::vector<CardField> cardFields_;
    std::vector<QuantityField*> fields_;
    std::vector<QWidget*> rows_;
    TextLabel* name_;
    QLineEdit* nameEdit_;
    GlyphButton* lock_;
    GlyphButton* switch_;
    GlyphButton* grip_;
    TextLabel* fact_;
    TextLabel* problem_;
};

} // namespace cornerwright
