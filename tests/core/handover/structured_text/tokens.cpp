#include "tests/core/handover/structured_text/tokens.h"

#include "tests/core/handover/structured_text/program.h"

#include <algorithm>
#include <array>
#include <cctype>

namespace cornerwright::test::st {
namespace {

class Lexer {
  public:
    explicit Lexer(std::string_view text) : text_(text) {}

    std::vector<Token> all() {
        std::vector<Token> tokens;
        do {
            skip_blanks_and_comments();
            tokens.push_back(next());
        } while (tokens.back().kind != Token::Kind::end);
        return tokens;
    }

  private:
    char at(std::size_t ahead = 0) const {
        return place_ + ahead < text_.size() ? text_[place_ + ahead] : '\0';
    }
    static bool is_digit(char c) { return c >= '0' && c <= '9'; }
    static bool is_letter(char c) { return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z'); }

    [[noreturn]] void refuse(const std::string& what) const {
        throw TextError("line " + std::to_string(line_) + ": " + what);
    }

    void advance() {
        if (at() == '\n')
            ++line_;
        ++place_;
    }

    void skip_blanks_and_comments() {
        while (place_ < text_.size()) {
            if (at() == '(' && at(1) == '*') {
                skip_comment();
            } else if (at() == ' ' || at() == '\n' || at() == '\t') {
                advance();
            } else {
                return;
            }
        }
    }

    void skip_comment() {
        place_ += 2;
        while (!(at() == '*' && at(1) == ')')) {
            if (place_ >= text_.size())
                refuse("a comment without an end");
            if (at() == '(' && at(1) == '*')
                refuse("a comment within a comment, which not every edition knows");
            advance();
        }
        place_ += 2;
    }

    Token next() {
        if (place_ >= text_.size())
            return {Token::Kind::end, "", line_};
        if (is_letter(at()) || at() == '_')
            return word();
        if (is_digit(at()))
            return number();
        for (const std::string_view sign :
             {":=", "<=", ">=", "<>", "<", ">", "=", "+", "-", "*", "/", "(", ")", ":", ";", ","})
            if (text_.substr(place_, sign.size()) == sign) {
                place_ += sign.size();
                return {Token::Kind::sign, std::string(sign), line_};
            }
        refuse(std::string("the character ") + at());
    }

    Token word() {
        Token token{Token::Kind::word, "", line_};
        while (is_letter(at()) || is_digit(at()) || at() == '_') {
            token.text += static_cast<char>(std::tolower(at()));
            ++place_;
        }
        if (token.text.find("__") != std::string::npos || token.text.back() == '_')
            refuse("the name " + token.text + " with underscores that the standard refuses");
        return token;
    }

    void digits(std::string& text) {
        if (!is_digit(at()))
            refuse("a number without digits where they belong");
        while (is_digit(at())) {
            text += at();
            ++place_;
        }
    }

    Token number() {
        Token token{Token::Kind::integer, "", line_};
        digits(token.text);
        if (at() != '.') {
            if (at() == 'e' || at() == 'E')
                refuse("a real number without a point");
            return token;
        }
        token.kind = Token::Kind::real;
        token.text += '.';
        ++place_;
        digits(token.text);
        if (at() == 'e' || at() == 'E') {
            token.text += 'e';
            ++place_;
            if (at() == '+' || at() == '-') {
                token.text += at();
                ++place_;
            }
            digits(token.text);
        }
        return token;
    }

    std::string_view text_;
    std::size_t place_ = 0;
    int line_ = 1;
};

} // namespace

std::vector<Token> tokens_of(std::string_view text) {
    return Lexer(text).all();
}

bool is_keyword(std::string_view word) {
    constexpr std::array<std::string_view, 41> keywords{
        "and",          "array",  "at",      "bool",           "by",      "case",
        "constant",     "dint",   "do",      "else",           "elsif",   "end_for",
        "end_function", "end_if", "end_var", "end_while",      "exit",    "false",
        "for",          "if",     "int",     "lint",           "lreal",   "mod",
        "not",          "of",     "or",      "real",           "repeat",  "return",
        "then",         "to",     "true",    "until",          "var",     "var_input",
        "var_output",   "while",  "xor",     "function_block", "var_temp"};
    return std::ranges::find(keywords, word) != keywords.end();
}

} // namespace cornerwright::test::st
