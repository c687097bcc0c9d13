#pragma once

#include "core/handover/realisation_study.h"
#include "core/project/project.h"

#include <QWidget>

#include <memory>

class QTableWidget;

namespace cornerwright {

class TextLabel;

/// What each choice costs: methods against requirements, and in sentences what structure, number
/// format and word length do.
class StudyView : public QWidget {
    Q_OBJECT

  public:
    explicit StudyView(QWidget* parent = nullptr);

    /// Until the next study the last one stays, marked as being worked out anew.
    void setPending();
    void setStudy(std::shared_ptr<const Project> project,
                  std::shared_ptr<const RealisationStudy> study);
    void setShowsHertz(bool hertz);

  Q_SIGNALS:
    void methodChosen(cornerwright::Method method);

  private:
    void refresh();
    void fillTable();

    std::shared_ptr<const Project> project_;
    std::shared_ptr<const RealisationStudy> study_;
    bool hertz_ = true;
    TextLabel* head_;
    QTableWidget* table_;
    TextLabel* sentences_;
};

/// "+6.2°", "−1.3 dB", "+12 %": how far a judged value stands from its limit.
QString headroomText(const Judgement& judgement, const Requirement& requirement);

/// The methods as people call them.
QString methodText(Method method);

} // namespace cornerwright
