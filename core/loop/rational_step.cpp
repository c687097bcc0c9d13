#include "core/loop/rational_step.h"

#include <cmath>

namespace cornerwright {
namespace {

ComplexVector joined(const ComplexVector& left, const ComplexVector& right) {
    ComplexVector all = left;
    all.insert(all.end(), right.begin(), right.end());
    return all;
}

/// Leading coefficient of the characteristic polynomial prod(s - p) + k prod(s - z).
double leading_coefficient(const RootForm& open, const ComplexVector& closed_loop_poles) {
    const std::size_t zeros = open.zeros.size();
    const std::size_t poles = open.poles.size();
    if (zeros < poles)
        return 1.0;
    if (zeros > poles)
        return open.gain;
    if (closed_loop_poles.size() == poles)
        return 1.0 + open.gain;
    // k = -1: the highest powers cancel and what leads is found by comparing at one point.
    double size = 1.0;
    for (const Complex& pole : closed_loop_poles)
        size = std::max(size, 2.0 * std::abs(pole));
    Complex left = 1.0, right = open.gain, closed = 1.0;
    for (const Complex& pole : open.poles)
        left *= (size - pole) / size;
    for (const Complex& zero : open.zeros)
        right *= (size - zero) / size;
    for (const Complex& pole : closed_loop_poles)
        closed *= (size - pole) / size;
    return ((left + right) / closed).real() *
           std::pow(size,
                    static_cast<double>(poles) - static_cast<double>(closed_loop_poles.size()));
}

} // namespace

StepSignals rational_step(const RootForm& compensator, const RootForm& plant,
                          const ComplexVector& closed_loop_poles) {
    const RootForm open = compensator * plant;
    const double leading = leading_coefficient(open, closed_loop_poles);
    ComplexVector poles = closed_loop_poles;
    poles.emplace_back(0.0); // the step

    StepSignals signals;
    signals.y.tail = modal_sum({open.zeros, poles, open.gain / leading});
    const RootForm control{joined(compensator.zeros, plant.poles), poles,
                           compensator.gain / leading};
    signals.u.tail = modal_sum(control);
    signals.control_has_impulse = control.zeros.size() >= control.poles.size();
    signals.y_disturbance.tail =
        modal_sum({joined(plant.zeros, compensator.poles), poles, plant.gain / leading});
    return signals;
}

} // namespace cornerwright
