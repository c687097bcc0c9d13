#include "tests/outside/case_differences.h"

#include <algorithm>
#include <cmath>
#include <complex>
#include <limits>
#include <map>
#include <sstream>

namespace cornerwright::outside {
namespace {

struct Tolerance {
    double relative = 0.0;
    double absolute = 0.0;

    double allowed(double expected) const {
        return std::max(relative * std::abs(expected), absolute);
    }
};

bool ends_with(const std::string& text, const std::string& end) {
    return text.size() >= end.size() &&
           text.compare(text.size() - end.size(), end.size(), end) == 0;
}

/// The table of the header. `eighth_s`: an eighth of the sample period of a realised loop, else 0.
Tolerance usual_tolerance(const std::string& key, bool realised, double eighth_s) {
    if (key == "sensitivity_peak_at_rad_s" || key == "complementary_peak_at_rad_s")
        return {1e-4, 0.0};
    if (ends_with(key, "_rad_s") || key == "delay_margin_s" || key == "step" || key == "ramp" ||
        key == "parabola")
        return {1e-6, 1e-12};
    if (ends_with(key, "_db") || ends_with(key, "_deg"))
        return {0.0, 1e-4};
    const double time_share = realised ? 0.01 : 0.002;
    if (key == "overshoot_percent")
        return {time_share, realised ? 0.1 : 0.05};
    if (key == "settling_time_s")
        return {0.01, eighth_s};
    if (key == "peak_time_s" || key == "rise_time_s")
        return {time_share, eighth_s};
    return {time_share, 0.0}; // control and disturbance peak
}

class Comparison {
  public:
    Comparison(const ReferenceCase& reference, const Json& assessment)
        : reference_(reference), assessment_(assessment) {}

    std::vector<std::string> run() {
        for (const Json& expected : reference_.expected.at("cases"))
            compare_case(expected);
        if (reference_.expected.contains("verdict"))
            compare_text("verdict", reference_.expected.at("verdict"), assessment_.at("verdict"));
        if (reference_.expected.contains("requirements"))
            compare_requirements();
        return std::move(found_);
    }

  private:
    void add(const std::string& where, const Json& expected, const Json& found,
             const std::string& more = "") {
        std::ostringstream line;
        line << where << ": expected " << expected << ", found " << found << more;
        found_.push_back(line.str());
    }

    void compare_text(const std::string& where, const Json& expected, const Json& found) {
        if (expected != found)
            add(where, expected, found);
    }

    /// What the case says about this figure; the most exact name counts.
    const Json& own_tolerance(const std::string& where, const std::string& key) const {
        static const Json none = Json::object();
        for (const std::string& name : {where, key})
            if (reference_.tolerances.contains(name))
                return reference_.tolerances.at(name);
        return none;
    }

    void compare_case(const Json& expected) {
        const auto& name = expected.at("name").get_ref<const std::string&>();
        for (const Json& found : assessment_.at("cases")) {
            if (found.at("name") != name)
                continue;
            for (const auto& [loop, figures] : expected.at("loops").items())
                if (found.at("loops").contains(loop))
                    compare_loop(name + "|" + loop, loop == "realised", figures,
                                 found.at("loops").at(loop));
                else
                    found_.push_back(name + " has no " + loop + " loop");
            return;
        }
        found_.push_back("no case " + name);
    }

    void compare_loop(const std::string& place, bool realised, const Json& expected,
                      const Json& found) {
        const double eighth =
            realised ? reference_.project.at("sampling").at("sample_period_s").get<double>() / 8.0
                     : 0.0;
        for (const auto& [key, value] : expected.items()) {
            const std::string where = place + "|" + key;
            const Json actual = found.value(key, Json());
            const Json& own = own_tolerance(where, key);
            if (key == "stable")
                compare_text(where, value, actual);
            else if (key == "steady_state_error")
                for (const auto& [input, error] : value.items())
                    compare_figure(where + "|" + input, error, actual.value(input, Json()),
                                   with_own(usual_tolerance(input, realised, 0.0), own));
            else if (key.starts_with("closed_loop_poles"))
                compare_poles(where, value, actual, realised ? 1e-8 : 1e-6, own);
            else if (key.ends_with("crossovers_rad_s") || key.ends_with("crossings_rad_s"))
                compare_crossings(where, value, actual,
                                  with_own(usual_tolerance(key, realised, 0.0), own), own);
            else
                compare_figure(where, value, actual,
                               with_own(usual_tolerance(key, realised, eighth), own));
        }
    }

    static Tolerance with_own(Tolerance usual, const Json& own) {
        if (!own.contains("rel") && !own.contains("abs"))
            return usual;
        return {own.value("rel", usual.relative), own.value("abs", usual.absolute)};
    }

    void compare_figure(const std::string& where, const Json& expected, const Json& found,
                        Tolerance tolerance) {
        if (!expected.is_number() || !found.is_number())
            return compare_text(where, expected, found);
        const double off = std::abs(expected.get<double>() - found.get<double>());
        if (!(off <= tolerance.allowed(expected.get<double>()))) {
            std::ostringstream more;
            more << ", off by " << off << " where " << tolerance.allowed(expected.get<double>())
                 << " is allowed";
            add(where, expected, found, more.str());
        }
    }

    /// Both lists ascend: walks them together.
    void compare_crossings(const std::string& where, const Json& expected, const Json& found,
                           Tolerance tolerance, const Json& own) {
        if (!found.is_array())
            return add(where, expected, found);
        const double complete_to =
            own.value("complete_to", std::numeric_limits<double>::infinity());
        const auto optional = own.value("optional", std::vector<double>{});
        const auto compared = [&](double w) {
            return w <= complete_to * (1.0 - tolerance.relative) &&
                   std::none_of(optional.begin(), optional.end(),
                                [&](double may) { return std::abs(may - w) <= 1e-6 * may; });
        };
        std::vector<double> wanted;
        std::vector<double> given;
        for (const Json& w : expected)
            if (compared(w))
                wanted.push_back(w);
        for (const Json& w : found)
            if (compared(w))
                given.push_back(w);
        bool equal = wanted.size() == given.size();
        for (std::size_t i = 0; equal && i < wanted.size(); ++i)
            equal = std::abs(wanted[i] - given[i]) <= tolerance.allowed(wanted[i]);
        if (!equal || !std::is_sorted(given.begin(), given.end()))
            add(where, wanted, given);
    }

    /// Expected poles take the nearest found ones, the closest pairs first.
    void compare_poles(const std::string& where, const Json& expected, const Json& found,
                       double relative, const Json& own) {
        using Complex = std::complex<double>;
        if (!found.is_array())
            return add(where, expected, found);
        const auto number = [](const Json& pair) {
            return Complex(pair.at(0).get<double>(), pair.at(1).get<double>());
        };
        std::multimap<double, std::pair<std::size_t, std::size_t>> pairs;
        for (std::size_t i = 0; i < expected.size(); ++i)
            for (std::size_t k = 0; k < found.size(); ++k)
                pairs.emplace(std::abs(number(expected[i]) - number(found[k])),
                              std::make_pair(i, k));
        std::vector<bool> used(found.size(), false);
        std::vector<bool> matched(expected.size(), false);
        for (const auto& [distance, pair] : pairs) {
            const auto [i, k] = pair;
            if (used[k] || matched[i])
                continue;
            used[k] = matched[i] = true;
            double allowed = own.value("rel", relative) * std::abs(number(expected[i]));
            if (own.contains("abs")) {
                // A list of one stands for all.
                const Json& list = own.at("abs");
                const Json& entry = list.is_array() ? list.at(std::min(i, list.size() - 1)) : list;
                allowed = std::max(allowed, entry.get<double>());
            }
            if (!(distance <= allowed)) {
                std::ostringstream more;
                more << ", off by " << distance << " where " << allowed << " is allowed";
                add(where, expected[i], found[k], more.str());
            }
        }
        if (expected.size() != found.size())
            add(where, expected, found);
    }

    void compare_requirements() {
        const Json& expected = reference_.expected.at("requirements");
        const Json& found = assessment_.at("requirements");
        for (std::size_t i = 0; i < expected.size(); ++i)
            for (const auto& [key, value] : expected[i].items()) {
                const std::string where = "requirement|" + std::to_string(i) + "|" + key;
                const Json actual = i < found.size() ? found[i].value(key, Json()) : Json();
                // Headrooms of dB and deg by difference, all others relative in the figure.
                const Tolerance usual{key == "worst" ? 1e-6 : 0.0, 1e-4};
                compare_figure(where, value, actual, with_own(usual, own_tolerance(where, key)));
            }
        if (expected.size() != found.size())
            add("requirements", expected.size(), found.size());
    }

    const ReferenceCase& reference_;
    const Json& assessment_;
    std::vector<std::string> found_;
};

} // namespace

std::vector<std::string> differences(const ReferenceCase& reference, const Json& assessment) {
    return Comparison(reference, assessment).run();
}

} // namespace cornerwright::outside
