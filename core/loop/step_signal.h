#pragma once

#include "core/loop/signal_search.h"

#include <optional>
#include <vector>

namespace cornerwright {

/// Points with values and slopes, joined by cubics. A time that stands twice is a jump of the
/// value or of the slope.
struct JoinedPoints {
    std::vector<double> t_s;
    std::vector<double> value;
    std::vector<double> slope;

    void append(double t, double v, double s) {
        t_s.push_back(t);
        value.push_back(v);
        slope.push_back(s);
    }
    double at(double t) const;
};

/// A signal of a step response for t >= 0: points up to the first time of the tail, a modal sum
/// from there on. Either may be all of it.
struct StepSignal {
    JoinedPoints points;
    double tail_from = 0.0;
    ModalSum tail;

    double at(double t) const;
    double final_value() const { return tail.constant(); }
    /// The largest |value| at the points and at some places of the tail.
    double size() const;
    /// True where every mode of the tail decays.
    bool settles() const;

    using Extreme = ModalSearch::Extreme;
    /// The largest of sign * signal; one that is only approached as t grows stands at infinity.
    Extreme largest(double sign) const;
    /// The first time at which sign * signal reaches `level`.
    std::optional<double> first_reaching(double level, double sign) const;
    /// The last time at which the signal lies farther than `band` (> 0) from its final value; 0
    /// where it never does.
    double last_outside(double band) const;
};

} // namespace cornerwright
