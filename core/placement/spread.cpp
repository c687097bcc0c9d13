#include "core/placement/spread.h"

#include "core/numerics/error.h"
#include "core/placement/free_parameters.h"

#include <algorithm>
#include <cmath>
#include <random>

namespace cornerwright {
namespace {

void check_percent(double percent) {
    if (!(percent >= 0.0 && percent < 100.0))
        throw InputError({}, "a spread from 0 % to below 100 %", "another");
}

/// Factors about 1. The distributions of the standard library differ from machine to machine; its
/// generators do not.
class Draws {
  public:
    Draws(SpreadShape shape, std::uint64_t seed, std::uint64_t number) : shape_(shape) {
        std::seed_seq words{seed & 0xffffffffU, seed >> 32U, number & 0xffffffffU, number >> 32U};
        random_.seed(words);
    }

    double factor(double percent) {
        if (percent == 0.0)
            return 1.0;
        const double part = shape_ == SpreadShape::uniform ? 2.0 * even() - 1.0 : bell() / 3.0;
        return 1.0 + 0.01 * percent * part;
    }

  private:
    /// In (0, 1), 53 bits.
    double even() {
        constexpr double unit = 0x1p-53;
        return (static_cast<double>(random_() >> 11U) + 0.5) * unit;
    }

    /// Within three standard deviations. Polar method: G. Marsaglia, T. A. Bray, A convenient
    /// method for generating normal variables, SIAM Review 6 (1964); citation from memory.
    double bell() {
        for (;;) {
            const double x = 2.0 * even() - 1.0;
            const double y = 2.0 * even() - 1.0;
            const double size = x * x + y * y;
            if (size >= 1.0)
                continue;
            const double drawn = x * std::sqrt(-2.0 * std::log(size) / size);
            if (std::abs(drawn) < 3.0)
                return drawn;
        }
    }

    SpreadShape shape_;
    std::mt19937_64 random_;
};

/// A root moved in size and, of a pair, in damping; the largest damping short of real roots.
Complex moved(Complex root, double size, double damping) {
    if (root.imag() == 0.0)
        return root * size;
    constexpr double most = 0.9999;
    const double w = std::abs(root) * size;
    const double cosine = std::clamp(-root.real() / std::abs(root) * damping, -most, most);
    return {-cosine * w, std::copysign(std::sqrt(1.0 - cosine * cosine) * w, root.imag())};
}

/// Moves roots in place; returns the product of the changes of size of those that are not at 0.
double move_roots(ComplexVector& roots, const Spreads& spreads, Draws& draws) {
    double product = 1.0;
    for (std::size_t i = 0; i < roots.size(); ++i) {
        const Complex root = roots[i];
        if (root == Complex(0.0) || root.imag() < 0.0)
            continue;
        const double size = draws.factor(spreads.plant_corner_percent);
        const double damping =
            root.imag() == 0.0 ? 1.0 : draws.factor(spreads.plant_damping_percent);
        roots[i] = moved(root, size, damping);
        product *= size;
        if (root.imag() == 0.0)
            continue;
        const auto twin = std::find(roots.begin(), roots.end(), std::conj(root));
        if (twin != roots.end()) {
            *twin = std::conj(roots[i]);
            product *= size;
        }
    }
    return product;
}

PlantModel drawn_model(PlantModel model, const Spreads& spreads, Draws& draws) {
    model.roots.gain *= draws.factor(spreads.plant_gain_percent);
    const double poles = move_roots(model.roots.poles, spreads, draws);
    const double zeros = move_roots(model.roots.zeros, spreads, draws);
    model.roots.gain *= poles / zeros;
    model.dead_time_s *= draws.factor(spreads.dead_time_percent);
    return model;
}

/// Every root at `stretch` times its size, at constant gain at low frequencies.
void stretch_roots(ComplexVector& roots, double stretch, double& gain, double power) {
    for (Complex& root : roots) {
        if (root != Complex(0.0)) {
            root *= stretch;
            gain *= std::pow(stretch, power);
        }
    }
}

MeasuredPlant drawn_measurement(MeasuredPlant plant, const Spreads& spreads, Draws& draws) {
    const double gain = draws.factor(spreads.plant_gain_percent);
    const double stretch = draws.factor(spreads.plant_corner_percent);
    const double dead_time = draws.factor(spreads.dead_time_percent);
    double more_delay_s = 0.0;
    if (plant.fit) {
        PlantModel& model = plant.fit->model;
        more_delay_s = model.dead_time_s * (dead_time - 1.0);
        model.dead_time_s *= dead_time;
        model.roots.gain *= gain;
        stretch_roots(model.roots.poles, stretch, model.roots.gain, 1.0);
        stretch_roots(model.roots.zeros, stretch, model.roots.gain, -1.0);
    }
    auto response = std::make_shared<MeasuredResponse>(*plant.response);
    // An integrator's asymptote K/s^n keeps its K: stretching the axis alone would raise it.
    const double level = gain * std::pow(stretch, -plant.integrators);
    for (std::size_t i = 0; i < response->w_rad_s.size(); ++i) {
        response->w_rad_s[i] *= stretch;
        response->response[i] *= std::polar(level, -response->w_rad_s[i] * more_delay_s);
    }
    plant.response = std::move(response);
    return plant;
}

bool keeps_its_order(const Section& section) {
    try {
        check(section);
        return true;
    } catch (const InputError&) {
        return false;
    }
}

Section drawn_section(const Section& section, double percent, Draws& draws) {
    constexpr int tries = 100; // beyond, the spread is wider than the section can bear
    for (int i = 0; i < tries; ++i) {
        Section result = section;
        for (const SectionParameter& parameter : parameters_of(section.kind))
            result.*parameter.value *= draws.factor(percent);
        if (keeps_its_order(result))
            return result;
    }
    return section;
}

/// 1/F.
RootForm inverse(const RootForm& form) {
    return {form.poles, form.zeros, 1.0 / form.gain};
}

/// Sampled over nominal section. Roots that did not move stand above and below and go; a section
/// with roots on the axis is left out, since a mode hidden there would count as not stable.
RootForm drift_of(const Section& nominal, const Section& sampled) {
    const RootForm before = roots_of(nominal);
    const bool has_root_on_axis =
        std::any_of(before.zeros.begin(), before.zeros.end(),
                    [](const Complex& zero) { return zero.real() == 0.0; }) &&
        nominal.kind != SectionKind::washout;
    if (nominal == sampled || has_root_on_axis)
        return {};
    RootForm drift = roots_of(sampled) * inverse(before);
    for (auto zero = drift.zeros.begin(); zero != drift.zeros.end();) {
        const auto same = std::find(drift.poles.begin(), drift.poles.end(), *zero);
        if (same == drift.poles.end()) {
            ++zero;
            continue;
        }
        drift.poles.erase(same);
        zero = drift.zeros.erase(zero);
    }
    return drift;
}

} // namespace

PlacementProblem drawn(const PlacementProblem& problem, const Spreads& spreads, std::uint64_t seed,
                       std::uint64_t number) {
    for (const double percent :
         {spreads.plant_gain_percent, spreads.plant_corner_percent, spreads.plant_damping_percent,
          spreads.dead_time_percent, spreads.component_percent})
        check_percent(percent);
    Draws draws(spreads.shape, seed, number);
    PlacementProblem result = problem;
    for (PlacementPlant& plant : result.plants) {
        if (auto* model = std::get_if<PlantModel>(&plant.plant))
            plant.plant = drawn_model(std::move(*model), spreads, draws);
        else
            plant.plant = drawn_measurement(std::get<MeasuredPlant>(plant.plant), spreads, draws);
    }
    for (Section& section : result.compensator) {
        if (section.enabled)
            section = drawn_section(section, spreads.component_percent, draws);
    }
    return result;
}

LoopPlant plant_with_drift(const PlacementProblem& problem, const PlacementProblem& sampled,
                           std::size_t index) {
    RootForm drift;
    for (std::size_t i = 0; i < problem.compensator.size(); ++i) {
        if (problem.compensator[i].enabled)
            drift = drift * drift_of(problem.compensator[i], sampled.compensator[i]);
    }
    LoopPlant plant = sampled.plants[index].plant;
    if (auto* model = std::get_if<PlantModel>(&plant)) {
        model->roots = model->roots * drift;
        return plant;
    }
    auto& measured = std::get<MeasuredPlant>(plant);
    auto response = std::make_shared<MeasuredResponse>(*measured.response);
    for (std::size_t i = 0; i < response->w_rad_s.size(); ++i)
        response->response[i] *= evaluate(drift, Complex(0.0, response->w_rad_s[i]));
    measured.response = std::move(response);
    if (measured.fit)
        measured.fit->model.roots = measured.fit->model.roots * drift;
    return plant;
}

} // namespace cornerwright
