#include "core/realisation/bit_true_run.h"
#include "tests/core/handover/handover_samples.h"

#include <gtest/gtest.h>

#include <bit>
#include <cmath>
#include <cstdint>
#include <fstream>
#include <future>
#include <sstream>

namespace cornerwright::test {
namespace {

constexpr int samples = 100000;
constexpr std::size_t fewest_compensators = 12;

/// Hash of all outputs; +0.0 makes zeros of both signs one.
class OutputHash {
  public:
    void add(double output) {
        hash_ = (hash_ ^ std::bit_cast<std::uint64_t>(output + 0.0)) * 1099511628211u;
        hash_ ^= hash_ >> 29;
    }
    std::uint64_t value() const { return hash_; }

  private:
    std::uint64_t hash_ = 14695981039346656037u;
};

std::string signal_type(const NumberFormat& format) {
    if (format.type == NumberFormat::Type::float64)
        return "double";
    if (format.type == NumberFormat::Type::float32)
        return "float";
    return format.word_bits == 16 ? "int16_t" : "int32_t";
}

void write_text(const std::filesystem::path& file, const std::string& text) {
    std::ofstream(file) << text;
}

/// A program that includes every generated source and prints the hash of each over the input file.
std::string driver_text(const std::vector<RealisedSample>& all, const NumberFormat& format) {
    const std::string type = signal_type(format);
    std::ostringstream text;
    for (const RealisedSample& sample : all)
        text << "#include \"" << sample.name << ".c\"\n";
    text << "#include <stdint.h>\n#include <stdio.h>\n#include <stdlib.h>\n#include <string.h>\n"
            "static double input["
         << samples
         << "];\n"
            "static uint64_t hash;\n"
            "static void add(double output) {\n"
            "    uint64_t bits;\n    output += 0.0;\n    memcpy(&bits, &output, 8);\n"
            "    hash = (hash ^ bits) * UINT64_C(1099511628211);\n    hash ^= hash >> 29;\n}\n"
            "int main(int count, char **arguments) {\n"
            "    FILE *file = fopen(arguments[count - 1], \"rb\");\n    int i;\n"
            "    if (!file || fread(input, 8, "
         << samples << ", file) != " << samples << ") return 1;\n    fclose(file);\n";
    for (const RealisedSample& sample : all)
        text << "    {\n        " << sample.name << "_state state;\n        " << sample.name
             << "_init(&state);\n        hash = UINT64_C(14695981039346656037);\n"
                "        for (i = 0; i < "
             << samples << "; ++i) {\n            if (i == " << samples / 2 << ") " << sample.name
             << "_reset(&state, (" << type << ")"
             << (format.type == NumberFormat::Type::fixed ? "200" : "0.25")
             << ");\n            add((double)" << sample.name << "_step(&state, (" << type
             << ")input[i]));\n        }\n        printf(\"%llu\\n\", (unsigned long long)hash);\n"
                "    }\n";
    text << "    return 0;\n}\n";
    return text.str();
}

double scale_of(const NumberFormat& format) {
    return format.type == NumberFormat::Type::fixed ? std::ldexp(1.0, format.fraction_bits) : 1.0;
}

std::uint64_t hash_of_bit_true_run(const DifferenceEquation& equation,
                                   const std::vector<double>& input) {
    const NumberFormat& format = equation.realisation.number_format;
    const double scale = scale_of(format);
    const double restart = format.type == NumberFormat::Type::fixed ? 200.0 / scale : 0.25;
    BitTrueRun run(equation);
    OutputHash hash;
    for (std::size_t i = 0; i < input.size(); ++i) {
        if (i == input.size() / 2)
            run.reset(restart);
        hash.add(run.step(input[i]) * scale);
    }
    return hash.value();
}

void write_input(const std::filesystem::path& file, const std::vector<double>& input,
                 double scale) {
    std::ofstream stream(file, std::ios::binary);
    for (const double value : input) {
        const double scaled = value * scale;
        stream.write(reinterpret_cast<const char*>(&scaled), sizeof scaled);
    }
}

/// Strictest warnings that firmware teams use, each an error.
constexpr const char* flags =
    " -std=c99 -Wall -Wextra -Werror -pedantic -Wconversion -Wshadow -O1 -ffp-contract=off ";

/// Compiles and runs; the hashes in the order of the compensators.
std::vector<std::uint64_t> run_generated(const std::filesystem::path& folder,
                                         const std::string& compiler) {
    const std::string program = (folder / ("run_" + compiler)).string();
    const CommandResult compiled =
        run_command(compiler + flags + (folder / "driver.c").string() + " -o " + program);
    EXPECT_EQ(compiled.status, 0) << compiler << ":\n" << compiled.output;
    const CommandResult ran = run_command(program + " " + (folder / "input").string());
    EXPECT_EQ(ran.status, 0) << ran.output;
    std::istringstream lines(ran.output);
    std::vector<std::uint64_t> hashes;
    for (std::uint64_t hash = 0; lines >> hash;)
        hashes.push_back(hash);
    return hashes;
}

struct StructureAndFormat {
    Structure structure;
    NumberFormat format;
};

class GeneratedC : public testing::TestWithParam<StructureAndFormat> {};

/// Every method on every sample compensator, in one program a compiler.
TEST_P(GeneratedC, EqualsTheBitTrueRunOverAHundredThousandSamples) {
    const auto [structure, format] = GetParam();
    std::vector<RealisedSample> all;
    for (const Method method : all_methods()) {
        Realisation realisation;
        realisation.method = method;
        realisation.structure = structure;
        realisation.number_format = format;
        std::vector<RealisedSample> of_method = realised_samples(realisation);
        EXPECT_GE(of_method.size(), fewest_compensators) << words_of(realisation);
        for (RealisedSample& sample : of_method) {
            sample.name = "c" + std::to_string(all.size());
            all.push_back(std::move(sample));
        }
    }

    const TemporaryFolder folder;
    for (const RealisedSample& sample : all)
        write_handover(handover_files(sample.input(), HandoverForm::c99), folder.path());
    write_text(folder.path() / "driver.c", driver_text(all, format));
    const std::vector<double> input = long_input(format, samples);
    write_input(folder.path() / "input", input, scale_of(format));

    auto clang = std::async(std::launch::async, run_generated, folder.path(), "clang");
    const std::vector<std::uint64_t> by_gcc = run_generated(folder.path(), "gcc");
    const std::vector<std::uint64_t> by_clang = clang.get();
    ASSERT_EQ(by_gcc.size(), all.size());
    ASSERT_EQ(by_clang.size(), all.size());
    for (std::size_t i = 0; i < all.size(); ++i) {
        const std::uint64_t expected = hash_of_bit_true_run(all[i].equation(), input);
        const std::string words =
            all[i].project.title + ", " + words_of(all[i].equation().realisation);
        EXPECT_EQ(by_gcc[i], expected) << words << ", gcc";
        EXPECT_EQ(by_clang[i], expected) << words << ", clang";
    }
}

std::vector<StructureAndFormat> every_structure_and_format() {
    std::vector<StructureAndFormat> all;
    for (const Structure structure : all_structures())
        for (const NumberFormat& format : all_formats())
            all.push_back({structure, format});
    return all;
}

INSTANTIATE_TEST_SUITE_P(
    All, GeneratedC, testing::ValuesIn(every_structure_and_format()), [](const auto& parameter) {
        const NumberFormat& format = parameter.param.format;
        return std::string(name_of(parameter.param.structure)) + "_" +
               std::string(name_of(format.type)) +
               (format.type == NumberFormat::Type::fixed ? std::to_string(format.word_bits) : "");
    });

} // namespace
} // namespace cornerwright::test
