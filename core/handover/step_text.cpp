#include "core/handover/step_text.h"

#include "core/handover/number_literals.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// One sum of products, its terms in the order in which they are added.
class Sum {
  public:
    void add(const std::string& term) { append(term, " + ", ""); }
    void subtract(const std::string& term) { append(term, " - ", "-"); }
    std::string text(const std::string& if_empty) const { return text_.empty() ? if_empty : text_; }

  private:
    void append(const std::string& term, const char* joint, const char* first) {
        text_ += (text_.empty() ? first : joint) + term;
    }
    std::string text_;
};

class StepWriter {
  public:
    StepWriter(const DifferenceEquation& equation, const Dialect& dialect)
        : equation_(equation),
          dialect_(dialect),
          format_(equation.realisation.number_format),
          structure_(equation.realisation.structure),
          fixed_(format_.type == NumberFormat::Type::fixed),
          plan_(run_plan(equation)) {}

    StepText write() {
        for (std::size_t i = 0; i < equation_.sections.size(); ++i)
            write_section(i);
        if (plan_.limits)
            write_limits();
        write_reset();
        return std::move(result_);
    }

  private:
    // ---- names, constants and sums of the section being written

    std::string named(const std::string& name) const {
        return "s" + std::to_string(section_ + 1) + "_" + name;
    }
    const DiscreteSection& section() const { return equation_.sections[section_]; }
    const SectionPlan& plan() const { return plan_.sections[section_]; }
    int bits() const { return format_.fraction_bits - section().shift; }
    int state_bits() const { return bits() + section().delta_shift; }
    std::string zero() const { return fixed_ ? "0" : dialect_.real(0.0); }

    std::string constant(const std::string& name, const std::string& value) {
        const auto same = [&name](const TextConstant& other) { return other.name == name; };
        if (std::ranges::none_of(result_.constants, same))
            result_.constants.push_back({name, value, false});
        return name;
    }

    /// Adds b or a (beta or alpha) number k times a signal; a coefficient of 0 is left out.
    void add_product(Sum& sum, bool numerator, std::size_t k, const std::string& signal) {
        const double value = numerator ? running_numerator(section(), structure_)[k]
                                       : running_denominator(section(), structure_)[k];
        if (value == 0.0)
            return;
        const bool delta = structure_ == Structure::delta;
        const std::string letter = numerator ? (delta ? "beta" : "b") : (delta ? "alpha" : "a");
        const auto& integers = numerator ? section().b_integers : section().a_integers;
        const std::string name =
            constant(named(letter + std::to_string(k)),
                     fixed_ ? std::to_string(integers[k]) : dialect_.real(value));
        const std::string product = name + " * " + signal;
        numerator ? sum.add(product) : sum.subtract(product);
    }

    /// A stored number in the scale of the sum.
    void add_state(Sum& sum, const std::string& name) {
        std::string text = dialect_.state(named(name));
        if (fixed_ && bits() > 0)
            text += " * " + constant(named("one"), std::to_string(std::int64_t{1} << bits()));
        sum.add(text);
    }

    std::string closed(const Sum& sum) const {
        const std::string text = sum.text(zero());
        return fixed_ ? dialect_.word(text, bits()) : text;
    }

    /// What a delta state becomes: its old value and an increment.
    std::string incremented(const std::string& name, const Sum& increment) const {
        const std::string old = dialect_.state(named(name));
        const std::string text = increment.text(zero());
        return fixed_ ? dialect_.saturated(old + " + " + dialect_.shifted(text, state_bits()))
                      : old + " + (" + text + ")";
    }

    // ---- statements

    void say(const std::string& statement) { result_.step.push_back(statement); }
    void let(const std::string& target, const std::string& value) {
        say(dialect_.assign(target, value));
    }
    std::string local(const std::string& name) {
        result_.locals.push_back(named(name));
        return named(name);
    }

    void write_section(std::size_t index) {
        section_ = index;
        const std::string count = std::to_string(equation_.sections.size());
        say(dialect_.comment("section " + std::to_string(index + 1) + " of " + count));
        if (index > 0)
            let("x", "y");
        if (plan().held_at_limits)
            let(local("x"), "x");
        if (structure_ == Structure::direct_form_1)
            write_direct_form_1();
        else
            write_two_states();
    }

    void write_direct_form_1() {
        const std::size_t order = plan().order;
        Sum sum;
        add_product(sum, true, 0, "x");
        for (std::size_t k = 1; k <= order; ++k)
            add_product(sum, true, k, dialect_.state(named("x" + std::to_string(k))));
        for (std::size_t k = 1; k <= order; ++k)
            add_product(sum, false, k, dialect_.state(named("y" + std::to_string(k))));
        let("y", closed(sum));
        for (const char* letter : {"x", "y"})
            for (std::size_t k = 1; k <= order; ++k)
                result_.states.push_back(named(letter + std::to_string(k)));
        if (plan().held_at_limits) {
            let(local("y"), "y");
            return;
        }
        for (std::string& statement : shift_of_direct_form_1("x", "y"))
            say(statement);
    }

    /// The stored inputs and outputs move up by one sample.
    std::vector<std::string> shift_of_direct_form_1(const std::string& x,
                                                    const std::string& y) const {
        std::vector<std::string> statements;
        for (const std::string& letter : {std::string("x"), std::string("y")}) {
            if (plan().order == 2)
                statements.push_back(
                    dialect_.store(named(letter + "2"), dialect_.state(named(letter + "1"))));
            if (plan().order > 0)
                statements.push_back(dialect_.store(named(letter + "1"), letter == "x" ? x : y));
        }
        return statements;
    }

    void write_two_states() {
        const std::size_t order = plan().order;
        Sum sum;
        add_product(sum, true, 0, "x");
        if (order > 0)
            add_state(sum, "w1");
        let("y", closed(sum));
        for (std::size_t k = 1; k <= order; ++k) {
            const std::string name = "w" + std::to_string(k);
            Sum next;
            add_product(next, true, k, "x");
            add_product(next, false, k, "y");
            if (k < order)
                add_state(next, "w2");
            const std::string value =
                structure_ == Structure::delta ? incremented(name, next) : closed(next);
            result_.states.push_back(named(name));
            if (plan().held_at_limits)
                let(local("next" + std::to_string(k)), value);
            else
                say(dialect_.store(named(name), value));
        }
    }

    // ---- output limits

    std::string limit(const std::string& name, double value) {
        result_.constants.push_back(
            {name, fixed_ ? word_literal(value, format_) : dialect_.real(value), true});
        return name;
    }

    void write_limits() {
        const std::string high = limit("limit_high", plan_.limits->at_most);
        const std::string low = limit("limit_low", plan_.limits->at_least);
        say(dialect_.comment("output limits with conditional integration"));
        for (section_ = 0; section_ < plan_.sections.size(); ++section_)
            if (plan().held_at_limits)
                write_hold(high, low);
        for (const auto& [sign, name] : {std::pair(" > ", high), std::pair(" < ", low)}) {
            say(dialect_.open_if("y" + std::string(sign) + name));
            let("    y", name);
            say(dialect_.close_if());
        }
    }

    void write_hold(const std::string& high, const std::string& low) {
        const std::string x = named("x");
        const std::string up = x + (plan().grows_with_input ? " > " : " < ") + zero();
        const std::string down = x + (plan().grows_with_input ? " < " : " > ") + zero();
        const std::string outwards =
            dialect_.either(dialect_.both("y >= " + high, up), dialect_.both("y <= " + low, down));
        if (structure_ == Structure::direct_form_1 && plan().order == 1) {
            say(dialect_.open_if(outwards));
            say("    " + dialect_.store(named("y1"), without_increment()));
            say(dialect_.open_else());
            say("    " + dialect_.store(named("y1"), named("y")));
            say(dialect_.close_if());
            say(dialect_.store(named("x1"), x));
            return;
        }
        say(dialect_.open_if(dialect_.negated(outwards)));
        for (std::string& statement : commit_of_held())
            say("    " + statement);
        say(dialect_.close_if());
    }

    std::string without_increment() {
        Sum increment;
        add_product(increment, true, 0, named("x"));
        add_product(increment, true, 1, named("x"));
        const std::string text = increment.text(zero());
        return fixed_ ? dialect_.saturated(named("y") + " - " + dialect_.shifted(text, bits()))
                      : named("y") + " - (" + text + ")";
    }

    std::vector<std::string> commit_of_held() const {
        if (structure_ == Structure::direct_form_1)
            return shift_of_direct_form_1(named("x"), named("y"));
        std::vector<std::string> statements;
        for (std::size_t k = 1; k <= plan().order; ++k)
            statements.push_back(
                dialect_.store(named("w" + std::to_string(k)), named("next" + std::to_string(k))));
        return statements;
    }

    // ---- bumpless start

    void write_reset() {
        if (!plan_.restart_section)
            return;
        section_ = *plan_.restart_section;
        const auto add = [this](const std::string& line) { result_.reset.push_back(line); };
        if (plan_.limits) {
            add(dialect_.open_if("y > limit_high"));
            add(dialect_.assign("    y", "limit_high"));
            add(dialect_.close_if());
            add(dialect_.open_if("y < limit_low"));
            add(dialect_.assign("    y", "limit_low"));
            add(dialect_.close_if());
        }
        std::string value = "y";
        if (plan_.restart_exponent > 0)
            value = dialect_.shifted(value, plan_.restart_exponent);
        add(dialect_.store(named(structure_ == Structure::direct_form_1 ? "y1" : "w1"), value));
    }

    const DifferenceEquation& equation_;
    const Dialect& dialect_;
    NumberFormat format_;
    Structure structure_;
    bool fixed_;
    RunPlan plan_;
    std::size_t section_ = 0;
    StepText result_;
};

} // namespace

StepText step_text(const DifferenceEquation& equation, const Dialect& dialect) {
    return StepWriter(equation, dialect).write();
}

} // namespace cornerwright
