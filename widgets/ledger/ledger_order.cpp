#include "widgets/ledger/ledger_order.h"

#include <algorithm>
#include <cmath>
#include <numeric>

namespace cornerwright {

namespace {

int rankOf(State state) {
    switch (state) {
    case State::unmet:
        return 0;
    case State::met:
        return 1;
    case State::undetermined:
        break;
    }
    return 2;
}

} // namespace

std::vector<std::size_t> ledgerOrder(const Verdict& verdict) {
    std::vector<std::size_t> order(verdict.requirements.size());
    std::iota(order.begin(), order.end(), std::size_t{0});
    std::ranges::stable_sort(order, [&verdict](std::size_t left, std::size_t right) {
        const Judgement& a = verdict.requirements[left].worst;
        const Judgement& b = verdict.requirements[right].worst;
        if (rankOf(a.state) != rankOf(b.state)) {
            return rankOf(a.state) < rankOf(b.state);
        }
        const double first = a.share.is_determined() ? a.share.value() : HUGE_VAL;
        const double second = b.share.is_determined() ? b.share.value() : HUGE_VAL;
        return first < second;
    });
    return order;
}

double barPosition(double share) {
    if (std::isinf(share)) {
        return share > 0.0 ? 1.0 : -1.0;
    }
    return share / (1.0 + std::abs(share));
}

} // namespace cornerwright
