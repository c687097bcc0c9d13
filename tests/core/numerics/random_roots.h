#pragma once

#include "core/numerics/complex.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <random>

namespace cornerwright::test {

/// Seeded loops of the kinds that occur: real and lightly damped roots over some decades.
class RandomRoots {
  public:
    explicit RandomRoots(unsigned seed) : generator_(seed) {}

    double uniform(double low, double high) {
        return std::uniform_real_distribution<double>(low, high)(generator_);
    }
    int integer(int low, int high) {
        return std::uniform_int_distribution<int>(low, high)(generator_);
    }
    double log_uniform(double low, double high) {
        return std::exp(uniform(std::log(low), std::log(high)));
    }

    /// `count` roots in conjugate pairs, moduli within 10^(-decades/2) ... 10^(decades/2).
    ComplexVector roots(int count, double decades) {
        ComplexVector result;
        while (static_cast<int>(result.size()) < count) {
            const double w = std::pow(10.0, decades * uniform(-0.5, 0.5));
            if (count - static_cast<int>(result.size()) >= 2 && uniform(0, 1) < 0.5) {
                const double damping = log_uniform(1e-3, 1.0);
                result.emplace_back(-damping * w, w * std::sqrt(1.0 - damping * damping));
                result.push_back(std::conj(result.back()));
            } else {
                const double kind = uniform(0, 1);
                result.emplace_back(kind < 0.15 ? 0.0 : kind < 0.25 ? w : -w);
            }
        }
        return result;
    }

  private:
    std::mt19937_64 generator_;
};

/// The largest relative distance after pairing each expected root with the nearest one found.
inline double worst_mismatch(ComplexVector found, const ComplexVector& expected) {
    if (found.size() != expected.size())
        return std::numeric_limits<double>::infinity();
    double worst = 0.0;
    for (const Complex& root : expected) {
        const auto nearest =
            std::min_element(found.begin(), found.end(), [&](Complex left, Complex right) {
                return std::norm(left - root) < std::norm(right - root);
            });
        worst = std::max(worst, std::abs(*nearest - root) / std::max(std::abs(root), 1e-300));
        found.erase(nearest);
    }
    return worst;
}

inline bool is_conjugate_symmetric(const ComplexVector& roots) {
    return std::all_of(roots.begin(), roots.end(), [&](Complex root) {
        return std::count(roots.begin(), roots.end(), root) ==
               std::count(roots.begin(), roots.end(), std::conj(root));
    });
}

} // namespace cornerwright::test
