#pragma once

#include "core/realisation/difference_equation.h"
#include "core/realisation/run_plan.h"

#include <string>
#include <vector>

namespace cornerwright {

/// What C and structured text write differently.
class Dialect {
  public:
    virtual ~Dialect() = default;

    virtual std::string comment(const std::string& text) const = 0;
    virtual std::string assign(const std::string& target, const std::string& value) const = 0;
    /// A stored number, to read.
    virtual std::string state(const std::string& name) const = 0;
    /// The same, to be given a value.
    virtual std::string store(const std::string& name, const std::string& value) const = 0;
    virtual std::string real(double value) const = 0;

    /// Fixed point: a sum over 2^bits to the nearest integer, ties away from zero; a value cut to
    /// the word; both.
    virtual std::string shifted(const std::string& sum, int bits) const = 0;
    virtual std::string saturated(const std::string& value) const = 0;
    virtual std::string word(const std::string& sum, int bits) const = 0;

    virtual std::string both(const std::string& left, const std::string& right) const = 0;
    virtual std::string either(const std::string& left, const std::string& right) const = 0;
    virtual std::string negated(const std::string& condition) const = 0;
    virtual std::string open_if(const std::string& condition) const = 0;
    virtual std::string open_else() const = 0;
    virtual std::string close_if() const = 0;
};

struct TextConstant {
    std::string name;
    std::string value;
    bool of_limits = false; ///< an output limit, which reset needs too
};

/// One sample of a difference equation as statements, in the order of operations of the bit-true
/// run, with what they need to be declared. Input and output stand in `x` and `y`; before the first
/// statement x is the error, after the last y is the output.
struct StepText {
    std::vector<TextConstant> constants;
    std::vector<std::string> states;
    std::vector<std::string> locals; ///< besides x and y
    std::vector<std::string> step;
    std::vector<std::string> reset; ///< after everything is 0: y holds the output to start from
};

StepText step_text(const DifferenceEquation& equation, const Dialect& dialect);

} // namespace cornerwright
