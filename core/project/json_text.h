#pragma once

#include "core/numerics/complex.h"

#include <span>
#include <string>
#include <string_view>

namespace cornerwright {

/// `text` as a JSON string, quotes included. Bytes that are not UTF-8 become U+FFFD.
std::string json_string(std::string_view text);

/// One JSON object on a single line, keys in the order in which they are added.
class JsonLine {
  public:
    JsonLine& raw(std::string_view key, std::string_view json);
    JsonLine& text(std::string_view key, std::string_view value);
    JsonLine& number(std::string_view key, double value);
    JsonLine& boolean(std::string_view key, bool value);
    JsonLine& numbers(std::string_view key, std::span<const double> values);
    /// [[real, imaginary], ...]
    JsonLine& roots(std::string_view key, const ComplexVector& values);

    /// {"key": value, ...}
    std::string str() const { return "{" + members_ + "}"; }

  private:
    std::string members_;
};

} // namespace cornerwright
