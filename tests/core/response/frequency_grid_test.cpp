#include "core/response/frequency_grid.h"

#include <gtest/gtest.h>

#include <algorithm>

namespace cornerwright {
namespace {

TEST(GuidedGrid, AscendsBetweenItsEnds) {
    const std::vector<GridGuide> guides{{1.0, 1.0}, {700.0, 0.07}, {3e4, 3e4}};
    const std::vector<double> grid = guided_grid(1e-2, 3e6, guides);
    EXPECT_EQ(grid.front(), 1e-2);
    EXPECT_EQ(grid.back(), 3e6);
    EXPECT_TRUE(std::is_sorted(grid.begin(), grid.end()));
    EXPECT_EQ(std::adjacent_find(grid.begin(), grid.end()), grid.end());
    EXPECT_GT(grid.size(), 300u);
    EXPECT_LT(grid.size(), 1100u);
}

TEST(GuidedGrid, ResolvesALightPairOverItsOwnWidth) {
    const GridGuide guide{700.0, 0.07};
    const std::vector<double> grid = guided_grid(1.0, 1e5, {&guide, 1});
    const auto inside = std::count_if(grid.begin(), grid.end(), [&](double w) {
        return std::abs(w - guide.w_rad_s) <= guide.width_rad_s;
    });
    EXPECT_GE(inside, 5);
    // Seen from the pair, no step is wider than twice the way already gone.
    for (std::size_t i = 1; i < grid.size(); ++i) {
        const double near = std::min(std::abs(grid[i] - 700.0), std::abs(grid[i - 1] - 700.0));
        if (near < 20.0) {
            EXPECT_LE(grid[i] - grid[i - 1], 0.071 + 2.0 * near);
        }
    }
}

TEST(GuidedGrid, TheLatticeStaysWhereItIsWhenACornerMoves) {
    const GridGuide before{10.0, 10.0};
    const GridGuide after{10.7, 10.7};
    const std::vector<double> a = guided_grid(0.1, 1e3, {&before, 1});
    const std::vector<double> b = guided_grid(0.1, 1e3, {&after, 1});
    std::vector<double> common;
    std::set_intersection(a.begin(), a.end(), b.begin(), b.end(), std::back_inserter(common));
    EXPECT_GT(common.size() * 10, a.size() * 8);
}

} // namespace
} // namespace cornerwright
