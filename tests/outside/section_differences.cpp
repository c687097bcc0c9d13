#include "tests/outside/section_differences.h"

#include "tests/outside/held_model.h"
#include "tests/outside/method_response.h"

#include <algorithm>
#include <cmath>
#include <functional>
#include <numbers>
#include <optional>
#include <sstream>

namespace cornerwright::outside {
namespace {

constexpr WideComplex j{0.0L, 1.0L};
constexpr Wide pi = std::numbers::pi_v<Wide>;
constexpr Wide frequency_tolerance = 1e-6L;
constexpr Wide level_tolerance = 1e-4L; // dB and deg
constexpr Wide negligible_loop = 1e-6L;
constexpr Wide response_tolerance = 1e-8L;

/// exp(jx) - 1 without loss near 0.
WideComplex circle_minus_1(Wide x) {
    const Wide half = std::sin(x / 2.0L);
    return {-2.0L * half * half, std::sin(x)};
}

/// c0 z^2 + c1 z + c2 at d = z - 1.
WideComplex quadratic(const Json& c, WideComplex d) {
    const Wide c0 = c.at(0).get<double>();
    const Wide c1 = c.at(1).get<double>();
    const Wide c2 = c.at(2).get<double>();
    return (c0 * d + 2.0L * c0 + c1) * d + c0 + c1 + c2;
}

/// The sections as the handover writes them, at d = z - 1.
WideComplex sections_at(const Json& handover, WideComplex d) {
    WideComplex value = 1.0L;
    for (const Json& section : handover.at("sections"))
        value *= quadratic(section.at("b"), d) / quadratic(section.at("a"), d);
    return value;
}

Wide decibel(Wide magnitude) {
    return 20.0L * std::log10(magnitude);
}

/// One realised loop from b, a and the plant model.
class SectionLoop {
  public:
    SectionLoop(const Json& handover, const PlantModel& plant, double computation_delay_s)
        : handover_(handover),
          period_(handover.at("sample_period_s").get<double>()),
          plant_(plant.roots, static_cast<double>(period_),
                 plant.dead_time_s + computation_delay_s),
          roots_(plant.roots) {}

    Wide half_rate() const { return pi / period_; }
    WideComplex d(Wide w) const { return circle_minus_1(w * period_); }
    WideComplex compensator(WideComplex at) const { return sections_at(handover_, at); }
    WideComplex loop(WideComplex at) const { return compensator(at) * plant_.step_equivalent(at); }

    /// 1 + L times every denominator: a polynomial in d.
    WideComplex characteristic(WideComplex at) const {
        WideComplex value = (1.0L + loop(at)) * plant_.denominator(at);
        for (const Json& section : handover_.at("sections"))
            value *= quadratic(section.at("a"), at);
        return value;
    }

    /// Nine decades below pi/Ts, closer around the plant's roots, the closed-loop poles and pi/Ts.
    std::vector<Wide> scan(const Json& closed_loop_poles_z) const {
        constexpr int points = 5000;
        std::vector<Wide> places;
        for (int i = 0; i <= points; ++i)
            places.push_back(half_rate() * std::pow(10.0L, -9.0L * i / points));
        for (int i = 1; i <= points; ++i)
            places.push_back(half_rate() * i / points);
        const auto add_around = [&](Wide w, Wide width) {
            for (int i = -100; i <= 100; ++i) {
                const Wide place = w + width * std::sinh(i / 15.0L);
                if (place > 0.0L && place < half_rate())
                    places.push_back(place);
            }
        };
        for (const ComplexVector* roots : {&roots_.zeros, &roots_.poles})
            for (const Complex& root : *roots)
                add_around(std::abs(root.imag()), std::abs(root.real()));
        for (const Json& pole : closed_loop_poles_z) {
            const Complex z(pole.at(0).get<double>(), pole.at(1).get<double>());
            add_around(std::abs(std::arg(z)) / period_, std::abs(std::log(std::abs(z))) / period_);
        }
        std::sort(places.begin(), places.end());
        // The two roots of a pair give every place twice.
        places.erase(std::unique(places.begin(), places.end()), places.end());
        return places;
    }

  private:
    const Json& handover_;
    Wide period_;
    HeldModel plant_;
    RootForm roots_;
};

/// Compares the printed figures of one realised loop.
class Recomputation {
  public:
    Recomputation(std::string name, const SectionLoop& loop, const Json& printed)
        : name_(std::move(name)),
          loop_(loop),
          printed_(printed),
          scan_(loop.scan(printed.at("closed_loop_poles_z"))) {
        for (const Wide w : scan_)
            values_.push_back(loop_.loop(loop_.d(w)));
    }

    std::vector<std::string> run() {
        compare_crossings("crossovers_rad_s", [](WideComplex value) {
            return std::optional<bool>(std::abs(value) >= 1.0L);
        });
        compare_crossings("phase_crossings_rad_s", [](WideComplex value) {
            return value.real() < 0.0L ? std::optional<bool>(value.imag() >= 0.0L) : std::nullopt;
        });
        compare_phase_margin();
        compare_gain_margins();
        compare_peak("sensitivity_peak_db",
                     [](WideComplex, WideComplex l) { return 1.0L / std::abs(1.0L + l); });
        compare_peak("complementary_peak_db",
                     [](WideComplex, WideComplex l) { return std::abs(l / (1.0L + l)); });
        compare_peak("control_effort_peak_db",
                     [](WideComplex c, WideComplex l) { return std::abs(c / (1.0L + l)); });
        compare_poles();
        return std::move(found_);
    }

  private:
    void add(const std::string& figure, const std::string& what) {
        found_.push_back(name_ + "|" + figure + " from the written b and a: " + what);
    }

    void compare(const std::string& figure, Wide recomputed, Wide allowed) {
        const Json& value = printed_.at(figure);
        std::ostringstream line;
        line << recomputed << ", printed " << value;
        const bool equal =
            std::isfinite(recomputed)
                ? value.is_number() && std::abs(value.get<double>() - recomputed) <= allowed
                : value == "infinite";
        if (!equal)
            add(figure, line.str());
    }

    /// `side` tells on which side of the crossing a value lies, or nothing where none counts. Every
    /// printed place must change sides within its tolerance, every change of the scan be printed.
    void compare_crossings(const std::string& figure,
                           const std::function<std::optional<bool>(WideComplex)>& side) {
        std::vector<Wide> places;
        for (const Json& w : printed_.at(figure))
            if (w.get<double>() < loop_.half_rate() * (1.0L - frequency_tolerance))
                places.push_back(w.get<double>());
        for (const Wide w : places) {
            const auto below = side(loop_.loop(loop_.d(w * (1.0L - frequency_tolerance))));
            const auto above = side(loop_.loop(loop_.d(w * (1.0L + frequency_tolerance))));
            // Where |L| is under 1e-6 the place hangs on rounding.
            if (w == 0.0L || std::abs(loop_.loop(loop_.d(w))) < negligible_loop)
                continue;
            if ((!below || !above || *below == *above))
                add(figure, "no crossing at " + std::to_string(w));
        }
        for (std::size_t i = 1; i < scan_.size(); ++i) {
            const auto below = side(values_[i - 1]);
            const auto above = side(values_[i]);
            if (!below || !above || *below == *above || std::abs(values_[i]) < negligible_loop)
                continue;
            // Through a zero on the axis L jumps to the other side of 0.
            constexpr Wide jump = 2.0L;
            if (std::abs(std::arg(values_[i] * std::conj(values_[i - 1]))) > jump)
                continue;
            const bool known = std::any_of(places.begin(), places.end(), [&](Wide w) {
                return w >= scan_[i - 1] * (1.0L - frequency_tolerance) &&
                       w <= scan_[i] * (1.0L + frequency_tolerance);
            });
            if (!known && scan_[i] < loop_.half_rate() * (1.0L - frequency_tolerance))
                add(figure, "one missing near " + std::to_string(scan_[i]));
        }
    }

    void compare_phase_margin() {
        Wide smallest = HUGE_VALL;
        Wide delay = HUGE_VALL;
        for (const Json& place : printed_.at("crossovers_rad_s")) {
            const Wide w = place.get<double>();
            const Wide margin = std::arg(-loop_.loop(loop_.d(w)));
            if (std::abs(margin) < std::abs(smallest))
                smallest = margin;
            delay = std::min(delay, (margin > 0.0L ? margin : margin + 2.0L * pi) / w);
        }
        compare("phase_margin_deg", smallest * 180.0L / pi, level_tolerance);
        compare("delay_margin_s", delay, frequency_tolerance * delay);
    }

    void compare_gain_margins() {
        Wide increase = HUGE_VALL;
        Wide decrease = HUGE_VALL;
        for (const Json& place : printed_.at("phase_crossings_rad_s")) {
            const Wide w = place.get<double>();
            if (w == 0.0L)
                return; // needs the limit at w = 0
            const Wide level = decibel(std::abs(loop_.loop(loop_.d(w))));
            (level < 0.0L ? increase : decrease) =
                std::min(level < 0.0L ? increase : decrease, std::abs(level));
        }
        // A crossing where L is 0 but for rounding says nothing.
        constexpr Wide nothing_db = 120.0L;
        if (increase < nothing_db)
            compare("gain_margin_db", increase, level_tolerance);
        compare("gain_reduction_margin_db", decrease, level_tolerance);
    }

    void compare_peak(const std::string& figure,
                      const std::function<Wide(WideComplex, WideComplex)>& size) {
        const auto at = [&](Wide w) {
            const WideComplex d = loop_.d(w);
            return size(loop_.compensator(d), loop_.loop(d));
        };
        std::size_t best = 0;
        std::vector<Wide> sizes;
        for (std::size_t i = 0; i < scan_.size(); ++i) {
            sizes.push_back(size(loop_.compensator(loop_.d(scan_[i])), values_[i]));
            if (sizes[i] > sizes[best])
                best = i;
        }
        Wide low = scan_[best > 0 ? best - 1 : best];
        Wide high = scan_[std::min(best + 1, scan_.size() - 1)];
        constexpr int thirds = 80; // each keeps two thirds of the bracket
        for (int i = 0; i < thirds; ++i) {
            const Wide third = (high - low) / 3.0L;
            if (at(low + third) < at(high - third))
                low += third;
            else
                high -= third;
        }
        compare(figure, decibel(std::max(sizes[best], at(low))), level_tolerance);
    }

    /// How far a pole is off tells one step of Newton on the characteristic function.
    void compare_poles() {
        for (const Json& pole : printed_.at("closed_loop_poles_z")) {
            const WideComplex d(static_cast<Wide>(pole.at(0).get<double>()) - 1.0L,
                                pole.at(1).get<double>());
            // Near z = 0 stand the many poles of a delay, of which none is sharp.
            constexpr Wide smallest = 1e-3L;
            if (std::abs(1.0L + d) < smallest)
                continue;
            const auto step = newton_step(d, 1e-3L * std::max(std::abs(d), smallest));
            if (!step)
                continue;
            const Wide off = std::abs(*step);
            if (!(off <= frequency_tolerance * std::abs(1.0L + d))) {
                std::ostringstream line;
                line << pole << " is off by " << off;
                add("closed_loop_poles_z", line.str());
            }
        }
    }

    /// Value over slope from places on a circle (Cauchy's integral formula): at `d` itself a root
    /// common to plant and sections would give 0/0. Nothing for a multiple root, which has no
    /// slope.
    std::optional<WideComplex> newton_step(WideComplex d, Wide radius) const {
        constexpr int places = 16;
        WideComplex value = 0.0L;
        WideComplex slope = 0.0L;
        Wide largest = 0.0L;
        for (int i = 0; i < places; ++i) {
            const WideComplex direction = std::exp(2.0L * pi * j * ((i + 0.5L) / places));
            const WideComplex here = loop_.characteristic(d + radius * direction);
            largest = std::max(largest, std::abs(here));
            value += here;
            slope += here / (radius * direction);
        }
        constexpr Wide no_slope = 1e-6L;
        if (std::abs(slope) * radius < no_slope * largest)
            return std::nullopt;
        return value / slope;
    }

    std::string name_;
    const SectionLoop& loop_;
    const Json& printed_;
    std::vector<Wide> scan_;
    std::vector<WideComplex> values_;
    std::vector<std::string> found_;
};

std::vector<std::string> response_differences(const Assessed& assessed) {
    std::vector<std::string> found;
    const double period = assessed.project.sampling->sample_period_s;
    constexpr int points = 60;
    for (int i = 0; i < points; ++i) {
        const double w =
            static_cast<double>(pi) / period * std::pow(10.0, -3.0 * i / points) * 0.999;
        const WideComplex written = sections_at(
            assessed.handover, circle_minus_1(static_cast<Wide>(w) * static_cast<Wide>(period)));
        const WideComplex own = method_response(assessed.project, w);
        if (!(std::abs(written - own) <= response_tolerance * std::abs(own))) {
            std::ostringstream line;
            line << "sections at " << w << " rad/s: " << written << ", the method's own " << own;
            found.push_back(line.str());
        }
    }
    return found;
}

} // namespace

std::vector<std::string> section_differences(const Assessed& assessed) {
    std::vector<std::string> found;
    if (assessed.project.realisation->number_format.type == NumberFormat::Type::float64)
        found = response_differences(assessed);
    for (std::size_t i = 0; i < assessed.project.plant_cases.size(); ++i) {
        const PlantCase& plant_case = assessed.project.plant_cases[i];
        if (std::holds_alternative<MeasurementSource>(plant_case.source))
            continue;
        const SectionLoop loop(assessed.handover, *model_of(plant_case.source),
                               assessed.project.sampling->computation_delay_s);
        const Json& printed = assessed.assessment.at("cases").at(i).at("loops").at("realised");
        const auto more = Recomputation(plant_case.name, loop, printed).run();
        found.insert(found.end(), more.begin(), more.end());
    }
    return found;
}

} // namespace cornerwright::outside
