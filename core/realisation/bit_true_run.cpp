#include "core/realisation/bit_true_run.h"

#include "core/realisation/run_plan.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <cstdint>

namespace cornerwright {

struct BitTrueRun::Machine {
    virtual ~Machine() = default;
    virtual double step(double error) = 0;
    virtual void init() = 0;
    virtual void reset(double output) = 0;
    virtual std::vector<double> state() const = 0;
};

namespace {

/// Stored numbers of one section: x', x'', y', y'' in direct form 1, w1 and w2 in the others.
template <class T>
using State = std::array<T, 4>;

template <class T>
struct SectionStep {
    T output{};
    State<T> next{};
};

/// Single or double precision.
template <class T>
class FloatSection {
  public:
    using Signal = T;

    FloatSection(const DiscreteSection& section, const Realisation& realisation)
        : structure_(realisation.structure) {
        std::ranges::transform(running_numerator(section, structure_), b_.begin(),
                               [](double c) { return static_cast<T>(c); });
        std::ranges::transform(running_denominator(section, structure_), a_.begin(),
                               [](double c) { return static_cast<T>(c); });
    }

    SectionStep<T> step(T x, const State<T>& s) const {
        switch (structure_) {
        case Structure::direct_form_1: {
            const T y = b_[0] * x + b_[1] * s[0] + b_[2] * s[1] - a_[1] * s[2] - a_[2] * s[3];
            return {y, {x, s[0], y, s[2]}};
        }
        case Structure::direct_form_2_transposed: {
            const T y = b_[0] * x + s[0];
            return {y, {b_[1] * x - a_[1] * y + s[1], b_[2] * x - a_[2] * y}};
        }
        case Structure::delta:
            break;
        }
        const T y = b_[0] * x + s[0];
        return {y, {s[0] + (b_[1] * x - a_[1] * y + s[1]), s[1] + (b_[2] * x - a_[2] * y)}};
    }

    /// What y' has to be so that direct form 1 has not integrated x.
    T without_increment(T x, T y) const { return y - (b_[0] * x + b_[1] * x); }

    T from_value(double value) const { return static_cast<T>(value); }
    double to_value(T signal) const { return static_cast<double>(signal); }
    T scaled_down(T signal, int exponent) const { return std::ldexp(signal, -exponent); }

  private:
    Structure structure_;
    std::array<T, 3> b_{};
    std::array<T, 3> a_{};
};

/// Words of 16 or 32 bits; the sums of products, at most twice that wide, are held in 64 bits.
class FixedSection {
  public:
    using Signal = std::int64_t;

    FixedSection(const DiscreteSection& section, const Realisation& realisation)
        : structure_(realisation.structure),
          format_(realisation.number_format),
          b_(section.b_integers),
          a_(section.a_integers),
          bits_(format_.fraction_bits - section.shift),
          delta_bits_(bits_ + section.delta_shift),
          one_(std::int64_t{1} << bits_) {}

    SectionStep<Signal> step(Signal x, const State<Signal>& s) const {
        switch (structure_) {
        case Structure::direct_form_1: {
            const Signal y =
                word(b_[0] * x + b_[1] * s[0] + b_[2] * s[1] - a_[1] * s[2] - a_[2] * s[3], bits_);
            return {y, {x, s[0], y, s[2]}};
        }
        case Structure::direct_form_2_transposed: {
            const Signal y = word(b_[0] * x + s[0] * one_, bits_);
            return {y,
                    {word(b_[1] * x - a_[1] * y + s[1] * one_, bits_),
                     word(b_[2] * x - a_[2] * y, bits_)}};
        }
        case Structure::delta:
            break;
        }
        const Signal y = word(b_[0] * x + s[0] * one_, bits_);
        return {y,
                {saturated(s[0] + shifted(b_[1] * x - a_[1] * y + s[1] * one_, delta_bits_)),
                 saturated(s[1] + shifted(b_[2] * x - a_[2] * y, delta_bits_))}};
    }

    Signal without_increment(Signal x, Signal y) const {
        return saturated(y - shifted(b_[0] * x + b_[1] * x, bits_));
    }

    Signal from_value(double value) const {
        return static_cast<Signal>(std::ldexp(held_value(value, format_), format_.fraction_bits));
    }
    double to_value(Signal signal) const {
        return std::ldexp(static_cast<double>(signal), -format_.fraction_bits);
    }
    static Signal scaled_down(Signal signal, int exponent) { return shifted(signal, exponent); }

  private:
    /// Over 2^bits to the nearest integer, ties away from zero.
    static Signal shifted(Signal sum, int bits) {
        if (bits == 0)
            return sum;
        const Signal half = Signal{1} << (bits - 1);
        return sum >= 0 ? (sum + half) >> bits : -((half - sum) >> bits);
    }
    Signal saturated(Signal value) const {
        const Signal top = (Signal{1} << (format_.word_bits - 1)) - 1;
        return std::clamp(value, -top - 1, top);
    }
    Signal word(Signal sum, int bits) const { return saturated(shifted(sum, bits)); }

    Structure structure_;
    NumberFormat format_;
    std::array<std::int64_t, 3> b_;
    std::array<std::int64_t, 3> a_;
    int bits_;
    int delta_bits_;
    Signal one_;
};

template <class SectionType>
class Cascade final : public BitTrueRun::Machine {
  public:
    using Signal = typename SectionType::Signal;

    explicit Cascade(const DifferenceEquation& equation)
        : plan_(run_plan(equation)), structure_(equation.realisation.structure) {
        for (const DiscreteSection& section : equation.sections)
            sections_.emplace_back(section, equation.realisation);
        states_.resize(sections_.size());
        inputs_.resize(sections_.size());
        steps_.resize(sections_.size());
        if (plan_.limits) {
            low_ = sections_.front().from_value(plan_.limits->at_least);
            high_ = sections_.front().from_value(plan_.limits->at_most);
        }
    }

    double step(double error) override {
        Signal signal = sections_.front().from_value(error);
        for (std::size_t i = 0; i < sections_.size(); ++i) {
            inputs_[i] = signal;
            steps_[i] = sections_[i].step(signal, states_[i]);
            signal = steps_[i].output;
        }
        if (plan_.limits)
            signal = limited(signal);
        for (std::size_t i = 0; i < sections_.size(); ++i)
            states_[i] = steps_[i].next;
        return sections_.front().to_value(signal);
    }

    void init() override { std::ranges::fill(states_, State<Signal>{}); }

    void reset(double output) override {
        init();
        if (!plan_.restart_section)
            return;
        Signal held = sections_.front().from_value(output);
        if (plan_.limits)
            held = std::clamp(held, low_, high_);
        const std::size_t section = *plan_.restart_section;
        const std::size_t place = structure_ == Structure::direct_form_1 ? 2 : 0;
        states_[section][place] = sections_[section].scaled_down(held, plan_.restart_exponent);
    }

    std::vector<double> state() const override {
        std::vector<double> values;
        for (const State<Signal>& state : states_)
            for (const Signal& entry : state)
                values.push_back(static_cast<double>(entry));
        return values;
    }

  private:
    Signal limited(Signal output) {
        const bool high = output >= high_;
        const bool low = output <= low_;
        if (high || low)
            for (std::size_t i = 0; i < sections_.size(); ++i)
                if (plan_.sections[i].held_at_limits && drives_outwards(i, high, low))
                    hold(i);
        return std::clamp(output, low_, high_);
    }

    bool drives_outwards(std::size_t i, bool high, bool low) const {
        const bool up = plan_.sections[i].grows_with_input;
        const bool drives_up = up ? inputs_[i] > Signal{} : inputs_[i] < Signal{};
        const bool drives_down = up ? inputs_[i] < Signal{} : inputs_[i] > Signal{};
        return (high && drives_up) || (low && drives_down);
    }

    void hold(std::size_t i) {
        const bool plain = plan_.sections[i].order == 1;
        if (plain && structure_ == Structure::direct_form_1)
            steps_[i].next[2] = sections_[i].without_increment(inputs_[i], steps_[i].output);
        else
            steps_[i].next = states_[i];
    }

    RunPlan plan_;
    Structure structure_;
    std::vector<SectionType> sections_;
    std::vector<State<Signal>> states_;
    std::vector<Signal> inputs_;
    std::vector<SectionStep<Signal>> steps_;
    Signal low_{};
    Signal high_{};
};

std::unique_ptr<BitTrueRun::Machine> make_machine(const DifferenceEquation& equation) {
    switch (equation.realisation.number_format.type) {
    case NumberFormat::Type::float64:
        return std::make_unique<Cascade<FloatSection<double>>>(equation);
    case NumberFormat::Type::float32:
        return std::make_unique<Cascade<FloatSection<float>>>(equation);
    case NumberFormat::Type::fixed:
        break;
    }
    return std::make_unique<Cascade<FixedSection>>(equation);
}

} // namespace

BitTrueRun::BitTrueRun(const DifferenceEquation& equation) : machine_(make_machine(equation)) {}
BitTrueRun::~BitTrueRun() = default;
BitTrueRun::BitTrueRun(BitTrueRun&&) noexcept = default;
BitTrueRun& BitTrueRun::operator=(BitTrueRun&&) noexcept = default;

double BitTrueRun::step(double error) {
    return machine_->step(error);
}
void BitTrueRun::init() {
    machine_->init();
}
void BitTrueRun::reset(double output) {
    machine_->reset(output);
}
std::vector<double> BitTrueRun::state() const {
    return machine_->state();
}

} // namespace cornerwright
