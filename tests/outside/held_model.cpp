#include "tests/outside/held_model.h"

#include <algorithm>
#include <cmath>

namespace cornerwright::outside {
namespace {

/// exp(m) - I of a square matrix by a Taylor series of m/2^k and repeated (I + f)^2 - I.
WideVector exponential_minus_identity(WideVector m, std::size_t size) {
    const auto product = [size](const WideVector& a, const WideVector& b) {
        WideVector c(size * size);
        for (std::size_t i = 0; i < size; ++i)
            for (std::size_t k = 0; k < size; ++k)
                for (std::size_t j = 0; j < size; ++j)
                    c[i * size + j] += a[i * size + k] * b[k * size + j];
        return c;
    };
    Wide largest = 0.0L;
    for (const WideComplex& entry : m)
        largest = std::max(largest, std::abs(entry));
    // Rows hold up to `size` entries: this keeps the norm below 1/4, where 20 terms reach 1e-27.
    const int halvings = std::max(0, std::ilogb(largest * static_cast<Wide>(size) + 1e-300L) + 3);
    for (WideComplex& entry : m)
        entry = entry * std::ldexp(1.0L, -halvings);
    constexpr int terms = 20;
    WideVector sum = m;
    WideVector power = m;
    for (int term = 2; term <= terms; ++term) {
        power = product(power, m);
        for (std::size_t i = 0; i < power.size(); ++i) {
            power[i] /= static_cast<Wide>(term);
            sum[i] += power[i];
        }
    }
    for (int i = 0; i < halvings; ++i) {
        const WideVector square = product(sum, sum);
        for (std::size_t k = 0; k < sum.size(); ++k)
            sum[k] = 2.0L * sum[k] + square[k];
    }
    return sum;
}

} // namespace

HeldModel::HeldModel(const RootForm& form, double period_s, double delay_s)
    : order_(form.poles.size()),
      period_(period_s),
      matrix_(order_ * order_),
      input_(order_),
      output_(order_) {
    make_chain(form);
    // A delay of a whole number of periods is one, though its double may miss it by a little.
    constexpr Wide same = 1e-9L;
    const Wide delay = delay_s;
    const Wide whole_samples = std::floor(delay / period_ + same);
    const Wide rest = std::max(0.0L, delay - whole_samples * period_);
    whole_samples_ = static_cast<int>(whole_samples);
    splits_period_ = rest > same * period_;
    whole_ = passage(period_);
    const Passage after = passage(period_ - rest);
    early_ = after.held;
    late_ = advanced(after, passage(rest).held);
}

void HeldModel::make_chain(const RootForm& form) {
    // What the block so far passes on: a multiple of the input and of each state.
    WideComplex from_input = form.gain;
    WideVector from_states(order_);
    ComplexVector zeros = form.zeros;
    for (std::size_t i = 0; i < order_; ++i) {
        const WideComplex pole(form.poles[i]);
        for (std::size_t k = 0; k < i; ++k)
            matrix_[i * order_ + k] = from_states[k];
        matrix_[i * order_ + i] = pole;
        input_[i] = from_input;
        if (zeros.empty()) {
            std::fill(from_states.begin(), from_states.end(), 0.0L);
            from_states[i] = 1.0L;
            from_input = 0.0L;
            continue;
        }
        // The zero nearest to the pole, so that the block does least.
        const auto nearest =
            std::min_element(zeros.begin(), zeros.end(), [&](Complex a, Complex b) {
                return std::abs(a - form.poles[i]) < std::abs(b - form.poles[i]);
            });
        from_states[i] = pole - WideComplex(*nearest);
        zeros.erase(nearest);
    }
    output_ = from_states;
    direct_ = from_input;
}

HeldModel::Passage HeldModel::passage(Wide duration) const {
    const std::size_t size = order_ + 2;
    WideVector m(size * size);
    for (std::size_t i = 0; i < order_; ++i) {
        for (std::size_t k = 0; k < order_; ++k)
            m[i * size + k] = matrix_[i * order_ + k] * duration;
        m[i * size + order_] = input_[i] * duration;
    }
    m[order_ * size + order_ + 1] = duration / period_;
    const WideVector all = exponential_minus_identity(std::move(m), size);
    Passage result{WideVector(order_ * order_), WideVector(order_), WideVector(order_)};
    for (std::size_t i = 0; i < order_; ++i) {
        for (std::size_t k = 0; k < order_; ++k)
            result.change[i * order_ + k] = all[i * size + k];
        result.held[i] = all[i * size + order_];
        result.ramp[i] = all[i * size + order_ + 1];
    }
    return result;
}

WideVector HeldModel::advanced(const Passage& by, WideVector states) const {
    WideVector result = states;
    for (std::size_t i = 0; i < order_; ++i)
        for (std::size_t k = 0; k <= i; ++k)
            result[i] += by.change[i * order_ + k] * states[k];
    return result;
}

WideComplex HeldModel::output_of(WideComplex d, WideVector input) const {
    WideComplex output = 0.0L;
    for (std::size_t i = 0; i < order_; ++i) {
        for (std::size_t k = 0; k < i; ++k)
            input[i] += whole_.change[i * order_ + k] * input[k];
        input[i] /= d - whole_.change[i * order_ + i];
        output += output_[i] * input[i];
    }
    return output;
}

WideComplex HeldModel::step_equivalent(WideComplex d) const {
    const WideComplex z = 1.0L + d;
    WideVector input = early_;
    if (splits_period_)
        for (std::size_t i = 0; i < order_; ++i)
            input[i] += late_[i] / z;
    const WideComplex value =
        output_of(d, std::move(input)) + (splits_period_ ? direct_ / z : direct_);
    return value * std::pow(z, -whole_samples_);
}

WideComplex HeldModel::denominator(WideComplex d) const {
    WideComplex value = std::pow(1.0L + d, whole_samples_ + (splits_period_ ? 1 : 0));
    for (std::size_t i = 0; i < order_; ++i)
        value *= d - whole_.change[i * order_ + i];
    return value;
}

WideComplex HeldModel::ramp_equivalent(WideComplex d) const {
    WideVector input = whole_.held;
    for (std::size_t i = 0; i < order_; ++i)
        input[i] += d * whole_.ramp[i];
    return output_of(d, std::move(input)) + direct_;
}

} // namespace cornerwright::outside
