#include "core/numerics/error.h"

#include <utility>

namespace cornerwright {
namespace {

std::string sentence(const InputPlace& place, const std::string& expected,
                     const std::string& found) {
    std::string text = place.file;
    if (place.line)
        text += (text.empty() ? "line " : ", line ") + std::to_string(*place.line);
    if (place.column)
        text += (text.empty() ? "column " : ", column ") + std::to_string(*place.column);
    if (!text.empty())
        text += ": ";
    return text + "expected " + expected + ", found " + found;
}

} // namespace

InputError::InputError(InputPlace place, std::string expected, std::string found)
    : std::runtime_error(sentence(place, expected, found)),
      place_(std::move(place)),
      expected_(std::move(expected)),
      found_(std::move(found)) {}

InputError InputError::in_file(const std::string& file) const {
    InputPlace place = place_;
    place.file = file;
    return {place, expected_, found_};
}

} // namespace cornerwright
