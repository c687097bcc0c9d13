#include "widgets/parts/quantity.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numbers>
#include <random>

namespace cornerwright {
namespace {

constexpr double turn = 2.0 * std::numbers::pi;

double read(const char* text, QuantityKind kind, const char* unit) {
    const ReadQuantity result =
        readQuantity(QString::fromUtf8(text), kind, QString::fromUtf8(unit));
    EXPECT_TRUE(result.value) << text << ": " << result.problem.toStdString();
    return result.value.value_or(-1.0);
}

TEST(Quantity, ReadsTheUnitTypedAlong) {
    EXPECT_DOUBLE_EQ(read("12 Hz", QuantityKind::frequency, "rad/s"), 12.0 * turn);
    EXPECT_DOUBLE_EQ(read("75rad/s", QuantityKind::frequency, "Hz"), 75.0);
    EXPECT_DOUBLE_EQ(read("1.5e3 mHz", QuantityKind::frequency, "Hz"), 1.5 * turn);
    EXPECT_DOUBLE_EQ(read("2 MHz", QuantityKind::frequency, "Hz"), 2e6 * turn);
    EXPECT_DOUBLE_EQ(read("250 ms", QuantityKind::time, "s"), 0.25);
    EXPECT_DOUBLE_EQ(read("40 us", QuantityKind::time, "s"), 40e-6);
    EXPECT_DOUBLE_EQ(read("2 kHz", QuantityKind::period, "ms"), 0.0005);
    EXPECT_DOUBLE_EQ(read("20 dB", QuantityKind::gain, ""), 10.0);
}

TEST(Quantity, TakesTheShownUnitWhereNoneIsTyped) {
    EXPECT_DOUBLE_EQ(read("12", QuantityKind::frequency, "kHz"), 12e3 * turn);
    EXPECT_DOUBLE_EQ(read("250", QuantityKind::time, "ms"), 0.25);
}

TEST(Quantity, TakesADecimalCommaAndATrueMinus) {
    EXPECT_DOUBLE_EQ(read("0,25 s", QuantityKind::time, "ms"), 0.25);
    EXPECT_DOUBLE_EQ(read("\u221220 dB", QuantityKind::decibel, "dB"), -20.0);
}

TEST(Quantity, SaysWhatWasExpectedAndWhatStoodThere) {
    const auto problem = [](const char* text, QuantityKind kind) {
        const ReadQuantity result =
            readQuantity(QString::fromUtf8(text), kind, QStringLiteral("Hz"));
        EXPECT_FALSE(result.value) << text;
        return result.problem;
    };
    EXPECT_TRUE(problem("twelve", QuantityKind::frequency).contains(QStringLiteral("twelve")));
    EXPECT_TRUE(problem("12 parsec", QuantityKind::frequency).contains(QStringLiteral("parsec")));
    EXPECT_TRUE(problem("12 parsec", QuantityKind::frequency).contains(QStringLiteral("rad/s")));
    EXPECT_FALSE(problem("", QuantityKind::time).isEmpty());
    EXPECT_FALSE(problem("1e999 Hz", QuantityKind::frequency).isEmpty());
    EXPECT_FALSE(problem("nan", QuantityKind::plain).isEmpty());
}

TEST(Quantity, ExactNumberComesBackBitForBit) {
    std::mt19937_64 random(20240607);
    std::uniform_real_distribution<double> exponent(-4.0, 7.0);
    for (int i = 0; i < 2000; ++i) {
        const double value = std::pow(10.0, exponent(random));
        for (const bool hertz : {true, false}) {
            const QString unit = shownQuantity(value, QuantityKind::frequency, hertz).unit;
            const QString text = exactNumber(value, QuantityKind::frequency, unit);
            const ReadQuantity back = readQuantity(text, QuantityKind::frequency, unit);
            ASSERT_TRUE(back.value);
            // Seventeen digits always suffice for the number in the unit; the product with the unit
            // may then differ in its last bit.
            EXPECT_DOUBLE_EQ(*back.value, value) << text.toStdString();
        }
    }
}

TEST(Quantity, ExactNumberIsShortWhereTheUserTypedAShortOne) {
    for (const char* typed : {"6.05", "12", "0.1", "302", "500", "2000"}) {
        const double value = read(typed, QuantityKind::frequency, "Hz");
        EXPECT_EQ(exactNumber(value, QuantityKind::frequency, QStringLiteral("Hz")),
                  QString::fromUtf8(typed));
    }
}

} // namespace
} // namespace cornerwright
