#pragma once

#include <array>
#include <cstddef>
#include <cstdint>
#include <string>
#include <string_view>

namespace cornerwright {

/// SHA-256 piece by piece, for files that are not held in memory at once.
/// Source: NIST FIPS 180-4, Secure Hash Standard, sections 5 and 6.2.
class Sha256 {
  public:
    void add(std::string_view bytes);

    /// The hash of everything added, 64 lower-case hexadecimal digits. Nothing may be added after.
    std::string hex();

  private:
    static constexpr std::size_t block_size = 64;

    void compress(const unsigned char* block);

    std::array<std::uint32_t, 8> state_{0x6a09e667, 0xbb67ae85, 0x3c6ef372, 0xa54ff53a,
                                        0x510e527f, 0x9b05688c, 0x1f83d9ab, 0x5be0cd19};
    std::array<unsigned char, block_size> pending_{};
    std::size_t pending_size_ = 0;
    std::uint64_t total_bytes_ = 0;
};

/// The hash of `bytes`, 64 lower-case hexadecimal digits.
std::string sha256_hex(std::string_view bytes);

} // namespace cornerwright
