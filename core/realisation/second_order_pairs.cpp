#include "core/realisation/second_order_pairs.h"

#include <algorithm>
#include <cmath>
#include <limits>

namespace cornerwright {
namespace {

/// 1 - |z|^2 for z = 1 + d, without the cancellation near the unit circle.
double depth_inside_circle(Complex d) {
    return -(2.0 * d.real() + std::norm(d));
}

double depth_of(const SectionRoots& section) {
    double depth = std::numeric_limits<double>::infinity();
    for (const Complex& pole : section.poles)
        depth = std::min(depth, std::abs(depth_inside_circle(pole)));
    return depth;
}

bool is_integrator(const SectionRoots& section) {
    return std::ranges::any_of(section.poles, [](const Complex& pole) { return pole == 0.0; });
}

bool nearer_the_circle(const SectionRoots& left, const SectionRoots& right) {
    if (is_integrator(left) != is_integrator(right))
        return is_integrator(left);
    return depth_of(left) < depth_of(right);
}

/// The poles in groups, those nearest the unit circle first.
std::vector<SectionRoots> pole_groups(const ComplexVector& poles) {
    std::vector<SectionRoots> groups;
    std::vector<double> single;
    for (const Complex& pole : poles) {
        if (pole == 0.0)
            groups.push_back({{}, {pole}});
        else if (pole.imag() == 0.0)
            single.push_back(pole.real());
        else if (pole.imag() > 0.0)
            groups.push_back({{}, {pole, std::conj(pole)}});
    }
    std::ranges::sort(single, {}, [](double d) { return std::abs(depth_inside_circle(d)); });
    std::size_t first = 0;
    if (single.size() % 2 == 1)
        groups.push_back({{}, {single[first++]}});
    for (std::size_t last = single.size(); first < last;) {
        --last;
        groups.push_back({{}, {single[first], single[last]}});
        ++first;
    }
    std::ranges::stable_sort(groups, nearer_the_circle);
    return groups;
}

bool is_single(const SectionRoots& group) {
    return group.poles.size() == 1;
}

/// Joins single poles, the nearest to the circle with the furthest, until `pairs` groups have two.
void join_singles(std::vector<SectionRoots>& groups, std::size_t pairs) {
    auto count = static_cast<std::size_t>(
        std::ranges::count_if(groups, [](const SectionRoots& group) { return !is_single(group); }));
    for (; count < pairs; ++count) {
        const auto first = std::ranges::find_if(groups, is_single);
        const auto last = std::find_if(groups.rbegin(), groups.rend(), is_single);
        first->poles.push_back(last->poles.front());
        groups.erase(std::next(last).base());
    }
}

/// The zeros not yet given away: real ones, and complex pairs by their upper member.
class ZeroStock {
  public:
    explicit ZeroStock(const ComplexVector& zeros) {
        for (const Complex& zero : zeros)
            if (zero.imag() >= 0.0)
                stock_.push_back(zero);
    }

    std::size_t complex_pairs() const {
        return static_cast<std::size_t>(
            std::ranges::count_if(stock_, [](const Complex& zero) { return zero.imag() > 0.0; }));
    }

    /// Gives `group` the zeros nearest to it. `other_pairs` second-order groups come after it.
    void serve(SectionRoots& group, std::size_t other_pairs) {
        const bool may_be_complex = !is_single(group);
        const bool must_be_complex = may_be_complex && other_pairs < complex_pairs();
        if (!take_nearest(group, may_be_complex, !must_be_complex))
            return;
        if (may_be_complex && group.zeros.size() == 1)
            take_nearest(group, false, true);
    }

  private:
    bool take_nearest(SectionRoots& group, bool complex_allowed, bool real_allowed) {
        const auto distance = [&group](const Complex& zero) {
            double least = std::numeric_limits<double>::infinity();
            for (const Complex& pole : group.poles)
                least = std::min(least, std::abs(zero - pole));
            return std::pair(least, std::abs(std::arg(1.0 + zero)));
        };
        auto best = stock_.end();
        for (auto zero = stock_.begin(); zero != stock_.end(); ++zero) {
            const bool allowed = zero->imag() > 0.0 ? complex_allowed : real_allowed;
            if (allowed && (best == stock_.end() || distance(*zero) < distance(*best)))
                best = zero;
        }
        if (best == stock_.end())
            return false;
        group.zeros.push_back(*best);
        if (best->imag() > 0.0)
            group.zeros.push_back(std::conj(*best));
        stock_.erase(best);
        return true;
    }

    ComplexVector stock_;
};

} // namespace

std::vector<SectionRoots> second_order_pairs(const RootForm& function) {
    std::vector<SectionRoots> groups = pole_groups(function.poles);
    ZeroStock zeros(function.zeros);
    join_singles(groups, zeros.complex_pairs());
    auto pairs_left = static_cast<std::size_t>(
        std::ranges::count_if(groups, [](const SectionRoots& group) { return !is_single(group); }));
    for (SectionRoots& group : groups) {
        if (!is_single(group))
            --pairs_left;
        zeros.serve(group, pairs_left);
    }
    std::ranges::reverse(groups);
    return groups;
}

} // namespace cornerwright
