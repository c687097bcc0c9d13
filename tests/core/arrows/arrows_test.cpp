// The arrows of the house, read from the includes: app -> widgets -> core, and inside core a folder
// uses only folders above it.

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <regex>
#include <string>
#include <vector>

namespace cornerwright {
namespace {

namespace fs = std::filesystem;

/// From the bottom of the house to the top: a folder may include itself and what stands before it.
const std::vector<std::string> order{
    "core/numerics",    "core/response",    "core/plant",    "core/measurement",  "core/fitting",
    "core/compensator", "core/realisation", "core/loop",     "core/requirements", "core/placement",
    "core/project",     "core/engine",      "core/handover", "widgets",           "app",
};

struct Include {
    fs::path file;
    std::string text; ///< what stands between the quotes or brackets
};

fs::path source_tree() {
    return fs::path(CORNERWRIGHT_TEST_DATA).parent_path();
}

std::vector<Include> includes_below(const std::string& folder) {
    static const std::regex line_with_include(R"(^\s*#\s*include\s*["<]([^">]+)[">])");
    std::vector<Include> includes;
    for (const auto& entry : fs::recursive_directory_iterator(source_tree() / folder)) {
        const std::string extension = entry.path().extension().string();
        if (extension != ".h" && extension != ".cpp")
            continue;
        std::ifstream file(entry.path());
        for (std::string line; std::getline(file, line);) {
            std::smatch match;
            if (std::regex_search(line, match, line_with_include))
                includes.push_back({fs::relative(entry.path(), source_tree()), match[1]});
        }
    }
    return includes;
}

/// Place in `order` of the folder that holds `path`; `order.size()` for what is not ours.
std::size_t floor_of(const std::string& path) {
    const auto holds = [&](const std::string& folder) { return path.starts_with(folder + "/"); };
    return static_cast<std::size_t>(std::find_if(order.begin(), order.end(), holds) -
                                    order.begin());
}

TEST(Arrows, EveryIncludeGoesDownTheHouse) {
    std::size_t seen = 0;
    for (const std::string& folder : order) {
        for (const Include& include : includes_below(folder)) {
            const std::size_t target = floor_of(include.text);
            if (target == order.size())
                continue;
            ++seen;
            EXPECT_LE(target, floor_of(include.file.generic_string()))
                << include.file << " includes " << include.text;
        }
    }
    EXPECT_GT(seen, 500U) << "the includes were not found";
}

TEST(Arrows, CoreIsMadeOfKnownFolders) {
    for (const auto& entry : fs::directory_iterator(source_tree() / "core")) {
        if (entry.is_directory()) {
            EXPECT_THAT(order, testing::Contains("core/" + entry.path().filename().string()));
        }
    }
}

TEST(Arrows, CoreAndTheCommandLineKnowNoQt) {
    static const std::regex qt(R"(^(Q[A-Z]\w*|Qt\w*/.*|qcustomplot\.h)$)");
    for (const std::string folder : {"core", "app/cli"})
        for (const Include& include : includes_below(folder))
            EXPECT_FALSE(std::regex_match(include.text, qt))
                << include.file << " includes " << include.text;
}

TEST(Arrows, CorePrintsNothing) {
    for (const Include& include : includes_below("core"))
        EXPECT_NE(include.text, "iostream") << include.file;
}

} // namespace
} // namespace cornerwright
