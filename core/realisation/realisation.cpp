#include "core/realisation/realisation.h"

namespace cornerwright {

std::string_view name_of(Method method) {
    switch (method) {
    case Method::tustin:
        return "tustin";
    case Method::tustin_at_corners:
        return "tustin_at_corners";
    case Method::tustin_at:
        return "tustin_at";
    case Method::matched_roots:
        return "matched_roots";
    case Method::step_invariant:
        return "step_invariant";
    case Method::ramp_invariant:
        break;
    }
    return "ramp_invariant";
}

std::string_view name_of(Structure structure) {
    switch (structure) {
    case Structure::direct_form_1:
        return "direct_form_1";
    case Structure::direct_form_2_transposed:
        return "direct_form_2_transposed";
    case Structure::delta:
        break;
    }
    return "delta";
}

std::string_view name_of(NumberFormat::Type type) {
    switch (type) {
    case NumberFormat::Type::float64:
        return "float64";
    case NumberFormat::Type::float32:
        return "float32";
    case NumberFormat::Type::fixed:
        break;
    }
    return "fixed";
}

} // namespace cornerwright
