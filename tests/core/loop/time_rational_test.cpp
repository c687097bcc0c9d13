#include "core/loop/closed_loop_poles.h"
#include "core/loop/modal_sum.h"
#include "core/loop/step_response.h"

#include <Eigen/Dense>
#include <gtest/gtest.h>

#include <cmath>
#include <numbers>
#include <random>
#include <unsupported/Eigen/MatrixFunctions>

namespace cornerwright {
namespace {

TimeAssessment assess(const DesignLoop& loop, const FigureRequest& request = {}) {
    return assess_time(loop, request, closed_loop_poles(loop).poles);
}

DesignLoop loop_of(RootForm compensator, RootForm plant) {
    return {std::move(compensator), PlantModel{std::move(plant), 0.0}};
}

// Unit feedback around wn^2/(s(s + 2 zeta wn)): overshoot exp(-pi zeta/sqrt(1 - zeta^2)), peak time
// pi/(wn sqrt(1 - zeta^2)). Source: G. F. Franklin, J. D. Powell, A. Emami-Naeini, Feedback Control
// of Dynamic Systems, ch. 3; K. Ogata, Modern Control Engineering, 5th ed., ch. 5 (citations from
// memory).
TEST(time_rational, second_order_prototype_by_formula) {
    const double wn = 7.0;
    for (const double zeta : {0.05, 0.1, 0.2, 0.3, 0.5, 0.7, 0.8, 0.9}) {
        const TimeFigures figures =
            assess(loop_of({}, {{}, {0.0, -2.0 * zeta * wn}, wn * wn})).figures;
        const double root = std::sqrt(1.0 - zeta * zeta);
        const double overshoot = 100.0 * std::exp(-std::numbers::pi * zeta / root);
        EXPECT_NEAR(figures.overshoot_percent.value(), overshoot, 1e-8) << zeta;
        EXPECT_NEAR(figures.peak_time_s.value() * wn * root, std::numbers::pi, 1e-6) << zeta;
    }
}

TEST(time_rational, critically_and_over_damped_loops_have_no_overshoot_and_no_peak) {
    for (const double zeta : {1.0, 1.2}) {
        const TimeFigures figures = assess(loop_of({}, {{}, {0.0, -2.0 * zeta}, 1.0})).figures;
        EXPECT_EQ(figures.overshoot_percent.value(), 0.0);
        EXPECT_FALSE(figures.peak_time_s.is_determined());
    }
    // Double pole at -1: y = 1 - (1 + t) exp(-t), worked by hand.
    const TimeFigures critical = assess(loop_of({}, {{}, {0.0, -2.0}, 1.0})).figures;
    const double settling = critical.settling_time_s.value();
    EXPECT_NEAR((1.0 + settling) * std::exp(-settling), 0.02, 1e-8);
}

/// Coefficients (highest power first) of a denominator whose unit-gain low-pass is the closed loop:
/// the open loop is c0/(den - c0), an integrator among its poles.
struct StandardForm {
    ComplexVector open_poles;
    double last = 1.0;
};

StandardForm open_loop_of(const std::vector<double>& denominator) {
    // den - c0 = s * (den without its last coefficient)
    const auto order = static_cast<Eigen::Index>(denominator.size()) - 2;
    Eigen::MatrixXd companion = Eigen::MatrixXd::Zero(order, order);
    for (Eigen::Index k = 0; k < order; ++k) {
        companion(0, k) = -denominator[static_cast<std::size_t>(k) + 1];
        if (k > 0)
            companion(k, k - 1) = 1.0;
    }
    StandardForm form{{0.0}, denominator.back()};
    const Eigen::VectorXcd roots = companion.eigenvalues();
    form.open_poles.insert(form.open_poles.end(), roots.begin(), roots.end());
    return form;
}

TimeFigures standard_form_figures(const std::vector<double>& denominator) {
    const StandardForm form = open_loop_of(denominator);
    return assess(loop_of({}, {{}, form.open_poles, form.last})).figures;
}

// ITAE standard forms, zero position error. Source of the coefficients: D. Graham, R. C. Lathrop,
// The synthesis of optimum transient response, Trans. AIEE 72 (1953), part II; R. C. Dorf, R. H.
// Bishop, Modern Control Systems, ch. 5 (citations from memory). The step figures are recomputed
// from them at 50 digits.
TEST(time_rational, itae_standard_forms) {
    struct Row {
        std::vector<double> denominator;
        double overshoot, settling, rise;
    };
    const std::vector<Row> rows = {
        {{1, 1.4, 1}, 4.59879103, 5.97879237, 2.12620187},
        {{1, 1.75, 2.15, 1}, 1.98034200, 7.54188917, 2.32287375},
        {{1, 2.1, 3.4, 2.7, 1}, 1.92517746, 4.51016708, 2.49629951},
        {{1, 2.8, 5, 5.5, 3.4, 1}, 2.10290562, 6.68130293, 2.79804829},
        {{1, 3.25, 6.6, 8.6, 7.45, 3.95, 1}, 4.99124767, 7.81117844, 2.75900870},
    };
    for (const Row& row : rows) {
        const TimeFigures figures = standard_form_figures(row.denominator);
        EXPECT_NEAR(figures.overshoot_percent.value(), row.overshoot, 1e-6);
        EXPECT_NEAR(figures.settling_time_s.value(), row.settling, 1e-6);
        EXPECT_NEAR(figures.rise_time_s.value(), row.rise, 1e-6);
    }
}

// Butterworth low-pass, poles exp(j pi (2k + n - 1)/(2n)). Source: L. Weinberg, Network Analysis
// and Synthesis, ch. 11; A. I. Zverev, Handbook of Filter Synthesis (step charts; citations from
// memory). Digits recomputed at 50 digits. Checked on the modal sum of the filter itself.
TEST(time_rational, butterworth_step_overshoot) {
    const std::vector<double> overshoots = {4.32139183, 8.14654414, 10.8301509, 12.7770469,
                                            14.2513534, 15.4087708, 16.3440590};
    for (int n = 2; n <= 8; ++n) {
        // Coefficients by F. Butterworth's cosine rule a_(k+1) = a_k cos((k pi)/(2n))/sin(((k+1)
        // pi)/(2n)).
        std::vector<double> coefficients{1.0};
        for (int k = 0; k < n; ++k)
            coefficients.push_back(coefficients.back() * std::cos(k * std::numbers::pi / (2 * n)) /
                                   std::sin((k + 1) * std::numbers::pi / (2 * n)));
        const TimeFigures figures = standard_form_figures(coefficients);
        EXPECT_NEAR(figures.overshoot_percent.value(), overshoots[static_cast<std::size_t>(n - 2)],
                    1e-6)
            << n;
    }
}

// Bessel low-pass, reverse Bessel polynomials. Source: W. E. Thomson, Delay networks having
// maximally flat frequency characteristics, Proc. IEE 96 (1949); Zverev, as above (citations from
// memory).
TEST(time_rational, bessel_step_overshoot) {
    EXPECT_NEAR(standard_form_figures({1, 3, 3}).overshoot_percent.value(), 0.433342051, 1e-7);
    EXPECT_NEAR(standard_form_figures({1, 10, 45, 105, 105}).overshoot_percent.value(), 0.835419951,
                1e-7);
    EXPECT_NEAR(standard_form_figures({1, 36, 630, 6930, 51975, 270270, 945945, 2027025, 2027025})
                    .overshoot_percent.value(),
                0.343940871, 1e-6);
}

// Symmetrical optimum: crossover at the geometric mean of PI corner and lag, ratio a^2. Source: C.
// Kessler, Das symmetrische Optimum, Regelungstechnik 6 (1958); W. Leonhard, Control of Electrical
// Drives, ch. 2 (citations from memory).
TEST(time_rational, symmetrical_optimum_overshoot) {
    const double overshoots[] = {43.410408, 24.893534, 17.306981};
    for (int i = 0; i < 3; ++i) {
        const double a = i + 2.0;
        // L = (s + 1/a) a/ (s^2 (s + a)) * ... with crossover 1: |L(j)| = 1.
        const double gain = std::abs(Complex(a, 1.0)) / std::abs(Complex(1.0 / a, 1.0));
        const TimeFigures figures =
            assess(loop_of({{-1.0 / a}, {0.0}, gain}, {{}, {0.0, -a}, 1.0})).figures;
        EXPECT_NEAR(figures.overshoot_percent.value(), overshoots[i], 2e-6) << a;
    }
}

// Magnitude optimum L = 1/(2 T s (T s + 1)): overshoot 100 exp(-pi), peak at 2 pi T. Source: C.
// Kessler (1955); Leonhard, as above (citations from memory).
TEST(time_rational, magnitude_optimum) {
    const double t = 0.5;
    const TimeFigures figures =
        assess(loop_of({}, {{}, {0.0, -1.0 / t}, 1.0 / (2.0 * t * t)})).figures;
    EXPECT_NEAR(figures.overshoot_percent.value(), 100.0 * std::exp(-std::numbers::pi), 1e-8);
    EXPECT_NEAR(figures.peak_time_s.value() / t, 2.0 * std::numbers::pi, 1e-6);
}

// K. Ogata, Modern Control Engineering, 5th ed., ch. 7, lead example (citation from memory):
// 41.7 (s + 4.41)/(s + 18.4) on 4/(s(s + 2)); overshoot recomputed at 50 digits.
TEST(time_rational, lead_example_overshoot) {
    const TimeFigures figures =
        assess(loop_of({{-4.41}, {-18.4}, 41.7}, {{}, {0.0, -2.0}, 4.0})).figures;
    EXPECT_NEAR(figures.overshoot_percent.value(), 21.68491181, 1e-7);
    EXPECT_NEAR(figures.control_peak.value(), 41.7, 1e-9);
}

TEST(time_rational, improper_compensator_has_an_impulse_in_u_and_a_finite_y) {
    const TimeAssessment flat =
        assess(loop_of({{-8.0}, {}, 0.25}, {{}, {-2.0}, 3.0})); // PD on one lag, by hand:
    EXPECT_EQ(flat.figures.control_peak.kind(), Figure::Kind::infinite);
    // L(infinity) = 3/4: y jumps to 3/7; L(0) = 3 settles at 3/4; d ends at P(0)/(1 + L(0)).
    EXPECT_NEAR(flat.curves.y.front(), 3.0 / 7.0, 1e-12);
    EXPECT_NEAR(flat.figures.disturbance_peak.value(), 1.5 / 4.0, 1e-9);
}

TEST(time_rational, a_loop_that_settles_to_zero_has_no_overshoot_rise_or_settling) {
    const TimeFigures figures =
        assess(loop_of({{0.0}, {-0.5}, 0.4}, {{}, {-1.0, -30.0}, 1200.0})).figures;
    EXPECT_FALSE(figures.overshoot_percent.is_determined());
    EXPECT_FALSE(figures.rise_time_s.is_determined());
    EXPECT_FALSE(figures.settling_time_s.is_determined());
    EXPECT_TRUE(figures.control_peak.is_value());
}

TEST(time_rational, settling_bands_of_the_request_come_in_its_order_and_nest) {
    FigureRequest request;
    request.settling_bands_percent = {10.0, 0.01, 2.0};
    const TimeFigures figures = assess(loop_of({}, {{}, {0.0, -4.0}, 100.0}), request).figures;
    ASSERT_EQ(figures.settling_times_s.size(), 3u);
    EXPECT_LT(figures.settling_times_s[0].value(), figures.settling_time_s.value());
    EXPECT_GT(figures.settling_times_s[1].value(), figures.settling_time_s.value());
    EXPECT_EQ(figures.settling_times_s[2].value(), figures.settling_time_s.value());
}

TEST(time_rational, a_slow_tail_is_settled_by_its_own_time_constant) {
    // PI whose corner is a millionth of the crossover, on a lag: y is short of 1 by 3 % until the
    // slow pole near it lets go.
    const double corner = 1e-4;
    const DesignLoop loop = loop_of({{-corner}, {0.0}, 30.0}, {{}, {-1.0}, 1.0});
    const TimeFigures figures = assess(loop).figures;
    // s^2 + 31 s + 30 corner = 0; residue of the slow pole p in y is L-part; worked by hand:
    const double slow = -60.0 * corner / (31.0 + std::sqrt(961.0 - 120.0 * corner));
    const double fast = -31.0 - slow;
    const double residue = 30.0 * (slow + corner) / (slow * (slow - fast));
    EXPECT_NEAR(figures.settling_time_s.value(), std::log(0.02 / std::abs(residue)) / slow,
                1e-6 * figures.settling_time_s.value());
}

/// y of the loop's state space (controllable form of L, unit feedback) by a matrix exponential.
double by_matrix_exponential(const RootForm& open, double t) {
    const auto expand = [](const ComplexVector& roots) {
        std::vector<double> coefficients{1.0}; // lowest power first
        ComplexVector product{1.0};
        for (const Complex& root : roots) {
            product.insert(product.begin(), 0.0);
            for (std::size_t k = 0; k + 1 < product.size(); ++k)
                product[k] -= root * product[k + 1];
        }
        coefficients.clear();
        for (const Complex& c : product)
            coefficients.push_back(c.real());
        return coefficients;
    };
    const std::vector<double> denominator = expand(open.poles);
    std::vector<double> numerator = expand(open.zeros);
    numerator.resize(open.poles.size(), 0.0);
    const auto n = static_cast<Eigen::Index>(open.poles.size());
    Eigen::MatrixXd a = Eigen::MatrixXd::Zero(n + 1, n + 1);
    Eigen::RowVectorXd c = Eigen::RowVectorXd::Zero(n + 1);
    for (Eigen::Index k = 0; k < n; ++k) {
        const auto i = static_cast<std::size_t>(k);
        c(k) = open.gain * numerator[i];
        a(n - 1, k) = -denominator[i] - c(k);
        if (k + 1 < n)
            a(k, k + 1) = 1.0;
    }
    a(n - 1, n) = 1.0; // the step
    Eigen::VectorXd x = Eigen::VectorXd::Zero(n + 1);
    x(n) = 1.0;
    return c * ((a * t).exp() * x);
}

TEST(time_rational, modes_equal_the_matrix_exponential_on_random_loops) {
    std::mt19937 random(11);
    std::uniform_real_distribution<double> part(0.2, 3.0);
    for (int round = 0; round < 40; ++round) {
        RootForm open;
        for (int k = 0; k < 3; ++k) {
            const Complex root(-part(random), part(random));
            open.poles.push_back(root);
            open.poles.push_back(std::conj(root));
        }
        open.poles.emplace_back(0.0);
        open.zeros = {-part(random), -part(random)};
        if (round % 4 == 0) // repeated open-loop poles as well
            open.poles[2] = open.poles[0], open.poles[3] = open.poles[1];
        open.gain = part(random);
        const DesignLoop loop = loop_of({}, open);
        const StepCurves curves = step_curves(loop, 6.0, 13);
        for (std::size_t i = 0; i < curves.t_s.size(); ++i)
            EXPECT_NEAR(curves.y[i], by_matrix_exponential(open, curves.t_s[i]),
                        1e-8 * std::max(1.0, std::abs(curves.y[i])))
                << round << " at " << curves.t_s[i];
    }
}

TEST(time_rational, repeated_poles_become_powers_of_t) {
    // m/(s (s + 2)^m): 1 - exp(-2t) sum (2t)^k/k!, an elementary transform pair.
    for (const int m : {2, 3, 5, 7}) {
        const ComplexVector poles(static_cast<std::size_t>(m), -2.0);
        RootForm form{{}, poles, std::pow(2.0, m)};
        form.poles.emplace_back(0.0);
        const ModalSum sum = modal_sum(form);
        for (const double t : {0.0, 0.3, 1.0, 4.0, 12.0}) {
            double series = 0.0;
            double term = 1.0;
            for (int k = 0; k < m; ++k) {
                series += term;
                term *= 2.0 * t / (k + 1);
            }
            EXPECT_NEAR(sum.value(t), 1.0 - std::exp(-2.0 * t) * series, 1e-10) << m << " " << t;
        }
    }
}

TEST(time_rational, an_unstable_loop_has_curves) {
    // K/(s (s + 1)(s + 2)) at K = 10 grows (Routh: stable below 6).
    const StepCurves curves = step_curves(loop_of({}, {{}, {0.0, -1.0, -2.0}, 10.0}), 40.0, 401);
    ASSERT_EQ(curves.y.size(), 401u);
    double early = 0.0, late = 0.0;
    for (std::size_t i = 0; i < 401; ++i)
        (i < 200 ? early : late) = std::max(i < 200 ? early : late, std::abs(curves.y[i]));
    EXPECT_GT(late, 2.0 * early);
}

TEST(time_rational, a_measured_plant_goes_through_its_fit_or_is_undetermined) {
    MeasuredPlant measured;
    DesignLoop loop{{}, measured};
    FigureRequest request;
    request.settling_bands_percent = {5.0};
    const TimeFigures without = assess_time(loop, request, {}).figures;
    EXPECT_EQ(without.overshoot_percent.reason(), "no fit for this measured case");
    EXPECT_EQ(without.settling_times_s.size(), 1u);

    measured.fit = FittedModel{{{{}, {0.0, -10.0}, 100.0}, 0.0}, 0.4};
    loop.plant = measured;
    const TimeFigures fitted = assess(loop).figures;
    EXPECT_EQ(fitted.overshoot_percent.note(), "from the fit, misfit 0.4 dB");
    EXPECT_NEAR(fitted.overshoot_percent.value(), 16.3033534822, 1e-7);
}

} // namespace
} // namespace cornerwright
