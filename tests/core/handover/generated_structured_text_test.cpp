#include "core/realisation/bit_true_run.h"
#include "tests/core/handover/handover_samples.h"
#include "tests/core/handover/structured_text/machine.h"

#include <gtest/gtest.h>

#include <cmath>

namespace cornerwright::test {
namespace {

constexpr std::size_t fewest_compensators = 12;
/// A chosen method is followed over the long run; the evaluator takes a microsecond and more a
/// sample, so that the others get the short one, which still has every kind of input.
constexpr int long_run = 100000;
constexpr int short_run = 10000;

/// The block of a compensator with the places of its inputs and its output.
class RunningBlock {
  public:
    RunningBlock(const RealisedSample& sample, const std::string& text)
        : program_(st::read_program(text)),
          block_(program_, sample.name),
          unit_(program_.unit(sample.name)),
          error_(unit_.slot_of("error")),
          restart_(unit_.slot_of("restart")),
          restart_output_(unit_.slot_of("restart_output")),
          output_(unit_.slot_of("output")),
          fixed_(sample.equation().realisation.number_format.type == NumberFormat::Type::fixed),
          scale_(fixed_ ? std::ldexp(1.0, sample.equation().realisation.number_format.fraction_bits)
                        : 1.0) {}

    double step(double error) {
        set(error_, error);
        block_.call();
        block_.set_integer(restart_, 0);
        return fixed_ ? static_cast<double>(block_.integer(output_)) / scale_
                      : block_.real(output_);
    }

    void reset(double output) {
        block_.set_integer(restart_, 1);
        set(restart_output_, output);
    }

  private:
    void set(std::size_t slot, double value) {
        if (fixed_)
            block_.set_integer(slot, static_cast<std::int64_t>(value * scale_));
        else
            block_.set_real(slot, value);
    }

    st::Program program_;
    st::BlockInstance block_;
    const st::Unit& unit_;
    std::size_t error_;
    std::size_t restart_;
    std::size_t restart_output_;
    std::size_t output_;
    bool fixed_;
    double scale_;
};

std::string text_of(const RealisedSample& sample) {
    return handover_files(sample.input(), HandoverForm::structured_text).front().bytes;
}

/// The first sample at which the two differ; the number of samples where they do not.
int first_difference(const RealisedSample& sample, const std::string& text,
                     const std::vector<double>& input) {
    const double restart =
        sample.equation().realisation.number_format.type == NumberFormat::Type::fixed
            ? std::ldexp(200.0, -sample.equation().realisation.number_format.fraction_bits)
            : 0.25;
    RunningBlock block(sample, text);
    BitTrueRun run(sample.equation());
    for (std::size_t i = 0; i < input.size(); ++i) {
        if (i == input.size() / 2) {
            run.reset(restart);
            block.reset(restart);
        }
        if (block.step(input[i]) != run.step(input[i]))
            return static_cast<int>(i);
    }
    return static_cast<int>(input.size());
}

struct Choice {
    Structure structure;
    NumberFormat format;
    Method followed; ///< over the long run
};

class GeneratedStructuredText : public testing::TestWithParam<Choice> {};

TEST_P(GeneratedStructuredText, EqualsTheBitTrueRun) {
    const Choice& choice = GetParam();
    for (const Method method : all_methods()) {
        Realisation realisation;
        realisation.method = method;
        realisation.structure = choice.structure;
        realisation.number_format = choice.format;
        const std::vector<RealisedSample> samples = realised_samples(realisation);
        EXPECT_GE(samples.size(), fewest_compensators) << words_of(realisation);
        const std::vector<double> input =
            long_input(choice.format, method == choice.followed ? long_run : short_run);
        for (const RealisedSample& sample : samples)
            EXPECT_EQ(first_difference(sample, text_of(sample), input),
                      static_cast<int>(input.size()))
                << sample.project.title << ", " << words_of(realisation);
    }
}

/// Every combination; the method followed for long changes from one to the next.
std::vector<Choice> every_choice() {
    std::vector<Choice> all;
    for (const Structure structure : all_structures())
        for (const NumberFormat& format : all_formats())
            all.push_back({structure, format, all_methods()[all.size() % all_methods().size()]});
    return all;
}

INSTANTIATE_TEST_SUITE_P(
    All, GeneratedStructuredText, testing::ValuesIn(every_choice()), [](const auto& parameter) {
        const NumberFormat& format = parameter.param.format;
        return std::string(name_of(parameter.param.structure)) + "_" +
               std::string(name_of(format.type)) +
               (format.type == NumberFormat::Type::fixed ? std::to_string(format.word_bits) : "");
    });

/// The comparison sees one wrong sign, one wrong digit and a wrong rounding.
TEST(StructuredTextComparison, FindsWhatIsWrong) {
    Realisation realisation;
    realisation.structure = Structure::direct_form_1;
    realisation.number_format = {NumberFormat::Type::fixed, 32, 24};
    const RealisedSample sample = realised_samples(realisation)[3];
    const std::vector<double> input = long_input(realisation.number_format, short_run);
    for (const auto& [right, wrong] :
         {std::pair(" - s1_a1 ", " + s1_a1 "), std::pair("s1_b0 : LINT := ", "s1_b0 : LINT := 1"),
          std::pair("(sum + divisor / 2)", "(sum)")}) {
        std::string text = text_of(sample);
        const std::size_t place = text.find(right);
        ASSERT_NE(place, std::string::npos) << right << "\n" << text;
        text.replace(place, std::string(right).size(), wrong);
        EXPECT_LT(first_difference(sample, text, input), short_run) << right;
    }
}

} // namespace
} // namespace cornerwright::test
