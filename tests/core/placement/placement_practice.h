#pragma once

#include "core/placement/problem.h"
#include "core/plant/formula.h"

#include <cmath>
#include <memory>
#include <numbers>

namespace cornerwright::practice {

inline Section gain_of(double gain) {
    Section section;
    section.kind = SectionKind::gain;
    section.gain = gain;
    return section;
}

inline Section pair_of(SectionKind kind, double zero, double pole) {
    Section section;
    section.kind = kind;
    section.zero_rad_s = zero;
    section.pole_rad_s = pole;
    return section;
}

inline Section corner_of(SectionKind kind, double corner) {
    Section section;
    section.kind = kind;
    section.corner_rad_s = corner;
    return section;
}

inline Section second_order_of(SectionKind kind, double corner, double damping) {
    Section section = corner_of(kind, corner);
    section.damping = damping;
    return section;
}

inline Section notch_of(double corner, double zero_damping, double pole_damping) {
    Section section = corner_of(SectionKind::notch, corner);
    section.zero_damping = zero_damping;
    section.pole_damping = pole_damping;
    return section;
}

inline Requirement at_least(Measure measure, double limit) {
    Requirement requirement;
    requirement.measure = measure;
    requirement.at_least = limit;
    return requirement;
}

inline Requirement at_most(Measure measure, double limit) {
    Requirement requirement;
    requirement.measure = measure;
    requirement.at_most = limit;
    return requirement;
}

/// The model seen at `points` frequencies, as a noise-free measurement.
inline MeasuredPlant measured(const PlantModel& model, double from, double to, int points,
                              int integrators) {
    auto response = std::make_shared<MeasuredResponse>();
    for (int i = 0; i < points; ++i) {
        const double w = from * std::pow(to / from, static_cast<double>(i) / (points - 1));
        response->w_rad_s.push_back(w);
        response->response.push_back(evaluate(model.roots, {0.0, w}) *
                                     std::polar(1.0, -w * model.dead_time_s));
    }
    return MeasuredPlant{std::move(response), integrators, 0, {}};
}

} // namespace cornerwright::practice
