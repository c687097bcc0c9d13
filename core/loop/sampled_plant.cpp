#include "core/loop/sampled_plant.h"

#include "core/loop/wide_cascade.h"
#include "core/numerics/error.h"
#include "core/numerics/wide_polynomial.h"

#include <algorithm>
#include <cmath>
#include <limits>

namespace cornerwright {
namespace {

constexpr double z_is_0 = -1.0; // in z - 1

/// A delay as whole samples and the rest as a fraction of one, rounding noise snapped away.
struct SplitDelay {
    int whole = 0;
    double fraction = 0.0; ///< [0, 1)
};

SplitDelay split(double samples) {
    // The quotient of two decimal figures misses a whole number by a few roundings.
    const double noise = 8.0 * std::numeric_limits<double>::epsilon() * std::max(1.0, samples);
    const double nearest = std::round(samples);
    if (std::abs(samples - nearest) <= noise)
        return {static_cast<int>(nearest), 0.0};
    const double whole = std::floor(samples);
    return {static_cast<int>(whole), samples - whole};
}

/// exp(p) - 1 with all digits of a small p.
Complex exponential_minus_1(Complex p) {
    const double half_sine = std::sin(0.5 * p.imag());
    const double growth = std::exp(p.real());
    return {std::expm1(p.real()) * std::cos(p.imag()) - 2.0 * half_sine * half_sine,
            growth * std::sin(p.imag())};
}

/// What the held input does to the states over one period: `now` times the present value plus
/// `before` times the one before (fractional delay), and exp(A Ts) - I.
struct HeldStep {
    WideTriangle step;
    std::vector<WideComplex> now;
    std::vector<WideComplex> before;
};

HeldStep held_step(const WideCascade& cascade, double fraction) {
    const std::size_t size = cascade.output.size();
    HeldStep result;
    const WideTriangle after = exponential_minus_identity(cascade.matrix, 1.0 - fraction);
    result.now.resize(size);
    result.before.resize(size);
    for (std::size_t i = 1; i < size; ++i)
        result.now[i] = after(i, 0);
    if (fraction == 0.0) {
        result.step = after;
        return result;
    }
    const WideTriangle first = exponential_minus_identity(cascade.matrix, fraction);
    result.step = compose(after, first);
    for (std::size_t i = 1; i < size; ++i) {
        result.before[i] = first(i, 0);
        for (std::size_t k = 1; k <= i; ++k)
            result.before[i] = result.before[i] + after(i, k) * first(k, 0);
    }
    return result;
}

/// Numerator over prod(d - e^{p Ts} + 1), with a fractional delay over (1 + d) as well: forward
/// substitution through the triangle, each state a polynomial over the poles up to its own.
WidePolynomial numerator(const WideCascade& cascade, const HeldStep& held, bool fractional) {
    const std::size_t size = cascade.output.size();
    std::vector<WidePolynomial> states(size);
    WidePolynomial poles_so_far{WideComplex(1.0)};
    WidePolynomial output{cascade.output[0]};
    for (std::size_t i = 1; i < size; ++i) {
        const WideComplex& pole = held.step(i, i);
        WidePolynomial state;
        for (std::size_t k = 1; k < i; ++k) {
            if (k > 1)
                state = times_root(state, held.step(k, k));
            add_scaled(state, held.step(i, k), states[k]);
        }
        // The input's part: (1 + d) now + before behind a fractional delay, now otherwise.
        add_scaled(state, held.now[i] + held.before[i], poles_so_far);
        if (fractional) {
            WidePolynomial shifted(1);
            shifted.insert(shifted.end(), poles_so_far.begin(), poles_so_far.end());
            add_scaled(state, held.now[i], shifted);
        }
        states[i] = state;
        poles_so_far = times_root(poles_so_far, pole);
        output = times_root(output, pole);
        add_scaled(output, cascade.output[i], state);
    }
    return output;
}

std::ptrdiff_t count_at_zero(const ComplexVector& roots) {
    return std::count(roots.begin(), roots.end(), Complex(0.0));
}

/// A zero of P at s = 0 is one of P_d at exactly d = 0; of several one only, since a held ramp is
/// no ramp; those that cancel poles at 0 stay. Leading coefficients may be very small and yet carry
/// all their digits: only an exact zero is dropped.
void settle_ends(WidePolynomial& polynomial, const RootForm& plant) {
    while (polynomial.size() > 1 && polynomial.back().re.high == 0.0)
        polynomial.pop_back();
    const std::ptrdiff_t exact =
        std::min(count_at_zero(plant.zeros), count_at_zero(plant.poles) + 1);
    for (std::size_t k = 0; k < static_cast<std::size_t>(exact) && k + 1 < polynomial.size(); ++k)
        polynomial[k] = WideComplex();
}

} // namespace

SampledPlant sample_plant(const PlantModel& plant, double computation_delay_s,
                          double sample_period_s) {
    if (!plant.roots.is_proper())
        throw InputError({}, "a plant with at least as many poles as zeros to sample",
                         std::to_string(plant.roots.zeros.size()) + " zeros and " +
                             std::to_string(plant.roots.poles.size()) + " poles");
    const SplitDelay delay = split((plant.dead_time_s + computation_delay_s) / sample_period_s);
    const bool fractional = delay.fraction > 0.0;

    const WideCascade cascade = wide_cascade(plant.roots, sample_period_s);
    WidePolynomial polynomial = numerator(cascade, held_step(cascade, delay.fraction), fractional);
    settle_ends(polynomial, plant.roots);

    SampledPlant result;
    result.sample_period_s = sample_period_s;
    result.whole_samples = delay.whole;
    result.delta_form.gain = cascade.gain * polynomial.back().re.rounded();
    result.delta_form.zeros = roots_of_wide_polynomial(polynomial, z_is_0);
    for (const Complex& pole : plant.roots.poles)
        result.delta_form.poles.push_back(exponential_minus_1(pole * sample_period_s));
    if (fractional)
        result.delta_form.poles.emplace_back(-1.0, 0.0);
    return result;
}

SampledPlants sample_plants(const PlantModel& plant, double computation_delay_s,
                            double sample_period_s) {
    SampledPlants result;
    result.delayed = sample_plant(plant, computation_delay_s, sample_period_s);
    result.undelayed =
        computation_delay_s == 0.0 ? result.delayed : sample_plant(plant, 0.0, sample_period_s);
    return result;
}

std::shared_ptr<const SampledPlants> sampled_plants_of(const RealisedLoop& loop) {
    if (loop.sampled)
        return loop.sampled;
    return std::make_shared<const SampledPlants>(sample_plants(std::get<PlantModel>(loop.plant),
                                                               loop.computation_delay_s,
                                                               loop.compensator.sample_period_s));
}

Complex evaluate(const SampledPlant& plant, Complex z_minus_1) {
    return evaluate(plant.delta_form, z_minus_1) * std::pow(1.0 + z_minus_1, -plant.whole_samples);
}

} // namespace cornerwright
