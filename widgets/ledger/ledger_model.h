#pragma once

#include "core/engine/assessment.h"
#include "core/project/project.h"

#include <QAbstractTableModel>

#include <memory>
#include <vector>

namespace cornerwright {

/// The requirement ledger as a table: one row a requirement, the most pressing first.
class LedgerModel : public QAbstractTableModel {
    Q_OBJECT

  public:
    enum Column { mark, measure, limit, worst, where, headroom, distance, state, columnCount_ };
    enum Role {
        stateRole = Qt::UserRole, ///< cornerwright::State as int
        shareRole,                ///< double, +-infinity; invalid where not determined
        startShareRole,           ///< the same at the start of the running drag; invalid outside
        requirementRole,          ///< index into the project's requirements
    };

    using QAbstractTableModel::QAbstractTableModel;

    /// Shows an assessment; `start` is that of the drag's start, null outside a drag. While a drag
    /// is on, rows keep their places.
    void setAssessment(std::shared_ptr<const Assessment> assessment,
                       std::shared_ptr<const Assessment> start);
    void setShowsHertz(bool on);

    /// The result shown in a row.
    const RequirementResult& result(int row) const;
    /// The row of a requirement of the project; -1 if it is not there.
    int rowOf(std::size_t requirement) const;
    std::size_t requirementOf(int row) const { return order_[static_cast<std::size_t>(row)]; }

    int rowCount(const QModelIndex& parent = {}) const override;
    int columnCount(const QModelIndex& parent = {}) const override;
    QVariant data(const QModelIndex& index, int role = Qt::DisplayRole) const override;
    QVariant headerData(int section, Qt::Orientation orientation,
                        int role = Qt::DisplayRole) const override;

  private:
    QString text(const RequirementResult& result, int column) const;
    QString explanation(const RequirementResult& result) const;
    QVariant startShare(std::size_t requirement) const;
    void reorder(const std::vector<std::size_t>& order);

    std::shared_ptr<const Assessment> assessment_;
    std::shared_ptr<const Assessment> start_;
    std::vector<std::size_t> order_;
    bool hertz_ = true;
};

} // namespace cornerwright
