#include "core/numerics/error.h"
#include "core/realisation/precision.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>

namespace cornerwright {
namespace {

/// Largest relative distance of the poles from the exact ones, each exact pole taking the nearest
/// that is left. Poles at z = 1 are kept exactly by every format and are left out.
Figure largest_error(const ComplexVector& exact, ComplexVector rounded) {
    double largest = 0.0;
    for (const Complex& pole : exact) {
        const auto nearest = std::ranges::min_element(
            rounded, {}, [&pole](const Complex& other) { return std::abs(other - pole); });
        if (nearest == rounded.end())
            return Figure::undetermined("rounding removed a pole");
        if (pole != 0.0)
            largest = std::max(largest, std::abs(*nearest - pole) / std::abs(pole));
        rounded.erase(nearest);
    }
    return Figure::of(largest);
}

} // namespace

std::vector<PoleError> pole_errors(const Chain& chain, const Sampling& sampling,
                                   const Realisation& realisation) {
    // In double precision the delta form keeps every digit of d = z - 1.
    Realisation reference = realisation;
    reference.number_format = {};
    reference.structure = Structure::delta;
    const ComplexVector exact = roots_in_z_minus_1(discretise(chain, sampling, reference)).poles;

    std::vector<PoleError> errors;
    for (const Structure structure :
         {Structure::direct_form_1, Structure::direct_form_2_transposed, Structure::delta}) {
        Realisation choice = realisation;
        choice.structure = structure;
        try {
            errors.push_back(
                {structure,
                 largest_error(exact,
                               roots_in_z_minus_1(discretise(chain, sampling, choice)).poles)});
        } catch (const InputError& refused) {
            errors.push_back({structure, Figure::undetermined(refused.what())});
        }
    }
    return errors;
}

std::optional<PoleError> best_structure(const std::vector<PoleError>& errors) {
    std::optional<PoleError> best;
    for (const PoleError& error : errors)
        if (error.largest_relative_error.is_value() &&
            (!best || error.largest_relative_error.value() < best->largest_relative_error.value()))
            best = error;
    return best;
}

std::optional<int>
smallest_fraction_bits(const Chain& chain, const Sampling& sampling, const Realisation& realisation,
                       const std::function<bool(const DifferenceEquation&)>& meets) {
    Realisation choice = realisation;
    choice.number_format.type = NumberFormat::Type::fixed;
    for (int bits = 1; bits < choice.number_format.word_bits; ++bits) {
        choice.number_format.fraction_bits = bits;
        try {
            if (meets(discretise(chain, sampling, choice)))
                return bits;
        } catch (const InputError&) {
            continue; // this many bits cannot hold the coefficients
        }
    }
    return std::nullopt;
}

} // namespace cornerwright
