#include "core/plant/formula.h"

#include "core/numerics/error.h"
#include "core/plant/factored.h"
#include "core/plant/formula_tokens.h"

#include <cmath>
#include <cstdlib>

namespace cornerwright {
namespace {

/// Bounds that no plant reaches and that keep a typing slip from filling memory or the call stack.
constexpr std::size_t longest_formula = 20'000; // characters
constexpr int deepest_nesting = 100;            // parentheses
constexpr std::size_t highest_order = 60;       // zeros or poles
constexpr std::size_t longest_sum = 200;        // terms
constexpr std::size_t widest_sum = 240;         // zeros and poles of all its terms

using Kind = FormulaToken::Kind;

/// Recursive descent over the tokens. Every method leaves the place behind what it read.
class Parser {
  public:
    explicit Parser(std::string_view text) : tokens_(formula_tokens(text)) {}

    Factored whole() {
        if (here().kind == Kind::end)
            refuse(here(), "a formula in s", "nothing");
        Factored value = expression();
        if (here().kind != Kind::end)
            refuse(here(), "an operator or the end of the formula", found(here()));
        return value;
    }

  private:
    struct Factor {
        Factored value;
        bool bare = false; ///< does not begin with a parenthesis
    };

    const FormulaToken& here() const { return tokens_[place_]; }
    const FormulaToken& take() { return tokens_[place_++]; }

    [[noreturn]] static void refuse(const FormulaToken& token, const std::string& expected,
                                    const std::string& found) {
        throw InputError({{}, {}, token.column}, expected, found);
    }

    static std::string found(const FormulaToken& token) {
        return token.kind == Kind::end ? "the end of the formula" : '"' + token.text + '"';
    }

    /// What a computation may hold before it is used further.
    static Factored checked(Factored value, const FormulaToken& at) {
        if (value.zeros.size() > highest_order || value.poles.size() > highest_order)
            refuse(at, "a plant of order " + std::to_string(highest_order) + " at most",
                   "a higher order");
        const auto gain = static_cast<double>(value.gain);
        if (!std::isfinite(gain) || (gain == 0.0 && !value.is_zero()) ||
            !std::isfinite(static_cast<double>(value.dead_time)))
            refuse(at, "values of a size that can be computed with", "a value beyond them");
        for (const auto* roots : {&value.zeros, &value.poles})
            for (const auto& root : *roots)
                if (!std::isfinite(static_cast<double>(std::abs(root))))
                    refuse(at, "roots of a size that can be computed with", "a root beyond them");
        return value;
    }

    /// Sums are taken whole, so that a polynomial's roots are solved for once.
    Factored expression() {
        const FormulaToken& start = here();
        std::vector<Factored> terms{term()};
        while (here().is('+') || here().is('-')) {
            const FormulaToken sign = take();
            Factored next = term();
            if (sign.is('-'))
                next.gain = -next.gain;
            if (!next.is_zero() && !terms.front().is_zero() &&
                next.dead_time != terms.front().dead_time)
                refuse(sign, "terms of one and the same dead time in a sum",
                       "two different dead times");
            if (terms.front().is_zero())
                terms.front() = std::move(next);
            else
                terms.push_back(std::move(next));
        }
        std::size_t factors = 0;
        for (const Factored& each : terms)
            factors += each.zeros.size() + each.poles.size();
        if (terms.size() > longest_sum)
            refuse(start, "a sum of " + std::to_string(longest_sum) + " terms at most",
                   std::to_string(terms.size()) + " terms");
        if (terms.size() > 1 && factors > widest_sum)
            refuse(start, "a sum with " + std::to_string(widest_sum) + " zeros and poles at most",
                   std::to_string(factors) + " of them");
        return checked(sum(terms), start);
    }

    bool begins_factor() const {
        return here().kind == Kind::number || here().kind == Kind::laplace_s ||
               here().kind == Kind::exponential || here().is('(');
    }

    Factored term() {
        Factored value = signed_power().value;
        bool behind_bare_divisor = false;
        for (;;) {
            const FormulaToken at = here();
            if (at.is('/')) {
                take();
                const FormulaToken divisor_at = here();
                const Factor divisor = signed_power();
                check_divisor(divisor.value, divisor_at);
                value = checked(value / divisor.value, at);
                behind_bare_divisor = divisor.bare;
            } else if (at.is('*')) {
                take();
                value = checked(value * signed_power().value, at);
                behind_bare_divisor = false;
            } else if (begins_factor()) {
                check_juxtaposed(at, behind_bare_divisor);
                value = checked(value * power().value, at);
            } else {
                return value;
            }
        }
    }

    static void check_divisor(const Factored& divisor, const FormulaToken& at) {
        if (divisor.is_zero())
            refuse(at, "a divisor that is not zero", "zero");
        if (divisor.dead_time != 0.0L)
            refuse(at, "dead time in the numerator only", "exp(-T s) in a denominator");
    }

    static void check_juxtaposed(const FormulaToken& at, bool behind_bare_divisor) {
        if (behind_bare_divisor)
            refuse(at,
                   "parentheses that tell whether this belongs to the divisor, as in (1/2) s or "
                   "1/(2 s)",
                   found(at));
        if (at.kind == Kind::number && !at.behind_space)
            refuse(at, "an operator before a number", found(at));
    }

    Factor signed_power() {
        bool negative = false;
        while (here().is('+') || here().is('-'))
            negative ^= take().is('-');
        Factor factor = power();
        if (negative)
            factor.value.gain = -factor.value.gain;
        return factor;
    }

    Factor power() {
        const FormulaToken at = here();
        Factor factor{primary(), !at.is('(')};
        if (!here().is('^'))
            return factor;
        take();
        const FormulaToken exponent_at = here();
        const int exponent = whole_exponent();
        if (here().is('^'))
            refuse(here(), "one power; a power of a power needs parentheses", found(here()));
        if (exponent < 0) {
            check_divisor(factor.value, at);
            factor.value = Factored{1.0L, {}, {}, 0.0L} / factor.value;
        }
        const Factored base = factor.value;
        factor.value = {1.0L, {}, {}, 0.0L};
        for (int i = 0; i < std::abs(exponent); ++i)
            factor.value = checked(factor.value * base, exponent_at);
        return factor;
    }

    int whole_exponent() {
        const bool in_parentheses = here().is('(');
        if (in_parentheses)
            take();
        bool negative = false;
        if (here().is('+') || here().is('-'))
            negative = take().is('-');
        const FormulaToken number = here();
        const bool whole =
            number.kind == Kind::number && std::trunc(number.number) == number.number;
        if (!whole)
            refuse(number, "a whole number as power", found(number));
        take();
        if (number.number > static_cast<long double>(highest_order))
            refuse(number, "a power of " + std::to_string(highest_order) + " at most",
                   found(number));
        if (in_parentheses && !take().is(')'))
            refuse(tokens_[place_ - 1], "\")\" behind the power", found(tokens_[place_ - 1]));
        const int size = static_cast<int>(number.number);
        return negative ? -size : size;
    }

    Factored primary() {
        const FormulaToken& token = here();
        switch (token.kind) {
        case Kind::number:
            take();
            return {token.number, {}, {}, 0.0L};
        case Kind::laplace_s:
            take();
            return {1.0L, {0.0L}, {}, 0.0L};
        case Kind::exponential:
            take();
            return exponential();
        case Kind::symbol:
            if (token.is('('))
                return parenthesised();
            break;
        case Kind::end:
            break;
        }
        refuse(token, "a number, s, exp(-T s) or \"(\"", found(token));
    }

    Factored parenthesised() {
        const FormulaToken& opening = take();
        if (++depth_ > deepest_nesting)
            refuse(opening, std::to_string(deepest_nesting) + " nested parentheses at most",
                   "more of them");
        Factored value = expression();
        if (!here().is(')'))
            refuse(here(), "\")\" for the \"(\" at character " + std::to_string(opening.column),
                   found(here()));
        take();
        --depth_;
        return value;
    }

    Factored exponential() {
        if (!here().is('('))
            refuse(here(), "\"(\" behind exp", found(here()));
        const FormulaToken& argument_at = here();
        const Factored argument = parenthesised();
        if (argument.is_zero())
            return {1.0L, {}, {}, 0.0L};
        const bool proportional = argument.dead_time == 0.0L && argument.poles.empty() &&
                                  argument.zeros.size() == 1 && argument.zeros.front() == 0.0L;
        if (!proportional)
            refuse(argument_at, "-T s as the argument of exp", "another expression");
        if (argument.gain > 0.0L)
            refuse(argument_at, "a dead time exp(-T s) with a minus sign",
                   "a response before its cause");
        return {1.0L, {}, {}, -argument.gain};
    }

    std::vector<FormulaToken> tokens_;
    std::size_t place_ = 0;
    int depth_ = 0;
};

} // namespace

PlantModel parse_formula(std::string_view text) {
    if (text.size() > longest_formula)
        throw InputError({{}, {}, static_cast<int>(longest_formula) + 1},
                         "a formula of " + std::to_string(longest_formula) + " characters at most",
                         std::to_string(text.size()) + " characters");
    const Factored plant = Parser(text).whole();
    if (plant.is_zero())
        throw InputError({{}, {}, 1}, "a plant that is not zero", "zero");
    return to_model(plant);
}

} // namespace cornerwright
