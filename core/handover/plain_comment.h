#pragma once

#include <string>
#include <string_view>

namespace cornerwright {

/// User text that cannot end or nest a comment of C or structured text, cannot be a trigraph and
/// stays on its line: "*/", "/*", "(*", "*)" and "??" are parted by a blank, control characters
/// become blanks.
std::string plain_comment(std::string_view text);

} // namespace cornerwright
