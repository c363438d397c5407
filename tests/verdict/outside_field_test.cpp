#include "planner/verdict/outside_field.h"

#include <gtest/gtest.h>

namespace lossline::verdict {
namespace {

// ICNIRP: f/40 W/m2 with f in MHz below 2 GHz gives 22.9 at 915 MHz; 50 above.
TEST(OutsideField, ComparesWithTheStrictestLevel) {
  EXPECT_NEAR(strictest_level(915e6), 22.875, 1e-9);
  EXPECT_DOUBLE_EQ(strictest_level(2450e6), 50);
}

TEST(OutsideField, IsAWordWithATenfoldBandEitherWay) {
  const EndTrap trap{"inlet", {0.85, 0.05}, 1, 20, 20, ""};
  auto word = [&](double leaving) {
    const auto outside = outside_field(trap, {"inlet", 2450e6, 400, 40, leaving});
    EXPECT_TRUE(outside.has_value());
    EXPECT_GE(outside->high, 99 * outside->low);
    return outside->word;
  };
  // The surface 5 cm around an 0.85 x 0.05 m mouth is 0.20 m2: 10 W is a mean of 50 W/m2.
  EXPECT_EQ(word(0.1), "below");
  EXPECT_EQ(word(2), "near");
  EXPECT_EQ(word(10), "near");
  EXPECT_EQ(word(95), "near");
  EXPECT_EQ(word(200), "above");
}

TEST(OutsideField, IsUnknownWithoutAFieldAtTheEnd) {
  const EndTrap trap{"inlet", {0.85, 0.05}, 1, 20, 20, ""};
  EXPECT_FALSE(outside_field(trap, {"inlet", 2450e6, 0, 0, 0}).has_value());
}

}  // namespace
}  // namespace lossline::verdict
