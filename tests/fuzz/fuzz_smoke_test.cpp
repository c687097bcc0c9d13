#include "tests/fuzz/fuzz_inputs.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <iterator>
#include <random>
#include <string>
#include <utility>
#include <vector>

namespace cornerwright::fuzzing {
namespace {

std::vector<std::string> corpus_of(const std::string& name) {
    const auto folder = std::filesystem::path(CORNERWRIGHT_TEST_DATA) / "fuzz/corpus" / name;
    std::vector<std::filesystem::path> files;
    for (const auto& entry : std::filesystem::directory_iterator(folder))
        files.push_back(entry.path());
    // Folders list in no order; mutations below depend on it.
    std::sort(files.begin(), files.end());
    std::vector<std::string> contents;
    for (const auto& file : files) {
        std::ifstream stream(file, std::ios::binary);
        contents.emplace_back(std::istreambuf_iterator<char>(stream),
                              std::istreambuf_iterator<char>());
    }
    return contents;
}

/// Flips, drops, doubles or cuts a piece, or takes one from another file.
std::string mutated(std::string text, const std::vector<std::string>& corpus,
                    std::mt19937& random) {
    const auto below = [&](std::size_t limit) { return limit == 0 ? 0 : random() % limit; };
    const std::size_t changes = 1 + below(4);
    for (std::size_t change = 0; change < changes && !text.empty(); ++change) {
        const std::size_t at = below(text.size());
        const std::size_t count = 1 + below(12);
        switch (below(5)) {
        case 0:
            text[at] = static_cast<char>(below(256));
            break;
        case 1:
            text.erase(at, count);
            break;
        case 2:
            text.insert(at, text.substr(at, count));
            break;
        case 3:
            text.resize(at);
            break;
        default: {
            const std::string& other = corpus[below(corpus.size())];
            text.insert(at, other.substr(below(other.size()), count));
        }
        }
    }
    return text;
}

class FuzzSmoke : public testing::TestWithParam<std::pair<Input, std::string>> {};

TEST_P(FuzzSmoke, CorpusAndMutationsEndWell) {
    const auto& [input, folder] = GetParam();
    const auto corpus = corpus_of(folder);
    ASSERT_FALSE(corpus.empty());
    std::mt19937 random(20310304); // seeded: a failure comes again
    for (std::size_t file = 0; file < corpus.size(); ++file) {
        EXPECT_NO_THROW(feed(input, corpus[file])) << "file " << file << " of " << folder;
        for (int copy = 0; copy < 100; ++copy) {
            const std::string text = mutated(corpus[file], corpus, random);
            EXPECT_NO_THROW(feed(input, text)) << folder << ":\n" << text;
        }
    }
}

INSTANTIATE_TEST_SUITE_P(Inputs, FuzzSmoke,
                         testing::Values(std::pair(Input::text_table, "text_table"),
                                         std::pair(Input::touchstone, "touchstone"),
                                         std::pair(Input::universal_file, "universal_file"),
                                         std::pair(Input::time_record, "time_record"),
                                         std::pair(Input::project, "project")),
                         [](const auto& test) { return test.param.second; });

} // namespace
} // namespace cornerwright::fuzzing
