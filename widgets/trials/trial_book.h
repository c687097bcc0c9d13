#pragma once

#include "core/engine/assessment.h"
#include "widgets/document/undo_history.h"

#include <QObject>
#include <QString>

#include <cstddef>
#include <memory>
#include <optional>
#include <vector>

namespace cornerwright {

/// A kept copy of the design with the figures it had.
struct Trial {
    QString name;
    ProjectPointer project;
    std::shared_ptr<const Assessment> assessment;
};

/// The trials kept of the project on the bench, and which of them is compared with.
class TrialBook : public QObject {
    Q_OBJECT

  public:
    using QObject::QObject;

    const std::vector<Trial>& trials() const { return trials_; }
    std::optional<std::size_t> compared() const { return compared_; }
    /// The trial compared with; null if none.
    const Trial* comparedTrial() const;

    /// Keeps a design as "trial N" and compares with it.
    void keep(ProjectPointer project, std::shared_ptr<const Assessment> assessment);
    void rename(std::size_t index, const QString& name);
    void remove(std::size_t index);
    void compare(std::optional<std::size_t> index);
    void clear();

  Q_SIGNALS:
    void changed();

  private:
    std::vector<Trial> trials_;
    std::optional<std::size_t> compared_;
    int nextNumber_ = 1;
};

} // namespace cornerwright
