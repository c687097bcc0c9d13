#pragma once

#include "core/numerics/complex.h"
#include "core/numerics/figure.h"

#include <nlohmann/json.hpp>

namespace cornerwright::cli {

using Json = nlohmann::ordered_json;

/// [real, imaginary]
inline Json to_json(Complex value) {
    return Json::array({value.real(), value.imag()});
}

inline Json to_json(const ComplexVector& values) {
    Json list = Json::array();
    for (const Complex value : values)
        list.push_back(to_json(value));
    return list;
}

/// The number; "infinite" or "-infinite"; null where not determined.
inline Json to_json(const Figure& figure) {
    switch (figure.kind()) {
    case Figure::Kind::value:
        return figure.value();
    case Figure::Kind::infinite:
        return "infinite";
    case Figure::Kind::minus_infinite:
        return "-infinite";
    case Figure::Kind::undetermined:
        break;
    }
    return nullptr;
}

} // namespace cornerwright::cli
