#include "core/plant/plant_case.h"

#include "core/numerics/error.h"
#include "core/plant/factored.h"
#include "core/plant/formula.h"

namespace cornerwright {
namespace {

Factored polynomial(const std::vector<double>& highest_first) {
    const std::vector<long double> lowest_first(highest_first.rbegin(), highest_first.rend());
    return from_coefficients(lowest_first);
}

PlantModel model_of_coefficients(const CoefficientsSource& source) {
    const Factored denominator = polynomial(source.denominator);
    if (denominator.is_zero())
        throw InputError({}, "a denominator that is not zero", "only zeros");
    PlantModel model = to_model(polynomial(source.numerator) / denominator);
    model.dead_time_s = source.dead_time_s;
    return model;
}

std::string count_of(std::size_t number, const char* what) {
    return std::to_string(number) + " " + what + (number == 1 ? "" : "s");
}

void check_usable(const PlantModel& model) {
    if (model.roots.gain == 0.0)
        throw InputError({}, "a plant that is not zero", "zero");
    if (!model.roots.is_proper())
        throw InputError({}, "a plant with no more zeros than poles",
                         count_of(model.roots.zeros.size(), "zero") + " and " +
                             count_of(model.roots.poles.size(), "pole"));
}

struct ModelOf {
    std::optional<PlantModel> operator()(const FormulaSource& source) const {
        return parse_formula(source.text);
    }
    std::optional<PlantModel> operator()(const RootsSource& source) const { return source.model; }
    std::optional<PlantModel> operator()(const CoefficientsSource& source) const {
        return model_of_coefficients(source);
    }
    std::optional<PlantModel> operator()(const MeasurementSource& source) const {
        if (!source.fit)
            return std::nullopt;
        return source.fit->model;
    }
};

} // namespace

bool MeasurementSource::operator==(const MeasurementSource& other) const {
    const auto same_points = [&] {
        if (response == other.response)
            return true;
        return response && other.response && *response == *other.response;
    };
    return file == other.file && sha256 == other.sha256 && integrators == other.integrators &&
           unstable_poles == other.unstable_poles && fit == other.fit && same_points();
}

std::optional<PlantModel> model_of(const PlantSource& source) {
    auto model = std::visit(ModelOf{}, source);
    if (model)
        check_usable(*model);
    return model;
}

} // namespace cornerwright
