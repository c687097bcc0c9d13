#include "core/response/rational_response.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;
constexpr std::size_t block_size = 64; // a block's arrays stay in the first-level cache
/// A factor may reach w/corner = 1e18; eight of them squared stay below 1e308.
constexpr std::size_t most_roots_a_group = 8;

/// A running product: its value within a full turn, and how many whole turns it has gone beyond.
struct Turning {
    double re = 1.0;
    double im = 0.0;
    double turns = 0.0;
};

bool is_upper(const Turning& a) {
    return a.im >= 0.0;
}

/// a * b, angles added.
Turning times(const Turning& a, const Turning& b) {
    Turning c{a.re * b.re - a.im * b.im, a.re * b.im + a.im * b.re, a.turns + b.turns};
    if (is_upper(a) && is_upper(b) && c.im < 0.0)
        c.turns += 1.0;
    if (!is_upper(a) && !is_upper(b) && c.im >= 0.0)
        c.turns -= 1.0;
    return c;
}

/// a * conj(b), angles subtracted.
Turning times_conjugate(const Turning& a, const Turning& b) {
    Turning c{a.re * b.re + a.im * b.im, a.im * b.re - a.re * b.im, a.turns - b.turns};
    if (is_upper(a) && !is_upper(b) && c.im < 0.0)
        c.turns += 1.0;
    if (!is_upper(a) && is_upper(b) && c.im > 0.0)
        c.turns -= 1.0;
    return c;
}

double squared(const Turning& a) {
    return a.re * a.re + a.im * a.im;
}

double angle(const Turning& a) {
    return std::atan2(a.im + 0.0, a.re) + 2.0 * pi * a.turns; // + 0.0 makes -0 a plain 0
}

/// Multiplies by j^-order, exactly.
Complex turned(Complex value, int order) {
    switch (((order % 4) + 4) % 4) {
    case 1:
        return {value.imag(), -value.real()};
    case 2:
        return -value;
    case 3:
        return {-value.imag(), value.real()};
    default:
        return value;
    }
}

double integer_power(double base, int exponent) {
    double result = 1.0;
    for (int i = 0; i < std::abs(exponent); ++i)
        result *= base;
    return exponent < 0 ? 1.0 / result : result;
}

} // namespace

struct RationalResponse::Block {
    std::size_t size = 0;
    const double* w = nullptr;
    std::array<double, block_size> slope_re;
    std::array<double, block_size> slope_im;
};

RationalResponse::RationalResponse(const RootForm& form)
    : gain_at_zero_(form.gain), gain_at_infinity_(form.gain) {
    order_at_infinity_ = static_cast<int>(form.poles.size()) - static_cast<int>(form.zeros.size());
    for (const Complex& zero : form.zeros)
        take(zero, false);
    for (const Complex& pole : form.poles)
        take(pole, true);
    for (const AxisPair& pair : axis_pairs_)
        axis_rad_s_.push_back(pair.imag);
    std::sort(axis_rad_s_.begin(), axis_rad_s_.end());
    axis_rad_s_.erase(std::unique(axis_rad_s_.begin(), axis_rad_s_.end()), axis_rad_s_.end());
}

RationalResponse::Group& RationalResponse::group_with_room(Group Chunk::*group) {
    for (Chunk& chunk : chunks_)
        if ((chunk.*group).order() + 2 <= most_roots_a_group)
            return chunk.*group;
    chunks_.emplace_back();
    return chunks_.back().*group;
}

void RationalResponse::take(Complex root, bool is_pole) {
    if (root.imag() < 0.0)
        return; // its conjugate stands for the pair
    const double size = std::norm(root);
    if (size == 0.0) {
        order_at_zero_ += is_pole ? 1 : -1;
        return;
    }
    const bool is_pair = root.imag() > 0.0;
    const double factor_at_zero = is_pair ? size : -root.real();
    gain_at_zero_ = is_pole ? gain_at_zero_ / factor_at_zero : gain_at_zero_ * factor_at_zero;
    if (is_pair && root.real() == 0.0) {
        axis_pairs_.push_back({root.imag(), is_pole});
        return;
    }
    const bool is_right = root.real() > 0.0;
    Group& group = group_with_room(is_pole ? (is_right ? &Chunk::poles_right : &Chunk::poles_left)
                                           : (is_right ? &Chunk::zeros_right : &Chunk::zeros_left));
    if (is_pair)
        group.quadratics.push_back({root.real() * root.real(), root.imag(), 1.0 / size,
                                    2.0 * std::abs(root.real()) / size});
    else
        group.inverse_corners.push_back(1.0 / std::abs(root.real()));
}

/// The product of a group's factors at each point of the block, its turns, and what the factors
/// add to the slope. Every factor's angle lies in (0, 180) degrees.
void RationalResponse::run(const Group& group, double slope_sign, double angle_sign, Block& block,
                           double* __restrict re, double* __restrict im, double* __restrict turns) {
    const std::size_t n = block.size;
    const double* __restrict w = block.w;
    double* __restrict slope_re = block.slope_re.data();
    double* __restrict slope_im = block.slope_im.data();
    std::fill_n(re, n, 1.0);
    std::fill_n(im, n, 0.0);
    std::fill_n(turns, n, 0.0);
    for (const double inverse_corner : group.inverse_corners) {
        for (std::size_t i = 0; i < n; ++i) {
            const double y = w[i] * inverse_corner;
            const double scale = slope_sign * inverse_corner / (1.0 + y * y);
            slope_re[i] += scale * y;
            slope_im[i] += scale * angle_sign;
            const double new_re = re[i] - im[i] * y;
            const double new_im = re[i] * y + im[i];
            turns[i] += (im[i] >= 0.0 && new_im < 0.0) ? 1.0 : 0.0;
            re[i] = new_re;
            im[i] = new_im;
        }
    }
    for (const Quadratic& q : group.quadratics) {
        for (std::size_t i = 0; i < n; ++i) {
            const double x = (q.real_squared + (q.imag - w[i]) * (q.imag + w[i])) * q.inverse_b;
            const double y = w[i] * q.width;
            const double dx = -2.0 * w[i] * q.inverse_b;
            const double scale = slope_sign / (x * x + y * y);
            slope_re[i] += scale * (dx * x + q.width * y);
            slope_im[i] += scale * angle_sign * (q.width * x - dx * y);
            const double new_re = re[i] * x - im[i] * y;
            const double new_im = re[i] * y + im[i] * x;
            turns[i] += (im[i] >= 0.0 && new_im < 0.0) ? 1.0 : 0.0;
            re[i] = new_re;
            im[i] = new_im;
        }
    }
}

void RationalResponse::evaluate_block(std::span<const double> w_rad_s,
                                      std::span<ResponseSample> samples) const {
    Block block;
    block.size = w_rad_s.size();
    std::fill_n(block.slope_re.data(), block.size, 0.0);
    std::fill_n(block.slope_im.data(), block.size, 0.0);
    block.w = w_rad_s.data();
    const double start_angle = -0.5 * pi * order_at_zero_ - (gain_at_zero_ < 0.0 ? pi : 0.0);
    for (std::size_t i = 0; i < block.size; ++i) {
        const double w = w_rad_s[i];
        const double magnitude = gain_at_zero_ * integer_power(w, -order_at_zero_);
        samples[i] = {turned(magnitude, order_at_zero_), std::log(std::abs(magnitude)), start_angle,
                      Complex(-order_at_zero_ / w, 0.0)};
    }
    std::array<std::array<double, block_size>, 12> arrays;
    for (const Chunk& chunk : chunks_) {
        const bool has_right = !chunk.zeros_right.empty() || !chunk.poles_right.empty();
        run(chunk.zeros_left, 1.0, 1.0, block, arrays[0].data(), arrays[1].data(),
            arrays[2].data());
        run(chunk.poles_left, -1.0, 1.0, block, arrays[3].data(), arrays[4].data(),
            arrays[5].data());
        if (has_right) {
            run(chunk.zeros_right, 1.0, -1.0, block, arrays[6].data(), arrays[7].data(),
                arrays[8].data());
            run(chunk.poles_right, -1.0, -1.0, block, arrays[9].data(), arrays[10].data(),
                arrays[11].data());
        }
        for (std::size_t i = 0; i < block.size; ++i) {
            const Turning poles{arrays[3][i], arrays[4][i], arrays[5][i]};
            Turning product = times_conjugate({arrays[0][i], arrays[1][i], arrays[2][i]}, poles);
            double scale = 1.0 / squared(poles);
            if (has_right) {
                const Turning right{arrays[9][i], arrays[10][i], arrays[11][i]};
                product = times_conjugate(product, {arrays[6][i], arrays[7][i], arrays[8][i]});
                product.re *= scale;
                product.im *= scale;
                product = times(product, right);
                scale = 1.0 / squared(right);
            }
            product.re *= scale;
            product.im *= scale;
            ResponseSample& sample = samples[i];
            sample.log_magnitude += 0.5 * std::log(squared(product));
            sample.phase_rad += angle(product);
            const Complex value = sample.value;
            sample.value = {value.real() * product.re - value.imag() * product.im,
                            value.real() * product.im + value.imag() * product.re};
        }
    }
    for (std::size_t i = 0; i < block.size; ++i)
        samples[i].slope += Complex(block.slope_re[i], block.slope_im[i]);
    for (const AxisPair& pair : axis_pairs_) {
        const double sign = pair.is_pole ? -1.0 : 1.0;
        for (std::size_t i = 0; i < block.size; ++i) {
            const double w = w_rad_s[i];
            const double distance = (pair.imag - w) * (pair.imag + w);
            const double factor = distance / (pair.imag * pair.imag);
            samples[i].value *= pair.is_pole ? 1.0 / factor : factor;
            samples[i].log_magnitude += sign * std::log(std::abs(factor));
            samples[i].phase_rad += w > pair.imag ? sign * pi : 0.0;
            samples[i].slope -= sign * 2.0 * w / distance;
        }
    }
}

void RationalResponse::evaluate(std::span<const double> w_rad_s,
                                std::span<ResponseSample> samples) const {
    for (std::size_t first = 0; first < w_rad_s.size(); first += block_size) {
        const std::size_t size = std::min(block_size, w_rad_s.size() - first);
        evaluate_block(w_rad_s.subspan(first, size), samples.subspan(first, size));
    }
}

ResponseSample RationalResponse::at(double w_rad_s) const {
    ResponseSample sample;
    evaluate_block({&w_rad_s, 1}, {&sample, 1});
    return sample;
}

} // namespace cornerwright
