#include "core/numerics/number_text.h"
#include "core/numerics/sha256.h"

#include <gtest/gtest.h>

#include <bit>
#include <cmath>
#include <locale.h>
#include <random>

namespace cornerwright {
namespace {

// Source: NIST FIPS 180-4 example values (SHA256 of "abc" and of the two-block message).
TEST(Sha256, GivesThePublishedExamples) {
    EXPECT_EQ(sha256_hex("abc"),
              "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
    EXPECT_EQ(sha256_hex("abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq"),
              "248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1");
    EXPECT_EQ(sha256_hex(std::string(1'000'000, 'a')),
              "cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0");
}

TEST(Sha256, DoesNotMindHowTheBytesArrive) {
    std::string bytes;
    for (int i = 0; i < 300; ++i)
        bytes.push_back(static_cast<char>(i * 7));
    for (std::size_t size = 0; size < bytes.size(); ++size) {
        Sha256 hash;
        hash.add(bytes.substr(0, size));
        hash.add(bytes.substr(size));
        ASSERT_EQ(hash.hex(), sha256_hex(bytes)) << size;
    }
}

TEST(NumberText, ReadsBackTheSameBits) {
    std::mt19937_64 random(5);
    for (int i = 0; i < 20'000; ++i) {
        const double value = std::bit_cast<double>(random());
        if (!std::isfinite(value))
            continue;
        const auto again = parse_number(number_text(value));
        ASSERT_TRUE(again);
        ASSERT_EQ(std::bit_cast<std::uint64_t>(*again), std::bit_cast<std::uint64_t>(value));
    }
}

TEST(NumberText, IsShortAndKnowsNoLocale) {
    const char* old = setlocale(LC_NUMERIC, nullptr);
    const std::string before = old ? old : "C";
    setlocale(LC_NUMERIC, "de_DE.UTF-8");
    EXPECT_EQ(number_text(0.1), "0.1");
    EXPECT_EQ(number_text(61.2345678, 4), "61.23");
    EXPECT_EQ(parse_number("0.5"), 0.5);
    EXPECT_EQ(parse_number("0,5"), std::nullopt);
    setlocale(LC_NUMERIC, before.c_str());
}

TEST(NumberText, ParsesNothingButANumber) {
    for (const char* text : {"", " 1", "1 ", "1x", "nan", "inf", "1e999", "+-1", "++1", "0x10"})
        EXPECT_EQ(parse_number(text), std::nullopt) << text;
    EXPECT_EQ(parse_number("+1.5e-3"), 1.5e-3);
}

} // namespace
} // namespace cornerwright
