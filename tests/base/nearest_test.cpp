#include "planner/base/nearest.h"

#include <gtest/gtest.h>

#include <vector>

namespace lossline {
namespace {

const std::vector<std::string> keys{"speed", "width", "thickness", "open_share"};

TEST(EditDistance, CountsInsertionsDeletionsAndReplacements) {
  EXPECT_EQ(edit_distance("speed", "speed"), 0);
  EXPECT_EQ(edit_distance("sped", "speed"), 1);
  EXPECT_EQ(edit_distance("spede", "speed"), 1);
  EXPECT_EQ(edit_distance("", "speed"), 5);
  EXPECT_EQ(edit_distance("kitten", "sitting"), 3);
}

TEST(Nearest, PrefersTheSameWordInAnotherCase) {
  EXPECT_EQ(nearest("SPEED", keys), "speed");
  const std::vector<std::string> units{"mV", "kV", "KV"};
  EXPECT_EQ(nearest("kv", units), "kV");
}

TEST(Nearest, FindsASlipOfTheFingers) {
  EXPECT_EQ(nearest("sped", keys), "speed");
  EXPECT_EQ(nearest("widht", keys), "width");
  EXPECT_EQ(nearest("thicknes", keys), "thickness");
}

TEST(Nearest, GivesNothingForAnUnrelatedWord) {
  EXPECT_EQ(nearest("colour", keys), "");
  EXPECT_EQ(nearest("wdt", keys), "");  // two edits in three letters are too many
}

TEST(Listed, JoinsWithOr) {
  EXPECT_EQ(listed(std::vector<std::string>{"a", "b", "c"}), "'a', 'b' or 'c'");
  EXPECT_EQ(listed(std::vector<std::string>{"a"}), "'a'");
}

}  // namespace
}  // namespace lossline
