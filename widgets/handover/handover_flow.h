#pragma once

#include "core/handover/handover.h"
#include "widgets/pane.h"

#include <QObject>
#include <QString>

namespace cornerwright {

/// Writes what leaves the program: handover files and the review report. Asks only where to.
class HandoverFlow : public QObject {
    Q_OBJECT

  public:
    explicit HandoverFlow(QWidget* window);

    void setContent(const PaneContent& content) { content_ = content; }
    /// The file whose hash the handover names as its source; empty while there are unsaved changes.
    void setProjectFile(const QString& path) { projectFile_ = path; }

    void chooseAndExport(HandoverForm form, const QString& name);
    void exportTo(HandoverForm form, const QString& name, const QString& folder);
    void chooseAndReport();
    void reportTo(const QString& path);

  Q_SIGNALS:
    void done(const QString& sentence);
    void failed(const QString& sentence);

  private:
    std::string projectHash() const;

    QWidget* window_;
    PaneContent content_;
    QString projectFile_;
};

} // namespace cornerwright
