#include "tests/core/handover/structured_text/machine.h"

#include <array>
#include <cstdint>

namespace cornerwright::test::st {
namespace {

using Cell = BlockInstance::Cell;
using Kind = Expression::Kind;

bool is_integral(const Expression& expression) {
    return !is_real(expression.type);
}

void start(const Unit& unit, Cell* cells, bool keep) {
    for (std::size_t i = 0; i < unit.variables.size(); ++i) {
        const Variable& variable = unit.variables[i];
        if (keep && variable.role != Variable::Role::temporary)
            continue;
        if (is_real(variable.type))
            cells[i].real = variable.real;
        else
            cells[i].integer = variable.integer;
    }
}

std::int64_t in_range(std::int64_t value, Type type) {
    const bool outside = type == Type::int16   ? value != static_cast<std::int16_t>(value)
                         : type == Type::int32 ? value != static_cast<std::int32_t>(value)
                                               : false;
    if (outside)
        throw TextError("an overflow of " + std::string(name_of(type)));
    return value;
}

/// Runs the body of one unit; functions get the cells behind those of their caller.
class Frame {
  public:
    Frame(const Unit& unit, Cell* cells) : unit_(unit), cells_(cells) {}

    void run() { run(unit_.body); }

  private:
    void run(const std::vector<Statement>& body) {
        for (const Statement& statement : body)
            statement.branches.empty() ? assign(statement) : choose(statement);
    }

    void assign(const Statement& statement) { store(cells_[statement.slot], statement.value); }

    void store(Cell& cell, const Expression& value) {
        if (is_integral(value))
            cell.integer = integer(value);
        else
            cell.real = real(value);
    }

    void choose(const Statement& statement) {
        for (const Branch& branch : statement.branches)
            if (integer(branch.condition) != 0) {
                run(branch.body);
                return;
            }
        run(statement.otherwise);
    }

    /// Calls within the arguments are over before the cells behind the own ones are used.
    Cell called(const Expression& call) {
        std::array<Cell, most_arguments> arguments{};
        for (std::size_t i = 0; i < call.operands.size(); ++i)
            store(arguments[i], call.operands[i]);
        Cell* cells = cells_ + unit_.variables.size();
        start(*call.function, cells, false);
        std::size_t argument = 0;
        for (std::size_t i = 0; i < call.function->variables.size(); ++i)
            if (call.function->variables[i].role == Variable::Role::input)
                cells[i] = arguments[argument++];
        Frame(*call.function, cells).run();
        return cells[0];
    }

    std::int64_t integer(const Expression& e) {
        switch (e.kind) {
        case Kind::literal:
            return e.integer;
        case Kind::variable:
            return cells_[e.slot].integer;
        case Kind::call:
            return called(e).integer;
        case Kind::conversion:
            return converted(e);
        case Kind::negate:
            return in_range(integer_sum(Kind::subtract, 0, integer(e.operands[0])), e.type);
        case Kind::logical_not:
            return integer(e.operands[0]) == 0;
        default:
            break;
        }
        if (is_real(e.operands[0].type))
            return compared(e.kind, real(e.operands[0]), real(e.operands[1]));
        const std::int64_t left = integer(e.operands[0]);
        const std::int64_t right = integer(e.operands[1]);
        switch (e.kind) {
        case Kind::logical_and:
            return left & right;
        case Kind::logical_or:
            return left | right;
        case Kind::logical_xor:
            return left ^ right;
        case Kind::add:
        case Kind::subtract:
        case Kind::multiply:
            return in_range(integer_sum(e.kind, left, right), e.type);
        case Kind::divide:
        case Kind::modulo:
            return quotient(e, left, right);
        default:
            return compared(e.kind, left, right);
        }
    }

    std::int64_t converted(const Expression& e) {
        if (is_real(e.operands[0].type))
            throw TextError("a conversion from a real number, whose rounding differs by maker");
        return in_range(integer(e.operands[0]), e.type);
    }

    static std::int64_t integer_sum(Kind kind, std::int64_t left, std::int64_t right) {
        std::int64_t result = 0;
        const bool overflow = kind == Kind::add ? __builtin_add_overflow(left, right, &result)
                              : kind == Kind::subtract
                                  ? __builtin_sub_overflow(left, right, &result)
                                  : __builtin_mul_overflow(left, right, &result);
        if (overflow)
            throw TextError("an overflow of lint");
        return result;
    }

    /// Division of integers cuts towards zero (IEC 61131-3, 3rd ed., table 29).
    static std::int64_t quotient(const Expression& e, std::int64_t left, std::int64_t right) {
        if (right == 0)
            throw TextError("a division by zero");
        if (right == -1)
            return e.kind == Kind::divide ? in_range(integer_sum(Kind::subtract, 0, left), e.type)
                                          : 0;
        return e.kind == Kind::divide ? left / right : left % right;
    }

    template <class Number>
    static bool compared(Kind kind, Number left, Number right) {
        switch (kind) {
        case Kind::equal:
            return left == right;
        case Kind::unequal:
            return left != right;
        case Kind::less:
            return left < right;
        case Kind::less_equal:
            return left <= right;
        case Kind::greater:
            return left > right;
        default:
            return left >= right;
        }
    }

    double real(const Expression& e) {
        switch (e.kind) {
        case Kind::literal:
            return e.real;
        case Kind::variable:
            return cells_[e.slot].real;
        case Kind::call:
            return called(e).real;
        case Kind::negate:
            return -real(e.operands[0]);
        case Kind::conversion:
            throw TextError("a conversion to a real number, which generated code has no use for");
        default:
            break;
        }
        const double left = real(e.operands[0]);
        const double right = real(e.operands[1]);
        const double exact = e.kind == Kind::add        ? left + right
                             : e.kind == Kind::subtract ? left - right
                             : e.kind == Kind::multiply ? left * right
                                                        : left / right;
        // One operation on single-precision numbers, rounded to double and then to single, is the
        // correctly rounded one: 53 bits are at least 2 * 24 + 2.
        return e.type == Type::real ? static_cast<double>(static_cast<float>(exact)) : exact;
    }

    static constexpr std::size_t most_arguments = 4;

    const Unit& unit_;
    Cell* cells_;
};

} // namespace

BlockInstance::BlockInstance(const Program& program, const std::string& block)
    : unit_(program.unit(block)) {
    std::size_t size = 0; // no unit calls itself: a name is known only behind its end
    for (const auto& unit : program.units)
        size += unit->variables.size();
    cells_.resize(size);
    start(unit_, cells_.data(), false);
}

void BlockInstance::call() {
    start(unit_, cells_.data(), true);
    Frame(unit_, cells_.data()).run();
}

} // namespace cornerwright::test::st
