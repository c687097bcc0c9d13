#include "widgets/ledger/ledger_model.h"

#include "widgets/figure_text.h"
#include "widgets/ledger/ledger_order.h"
#include "widgets/ledger/ledger_text.h"
#include "widgets/theme.h"

#include <algorithm>

namespace cornerwright {

void LedgerModel::setAssessment(std::shared_ptr<const Assessment> assessment,
                                std::shared_ptr<const Assessment> start) {
    const std::size_t count = assessment ? assessment->verdict.requirements.size() : 0;
    if (count != order_.size() || !assessment) {
        beginResetModel();
        assessment_ = std::move(assessment);
        start_ = std::move(start);
        order_ = assessment_ ? ledgerOrder(assessment_->verdict) : std::vector<std::size_t>();
        endResetModel();
        return;
    }
    assessment_ = std::move(assessment);
    start_ = std::move(start);
    if (!start_) {
        reorder(ledgerOrder(assessment_->verdict));
    }
    if (count > 0) {
        Q_EMIT dataChanged(index(0, 0), index(static_cast<int>(count) - 1, columnCount_ - 1));
    }
}

void LedgerModel::reorder(const std::vector<std::size_t>& order) {
    if (order == order_) {
        return;
    }
    Q_EMIT layoutAboutToBeChanged({}, QAbstractItemModel::VerticalSortHint);
    const QModelIndexList before = persistentIndexList();
    const std::vector<std::size_t> old = std::exchange(order_, order);
    QModelIndexList after;
    for (const QModelIndex& each : before) {
        after << index(rowOf(old[static_cast<std::size_t>(each.row())]), each.column());
    }
    changePersistentIndexList(before, after);
    Q_EMIT layoutChanged({}, QAbstractItemModel::VerticalSortHint);
}

void LedgerModel::setShowsHertz(bool on) {
    hertz_ = on;
    if (!order_.empty()) {
        Q_EMIT dataChanged(index(0, 0), index(rowCount() - 1, columnCount_ - 1));
    }
}

const RequirementResult& LedgerModel::result(int row) const {
    return assessment_->verdict.requirements[requirementOf(row)];
}

int LedgerModel::rowOf(std::size_t requirement) const {
    const auto found = std::ranges::find(order_, requirement);
    return found == order_.end() ? -1 : static_cast<int>(found - order_.begin());
}

int LedgerModel::rowCount(const QModelIndex& parent) const {
    return parent.isValid() ? 0 : static_cast<int>(order_.size());
}

int LedgerModel::columnCount(const QModelIndex& parent) const {
    return parent.isValid() ? 0 : columnCount_;
}

QVariant LedgerModel::headerData(int section, Qt::Orientation orientation, int role) const {
    if (orientation != Qt::Horizontal || role != Qt::DisplayRole) {
        return {};
    }
    switch (section) {
    case measure:
        return tr("measure");
    case limit:
        return tr("limit");
    case worst:
        return tr("worst");
    case where:
        return tr("where");
    case headroom:
        return tr("headroom");
    case state:
        return tr("state");
    default:
        return QString();
    }
}

QVariant LedgerModel::data(const QModelIndex& index, int role) const {
    if (!checkIndex(index, CheckIndexOption::IndexIsValid)) {
        return {};
    }
    const std::size_t requirement = requirementOf(index.row());
    const RequirementResult& shown = assessment_->verdict.requirements[requirement];
    switch (role) {
    case Qt::DisplayRole:
        return text(shown, index.column());
    case Qt::AccessibleTextRole:
        return index.column() == mark || index.column() == headroom
                   ? tr("%1, headroom %2")
                         .arg(stateText(shown.worst.state), distanceText(shown, hertz_))
                   : text(shown, index.column());
    case Qt::ToolTipRole:
        return explanation(shown);
    case stateRole:
        return static_cast<int>(shown.worst.state);
    case shareRole:
        return shown.worst.share.is_determined() ? QVariant(shown.worst.share.value()) : QVariant();
    case startShareRole:
        return startShare(requirement);
    case requirementRole:
        return static_cast<qulonglong>(requirement);
    default:
        return {};
    }
}

QString LedgerModel::text(const RequirementResult& shown, int column) const {
    switch (column) {
    case mark:
        return markOf(shown.worst.state);
    case measure:
        return requirementText(shown.requirement, hertz_);
    case limit:
        return limitText(shown.requirement, hertz_);
    case worst:
        return figureText(shown.worst.value, unit_of(shown.requirement.measure), hertz_);
    case where:
        return whereText(shown, hertz_);
    case distance:
        return distanceText(shown, hertz_);
    case state:
        return stateText(shown.worst.state);
    default:
        return {};
    }
}

QString LedgerModel::explanation(const RequirementResult& shown) const {
    QStringList lines;
    for (const Judgement& judgement : shown.all) {
        QString line =
            tr("%1, %2: %3 (%4)")
                .arg(QString::fromStdString(judgement.case_name), loopText(judgement.loop),
                     figureText(judgement.value, unit_of(shown.requirement.measure), hertz_),
                     stateText(judgement.state));
        for (const std::string& remark : {judgement.reason, judgement.value.note()}) {
            if (!remark.empty()) {
                line += QStringLiteral(" · ") + QString::fromStdString(remark);
            }
        }
        lines << line;
    }
    return lines.join(QLatin1Char('\n'));
}

QVariant LedgerModel::startShare(std::size_t requirement) const {
    if (!start_ || requirement >= start_->verdict.requirements.size()) {
        return {};
    }
    const Figure& share = start_->verdict.requirements[requirement].worst.share;
    return share.is_determined() ? QVariant(share.value()) : QVariant();
}

} // namespace cornerwright
