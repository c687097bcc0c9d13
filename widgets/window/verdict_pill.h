#pragma once

#include "core/requirements/verdict.h"

#include <QAbstractButton>

namespace cornerwright {

/// The verdict over everything, always in sight. A click goes to the worst requirement.
class VerdictPill : public QAbstractButton {
    Q_OBJECT

  public:
    explicit VerdictPill(QWidget* parent = nullptr);

    /// Null while nothing is assessed.
    void setVerdict(const Verdict* verdict, bool hertz);

    QSize sizeHint() const override;
    QSize minimumSizeHint() const override;

  protected:
    void paintEvent(QPaintEvent* event) override;

  private:
    State state_ = State::undetermined;
};

} // namespace cornerwright
