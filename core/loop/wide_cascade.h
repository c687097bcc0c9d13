#pragma once

#include "core/numerics/double_double.h"
#include "core/numerics/root_form.h"

#include <vector>

namespace cornerwright {

/// A lower triangular matrix to about 32 digits.
class WideTriangle {
  public:
    WideTriangle() = default;
    explicit WideTriangle(std::size_t size) : size_(size), entries_(size * (size + 1) / 2) {}

    std::size_t size() const { return size_; }
    WideComplex& operator()(std::size_t row, std::size_t column) {
        return entries_[row * (row + 1) / 2 + column];
    }
    const WideComplex& operator()(std::size_t row, std::size_t column) const {
        return entries_[row * (row + 1) / 2 + column];
    }

  private:
    std::size_t size_ = 0;
    std::vector<WideComplex> entries_;
};

/// A rational function as a chain of first-order blocks, time counted in sample periods: state 0 is
/// the held input (its derivative 0), state i belongs to pole i - 1, output = `gain` * (`output` .
/// states). Blocks keep the roots as they are: no coefficient is formed.
struct WideCascade {
    WideTriangle matrix;
    std::vector<WideComplex> output;
    double gain = 1.0;
};

/// `form` is proper.
WideCascade wide_cascade(const RootForm& form, double sample_period_s);

/// exp(matrix * duration) - I by a Taylor series and repeated squaring of the difference from I, so
/// that slow states keep their digits.
/// Source: N. J. Higham, Functions of Matrices (2008), ch. 10 (citation from memory).
WideTriangle exponential_minus_identity(const WideTriangle& matrix, double duration);

/// (I + later)(I + earlier) - I.
WideTriangle compose(const WideTriangle& later, const WideTriangle& earlier);

} // namespace cornerwright
