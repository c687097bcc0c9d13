#pragma once

#include <complex>
#include <vector>

namespace cornerwright {

using Complex = std::complex<double>;
using ComplexVector = std::vector<Complex>;

} // namespace cornerwright
