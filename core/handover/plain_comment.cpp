#include "core/handover/plain_comment.h"

#include <array>

namespace cornerwright {

std::string plain_comment(std::string_view text) {
    constexpr std::array<std::string_view, 5> parted{"*/", "/*", "(*", "*)", "??"};
    constexpr unsigned char first_printable = 0x20;
    constexpr unsigned char deleted = 0x7f;
    std::string result;
    for (const char c : text) {
        const auto byte = static_cast<unsigned char>(c);
        const char safe = byte < first_printable || byte == deleted ? ' ' : c;
        if (!result.empty())
            for (const std::string_view pair : parted)
                if (result.back() == pair[0] && safe == pair[1]) {
                    result += ' ';
                    break;
                }
        result += safe;
    }
    return result;
}

} // namespace cornerwright
