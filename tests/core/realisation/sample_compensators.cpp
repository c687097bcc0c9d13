#include "tests/core/realisation/sample_compensators.h"

#include "tests/core/realisation/section_builders.h"

namespace cornerwright::test {

std::vector<SampleCompensator> sample_compensators() {
    const OutputLimits narrow{-0.4, 0.7};
    return {
        {"gain", {gain_of(0.7)}, {}},
        {"integrator", {gain_of(20.0), plain_integrator()}, {}},
        {"pi", {gain_of(0.9), pi_at(30.0)}, {}},
        {"lead", {gain_of(0.5), lead_of(40.0, 400.0)}, {}},
        {"lag", {gain_of(1.5), lag_of(8.0, 0.9)}, {}},
        {"servo", {gain_of(0.8), pi_at(4.0), lead_of(60.0, 500.0), pole_at(1500.0)}, {}},
        {"two notches", {notch_at(800.0, 0.02, 0.5), notch_at(1300.0, 0.0, 0.4)}, {}},
        {"low pass", {poles_at(600.0, 0.7)}, {}},
        {"overdamped", {gain_of(-2.0), poles_at(90.0, 3.0)}, {}},
        {"shaped zeros", {zeros_at(300.0, 0.05), poles_at(900.0, 0.6), poles_at(700.0, 0.8)}, {}},
        {"washout", {gain_of(-1.2), washout_at(5.0)}, {}},
        {"improper inside", {pi_at(20.0), zero_at(50.0), pole_at(600.0), pole_at(600.0)}, {}},
        {"two integrators", {gain_of(0.3), pi_at(5.0), pi_at(9.0), poles_at(500.0, 0.6)}, {}},
        {"long chain",
         {gain_of(2.0), pi_at(3.0), lead_of(30.0, 200.0), lead_of(80.0, 900.0),
          notch_at(700.0, 0.05, 0.6), notch_at(1100.0, 0.01, 0.3), poles_at(1400.0, 0.7),
          pole_at(2000.0)},
         {}},
        {"slow corner", {gain_of(0.2), lag_of(0.6, 0.05), pole_at(900.0)}, {}},
        {"pi with limits", {gain_of(0.9), pi_at(30.0)}, narrow},
        {"servo with limits", {gain_of(-0.8), pi_at(4.0), lead_of(60.0, 500.0)}, narrow},
        {"joined integrators with limits",
         {gain_of(0.2), plain_integrator(), plain_integrator(), zeros_at(40.0, 0.7)},
         narrow},
        {"lead with limits", {gain_of(0.5), lead_of(40.0, 400.0)}, narrow},
    };
}

std::vector<Method> all_methods() {
    return {Method::tustin,        Method::tustin_at_corners, Method::tustin_at,
            Method::matched_roots, Method::step_invariant,    Method::ramp_invariant};
}

std::vector<Structure> all_structures() {
    return {Structure::direct_form_1, Structure::direct_form_2_transposed, Structure::delta};
}

std::vector<NumberFormat> all_formats() {
    return {{NumberFormat::Type::float64, 32, 28},
            {NumberFormat::Type::float32, 32, 28},
            {NumberFormat::Type::fixed, 32, 24},
            {NumberFormat::Type::fixed, 16, 11}};
}

std::string words_of(const Realisation& realisation) {
    std::string words(name_of(realisation.method));
    words += ", " + std::string(name_of(realisation.structure));
    words += ", " + std::string(name_of(realisation.number_format.type));
    if (realisation.number_format.type == NumberFormat::Type::fixed)
        words += " " + std::to_string(realisation.number_format.word_bits);
    return words;
}

} // namespace cornerwright::test
