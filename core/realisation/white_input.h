#pragma once

#include <cstdint>

namespace cornerwright {

/// A repeatable white sequence, even over [-size, size]. The generator is written out so that every
/// platform gives the same sequence.
/// Source: the 64-bit linear congruential generator of D. E. Knuth, MMIX (citation from memory).
class WhiteInput {
  public:
    explicit WhiteInput(double size) : size_(size) {}

    double next() {
        state_ = state_ * 6364136223846793005u + 1442695040888963407u;
        const auto top = static_cast<double>(state_ >> 32); // 0 to 2^32 - 1
        return size_ * (2.0 * top / 4294967295.0 - 1.0);
    }

  private:
    double size_;
    std::uint64_t state_ = 1;
};

} // namespace cornerwright
