#include "core/loop/locus_crossings.h"

#include <algorithm>
#include <cmath>
#include <optional>

namespace cornerwright {
namespace {

/// The pole that is a root at `factor`, both moved along the axis: Newton on the angle of
/// -1/L(jw), which is 0 where the factor is real.
std::optional<AxisCrossing> polish(const LocusEquation& equation, double w) {
    constexpr int rounds = 30;
    for (int round = 0; round < rounds; ++round) {
        const Complex s(0.0, w);
        const Complex factor = equation.factor_for(s);
        if (!(factor.real() > 0.0))
            return std::nullopt;
        const double angle = std::arg(factor);
        // ds/d ln(factor) = rate, so that d angle/dw = Im(j/rate) = Re(1/rate).
        const double slope = (1.0 / equation.at(s, factor.real()).rate).real();
        const double correction = angle / slope;
        if (!std::isfinite(correction))
            return std::nullopt;
        w -= correction;
        if (std::abs(correction) <= 4e-16 * w || angle == 0.0)
            return w > 0.0
                       ? std::optional(AxisCrossing{w, equation.factor_for(Complex(0.0, w)).real()})
                       : std::nullopt;
        if (std::abs(correction) <= 1e-13 * w && round > 8)
            break; // the rounding of the angle keeps it from settling further
    }
    const AxisCrossing crossing{w, equation.factor_for(Complex(0.0, w)).real()};
    return w > 0.0 && crossing.factor > 0.0 ? std::optional(crossing) : std::nullopt;
}

/// -1, 1, or 0 for a pole on the axis as far as double precision can tell.
int side(Complex pole) {
    constexpr double on_axis = 1e-11;
    if (std::abs(pole.real()) <= on_axis * std::abs(pole))
        return 0;
    return pole.real() < 0.0 ? -1 : 1;
}

} // namespace

std::vector<AxisCrossing> axis_crossings(const LocusEquation& equation,
                                         const std::vector<LocusState>& states) {
    std::vector<AxisCrossing> crossings;
    const std::size_t branches = states.empty() ? 0 : states.front().poles.size();
    for (std::size_t i = 0; i < branches; ++i) {
        int last_side = 0;
        for (std::size_t k = 0; k < states.size(); ++k) {
            const Complex pole = states[k].poles[i];
            const int now = side(pole);
            if (now == 0)
                continue;
            const bool crossed = last_side == -now;
            last_side = now;
            if (!crossed || pole.imag() < 0.0)
                continue;
            const double low = states[k - 1].log_factor;
            if (states[k].mirror[i] == i) { // a real pole goes through the origin
                const double factor = equation.factor_for(0.0).real();
                if (factor > 0.0 && std::isfinite(factor) && std::log(factor) >= low - 1.0 &&
                    std::log(factor) <= states[k].log_factor + 1.0)
                    crossings.push_back({0.0, factor});
                continue;
            }
            const Complex before = states[k - 1].poles[i];
            const double part = before.real() / (before.real() - pole.real());
            const double guess = std::lerp(std::abs(before.imag()), pole.imag(), part);
            if (const std::optional<AxisCrossing> crossing = polish(equation, guess))
                crossings.push_back(*crossing);
        }
    }
    std::sort(crossings.begin(), crossings.end(),
              [](const AxisCrossing& left, const AxisCrossing& right) {
                  return left.factor < right.factor;
              });
    return crossings;
}

} // namespace cornerwright
