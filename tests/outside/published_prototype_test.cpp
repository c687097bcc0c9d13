// The second-order prototype wn^2/(s(s + 2 zeta wn)) and low-pass standard forms, digits computed
// with 50 digits from the published formulas or coefficients. Every citation is from memory.

#include "core/loop/decibel.h"
#include "tests/outside/published.h"

#include <cmath>
#include <numbers>

namespace cornerwright::outside {
namespace {

constexpr double pi = std::numbers::pi;
constexpr double wn = 7.0; // any will do

LoopFigures prototype(double zeta) {
    DesignLoop loop;
    loop.plant = PlantModel{{{}, {0.0, -2.0 * zeta * wn}, wn * wn}, 0.0};
    return figures_of(loop);
}

struct Overshoot {
    double zeta;
    double percent;
    double peak_time_wn;
};

// exp(-pi zeta/sqrt(1 - zeta^2)) and pi/(wn sqrt(1 - zeta^2)): G. F. Franklin, J. D. Powell, A.
// Emami-Naeini, Feedback Control of Dynamic Systems, ch. 3; K. Ogata, Modern Control Engineering,
// 5th ed., ch. 5.
TEST(PublishedPrototype, OvershootAndPeakTime) {
    for (const Overshoot& row :
         {Overshoot{0.1, 72.92476143, 3.157419417}, Overshoot{0.2, 52.66205993, 3.206374575},
          Overshoot{0.3, 37.23261049, 3.293283942}, Overshoot{0.4, 25.38267220, 3.427758604},
          Overshoot{0.5, 16.30335348, 3.627598728}, Overshoot{0.6, 9.478022484, 3.926990817},
          Overshoot{0.7, 4.598791026, 4.399109625}, Overshoot{0.8, 1.516461986, 5.235987756},
          Overshoot{0.9, 0.1523755821, 7.207307841}}) {
        SCOPED_TRACE(row.zeta);
        const TimeFigures time = prototype(row.zeta).time;
        expect_figure(time.overshoot_percent, row.percent);
        // The top of a curve is sharp to the root of the rounding.
        expect_figure(time.peak_time_s, row.peak_time_wn / wn, 1e-8);
    }
}

struct Margin {
    double zeta;
    double phase_margin_deg;
    double crossover;
    double delay_margin_wn;
};

// atan(2 zeta/sqrt(sqrt(1 + 4 zeta^4) - 2 zeta^2)): Ogata, as above, ch. 7; Franklin, Powell,
// Emami-Naeini, as above, ch. 6. Delay margin = phase margin/crossover: K. J. Astrom, R. M. Murray,
// Feedback Systems, ch. 9.
TEST(PublishedPrototype, MarginsAgainstDamping) {
    for (const Margin& row : {Margin{0.1, 11.42061909, 0.9900504937, 0.2013305453},
                              Margin{0.2, 22.60228412, 0.9608303161, 0.4105660174},
                              Margin{0.3, 33.27249096, 0.9143691069, 0.6350985759},
                              Margin{0.4, 43.11759796, 0.8543725065, 0.8808149188},
                              Margin{0.5, 51.82729237, 0.7861513778, 1.150614144},
                              Margin{0.6, 59.18726681, 0.7157050678, 1.443349681},
                              Margin{0.7, 65.15639347, 0.6481842715, 1.754429481},
                              Margin{0.8, 69.85999890, 0.5867838106, 2.077915195},
                              Margin{1.0, 76.34541525, 0.4858682718, 2.742469394},
                              Margin{1.2, 80.28939388, 0.4106967762, 3.412041094}}) {
        SCOPED_TRACE(row.zeta);
        const FrequencyFigures f = prototype(row.zeta).frequency;
        expect_figure(f.phase_margin_deg, row.phase_margin_deg);
        expect_figure(f.phase_margin_at_rad_s, row.crossover * wn);
        expect_figure(f.delay_margin_s, row.delay_margin_wn / wn);
    }
}

struct Resonance {
    double zeta;
    double peak_db;
    double at;
    double bandwidth;
};

// Mr = 1/(2 zeta sqrt(1 - zeta^2)) at wn sqrt(1 - 2 zeta^2), and the bandwidth: Ogata, as above,
// ch. 7; B. C. Kuo, F. Golnaraghi, Automatic Control Systems, chapter on frequency-domain analysis.
TEST(PublishedPrototype, ResonantPeakAndBandwidth) {
    for (const Resonance& row : {Resonance{0.1, 14.02304814, 0.9899494937, 1.542771159},
                                 Resonance{0.2, 8.136087843, 0.9591663047, 1.509577100},
                                 Resonance{0.3, 4.846561069, 0.9055385138, 1.453689462},
                                 Resonance{0.4, 2.695407400, 0.8246211251, 1.374517121},
                                 Resonance{0.5, 1.249387366, 0.7071067812, 1.272019650},
                                 Resonance{0.6, 0.3545753392, 0.5291502622, 1.148242308},
                                 Resonance{0.7, 0.001737525456, 0.1414213562, 1.010049494}}) {
        SCOPED_TRACE(row.zeta);
        const FrequencyFigures f = prototype(row.zeta).frequency;
        expect_figure(f.complementary_peak_db, row.peak_db);
        expect_figure(f.complementary_peak_at_rad_s, row.at * wn);
        expect_figure(f.bandwidth_rad_s, row.bandwidth * wn);
    }
}

// |S|^2 stationary at (w/wn)^2 = (1 + sqrt(1 + 8 zeta^2))/2, derived by hand; the notion: Astrom
// and Murray, as above, chapter on frequency-domain design.
TEST(PublishedPrototype, SensitivityPeak) {
    struct Row {
        double zeta;
        double peak_db;
        double at;
    };
    for (const Row& row : {Row{0.2, 8.735719571, 1.036559822}, Row{0.5, 3.333869202, 1.168770894},
                           Row{1.0, 1.249387366, 1.414213562}}) {
        SCOPED_TRACE(row.zeta);
        const FrequencyFigures f = prototype(row.zeta).frequency;
        expect_figure(f.sensitivity_peak_db, row.peak_db);
        expect_figure(f.sensitivity_peak_at_rad_s, row.at * wn);
    }
}

// Gain margin >= Ms/(Ms - 1), phase margin >= 2 asin(1/(2 Ms)): K. J. Astrom, T. Hagglund, PID
// Controllers, 2nd ed., ch. 4. On K/(s+1)^3 with K set so that Ms is the round number.
TEST(PublishedPrototype, BoundsFromTheSensitivityPeak) {
    struct Row {
        double peak;
        double gain_margin_db;
        double phase_margin_deg;
    };
    for (const Row& row :
         {Row{1.2, 15.56302501, 49.24863670}, Row{1.4, 10.88136089, 41.84966486},
          Row{1.6, 8.519374645, 36.41991373}, Row{2.0, 6.020599913, 28.95502437}}) {
        SCOPED_TRACE(row.peak);
        const auto at_gain = [](double gain) {
            DesignLoop loop;
            loop.plant = PlantModel{{{}, {-1.0, -1.0, -1.0}, gain}, 0.0};
            return figures_of(loop).frequency;
        };
        double low = 0.0;
        double high = 8.0;
        for (int i = 0; i < 60; ++i) {
            const double middle = 0.5 * (low + high);
            const bool below =
                at_gain(middle).sensitivity_peak_db.value() < 20.0 * std::log10(row.peak);
            (below ? low : high) = middle;
        }
        const FrequencyFigures f = at_gain(low);
        EXPECT_GE(f.gain_margin_db.value(), row.gain_margin_db - 1e-8);
        if (f.phase_margin_deg.is_value()) {
            EXPECT_GE(f.phase_margin_deg.value(), row.phase_margin_deg - 1e-8);
        }
    }
}

// Pole/zero = (1 + sin phi)/(1 - sin phi), the lift at the geometric mean: Ogata, as above, ch. 7;
// Franklin, Powell, Emami-Naeini, as above, ch. 6.
TEST(PublishedPrototype, LeadRatioForALift) {
    struct Row {
        double lift_deg;
        double ratio;
        double gain_db;
    };
    for (const Row& row :
         {Row{20.0, 2.039606729, 3.095464361}, Row{30.0, 3.0, 4.771212547},
          Row{40.0, 4.598909932, 6.626549042}, Row{45.0, 5.828427125, 7.655513707},
          Row{50.0, 7.548632170, 8.778682636}, Row{60.0, 13.92820323, 11.43895095}}) {
        SCOPED_TRACE(row.lift_deg);
        Section lead;
        lead.kind = SectionKind::lead;
        lead.zero_rad_s = wn / std::sqrt(row.ratio);
        lead.pole_rad_s = wn * std::sqrt(row.ratio);
        const Complex value = evaluate(roots_of(lead), Complex(0.0, wn));
        EXPECT_NEAR(std::arg(value) * deg_per_rad, row.lift_deg, 1e-7);
        EXPECT_NEAR(20.0 * std::log10(std::abs(value)), row.gain_db, 1e-8);
        EXPECT_NEAR(characteristic_rad_s(lead), wn, 1e-12 * wn);
    }
}

// ITAE standard forms, zero position error: D. Graham, R. C. Lathrop, The synthesis of optimum
// transient response, Trans. AIEE 72 (1953), part II.
TEST(PublishedLowPass, ItaeForms) {
    struct Row {
        std::vector<double> denominator;
        double overshoot_percent;
        double settling_s;
        double rise_s;
    };
    const std::vector<Row> rows{
        {{1, 1.4, 1}, 4.59879103, 5.97879237, 2.12620187},
        {{1, 1.75, 2.15, 1}, 1.98034200, 7.54188917, 2.32287375},
        {{1, 2.1, 3.4, 2.7, 1}, 1.92517746, 4.51016708, 2.49629951},
        {{1, 2.8, 5, 5.5, 3.4, 1}, 2.10290562, 6.68130293, 2.79804829},
        {{1, 3.25, 6.6, 8.6, 7.45, 3.95, 1}, 4.99124767, 7.81117844, 2.75900870}};
    for (const Row& row : rows) {
        SCOPED_TRACE(row.denominator.size() - 1);
        const TimeFigures time = low_pass_figures(row.denominator).time;
        expect_figure(time.overshoot_percent, row.overshoot_percent, 1e-8);
        expect_figure(time.settling_time_s, row.settling_s, 1e-8);
        expect_figure(time.rise_time_s, row.rise_s, 1e-8);
    }
}

// Butterworth poles exp(j pi (2k + n - 1)/(2n)): L. Weinberg, Network Analysis and Synthesis,
// ch. 11; the overshoots stand in A. I. Zverev, Handbook of Filter Synthesis, as charts.
TEST(PublishedLowPass, Butterworth) {
    struct Row {
        int order;
        double overshoot_percent;
        double rise_s;
    };
    for (const Row& row : {Row{2, 4.32139183, 2.14803799}, Row{3, 8.14654414, 2.29015807},
                           Row{4, 10.8301509, 2.43240920}, Row{5, 12.7770469, 2.56213901},
                           Row{6, 14.2513534, 2.67994532}, Row{7, 15.4087708, 2.78774182},
                           Row{8, 16.3440590, 2.88724587}}) {
        SCOPED_TRACE(row.order);
        ComplexVector polynomial{1.0};
        for (int k = 1; k <= row.order; ++k) {
            const Complex pole = std::polar(1.0, pi * (2 * k + row.order - 1) / (2 * row.order));
            polynomial.push_back(0.0);
            for (std::size_t i = polynomial.size() - 1; i > 0; --i)
                polynomial[i] -= pole * polynomial[i - 1];
        }
        std::vector<double> denominator;
        for (const Complex& coefficient : polynomial)
            denominator.push_back(coefficient.real());
        const TimeFigures time = low_pass_figures(denominator).time;
        expect_figure(time.overshoot_percent, row.overshoot_percent, 1e-8);
        expect_figure(time.rise_time_s, row.rise_s, 1e-8);
    }
}

// Bessel, unit delay at w = 0, coefficients (2n - k)!/(2^(n-k) k! (n-k)!): W. E. Thomson, Delay
// networks having maximally flat frequency characteristics, Proc. IEE 96 (1949).
TEST(PublishedLowPass, Bessel) {
    struct Row {
        std::vector<double> denominator;
        double overshoot_percent;
    };
    const std::vector<Row> rows{
        {{1, 3, 3}, 0.433342051},
        {{1, 6, 15, 15}, 0.753746592},
        {{1, 10, 45, 105, 105}, 0.835419951},
        {{1, 15, 105, 420, 945, 945}, 0.772683578},
        {{1, 21, 210, 1260, 4725, 10395, 10395}, 0.641839935},
        {{1, 28, 378, 3150, 17325, 62370, 135135, 135135}, 0.490032964},
        {{1, 36, 630, 6930, 51975, 270270, 945945, 2027025, 2027025}, 0.343940871}};
    for (const Row& row : rows) {
        SCOPED_TRACE(row.denominator.size() - 1);
        expect_figure(low_pass_figures(row.denominator).time.overshoot_percent,
                      row.overshoot_percent, 1e-8);
    }
}

} // namespace
} // namespace cornerwright::outside
