#include "core/loop/steady_values.h"

namespace cornerwright {
namespace {

/// value * s^order near s = 0.
struct LowEnd {
    double value = 0.0;
    int order = 0;
};

LowEnd low_end(const RootForm& form) {
    RootForm rest{{}, {}, form.gain};
    LowEnd end;
    for (const Complex& zero : form.zeros) {
        if (zero == 0.0)
            ++end.order;
        else
            rest.zeros.push_back(zero);
    }
    for (const Complex& pole : form.poles) {
        if (pole == 0.0)
            --end.order;
        else
            rest.poles.push_back(pole);
    }
    end.value = evaluate(rest, 0.0).real();
    return end;
}

/// value * s^order at s = 0.
double at_zero(double value, int order, bool& finite) {
    if (order < 0)
        finite = false;
    return order == 0 ? value : 0.0;
}

} // namespace

SteadyValues steady_values(const RootForm& compensator, const RootForm& plant) {
    const LowEnd c = low_end(compensator);
    const LowEnd p = low_end(plant);
    SteadyValues values;
    const int order = c.order + p.order;
    if (order < 0) {
        values.y = 1.0;
        values.u = at_zero(1.0 / p.value, -p.order, values.finite);
        values.y_disturbance = at_zero(1.0 / c.value, -c.order, values.finite);
        return values;
    }
    const double loop = order == 0 ? c.value * p.value : 0.0;
    values.y = loop / (1.0 + loop);
    values.u = at_zero(c.value / (1.0 + loop), c.order, values.finite);
    values.y_disturbance = at_zero(p.value / (1.0 + loop), p.order, values.finite);
    return values;
}

} // namespace cornerwright
