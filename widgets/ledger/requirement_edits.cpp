#include "widgets/ledger/requirement_edits.h"

#include <QCoreApplication>

namespace cornerwright {

namespace {

QString tr(const char* text) {
    return QCoreApplication::translate("cornerwright", text);
}

bool isRatioScale(MeasureUnit unit) {
    return unit == MeasureUnit::rad_s || unit == MeasureUnit::s;
}

} // namespace

// Limits to start from are common practice (45 deg, 8 dB, 6 dB, 25 %); the user sets the real ones.
Requirement newRequirement(Measure measure, double w) {
    Requirement made;
    made.measure = measure;
    switch (measure) {
    case Measure::phase_margin:
        made.at_least = 45.0;
        break;
    case Measure::gain_margin:
        made.at_least = 8.0;
        break;
    case Measure::gain_reduction_margin:
        made.at_least = 6.0;
        break;
    case Measure::delay_margin:
        made.at_least = 0.5 / w;
        break;
    case Measure::sensitivity_peak:
        made.at_most = 6.0;
        break;
    case Measure::complementary_peak:
        made.at_most = 3.0;
        break;
    case Measure::control_effort_peak:
        made.at_most = 40.0;
        break;
    case Measure::bandwidth:
        made.at_least = w;
        break;
    case Measure::disturbance_rejection:
        made.up_to_rad_s = w / 10.0;
        made.at_most = -20.0;
        break;
    case Measure::roll_off:
        made.from_rad_s = w * 10.0;
        made.at_most = -20.0;
        break;
    case Measure::overshoot:
        made.at_most = 25.0;
        break;
    case Measure::peak_time:
        made.at_most = 4.0 / w;
        break;
    case Measure::rise_time:
        made.at_most = 2.0 / w;
        break;
    case Measure::settling_time:
        made.at_most = 10.0 / w;
        break;
    case Measure::steady_state_error:
        made.at_most = 0.05;
        break;
    case Measure::control_peak:
    case Measure::disturbance_peak:
        made.at_most = 1.0;
        break;
    }
    return made;
}

Project withRequirementAdded(const Project& project, const Requirement& requirement) {
    Project next = project;
    next.requirements.push_back(requirement);
    return next;
}

Project withRequirementChanged(const Project& project, std::size_t index,
                               const Requirement& requirement) {
    Project next = project;
    next.requirements.at(index) = requirement;
    return next;
}

Project withRequirementRemoved(const Project& project, std::size_t index) {
    Project next = project;
    next.requirements.erase(next.requirements.begin() + static_cast<std::ptrdiff_t>(index));
    return next;
}

QuantityKind quantityOf(MeasureUnit unit) {
    switch (unit) {
    case MeasureUnit::deg:
        return QuantityKind::angle;
    case MeasureUnit::db:
        return QuantityKind::decibel;
    case MeasureUnit::rad_s:
        return QuantityKind::frequency;
    case MeasureUnit::s:
        return QuantityKind::time;
    case MeasureUnit::percent:
        return QuantityKind::percent;
    case MeasureUnit::plain:
        break;
    }
    return QuantityKind::plain;
}

QString problemOf(const Requirement& requirement) {
    const std::optional<double>& low = requirement.at_least;
    const std::optional<double>& high = requirement.at_most;
    if (!low && !high) {
        return tr("Expected at least one limit, found none.");
    }
    if (low && high && !(*low < *high)) {
        return tr("Expected the lower limit below the upper one.");
    }
    const bool ratio = isRatioScale(unit_of(requirement.measure));
    if (ratio && ((low && *low <= 0.0) || (high && *high <= 0.0))) {
        return tr("Expected a limit above zero.");
    }
    if (requirement.measure == Measure::disturbance_rejection && requirement.up_to_rad_s <= 0.0) {
        return tr("Expected a frequency above zero.");
    }
    if (requirement.measure == Measure::roll_off && requirement.from_rad_s <= 0.0) {
        return tr("Expected a frequency above zero.");
    }
    if (requirement.measure == Measure::settling_time && requirement.band_percent <= 0.0) {
        return tr("Expected a band above zero.");
    }
    return {};
}

} // namespace cornerwright
