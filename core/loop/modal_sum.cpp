#include "core/loop/modal_sum.h"

#include "core/loop/common_roots.h"
#include "core/numerics/double_double.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

// Poles closer than this part of their decay are taken together: over the 40 time constants for
// which they count, the differences between their exponentials stay a short power series.
constexpr double crowd_reach = 0.05;
constexpr double time_constants = 40.0; // exp(-40) is below double precision
constexpr double series_end = 1e-14;

Complex residue(const RootForm& form, std::size_t at) {
    const Complex s = form.poles[at];
    Complex value = form.gain;
    std::size_t zero = 0;
    for (std::size_t i = 0; i < form.poles.size(); ++i) {
        if (i == at)
            continue;
        value = times(value, inverse(s - form.poles[i]));
        if (zero < form.zeros.size())
            value = times(value, s - form.zeros[zero++]);
    }
    for (; zero < form.zeros.size(); ++zero)
        value = times(value, s - form.zeros[zero]);
    return value;
}

/// Residue at centre + offset of one of a crowd; `outside` are the poles that do not belong to it.
WideComplex wide_residue(const RootForm& form, const ComplexVector& outside, Complex centre,
                         const std::vector<WideComplex>& offsets, std::size_t at) {
    const WideComplex s = WideComplex(centre) + offsets[at];
    WideComplex value(form.gain);
    std::size_t zero = 0;
    for (const Complex& pole : outside) {
        value = value / (s - WideComplex(pole));
        if (zero < form.zeros.size())
            value = value * (s - WideComplex(form.zeros[zero++]));
    }
    for (; zero < form.zeros.size(); ++zero)
        value = value * (s - WideComplex(form.zeros[zero]));
    for (std::size_t i = 0; i < offsets.size(); ++i)
        if (i != at)
            value = value / (offsets[at] - offsets[i]);
    return value;
}

/// Offsets of the crowd from its centre. Poles that coincide are put on a small circle: the product
/// of m factors changes by the m-th power of its radius alone, the residues grow as its power
/// 1 - m; the radius balances the two at 32 digits.
std::vector<WideComplex> offsets_of(const ComplexVector& members, Complex centre, double scale) {
    const std::size_t count = members.size();
    constexpr double coincident = 3e-8; // of the scale: its square is below double precision
    constexpr double nudge = 1e-7;      // parts pairs within a wider crowd
    constexpr double precision = 1e-32;
    double spread = 0.0;
    double closest = HUGE_VAL;
    for (std::size_t i = 0; i < count; ++i) {
        spread = std::max(spread, std::abs(members[i] - centre));
        for (std::size_t j = 0; j < i; ++j)
            closest = std::min(closest, std::abs(members[i] - members[j]));
    }
    const bool one_place = spread <= coincident * scale;
    double radius = 0.0;
    if (one_place)
        radius = scale * std::pow(precision, 1.0 / (2.0 * static_cast<double>(count) - 1.0));
    else if (closest <= coincident * scale)
        radius = nudge * scale;
    std::vector<WideComplex> offsets;
    for (std::size_t i = 0; i < count; ++i) {
        const Complex on_circle =
            std::polar(radius, std::numbers::pi * (2.0 * static_cast<double>(i) + 1.0) /
                                   static_cast<double>(count));
        const WideComplex own =
            one_place ? WideComplex() : WideComplex(members[i]) - WideComplex(centre);
        offsets.push_back(own + WideComplex(on_circle));
    }
    return offsets;
}

Mode crowd_mode(const RootForm& form, const ComplexVector& members, const ComplexVector& outside,
                double scale) {
    Complex sum = 0.0;
    for (const Complex& member : members)
        sum += member;
    Mode mode;
    mode.rate = sum / static_cast<double>(members.size());
    if (std::abs(mode.rate.imag()) < 1e-12 * std::abs(mode.rate))
        mode.rate.imag(0.0);
    const std::vector<WideComplex> offsets = offsets_of(members, mode.rate, scale);
    std::vector<WideComplex> weights;
    double reach = 0.0;
    for (std::size_t i = 0; i < offsets.size(); ++i) {
        weights.push_back(wide_residue(form, outside, mode.rate, offsets, i));
        reach = std::max(reach, offsets[i].size());
    }
    // exp(offset t) expanded: coefficient of t^k is sum of weight offset^k / k!.
    const double span = reach * time_constants / std::max(std::abs(mode.rate.real()), reach);
    double remaining = 1.0;
    for (std::size_t k = 0; k < members.size() || remaining > series_end; ++k) {
        WideComplex coefficient;
        for (std::size_t i = 0; i < offsets.size(); ++i) {
            coefficient = coefficient + weights[i];
            weights[i] = weights[i] * offsets[i] / WideComplex(static_cast<double>(k + 1));
        }
        mode.coefficients.push_back(coefficient.rounded());
        if (k + 1 >= members.size())
            remaining *= span / static_cast<double>(k + 2 - members.size());
    }
    return mode;
}

double smallest_size(const ComplexVector& poles) {
    double smallest = HUGE_VAL;
    for (const Complex& pole : poles)
        if (pole != 0.0)
            smallest = std::min(smallest, std::abs(pole));
    return std::isfinite(smallest) ? smallest : 1.0;
}

/// coefficients[0] + coefficients[1] t + ... and its first two derivatives.
struct Series {
    Complex value, slope, curvature;
};

Series expand(const ComplexVector& coefficients, double t) {
    Series result;
    for (std::size_t k = coefficients.size(); k-- > 0;) {
        result.curvature = result.curvature * t + 2.0 * result.slope;
        result.slope = result.slope * t + result.value;
        result.value = result.value * t + coefficients[k];
    }
    return result;
}

Complex turning(Complex rate, double t) {
    const double size = std::exp(rate.real() * t);
    return rate.imag() == 0.0 ? Complex(size) : std::polar(size, rate.imag() * t);
}

} // namespace

ModalSum modal_sum(const RootForm& given) {
    RootForm form = given;
    take_common_roots(form);
    ModalSum sum;
    std::vector<bool> taken(form.poles.size(), false);
    for (std::size_t i = 0; i < form.poles.size(); ++i) {
        const Complex pole = form.poles[i];
        if (taken[i] || pole.imag() < 0.0)
            continue;
        const double size = std::abs(pole);
        const double scale = size > 0.0 ? size : smallest_size(form.poles);
        const double reach = std::max(crowd_reach * std::abs(pole.real()), 1e-9 * scale);
        ComplexVector members;
        ComplexVector outside;
        for (std::size_t j = 0; j < form.poles.size(); ++j) {
            // What crowds about the real axis is taken with its mirror images.
            const bool near = !taken[j] && std::abs(form.poles[j] - pole) <= 2.0 * reach &&
                              (std::abs(pole.imag()) <= reach || form.poles[j].imag() > 0.0);
            if (near)
                taken[j] = true;
            (near ? members : outside).push_back(form.poles[j]);
        }
        Mode mode;
        if (members.size() == 1)
            mode = {pole, {residue(form, i)}};
        else
            mode = crowd_mode(form, members, outside, scale);
        if (mode.rate.imag() != 0.0)
            for (Complex& coefficient : mode.coefficients)
                coefficient *= 2.0;
        if (std::any_of(mode.coefficients.begin(), mode.coefficients.end(),
                        [](Complex c) { return c != 0.0; }))
            sum.modes.push_back(std::move(mode));
    }
    return sum;
}

double ModalSum::value(double t) const {
    double sum = 0.0;
    for (const Mode& mode : modes) {
        const Complex series = mode.coefficients.size() == 1 ? mode.coefficients[0]
                                                             : expand(mode.coefficients, t).value;
        sum += times(series, turning(mode.rate, t)).real();
    }
    return sum;
}

double ModalSum::slope(double t) const {
    double sum = 0.0;
    for (const Mode& mode : modes) {
        const Series series = expand(mode.coefficients, t);
        sum += times(mode.rate * series.value + series.slope, turning(mode.rate, t)).real();
    }
    return sum;
}

double ModalSum::curvature(double t) const {
    double sum = 0.0;
    for (const Mode& mode : modes) {
        const Series series = expand(mode.coefficients, t);
        const Complex inner = mode.rate * mode.rate * series.value +
                              2.0 * mode.rate * series.slope + series.curvature;
        sum += times(inner, turning(mode.rate, t)).real();
    }
    return sum;
}

double ModalSum::deviation_from_line(double begin, double end) const {
    const double length = end - begin;
    double sum = 0.0;
    for (const Mode& mode : modes) {
        if (mode.rate == 0.0 && mode.coefficients.size() == 1)
            continue;
        const double decay = std::exp(mode.rate.real() * (mode.rate.real() <= 0.0 ? begin : end));
        const double rate = std::abs(mode.rate);
        double size = 0.0;
        double bend = 0.0;
        double power = 1.0; // end^k
        double power_1 = 0.0, power_2 = 0.0;
        for (std::size_t k = 0; k < mode.coefficients.size(); ++k) {
            const double order = static_cast<double>(k);
            const double c = std::abs(mode.coefficients[k]);
            size += c * power;
            bend += c * (rate * rate * power + 2.0 * order * rate * power_1 +
                         order * (order - 1.0) * power_2);
            power_2 = power_1;
            power_1 = power;
            power *= end;
        }
        sum += decay * std::min(2.0 * size, bend * length * length / 8.0);
    }
    return sum;
}

double ModalSum::envelope(double t) const {
    double sum = 0.0;
    for (const Mode& mode : modes) {
        const double decay = mode.rate.real();
        if (mode.rate == 0.0 && mode.coefficients.size() == 1)
            continue;
        if (decay >= 0.0)
            return HUGE_VAL;
        double power = 1.0;
        for (std::size_t k = 0; k < mode.coefficients.size(); ++k) {
            // t^k exp(decay t) is largest at k/|decay| and falls from there.
            const double at = std::max(t, static_cast<double>(k) / -decay);
            power = std::pow(at, static_cast<double>(k));
            sum += std::abs(mode.coefficients[k]) * power * std::exp(decay * at);
        }
    }
    return sum;
}

double ModalSum::constant() const {
    double sum = 0.0;
    for (const Mode& mode : modes)
        if (mode.rate == 0.0)
            sum += mode.coefficients[0].real();
    return sum;
}

} // namespace cornerwright
