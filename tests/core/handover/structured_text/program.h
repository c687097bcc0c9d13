#pragma once

#include <cstdint>
#include <memory>
#include <stdexcept>
#include <string>
#include <string_view>
#include <vector>

/// A small reader of structured text (IEC 61131-3, 3rd ed., clause 7.3), for tests of generated
/// code: functions and function blocks, elementary types, assignments, IF, expressions and calls.
/// It is stricter than many compilers: types never mix without a conversion, names and keywords are
/// checked, and what the standard leaves to the implementation is refused.
namespace cornerwright::test::st {

/// The text breaks a rule; the sentence says where.
class TextError : public std::runtime_error {
  public:
    using std::runtime_error::runtime_error;
};

enum class Type { boolean, int16, int32, int64, real, lreal };

bool is_integer(Type type);
bool is_real(Type type);
/// INT, DINT, LINT, REAL, LREAL, BOOL.
std::string_view name_of(Type type);

struct Unit;

struct Expression {
    enum class Kind {
        literal, ///< in `integer` or `real`
        variable,
        call,
        conversion,
        negate,
        logical_not,
        add,
        subtract,
        multiply,
        divide,
        modulo,
        equal,
        unequal,
        less,
        less_equal,
        greater,
        greater_equal,
        logical_and,
        logical_or,
        logical_xor,
    };
    Kind kind = Kind::literal;
    Type type = Type::boolean;
    bool open = false; ///< a number that takes the type of what it is joined with
    std::int64_t integer = 0;
    double real = 0.0;
    std::size_t slot = 0;           ///< variable
    const Unit* function = nullptr; ///< call
    std::vector<Expression> operands;
};

struct Statement;

struct Branch {
    Expression condition;
    std::vector<Statement> body;
};

/// An assignment, or a choice where there are branches.
struct Statement {
    std::size_t slot = 0;
    Expression value;
    std::vector<Branch> branches;
    std::vector<Statement> otherwise;
};

struct Variable {
    enum class Role { input, output, kept, temporary, constant, result };
    std::string name; ///< in lower case: names do not differ by case
    Type type = Type::boolean;
    Role role = Role::kept;
    std::int64_t integer = 0; ///< initial value
    double real = 0.0;
};

struct Unit {
    std::string name;
    bool is_block = false;
    std::vector<Variable> variables;
    std::vector<Statement> body;

    /// Throws TextError where there is none.
    std::size_t slot_of(const std::string& name) const;
};

struct Program {
    std::vector<std::unique_ptr<Unit>> units;

    const Unit& unit(const std::string& name) const;
};

/// Throws TextError.
Program read_program(std::string_view text);

} // namespace cornerwright::test::st
