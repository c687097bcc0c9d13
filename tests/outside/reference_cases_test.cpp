// Projects whose figures were computed by an independent program (mpmath and NumPy, 34 to 140
// digits): every figure of every case within its tolerance. Another folder of cases runs through
// the environment variable CORNERWRIGHT_CASES.

#include "tests/outside/case_differences.h"
#include "tests/outside/reference_case.h"
#include "tests/outside/section_differences.h"

#include <gtest/gtest.h>

#include <iostream>
#include <map>

namespace cornerwright::outside {
namespace {

/// Cases known to disagree, and why. A case that stands here and agrees fails, so that the list
/// shrinks.
const std::map<std::string, std::string> known_to_disagree{};

class ReferenceCases : public testing::TestWithParam<std::string> {
  protected:
    static void TearDownTestSuite() {
        if (assessed_ > 0)
            std::cout << "assessed " << assessed_ << " cases, on average "
                      << seconds_ / assessed_ * 1e3 << " ms each\n";
    }

    static void count(double seconds) {
        ++assessed_;
        seconds_ += seconds;
    }

  private:
    static inline int assessed_ = 0;
    static inline double seconds_ = 0.0;
};

TEST_P(ReferenceCases, Agrees) {
    const ReferenceCase reference = read_case(GetParam());
    const Assessed assessed = assess(reference);
    count(assessed.seconds);
    std::vector<std::string> all = differences(reference, assessed.assessment);
    if (!assessed.handover.is_null())
        for (std::string& difference : section_differences(assessed))
            all.push_back(std::move(difference));

    const auto known = known_to_disagree.find(GetParam());
    if (known != known_to_disagree.end()) {
        EXPECT_FALSE(all.empty()) << GetParam() << " agrees now: take it off the list";
        return;
    }
    for (const std::string& difference : all)
        ADD_FAILURE() << GetParam() << ": " << difference;
}

INSTANTIATE_TEST_SUITE_P(Folder, ReferenceCases, testing::ValuesIn(case_names()),
                         [](const testing::TestParamInfo<std::string>& tested) {
                             std::string name = tested.param;
                             for (char& c : name)
                                 if (std::isalnum(static_cast<unsigned char>(c)) == 0)
                                     c = '_';
                             return name;
                         });

} // namespace
} // namespace cornerwright::outside
