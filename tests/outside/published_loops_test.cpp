// Textbook loops and relations. Where a published figure is rounded, the digits here are sharper
// ones of the same loop, computed with 50 digits. Every citation is from memory.

#include "core/loop/closed_loop_poles.h"
#include "core/loop/decibel.h"
#include "core/loop/frequency_figures.h"
#include "core/loop/root_locus.h"
#include "core/loop/step_response.h"
#include "tests/outside/published.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright::outside {
namespace {

constexpr double pi = std::numbers::pi;

void expect_pole(const ComplexVector& poles, Complex printed, double allowed) {
    const auto nearest = std::min_element(poles.begin(), poles.end(), [&](Complex a, Complex b) {
        return std::abs(a - printed) < std::abs(b - printed);
    });
    ASSERT_NE(nearest, poles.end());
    EXPECT_LT(std::abs(*nearest - printed), allowed);
}

// K. Ogata, Modern Control Engineering, 5th ed., ch. 7, lead compensation of 4/(s(s+2)): Kv = 20,
// phase margin 50 deg, gain margin infinite.
TEST(Published, LeadCompensationExample) {
    const LoopFigures f = figures_of("41.7 (s + 4.41)/(s + 18.4) * 4/(s (s + 2))");
    EXPECT_EQ(f.stability.stable, true);
    expect_figure(f.steady_state_error.ramp, 1.0 / 19.98880435);
    expect_figure(f.frequency.phase_margin_at_rad_s, 8.889535093);
    expect_figure(f.frequency.phase_margin_deg, 50.50755251);
    EXPECT_EQ(f.frequency.gain_margin_db.kind(), Figure::Kind::infinite);
    expect_figure(f.time.overshoot_percent, 21.68491181, 1e-8);
    expect_figure(f.frequency.sensitivity_peak_db, 2.943126880);
    expect_pole(f.closed_loop_poles, {-6.954120785, 8.059234433}, 1e-8);
    expect_pole(f.closed_loop_poles, {-6.954120785, -8.059234433}, 1e-8);
    expect_pole(f.closed_loop_poles, -6.49175843, 1e-8);
}

// Ogata, as above: the gain alone gives about 17 deg.
TEST(Published, LeadExampleWithoutLead) {
    const LoopFigures f = figures_of("40/(s (s + 2))");
    expect_figure(f.frequency.phase_margin_at_rad_s, 6.168465675);
    expect_figure(f.frequency.phase_margin_deg, 17.96423592);
}

// Ogata, as above, lag compensation: Kv = 5, about 40 deg, gain margin above 10 dB.
TEST(Published, LagCompensationExample) {
    const LoopFigures f = figures_of("0.5 (s + 0.1)/(s + 0.01) * 1/(s (s + 1) (0.5 s + 1))");
    expect_figure(f.steady_state_error.ramp, 1.0 / 5.0);
    expect_figure(f.frequency.phase_margin_at_rad_s, 0.4544058944);
    expect_figure(f.frequency.phase_margin_deg, 41.61178798);
    expect_figure(f.frequency.gain_margin_db, 14.29961336);
    expect_figure(f.frequency.gain_margin_at_rad_s, 1.315353932);
}

// K/(s(s+1)(s+2)): Ogata, as above, ch. 5 (Routh) and 6 (root locus).
TEST(Published, ThreeLagsWithIntegrator) {
    const LoopFigures f = figures_of("1/(s (s + 1) (s + 2))");
    expect_figure(f.frequency.gain_margin_db, 20.0 * std::log10(6.0), 1e-12);
    expect_figure(f.frequency.gain_margin_at_rad_s, std::sqrt(2.0), 1e-12);

    const ComplexVector limit = closed_loop_poles(loop_of("6/(s (s + 1) (s + 2))")).poles;
    expect_pole(limit, {0.0, std::sqrt(2.0)}, 1e-12);
    expect_pole(limit, -3.0, 1e-12);

    // A double pole is sharp to the root of the rounding only.
    const std::vector<double> breakaway{0.384900179459751};
    const ComplexVector at_breakaway =
        locus_poles(loop_of("1/(s (s + 1) (s + 2))"), breakaway).front();
    EXPECT_EQ(std::count_if(at_breakaway.begin(), at_breakaway.end(),
                            [](Complex pole) { return std::abs(pole + 0.422649730810374) < 1e-6; }),
              2);

    const RootLocus locus = root_locus(loop_of("1/(s (s + 1) (s + 2))"));
    const auto crossing = std::find_if(locus.crossings.begin(), locus.crossings.end(),
                                       [](const AxisCrossing& at) { return at.w_rad_s > 0.0; });
    ASSERT_NE(crossing, locus.crossings.end());
    EXPECT_NEAR(crossing->factor, 6.0, 1e-9);
    EXPECT_NEAR(crossing->w_rad_s, std::sqrt(2.0), 1e-9);
}

// Asymptotes of the same locus: centroid -1 at 60, 180 and 300 deg. Ogata, as above, ch. 6.
TEST(Published, AsymptotesOfTheLocus) {
    const double radius = 1e4;
    const std::vector<double> far{std::pow(radius, 3.0)};
    const ComplexVector poles = locus_poles(loop_of("1/(s (s + 1) (s + 2))"), far).front();
    for (const double angle_deg : {60.0, 180.0, 300.0})
        expect_pole(poles, -1.0 + std::polar(radius, angle_deg / deg_per_rad), 1.0 / radius);
}

// 1/(s+1)^3: ultimate gain 8, ultimate period 2 pi/sqrt 3. J. G. Ziegler, N. B. Nichols, Optimum
// settings for automatic controllers, Trans. ASME 64 (1942); K. J. Astrom, T. Hagglund, PID
// Controllers, 2nd ed., ch. 4.
TEST(Published, UltimateGainAndPeriod) {
    const LoopFigures f = figures_of("1/(s + 1)^3");
    expect_figure(f.frequency.gain_margin_db, 20.0 * std::log10(8.0), 1e-12);
    EXPECT_NEAR(2.0 * pi / f.frequency.gain_margin_at_rad_s.value(), 3.62759872847, 1e-10);
}

// K exp(-s tau)/s: stable for K tau < pi/2. Astrom and Hagglund, as above, ch. 2 and 4.
TEST(Published, IntegratorWithDeadTime) {
    const LoopFigures f = figures_of("exp(-s)/s");
    EXPECT_EQ(f.stability.stable, true);
    expect_figure(f.frequency.gain_margin_db, 3.92239754060);
    expect_figure(f.frequency.phase_margin_deg, 32.7042204869);
    expect_figure(f.frequency.delay_margin_s, 0.570796326795);
    expect_figure(f.frequency.gain_margin_at_rad_s, 1.57079632679);
    expect_figure(f.frequency.sensitivity_peak_db, 9.90897620147);
    EXPECT_EQ(figures_of("1.5707 exp(-s)/s").stability.stable, true);
    EXPECT_EQ(figures_of("1.5709 exp(-s)/s").stability.stable, false);
}

// Its step by the method of steps, y = sum (-1)^(k+1) (t - k)^k/k! over k < t: R. Bellman, K. L.
// Cooke, Differential-Difference Equations, ch. 3.
TEST(Published, StepByTheMethodOfSteps) {
    const DesignLoop loop = loop_of("exp(-s)/s");
    const LoopFigures f = figures_of(loop);
    expect_figure(f.time.overshoot_percent, 50.0);
    expect_figure(f.time.peak_time_s, 3.0);
    const StepCurves curves = step_curves(loop, 8.0, 81);
    for (std::size_t i = 0; i < curves.t_s.size(); ++i) {
        double y = 0.0;
        double factorial = 1.0;
        for (int k = 1; k <= curves.t_s[i]; ++k) {
            factorial *= k;
            y -= std::pow(-1.0, k) * std::pow(curves.t_s[i] - k, k) / factorial;
        }
        EXPECT_NEAR(curves.y[i], y, 1e-7) << "t = " << curves.t_s[i];
    }
}

// Error constants by type: Ogata, as above, ch. 5; G. F. Franklin, J. D. Powell, A. Emami-Naeini,
// Feedback Control of Dynamic Systems, ch. 4.
TEST(Published, SteadyStateErrorsByType) {
    const SteadyStateErrors type0 = figures_of("9/(s + 1)").steady_state_error;
    expect_figure(type0.step, 0.1, 1e-14);
    EXPECT_EQ(type0.ramp.kind(), Figure::Kind::infinite);
    const SteadyStateErrors type1 = figures_of("40/(s (s + 2))").steady_state_error;
    EXPECT_EQ(type1.step.value(), 0.0);
    expect_figure(type1.ramp, 0.05, 1e-14);
    EXPECT_EQ(type1.parabola.kind(), Figure::Kind::infinite);
    const SteadyStateErrors type2 = figures_of("5 (s + 1)/s^2").steady_state_error;
    EXPECT_EQ(type2.ramp.value(), 0.0);
    expect_figure(type2.parabola, 0.2, 1e-14);
    const SteadyStateErrors type3 = figures_of("4 (s + 1)^2/s^3").steady_state_error;
    EXPECT_EQ(type3.parabola.value(), 0.0);
}

// K/(s - 1) is stable for K > 1: K. J. Astrom, R. M. Murray, Feedback Systems, chapter on frequency
// domain analysis; the limit worked by hand.
TEST(Published, UnstablePoleStabilised) {
    const LoopFigures f = figures_of("4/(s - 1)");
    EXPECT_EQ(f.stability.stable, true);
    expect_figure(f.frequency.gain_reduction_margin_db, 12.0411998266);
    expect_figure(f.frequency.phase_margin_deg, 75.5224878141);
    expect_figure(f.frequency.phase_margin_at_rad_s, 3.87298334621);
    EXPECT_EQ(figures_of("0.999/(s - 1)").stability.stable, false);
}

// K (s+1)^2/s^3 is stable for K > 1/2 (Routh): conditional stability, Ogata, as above, ch. 6 and 7.
TEST(Published, ConditionalStability) {
    const LoopFigures f = figures_of("2 (s + 1)^2/s^3");
    EXPECT_EQ(f.stability.stable, true);
    expect_figure(f.frequency.gain_reduction_margin_db, 12.0411998266);
    ASSERT_EQ(f.frequency.phase_crossings_rad_s.size(), 1u);
    EXPECT_NEAR(f.frequency.phase_crossings_rad_s.front(), 1.0, 1e-12);
    EXPECT_EQ(f.frequency.gain_margin_db.kind(), Figure::Kind::infinite);
    EXPECT_EQ(figures_of("0.499 (s + 1)^2/s^3").stability.stable, false);
    EXPECT_EQ(figures_of("0.501 (s + 1)^2/s^3").stability.stable, true);
}

/// Integral of ln|S| dw from 0 to `end` by Simpson's rule over ln w.
double sensitivity_area(const DesignLoop& loop, double end) {
    constexpr int steps = 40000;
    const double low = std::log(1e-9);
    const double width = (std::log(end) - low) / steps;
    std::vector<double> w;
    for (int i = 0; i <= steps; ++i)
        w.push_back(std::exp(low + i * width));
    const std::vector<LoopPoint> points = loop_points(loop, w);
    double sum = 0.0;
    for (int i = 0; i <= steps; ++i) {
        const double weight = i == 0 || i == steps ? 1.0 : i % 2 == 1 ? 4.0 : 2.0;
        const auto at = static_cast<std::size_t>(i);
        sum += weight * w[at] * std::log(std::abs(points[at].sensitivity));
    }
    return sum * width / 3.0;
}

// H. W. Bode, Network Analysis and Feedback Amplifier Design (1945); J. S. Freudenberg, D. P.
// Looze, Right half plane poles and zeros and design tradeoffs in feedback systems, IEEE Trans. AC
// 30 (1985). Beyond `end` ln|S| is K/w^2 more.
TEST(Published, AreaOfTheSensitivity) {
    constexpr double end = 1e5;
    EXPECT_NEAR(sensitivity_area(loop_of("4/((s + 1) (s + 2))"), end), -4.0 / end, 1e-7);
    EXPECT_NEAR(sensitivity_area(loop_of("6/((s - 1) (s + 5))"), end), pi - 6.0 / end, 1e-7);
}

// Worked by hand from the definitions.
TEST(Published, LagWithDeadTime) {
    const LoopFigures f = figures_of("2 exp(-0.5 s)/(s + 1)");
    expect_figure(f.frequency.phase_margin_at_rad_s, 1.73205080757);
    expect_figure(f.frequency.phase_margin_deg, 70.3803994120);
    expect_figure(f.frequency.delay_margin_s, 0.709199576156);
    expect_figure(f.frequency.gain_margin_db, 5.59079036825);
    expect_figure(f.frequency.gain_margin_at_rad_s, 3.67319440630);
}

// Symmetrical optimum, PI on an integrator with a lag, crossover at the geometric mean: C. Kessler,
// Regelungstechnik 6 (1958); W. Leonhard, Control of Electrical Drives, ch. 2.
TEST(Published, SymmetricalOptimum) {
    struct Row {
        double a;
        double phase_margin_deg;
        double overshoot_percent;
    };
    for (const Row& row : {Row{2.0, 36.86989765, 43.410408}, Row{3.0, 53.13010235, 24.893534},
                           Row{4.0, 61.92751306, 17.306981}}) {
        SCOPED_TRACE(row.a);
        // Lag at a, corner of the PI at 1/a: |L(j)| = 1.
        RootForm roots{{-1.0 / row.a}, {0.0, 0.0, -row.a}, row.a};
        DesignLoop loop;
        loop.plant = PlantModel{roots, 0.0};
        const LoopFigures f = figures_of(loop);
        expect_figure(f.frequency.phase_margin_at_rad_s, 1.0, 1e-12);
        expect_figure(f.frequency.phase_margin_deg, row.phase_margin_deg);
        expect_figure(f.time.overshoot_percent, row.overshoot_percent, 1e-7);
    }
}

// Magnitude optimum L = 1/(2 T s (T s + 1)), T = 0.5: C. Kessler (1955); Leonhard, as above.
TEST(Published, MagnitudeOptimum) {
    const LoopFigures f = figures_of("1/(s (0.5 s + 1))");
    expect_figure(f.time.overshoot_percent, 4.32139182638);
    expect_figure(f.frequency.phase_margin_deg, 65.5301994793);
    expect_figure(f.time.peak_time_s, 0.5 * 2.0 * pi, 1e-9);
}

} // namespace
} // namespace cornerwright::outside
