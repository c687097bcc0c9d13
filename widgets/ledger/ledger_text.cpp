#include "widgets/ledger/ledger_text.h"

#include "widgets/figure_text.h"
#include "widgets/ledger/ledger_order.h"

#include <QCoreApplication>
#include <QStringList>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

QString tr(const char* text) {
    return QCoreApplication::translate("cornerwright", text);
}

/// Distance to the nearer limit in the measure's unit, positive inside. Margins count by size.
double distanceOf(const Requirement& requirement, double value) {
    const bool bySize = requirement.measure == Measure::phase_margin;
    const double judged = bySize ? std::abs(value) : value;
    double distance = HUGE_VAL;
    if (requirement.at_least) {
        distance = std::min(distance, judged - *requirement.at_least);
    }
    if (requirement.at_most) {
        distance = std::min(distance, *requirement.at_most - judged);
    }
    return distance;
}

qsizetype countOf(const Verdict& verdict, State state) {
    return std::ranges::count_if(verdict.requirements, [state](const RequirementResult& result) {
        return result.worst.state == state;
    });
}

/// "unit 7, phase margin, 3.1° short"
QString shortLine(const RequirementResult& result, bool hertz) {
    QStringList parts{QString::fromStdString(result.worst.case_name),
                      insideSentence(requirementText(result.requirement, hertz))};
    const QString distance = distanceText(result, hertz);
    if (!distance.isEmpty()) {
        parts << distance;
    }
    return parts.join(QStringLiteral(", "));
}

} // namespace

QString distanceText(const RequirementResult& result, bool hertz) {
    const Figure& value = result.worst.value;
    if (!value.is_determined()) {
        return {};
    }
    const double distance = distanceOf(result.requirement, value.value());
    if (!std::isfinite(distance)) {
        return QStringLiteral("∞");
    }
    const MeasureUnit unit = unit_of(result.requirement.measure);
    const QString size = valueText(std::abs(distance), unit, hertz);
    if (distance < 0.0) {
        const bool tooMuch =
            result.requirement.at_most && value.value() > *result.requirement.at_most;
        return (tooMuch ? tr("%1 over") : tr("%1 short")).arg(size);
    }
    return size;
}

QString loopText(LoopName loop) {
    return loop == LoopName::design ? tr("design") : tr("realised");
}

QString whereText(const RequirementResult& result, bool hertz) {
    const Judgement& worst = result.worst;
    QStringList parts;
    if (!worst.case_name.empty()) {
        parts << QString::fromStdString(worst.case_name) << loopText(worst.loop);
    }
    if (worst.at_rad_s.is_value()) {
        parts << frequencyText(worst.at_rad_s.value(), hertz);
    }
    if (!worst.reason.empty()) {
        parts << QString::fromStdString(worst.reason);
    } else if (!worst.value.is_determined()) {
        parts << QString::fromStdString(worst.value.reason());
    }
    return parts.join(QStringLiteral(", "));
}

QString verdictText(const Verdict& verdict, bool hertz) {
    if (verdict.requirements.empty()) {
        return tr("no requirements yet");
    }
    const RequirementResult& first = verdict.requirements[ledgerOrder(verdict).front()];
    const qsizetype all = std::ssize(verdict.requirements);
    const qsizetype unmet = countOf(verdict, State::unmet);
    const qsizetype undetermined = countOf(verdict, State::undetermined);
    if (unmet > 0) {
        return tr("%1 of %2 unmet · worst: %3").arg(unmet).arg(all).arg(shortLine(first, hertz));
    }
    if (undetermined > 0) {
        return tr("%1 of %2 not determined").arg(undetermined).arg(all);
    }
    return tr("all %1 met · tightest: %2").arg(all).arg(shortLine(first, hertz));
}

} // namespace cornerwright
