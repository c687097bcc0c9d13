#pragma once

#include "widgets/help/help_texts.h"
#include "widgets/parts/panel_frame.h"

#include <QPointer>

class QTextBrowser;

namespace cornerwright {

/// Help in place, beside the panes: one topic at a time. Escape or its button closes it and gives
/// the focus back.
class HelpPanel : public PanelFrame {
    Q_OBJECT

  public:
    explicit HelpPanel(const HelpTexts& texts, QWidget* parent = nullptr);

    /// Shows a topic; "window" where nothing is said of this one. While the panel stands, the same
    /// topic asked again closes it.
    void explain(const QString& topic);
    QString topic() const { return topic_; }
    /// What stands in the panel, without its marks.
    QString text() const;

  protected:
    void keyPressEvent(QKeyEvent* event) override;
    void changeEvent(QEvent* event) override;

  private:
    void fit();
    void close();

    HelpTexts texts_;
    QString topic_;
    QTextBrowser* page_;
    QPointer<QWidget> focusBefore_;
};

} // namespace cornerwright
