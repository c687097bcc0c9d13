#include "core/requirements/requirement.h"

#include <array>

namespace cornerwright {
namespace {

struct MeasureRow {
    Measure measure;
    std::string_view name;
    MeasureUnit unit;
};

/// In the order of the enumeration.
constexpr std::array measure_table{
    MeasureRow{Measure::phase_margin, "phase_margin", MeasureUnit::deg},
    MeasureRow{Measure::gain_margin, "gain_margin", MeasureUnit::db},
    MeasureRow{Measure::gain_reduction_margin, "gain_reduction_margin", MeasureUnit::db},
    MeasureRow{Measure::delay_margin, "delay_margin", MeasureUnit::s},
    MeasureRow{Measure::sensitivity_peak, "sensitivity_peak", MeasureUnit::db},
    MeasureRow{Measure::complementary_peak, "complementary_peak", MeasureUnit::db},
    MeasureRow{Measure::control_effort_peak, "control_effort_peak", MeasureUnit::db},
    MeasureRow{Measure::bandwidth, "bandwidth", MeasureUnit::rad_s},
    MeasureRow{Measure::disturbance_rejection, "disturbance_rejection", MeasureUnit::db},
    MeasureRow{Measure::roll_off, "roll_off", MeasureUnit::db},
    MeasureRow{Measure::overshoot, "overshoot", MeasureUnit::percent},
    MeasureRow{Measure::peak_time, "peak_time", MeasureUnit::s},
    MeasureRow{Measure::rise_time, "rise_time", MeasureUnit::s},
    MeasureRow{Measure::settling_time, "settling_time", MeasureUnit::s},
    MeasureRow{Measure::steady_state_error, "steady_state_error", MeasureUnit::plain},
    MeasureRow{Measure::control_peak, "control_peak", MeasureUnit::plain},
    MeasureRow{Measure::disturbance_peak, "disturbance_peak", MeasureUnit::plain},
};

constexpr std::size_t measure_count = measure_table.size();

constexpr std::array<Measure, measure_count> measures_in_order = [] {
    std::array<Measure, measure_count> list{};
    for (std::size_t i = 0; i < measure_count; ++i)
        list[i] = measure_table[i].measure;
    return list;
}();

constexpr bool table_follows_enumeration = [] {
    for (std::size_t i = 0; i < measure_count; ++i)
        if (static_cast<std::size_t>(measure_table[i].measure) != i)
            return false;
    return true;
}();
static_assert(table_follows_enumeration);

const MeasureRow& row_of(Measure measure) {
    return measure_table[static_cast<std::size_t>(measure)];
}

} // namespace

std::string_view name_of(Measure measure) {
    return row_of(measure).name;
}

std::span<const Measure> all_measures() {
    return measures_in_order;
}

MeasureUnit unit_of(Measure measure) {
    return row_of(measure).unit;
}

std::string_view key_suffix(MeasureUnit unit) {
    switch (unit) {
    case MeasureUnit::deg:
        return "_deg";
    case MeasureUnit::db:
        return "_db";
    case MeasureUnit::rad_s:
        return "_rad_s";
    case MeasureUnit::s:
        return "_s";
    case MeasureUnit::percent:
        return "_percent";
    case MeasureUnit::plain:
        break;
    }
    return "";
}

std::string_view symbol_of(MeasureUnit unit) {
    switch (unit) {
    case MeasureUnit::deg:
        return "deg";
    case MeasureUnit::db:
        return "dB";
    case MeasureUnit::rad_s:
        return "rad/s";
    case MeasureUnit::s:
        return "s";
    case MeasureUnit::percent:
        return "%";
    case MeasureUnit::plain:
        break;
    }
    return "";
}

std::string_view name_of(ErrorInput input) {
    switch (input) {
    case ErrorInput::ramp:
        return "ramp";
    case ErrorInput::parabola:
        return "parabola";
    case ErrorInput::step:
        break;
    }
    return "step";
}

std::string_view name_of(State state) {
    switch (state) {
    case State::met:
        return "met";
    case State::unmet:
        return "unmet";
    case State::undetermined:
        break;
    }
    return "undetermined";
}

} // namespace cornerwright
