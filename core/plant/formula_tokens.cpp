#include "core/plant/formula_tokens.h"

#include "core/numerics/error.h"

#include <charconv>
#include <cmath>

namespace cornerwright {
namespace {

bool is_digit(char c) {
    return c >= '0' && c <= '9';
}
bool is_letter(char c) {
    return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || c == '_';
}
bool is_space(char c) {
    return c == ' ' || c == '\t' || c == '\n' || c == '\r';
}
/// Second and later bytes of a UTF-8 character: they do not count as columns.
bool continues_character(char c) {
    return (static_cast<unsigned char>(c) & 0xc0U) == 0x80U;
}

class Scanner {
  public:
    explicit Scanner(std::string_view text) : text_(text) {}

    FormulaToken next() {
        FormulaToken token;
        token.behind_space = place_ == 0;
        for (; place_ < text_.size() && is_space(text_[place_]); ++place_)
            token.behind_space = true;
        token.column = column();
        if (place_ == text_.size())
            return token;
        const char c = text_[place_];
        if (is_digit(c) || c == '.')
            scan_number(token);
        else if (is_letter(c))
            scan_word(token);
        else
            scan_symbol(token);
        return token;
    }

  private:
    /// Of `place_`; counts on from where it was asked for last.
    int column() {
        for (; counted_ < place_; ++counted_)
            if (!continues_character(text_[counted_]))
                ++column_;
        return column_;
    }

    [[noreturn]] void refuse(const FormulaToken& token, const char* expected,
                             const std::string& found) const {
        throw InputError({{}, {}, token.column}, expected, found);
    }

    void scan_number(FormulaToken& token) {
        const char* begin = text_.data() + place_;
        const char* end = text_.data() + text_.size();
        const auto result = std::from_chars(begin, end, token.number);
        token.kind = FormulaToken::Kind::number;
        if (result.ec == std::errc::invalid_argument)
            refuse(token, "a number", "\".\"");
        token.text.assign(begin, result.ptr);
        if (result.ec == std::errc::result_out_of_range ||
            !std::isfinite(static_cast<double>(token.number)))
            refuse(token, "a number of a size that can be computed with", token.text);
        place_ += token.text.size();
    }

    void scan_word(FormulaToken& token) {
        const auto begin = place_;
        while (place_ < text_.size() && is_letter(text_[place_]))
            ++place_;
        token.text = text_.substr(begin, place_ - begin);
        if (token.text == "s")
            token.kind = FormulaToken::Kind::laplace_s;
        else if (token.text == "exp")
            token.kind = FormulaToken::Kind::exponential;
        else
            refuse(token, "a number, s, exp(-T s) or an operator", '"' + token.text + '"');
    }

    void scan_symbol(FormulaToken& token) {
        const auto begin = place_++;
        while (place_ < text_.size() && continues_character(text_[place_]))
            ++place_;
        token.text = text_.substr(begin, place_ - begin);
        token.kind = FormulaToken::Kind::symbol;
        token.symbol = token.text.front();
        if (token.text == ",")
            refuse(token, "a point as decimal sign", "a comma");
        constexpr std::string_view known = "+-*/^()";
        if (token.text.size() != 1 || known.find(token.symbol) == std::string_view::npos)
            refuse(token, "a number, s, exp(-T s) or an operator", '"' + token.text + '"');
    }

    std::string_view text_;
    std::size_t place_ = 0;
    std::size_t counted_ = 0;
    int column_ = 1;
};

} // namespace

std::vector<FormulaToken> formula_tokens(std::string_view text) {
    Scanner scanner(text);
    std::vector<FormulaToken> tokens;
    do
        tokens.push_back(scanner.next());
    while (tokens.back().kind != FormulaToken::Kind::end);
    return tokens;
}

} // namespace cornerwright
