#include "core/loop/closed_loop_poles.h"

#include "core/loop/loop_model.h"
#include "core/loop/sampled_plant.h"
#include "core/numerics/delayed_sum.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double half_ulp = 0x1p-53;

void sort_with_errors(ClosedLoopPoles& result) {
    std::vector<std::size_t> order(result.poles.size());
    for (std::size_t i = 0; i < order.size(); ++i)
        order[i] = i;
    std::stable_sort(order.begin(), order.end(), [&](std::size_t left, std::size_t right) {
        const Complex a = result.poles[left];
        const Complex b = result.poles[right];
        return a.real() != b.real() ? a.real() < b.real() : a.imag() < b.imag();
    });
    const ClosedLoopPoles before = result;
    for (std::size_t i = 0; i < order.size(); ++i) {
        result.poles[i] = before.poles[order[i]];
        result.relative_error[i] = before.relative_error[order[i]];
    }
}

double relative_error(double uncertainty, Complex pole) {
    // The root itself is rounded to a double.
    return pole == Complex(0.0) ? 0.0 : uncertainty / std::abs(pole) + half_ulp;
}

void append_note(std::string& note, const std::string& more) {
    note += note.empty() ? more : "; " + more;
}

/// All rightmost roots that a step response shows within some dead times of the last decisive one.
ClosedLoopPoles rightmost_poles(const LoopModel& model) {
    const DelayedSum function{
        FactoredSum({model.roots.poles}, {model.roots.zeros}, model.roots.gain), model.delay_s};
    // Modes left of -3/delay lose 95 % within a single dead time.
    constexpr double decay = 3.0;
    // Of the chain of a loop that does not roll off; its links stand near whole and half numbers.
    constexpr double most_links = 40.25;
    const SymmetricRectangle rectangle =
        rightmost_rectangle(function, decay, 2.0 * std::numbers::pi * most_links / model.delay_s);
    RootsInside inside = roots_inside(function, rectangle);

    ClosedLoopPoles result;
    result.complete = false;
    constexpr int digits = 3;
    result.note = model.note;
    append_note(result.note, "dead time: the poles right of " +
                                 number_text(rectangle.real_low, digits) +
                                 " rad/s of infinitely many");
    if (!inside.confirmed)
        append_note(result.note, "their number could not be confirmed");
    for (const Complex& root : inside.roots) {
        result.poles.push_back(root);
        result.relative_error.push_back(relative_error(function.coarse(root).data, root));
    }
    for (const Complex& root : function.sum.common_roots()) {
        result.poles.push_back(root);
        result.relative_error.push_back(0.0);
    }
    return result;
}

} // namespace

ClosedLoopPoles closed_loop_poles(const DesignLoop& loop, const ComplexVector& warm_start) {
    const std::optional<LoopModel> model = loop_model(loop);
    if (!model)
        return {{}, {}, true, no_model_note};
    ClosedLoopPoles result;
    if (model->delay_s > 0.0) {
        result = rightmost_poles(*model);
    } else {
        const FactoredSum sum({model->roots.poles}, {model->roots.zeros}, model->roots.gain);
        const SolvedRoots solved = roots_of_sum(sum, warm_start);
        result.poles = solved.roots;
        for (std::size_t i = 0; i < solved.roots.size(); ++i)
            result.relative_error.push_back(relative_error(solved.uncertainty[i], solved.roots[i]));
        result.note = model->note;
    }
    sort_with_errors(result);
    return result;
}

ClosedLoopPoles closed_loop_poles(const RealisedLoop& loop, const ComplexVector& warm_start) {
    if (!std::holds_alternative<PlantModel>(loop.plant))
        return {{}, {}, true, "a measured plant has no poles in z"};
    const std::shared_ptr<const SampledPlants> plants = sampled_plants_of(loop);
    const SampledPlant& sampled = plants->delayed;
    const RootForm open = roots_in_z_minus_1(loop.compensator) * sampled.delta_form;
    // z^whole_samples = (d + 1)^whole_samples with d = z - 1.
    const FactoredSum sum({open.poles, -1.0, sampled.whole_samples}, {open.zeros}, open.gain);
    ComplexVector warm = warm_start;
    for (Complex& z : warm)
        z -= 1.0;
    const SolvedRoots solved = roots_of_sum(sum, warm);
    ClosedLoopPoles result;
    for (std::size_t i = 0; i < solved.roots.size(); ++i) {
        const Complex z = 1.0 + solved.roots[i];
        result.poles.push_back(z);
        result.relative_error.push_back(relative_error(solved.uncertainty[i], z));
    }
    sort_with_errors(result);
    return result;
}

} // namespace cornerwright
