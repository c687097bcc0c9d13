#pragma once

#include <string>
#include <string_view>
#include <vector>

namespace cornerwright::test::st {

struct Token {
    enum class Kind { word, integer, real, sign, end };
    Kind kind = Kind::end;
    std::string text; ///< words in lower case
    int line = 1;
};

/// Comments are left out. Throws TextError at a character or comment that the standard does not
/// know.
std::vector<Token> tokens_of(std::string_view text);

bool is_keyword(std::string_view word);

} // namespace cornerwright::test::st
