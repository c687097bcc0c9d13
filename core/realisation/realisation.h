#pragma once

#include <optional>
#include <string_view>

namespace cornerwright {

/// The clock of the processor. A period of 0 means that the project does not sample.
struct Sampling {
    double sample_period_s = 0.0;
    double computation_delay_s = 0.0;
    bool design_includes_hold = true;

    bool operator==(const Sampling&) const = default;
};

enum class Method {
    tustin,
    tustin_at_corners,
    tustin_at,
    matched_roots,
    step_invariant,
    ramp_invariant,
};

enum class Structure { direct_form_1, direct_form_2_transposed, delta };

struct NumberFormat {
    enum class Type { float64, float32, fixed };
    Type type = Type::float64;
    int word_bits = 32;     ///< 16 or 32; fixed only
    int fraction_bits = 28; ///< fixed only

    bool operator==(const NumberFormat&) const = default;
};

/// Limits of the controller's output in the plant-input unit, at_least < at_most.
struct OutputLimits {
    double at_least = 0.0;
    double at_most = 0.0;
    bool operator==(const OutputLimits&) const = default;
};

/// How the compensator becomes a difference equation.
struct Realisation {
    Method method = Method::tustin;
    double match_rad_s = 0.0; ///< tustin_at only, > 0
    Structure structure = Structure::direct_form_2_transposed;
    NumberFormat number_format;
    std::optional<OutputLimits> output_limits;

    bool operator==(const Realisation&) const = default;
};

/// The words of the project file.
std::string_view name_of(Method method);
std::string_view name_of(Structure structure);
std::string_view name_of(NumberFormat::Type type);

} // namespace cornerwright
