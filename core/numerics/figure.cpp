#include "core/numerics/figure.h"

#include <cmath>
#include <utility>

namespace cornerwright {

Figure Figure::of(double value) {
    if (std::isnan(value))
        return undetermined("the computation gave no number");
    if (std::isinf(value))
        return value > 0.0 ? infinite() : minus_infinite();
    Figure figure;
    figure.kind_ = Kind::value;
    figure.value_ = value;
    return figure;
}

Figure Figure::infinite() {
    Figure figure;
    figure.kind_ = Kind::infinite;
    return figure;
}

Figure Figure::minus_infinite() {
    Figure figure;
    figure.kind_ = Kind::minus_infinite;
    return figure;
}

Figure Figure::undetermined(std::string reason) {
    Figure figure;
    figure.reason_ = std::move(reason);
    return figure;
}

double Figure::value() const {
    switch (kind_) {
    case Kind::infinite:
        return HUGE_VAL;
    case Kind::minus_infinite:
        return -HUGE_VAL;
    case Kind::value:
    case Kind::undetermined:
        break;
    }
    return value_;
}

Figure Figure::with_note(std::string note) const {
    Figure figure = *this;
    figure.note_ = std::move(note);
    return figure;
}

Figure Figure::with_standard_deviation(double deviation) const {
    Figure figure = *this;
    figure.standard_deviation_ = deviation;
    return figure;
}

} // namespace cornerwright
