#include "core/project/json_text.h"

#include "core/numerics/number_text.h"

#include <nlohmann/json.hpp>

namespace cornerwright {

std::string json_string(std::string_view text) {
    constexpr int no_indent = -1;
    return nlohmann::json(text).dump(no_indent, ' ', false,
                                     nlohmann::json::error_handler_t::replace);
}

JsonLine& JsonLine::raw(std::string_view key, std::string_view json) {
    if (!members_.empty())
        members_ += ", ";
    members_ += json_string(key) + ": ";
    members_ += json;
    return *this;
}

JsonLine& JsonLine::text(std::string_view key, std::string_view value) {
    return raw(key, json_string(value));
}

JsonLine& JsonLine::number(std::string_view key, double value) {
    return raw(key, number_text(value));
}

JsonLine& JsonLine::boolean(std::string_view key, bool value) {
    return raw(key, value ? "true" : "false");
}

JsonLine& JsonLine::numbers(std::string_view key, std::span<const double> values) {
    std::string list;
    for (const double value : values)
        list += (list.empty() ? "" : ", ") + number_text(value);
    return raw(key, "[" + list + "]");
}

JsonLine& JsonLine::roots(std::string_view key, const ComplexVector& values) {
    std::string list;
    for (const Complex value : values) {
        list += list.empty() ? "[" : ", [";
        list += number_text(value.real()) + ", " + number_text(value.imag()) + "]";
    }
    return raw(key, "[" + list + "]");
}

} // namespace cornerwright
