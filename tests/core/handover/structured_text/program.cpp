#include "tests/core/handover/structured_text/program.h"

#include "tests/core/handover/structured_text/tokens.h"

#include <charconv>
#include <optional>
#include <utility>

namespace cornerwright::test::st {

bool is_integer(Type type) {
    return type == Type::int16 || type == Type::int32 || type == Type::int64;
}

bool is_real(Type type) {
    return type == Type::real || type == Type::lreal;
}

std::string_view name_of(Type type) {
    constexpr std::string_view names[] = {"bool", "int", "dint", "lint", "real", "lreal"};
    return names[static_cast<int>(type)];
}

std::size_t Unit::slot_of(const std::string& wanted) const {
    for (std::size_t i = 0; i < variables.size(); ++i)
        if (variables[i].name == wanted)
            return i;
    throw TextError("no variable " + wanted + " in " + name);
}

const Unit& Program::unit(const std::string& name) const {
    for (const auto& candidate : units)
        if (candidate->name == name)
            return *candidate;
    throw TextError("no unit " + name);
}

namespace {

using Kind = Expression::Kind;

std::optional<Type> type_named(std::string_view name) {
    for (const Type type :
         {Type::boolean, Type::int16, Type::int32, Type::int64, Type::real, Type::lreal})
        if (name_of(type) == name)
            return type;
    return std::nullopt;
}

class Parser {
  public:
    explicit Parser(std::string_view text) : tokens_(tokens_of(text)) {}

    Program program() {
        while (token().kind != Token::Kind::end)
            read_unit();
        return std::move(program_);
    }

  private:
    // ---- tokens

    const Token& token() const { return tokens_[place_]; }
    [[noreturn]] void refuse(const std::string& what) const {
        throw TextError("line " + std::to_string(token().line) + ": " + what);
    }
    bool stands(std::string_view text) const {
        return token().kind != Token::Kind::end && token().text == text;
    }
    bool take(std::string_view text) {
        if (!stands(text))
            return false;
        ++place_;
        return true;
    }
    void expect(std::string_view text) {
        if (!take(text))
            refuse("expected " + std::string(text) + ", found " + token().text);
    }
    std::string expect_name() {
        if (token().kind != Token::Kind::word || is_keyword(token().text))
            refuse("expected a name, found " + token().text);
        return tokens_[place_++].text;
    }
    Type expect_type() {
        const std::optional<Type> type = type_named(token().text);
        if (!type)
            refuse("expected a type, found " + token().text);
        ++place_;
        return *type;
    }

    // ---- units and declarations

    void read_unit() {
        auto unit = std::make_unique<Unit>();
        unit_ = unit.get();
        unit->is_block = stands("function_block");
        if (!take("function_block"))
            expect("function");
        unit->name = expect_name();
        for (const auto& other : program_.units)
            if (other->name == unit->name)
                refuse("a second unit " + unit->name);
        if (!unit->is_block) {
            expect(":");
            unit->variables.push_back({unit->name, expect_type(), Variable::Role::result});
        }
        while (token().text.starts_with("var"))
            read_variables();
        const std::string end = unit->is_block ? "end_function_block" : "end_function";
        unit->body = statements({end});
        expect(end);
        program_.units.push_back(std::move(unit));
    }

    Variable::Role read_role() {
        if (take("var_input"))
            return Variable::Role::input;
        if (take("var_output"))
            return Variable::Role::output;
        if (take("var_temp")) {
            if (!unit_->is_block)
                refuse("temporary variables in a function");
            return Variable::Role::temporary;
        }
        expect("var");
        return take("constant") ? Variable::Role::constant : Variable::Role::kept;
    }

    void read_variables() {
        const Variable::Role role = read_role();
        while (!take("end_var")) {
            Variable variable;
            variable.role = role;
            variable.name = expect_name();
            for (const Variable& other : unit_->variables)
                if (other.name == variable.name)
                    refuse("a second variable " + variable.name);
            expect(":");
            variable.type = expect_type();
            if (take(":=")) {
                const Expression value = closed(signed_literal(), variable.type);
                variable.integer = value.integer;
                variable.real = value.real;
            } else if (role == Variable::Role::constant) {
                refuse("a constant without a value");
            }
            expect(";");
            unit_->variables.push_back(variable);
        }
    }

    // ---- statements

    std::vector<Statement> statements(std::initializer_list<std::string_view> ends) {
        std::vector<Statement> result;
        const auto at_end = [&] {
            for (const std::string_view end : ends)
                if (stands(end))
                    return true;
            return false;
        };
        while (!at_end()) {
            if (take(";"))
                continue;
            result.push_back(take("if") ? choice() : assignment());
        }
        return result;
    }

    Statement choice() {
        Statement statement;
        do {
            Branch branch;
            branch.condition = closed(expression(), Type::boolean);
            expect("then");
            branch.body = statements({"elsif", "else", "end_if"});
            statement.branches.push_back(std::move(branch));
        } while (take("elsif"));
        if (take("else"))
            statement.otherwise = statements({"end_if"});
        expect("end_if");
        expect(";");
        return statement;
    }

    Statement assignment() {
        Statement statement;
        statement.slot = unit_->slot_of(expect_name());
        const Variable& target = unit_->variables[statement.slot];
        if (target.role == Variable::Role::constant || target.role == Variable::Role::input)
            refuse("an assignment to " + target.name + ", which may not change");
        expect(":=");
        statement.value = closed(expression(), target.type);
        expect(";");
        return statement;
    }

    // ---- expressions, from the weakest operator to the strongest

    Expression expression() {
        Expression left = exclusive();
        while (take("or"))
            left = logical(Kind::logical_or, std::move(left), exclusive());
        return left;
    }
    Expression exclusive() {
        Expression left = conjunction();
        while (take("xor"))
            left = logical(Kind::logical_xor, std::move(left), conjunction());
        return left;
    }
    Expression conjunction() {
        Expression left = equality();
        while (take("and"))
            left = logical(Kind::logical_and, std::move(left), equality());
        return left;
    }
    Expression equality() {
        Expression left = comparison();
        for (;;) {
            if (take("="))
                left = compared(Kind::equal, std::move(left), comparison());
            else if (take("<>"))
                left = compared(Kind::unequal, std::move(left), comparison());
            else
                return left;
        }
    }
    Expression comparison() {
        Expression left = sum();
        for (;;) {
            if (take("<"))
                left = compared(Kind::less, std::move(left), sum());
            else if (take("<="))
                left = compared(Kind::less_equal, std::move(left), sum());
            else if (take(">"))
                left = compared(Kind::greater, std::move(left), sum());
            else if (take(">="))
                left = compared(Kind::greater_equal, std::move(left), sum());
            else
                return left;
        }
    }
    Expression sum() {
        Expression left = term();
        for (;;) {
            if (take("+"))
                left = arithmetic(Kind::add, std::move(left), term());
            else if (take("-"))
                left = arithmetic(Kind::subtract, std::move(left), term());
            else
                return left;
        }
    }
    Expression term() {
        Expression left = unary();
        for (;;) {
            if (take("*"))
                left = arithmetic(Kind::multiply, std::move(left), unary());
            else if (take("/"))
                left = arithmetic(Kind::divide, std::move(left), unary());
            else if (take("mod"))
                left = arithmetic(Kind::modulo, std::move(left), unary());
            else
                return left;
        }
    }
    Expression unary() {
        if (stands("-") && tokens_[place_ + 1].kind != Token::Kind::word &&
            tokens_[place_ + 1].text != "(")
            return signed_literal();
        if (take("-")) {
            Expression operand = primary();
            if (operand.type == Type::boolean)
                refuse("a minus before a BOOL");
            return joined(Kind::negate, operand.type, {std::move(operand)});
        }
        if (take("not"))
            return joined(Kind::logical_not, Type::boolean, {closed(primary(), Type::boolean)});
        return primary();
    }
    Expression primary() {
        if (take("(")) {
            Expression inner = expression();
            expect(")");
            return inner;
        }
        if (token().kind == Token::Kind::integer || token().kind == Token::Kind::real)
            return signed_literal();
        for (const bool value : {false, true})
            if (take(value ? "true" : "false")) {
                Expression literal;
                literal.integer = value;
                return literal;
            }
        const std::string name = expect_name();
        if (take("("))
            return call(name);
        Expression variable;
        variable.kind = Kind::variable;
        variable.slot = unit_->slot_of(name);
        variable.type = unit_->variables[variable.slot].type;
        return variable;
    }

    Expression signed_literal() {
        Expression literal;
        literal.open = true;
        const std::string sign = take("-") ? "-" : "";
        const std::string text = sign + token().text;
        const char* const end = text.data() + text.size();
        std::from_chars_result read{};
        if (token().kind == Token::Kind::integer) {
            literal.type = Type::int64;
            read = std::from_chars(text.data(), end, literal.integer);
        } else if (token().kind == Token::Kind::real) {
            literal.type = Type::lreal;
            read = std::from_chars(text.data(), end, literal.real);
        } else {
            refuse("expected a number, found " + token().text);
        }
        if (read.ec != std::errc() || read.ptr != end)
            refuse("the number " + text);
        ++place_;
        return literal;
    }

    Expression call(const std::string& name) {
        std::vector<Expression> arguments;
        if (!stands(")")) {
            do
                arguments.push_back(expression());
            while (take(","));
        }
        expect(")");
        if (const std::size_t middle = name.find("_to_"); middle != std::string::npos) {
            const std::optional<Type> from = type_named(name.substr(0, middle));
            const std::optional<Type> to = type_named(name.substr(middle + 4));
            if (from && to && arguments.size() == 1)
                return joined(Kind::conversion, *to, {closed(std::move(arguments[0]), *from)});
        }
        Expression result = joined(Kind::call, Type::boolean, {});
        result.function = &program_.unit(name);
        if (result.function->is_block)
            refuse(name + " is a function block");
        result.type = result.function->variables.front().type;
        for (const Variable& variable : result.function->variables) {
            if (variable.role != Variable::Role::input)
                continue;
            const std::size_t index = result.operands.size();
            if (index >= arguments.size())
                refuse("too few arguments for " + name);
            result.operands.push_back(closed(std::move(arguments[index]), variable.type));
        }
        if (result.operands.size() != arguments.size())
            refuse("too many arguments for " + name);
        return result;
    }

    // ---- types

    static Expression joined(Kind kind, Type type, std::vector<Expression> operands) {
        Expression result;
        result.kind = kind;
        result.type = type;
        result.operands = std::move(operands);
        return result;
    }

    /// An expression of exactly this type; a number takes it on.
    Expression closed(Expression value, Type type) const {
        if (value.open && is_integer(value.type) && is_integer(type)) {
            const int bits = type == Type::int16 ? 16 : type == Type::int32 ? 32 : 64;
            const std::int64_t top = bits == 64 ? INT64_MAX : (std::int64_t{1} << (bits - 1)) - 1;
            if (value.integer > top || value.integer < -top - 1)
                refuse("a number beyond " + std::string(name_of(type)));
            value.type = type;
        } else if (value.open && is_real(value.type) && is_real(type)) {
            if (type == Type::real)
                value.real = static_cast<double>(static_cast<float>(value.real));
            value.type = type;
        }
        value.open = false;
        if (value.type != type)
            refuse("expected " + std::string(name_of(type)) + ", found " +
                   std::string(name_of(value.type)));
        return value;
    }

    /// Both operands of one type.
    std::vector<Expression> alike(Expression left, Expression right) const {
        const Type type = left.open ? right.type : left.type;
        std::vector<Expression> both;
        both.push_back(closed(std::move(left), type));
        both.push_back(closed(std::move(right), type));
        return both;
    }

    Expression arithmetic(Kind kind, Expression left, Expression right) const {
        std::vector<Expression> operands = alike(std::move(left), std::move(right));
        const Type type = operands[0].type;
        if (type == Type::boolean || (kind == Kind::modulo && !is_integer(type)))
            refuse("arithmetic on " + std::string(name_of(type)));
        return joined(kind, type, std::move(operands));
    }
    Expression compared(Kind kind, Expression left, Expression right) const {
        return joined(kind, Type::boolean, alike(std::move(left), std::move(right)));
    }
    Expression logical(Kind kind, Expression left, Expression right) const {
        std::vector<Expression> operands;
        operands.push_back(closed(std::move(left), Type::boolean));
        operands.push_back(closed(std::move(right), Type::boolean));
        return joined(kind, Type::boolean, std::move(operands));
    }

    std::vector<Token> tokens_;
    std::size_t place_ = 0;
    Program program_;
    Unit* unit_ = nullptr;
};

} // namespace

Program read_program(std::string_view text) {
    return Parser(text).program();
}

} // namespace cornerwright::test::st
