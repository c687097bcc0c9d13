#include "core/realisation/hold_equivalent.h"

#include "core/realisation/quadratic.h"

#include <array>
#include <cmath>

namespace cornerwright {
namespace {

using Real = long double;
using Pair = std::array<Real, 2>;

/// Over one period, with time in units of 1/w: x1' = x2, x2' = u - x1 - 2 damping x2. `growth` is
/// exp(A tau) - I by rows, `step` the state after a unit step from rest, `ramp` its integral.
struct SecondOrderPeriod {
    std::array<Pair, 2> growth{};
    Pair step{};
    Pair ramp{};
};

Pair multiply(const std::array<Pair, 2>& matrix, const Pair& vector) {
    return {matrix[0][0] * vector[0] + matrix[0][1] * vector[1],
            matrix[1][0] * vector[0] + matrix[1][1] * vector[1]};
}

/// The Taylor series over a time so short (size of A tau below 1/4) that 18 terms reach the last
/// digit of an 80-bit number: 0.25^18/18! is 1e-27.
SecondOrderPeriod short_period(Real tau, Real damping) {
    constexpr int terms = 18;
    const std::array<Pair, 2> rate{Pair{0.0L, tau}, Pair{-tau, -2.0L * damping * tau}};
    SecondOrderPeriod period;
    std::array<Pair, 3> power{Pair{1.0L, 0.0L}, Pair{0.0L, 1.0L}, Pair{0.0L, tau}};
    for (int n = 1; n <= terms; ++n) {
        // power[2] is (A tau)^(n-1) B tau / n!, the term of the step; over n+1 the one of the ramp.
        for (std::size_t row = 0; row < 2; ++row) {
            period.step[row] += power[2][row];
            period.ramp[row] += power[2][row] * tau / static_cast<Real>(n + 1);
        }
        for (std::size_t column = 0; column < 2; ++column) {
            power[column] = multiply(rate, power[column]);
            for (std::size_t row = 0; row < 2; ++row) {
                power[column][row] /= static_cast<Real>(n);
                period.growth[row][column] += power[column][row];
            }
        }
        power[2] = multiply(rate, power[2]);
        for (Real& entry : power[2])
            entry /= static_cast<Real>(n + 1);
    }
    return period;
}

/// The same over twice the time. Every term adds up without cancellation of small quantities.
SecondOrderPeriod doubled(const SecondOrderPeriod& half, Real half_tau) {
    SecondOrderPeriod period;
    const Pair step_after = multiply(half.growth, half.step);
    const Pair ramp_after = multiply(half.growth, half.ramp);
    for (std::size_t row = 0; row < 2; ++row) {
        period.step[row] = 2.0L * half.step[row] + step_after[row];
        period.ramp[row] = 2.0L * half.ramp[row] + ramp_after[row] + half_tau * half.step[row];
        for (std::size_t column = 0; column < 2; ++column)
            period.growth[row][column] = 2.0L * half.growth[row][column] +
                                         half.growth[row][0] * half.growth[0][column] +
                                         half.growth[row][1] * half.growth[1][column];
    }
    return period;
}

SecondOrderPeriod over_period(Real tau, Real damping) {
    int doublings = 0;
    Real part = tau;
    for (; part * (1.0L + 2.0L * damping) > 0.25L; ++doublings)
        part /= 2.0L;
    SecondOrderPeriod period = short_period(part, damping);
    for (; doublings > 0; --doublings) {
        period = doubled(period, part);
        part *= 2.0L;
    }
    return period;
}

enum class Hold { step, ramp };

/// (1 - exp(-x))/x and what is missing to 1, both without cancellation.
struct FirstOrderMean {
    Real decayed;
    Real risen;
};

FirstOrderMean first_order_mean(Real x) {
    const Real decayed = -std::expm1(-x) / x;
    if (x > 0.5L)
        return {decayed, 1.0L - decayed};
    // x/2! - x^2/3! + x^3/4! - ...; 0.5^20/21! lies below the last digit of an 80-bit number.
    constexpr int terms = 20;
    Real term = x / 2.0L;
    Real sum = term;
    for (int n = 3; n < terms; ++n) {
        term *= -x / static_cast<Real>(n);
        sum += term;
    }
    return {decayed, sum};
}

/// direct + (at_dc - direct) p/(s + p).
RootForm first_order(Real direct, Real at_dc, Real pole_rad_s, Real period, Hold hold) {
    const Real pole = std::expm1(-pole_rad_s * period);
    Real leading = direct;
    if (hold == Hold::ramp) {
        const FirstOrderMean mean = first_order_mean(pole_rad_s * period);
        leading = direct * mean.decayed + at_dc * mean.risen;
    }
    const Real constant = -pole * at_dc;
    RootForm form;
    form.poles = {static_cast<double>(pole)};
    form.gain = static_cast<double>(leading == 0.0L ? constant : leading);
    if (leading != 0.0L)
        form.zeros = {static_cast<double>(-constant / leading)};
    return form;
}

/// direct + (low + high s/w) / (s^2/w^2 + 2 damping s/w + 1); one of `low`, `high` is 0.
RootForm second_order(Real direct, Real low, Real high, const Section& section, Real damping,
                      Real period, Hold hold) {
    const SecondOrderPeriod x =
        over_period(static_cast<Real>(section.corner_rad_s) * period, damping);
    const Real alpha1 = -(x.growth[0][0] + x.growth[1][1]);
    const Real alpha2 = x.growth[0][0] * x.growth[1][1] - x.growth[0][1] * x.growth[1][0];
    // C (dI - E)^-1 (step + ramp d) with adj(dI - E) = (d - trace E) I + E, by powers of d. The
    // constant term is the gain at rest times alpha2.
    const auto& e = x.growth;
    std::array<Real, 3> numerator{direct, direct * alpha1, (direct + low) * alpha2};
    if (hold == Hold::step) {
        numerator[1] += low * x.step[0] + high * x.step[1];
    } else {
        const Real tau = static_cast<Real>(section.corner_rad_s) * period;
        const Pair ramp{x.ramp[0] / tau, x.ramp[1] / tau};
        numerator[0] += low * ramp[0] + high * ramp[1];
        numerator[1] += low * (x.step[0] + e[0][1] * ramp[1] - e[1][1] * ramp[0]) +
                        high * (x.step[1] + e[1][0] * ramp[0] - e[0][0] * ramp[1]);
    }
    const QuadraticRoots zeros = quadratic_roots(numerator);
    return {zeros.roots, quadratic_roots({1.0L, alpha1, alpha2}).roots, zeros.leading};
}

RootForm hold_equivalent(const Section& section, Real period, Hold hold) {
    const bool ramp = hold == Hold::ramp;
    const Real corner = section.corner_rad_s * period;
    switch (section.kind) {
    case SectionKind::integrator:
        if (ramp)
            return {{-2.0}, {0.0}, static_cast<double>(period / 2.0L)};
        return {{}, {0.0}, static_cast<double>(period)};
    case SectionKind::pi: {
        const Real leading = ramp ? 1.0L + corner / 2.0L : 1.0L;
        return {{static_cast<double>(-corner / leading)}, {0.0}, static_cast<double>(leading)};
    }
    case SectionKind::lead:
    case SectionKind::lag:
        return first_order(static_cast<Real>(section.pole_rad_s) / section.zero_rad_s, 1.0L,
                           section.pole_rad_s, period, hold);
    case SectionKind::real_pole:
        return first_order(0.0L, 1.0L, section.pole_rad_s, period, hold);
    case SectionKind::washout:
        return first_order(1.0L, 0.0L, section.corner_rad_s, period, hold);
    case SectionKind::complex_poles:
        return second_order(0.0L, 1.0L, 0.0L, section, section.damping, period, hold);
    case SectionKind::notch:
        return second_order(1.0L, 0.0L,
                            2.0L * (static_cast<Real>(section.zero_damping) - section.pole_damping),
                            section, section.pole_damping, period, hold);
    case SectionKind::gain:
    case SectionKind::real_zero:
    case SectionKind::complex_zeros:
        break;
    }
    return roots_of(section); // a plain gain; the improper kinds never come here
}

} // namespace

RootForm step_equivalent(const Section& section, double sample_period_s) {
    return hold_equivalent(section, sample_period_s, Hold::step);
}

RootForm ramp_equivalent(const Section& section, double sample_period_s) {
    return hold_equivalent(section, sample_period_s, Hold::ramp);
}

} // namespace cornerwright
