#pragma once

#include "tests/core/handover/structured_text/program.h"

namespace cornerwright::test::st {

/// One instance of a function block. An integer that leaves the range of its type, and a division
/// by zero, are TextErrors: what happens then is left to the controller, so that generated code
/// must not rely on it.
class BlockInstance {
  public:
    /// `program` must live as long.
    BlockInstance(const Program& program, const std::string& block);

    void set_integer(std::size_t slot, std::int64_t value) { cells_[slot].integer = value; }
    void set_real(std::size_t slot, double value) { cells_[slot].real = value; }
    std::int64_t integer(std::size_t slot) const { return cells_[slot].integer; }
    double real(std::size_t slot) const { return cells_[slot].real; }

    /// One call of the block.
    void call();

    union Cell {
        std::int64_t integer;
        double real;
    };

  private:
    const Unit& unit_;
    std::vector<Cell> cells_; ///< the block's own, then those of the functions being called
};

} // namespace cornerwright::test::st
