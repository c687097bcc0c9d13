#include "core/loop/frequency_axis.h"

#include <cmath>
#include <cstdlib>
#include <numbers>

namespace cornerwright {

double FrequencyAxis::end_rad_s() const {
    return sampled() ? 0.5 * std::numbers::pi / half_period_ : HUGE_VAL;
}

double FrequencyAxis::place(double w_rad_s) const {
    // At pi/Ts itself the place is infinite; this far out its angle is off by 1e-9 of a turn at
    // most and products of factors stay within the range of a double.
    constexpr double farthest = 1e10;
    if (!sampled())
        return w_rad_s;
    const double place = std::tan(w_rad_s * half_period_);
    return place >= 0.0 && place < farthest ? place : farthest;
}

double FrequencyAxis::w_rad_s(double place) const {
    return sampled() ? std::atan(place) / half_period_ : place;
}

double FrequencyAxis::rate(double place) const {
    return sampled() ? half_period_ * (1.0 + place * place) : 1.0;
}

GridGuide FrequencyAxis::guide(Complex root) const {
    // A well-damped pair acts around its modulus, a light one at its imaginary part.
    const bool light = std::abs(root.real()) < std::abs(root.imag());
    const double place = light ? std::abs(root.imag()) : std::abs(root);
    return {w_rad_s(place), std::abs(root.real()) / rate(place)};
}

void FrequencyAxis::evaluate(const RationalResponse& response, const std::vector<double>& w_rad_s,
                             std::vector<ResponseSample>& samples) const {
    samples.resize(w_rad_s.size());
    if (!sampled()) {
        response.evaluate(w_rad_s, samples);
        return;
    }
    std::vector<double> places;
    places.reserve(w_rad_s.size());
    for (const double w : w_rad_s)
        places.push_back(place(w));
    response.evaluate(places, samples);
    for (std::size_t i = 0; i < places.size(); ++i)
        samples[i].slope *= rate(places[i]);
}

ResponseSample FrequencyAxis::at(const RationalResponse& response, double w_rad_s) const {
    const double p = place(w_rad_s);
    ResponseSample sample = response.at(p);
    sample.slope *= rate(p);
    return sample;
}

RootForm on_bilinear_axis(const RootForm& delta_form) {
    RootForm result;
    double gain = delta_form.gain;
    const auto move = [&](const ComplexVector& roots, ComplexVector& moved, bool is_pole) {
        for (const Complex& root : roots) {
            const Complex from_minus_1 = root + 2.0;
            double factor = 2.0; // at z = -1 the factor becomes a constant
            if (from_minus_1 != 0.0) {
                moved.push_back(root / from_minus_1);
                factor = root.imag() == 0.0  ? from_minus_1.real()
                         : root.imag() > 0.0 ? std::norm(from_minus_1)
                                             : 1.0;
            }
            gain = is_pole ? gain / factor : gain * factor;
        }
    };
    move(delta_form.zeros, result.zeros, false);
    move(delta_form.poles, result.poles, true);
    // Every factor brought a 1/(1 - s'): the surplus of poles leaves zeros at s' = 1 (z =
    // infinity).
    const int surplus =
        static_cast<int>(delta_form.poles.size()) - static_cast<int>(delta_form.zeros.size());
    ComplexVector& at_infinity = surplus > 0 ? result.zeros : result.poles;
    at_infinity.insert(at_infinity.end(), static_cast<std::size_t>(std::abs(surplus)), 1.0);
    result.gain = surplus % 2 == 0 ? gain : -gain;
    return result;
}

} // namespace cornerwright
