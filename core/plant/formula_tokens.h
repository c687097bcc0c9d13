#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

struct FormulaToken {
    enum class Kind { number, laplace_s, exponential, symbol, end };
    Kind kind = Kind::end;
    char symbol = '\0';        ///< one of + - * / ^ ( )
    long double number = 0.0L; ///< finite
    std::string text;          ///< as written, for messages
    int column = 1;            ///< characters, from 1
    bool behind_space = false; ///< a space or the beginning stands before it

    bool is(char wanted) const { return kind == Kind::symbol && symbol == wanted; }
};

/// Splits a formula; the last token is `end`. Throws InputError with the column for anything that
/// is not part of the grammar.
std::vector<FormulaToken> formula_tokens(std::string_view text);

} // namespace cornerwright
