#include "planner/linefile/settings.h"

#include "small_line.h"

namespace lossline::linefile {
namespace {

Line set(const std::vector<Setting>& settings) {
  return read_text(small_line, "test.toml", settings).line;
}

TEST(Settings, AreSplitAtTheFirstEqualsSign) {
  const Setting s = setting_from(" line.note = a = b ");
  EXPECT_EQ(s.key, "line.note");
  EXPECT_EQ(s.value, "a = b");
  EXPECT_THROW((void)setting_from("belt.speed"), Error);
  EXPECT_THROW((void)setting_from("=3"), Error);
}

TEST(Settings, ReplaceAndAddValuesOfAnyType) {
  EXPECT_EQ(set({{"feed.depth", "30 mm"}}).feed.depth, 0.03);
  EXPECT_EQ(set({{"belt.speed", "2.4 m/min"}}).belt.speed, 0.04);
  EXPECT_EQ(set({{"stretch[2].launchers", "3"}}).stretches[1].launchers, 3);
  EXPECT_EQ(set({{"stretch[2].mixing", "0.1"}}).stretches[1].mixing, 0.1);
  EXPECT_TRUE(set({{"product.food", "true"}}).product.food);
  EXPECT_EQ(set({{"limits.product_temperature", "90 degC"}}).limits.product_temperature, 363.15);
  EXPECT_EQ(set({{"line.note", "tried"}, {"line.note", "tried again"}}).note, "tried again");
  const Line fed =
      set({{"generator.G1.feeds", "cavity 1b, cavity 1"}, {"generator[1].shares", "30 %,70 %"}});
  EXPECT_EQ(fed.generators[0].feeds[0].stretch, "cavity 1b");
  EXPECT_EQ(fed.generators[0].feeds[1].share, 0.7);
}

TEST(Settings, FindMembersByTheirLongestName) {
  EXPECT_EQ(set({{"stretch.cavity 1.length", "3 m"}}).stretches[0].length, 3);
  EXPECT_EQ(set({{"stretch.cavity 1b.length", "3 m"}}).stretches[1].length, 3);
  const std::string dotted = with(small_line, "name = \"cavity 1b\"", "name = \"cavity 1.b\"");
  const Line line = read_text(with(dotted, "\"cavity 1b\"]", "\"cavity 1.b\"]"), "test.toml",
                              std::vector<Setting>{{"stretch.cavity 1.b.length", "3 m"}})
                        .line;
  EXPECT_EQ(line.stretches[1].length, 3);
}

TEST(Settings, FaultsSayThatTheyCameWithSet) {
  EXPECT_EQ(faults(small_line, {{"belt.sped", "2 m/min"}}),
            "--set: belt.sped: is not a key of [belt]; did you mean 'speed'?");
  EXPECT_EQ(faults(small_line, {{"bolt.speed", "2 m/min"}}),
            "--set: bolt: is not a key of a line file; did you mean 'belt'?");
  EXPECT_EQ(faults(small_line, {{"belt.speed", "2"}}),
            "--set: belt.speed: \"2\" has no unit; write a speed as in \"2.4 m/min\"");
  EXPECT_EQ(faults(small_line, {{"feed.width", "1.5 m"}}),
            "--set: feed.width: the product is 1.5 m wide and the belt 1.2 m; the product lies on "
            "the belt");
  EXPECT_EQ(faults(small_line, {{"stretch.cavity 9.length", "2 m"}}),
            "--set: stretch.cavity 9.length: names no member of stretch; the names are 'cavity 1' "
            "or 'cavity 1b'");
  EXPECT_EQ(faults(small_line, {{"stretch[3].length", "2 m"}}),
            "--set: stretch[3].length: has no such member; stretch has members [1] to [2]");
  EXPECT_EQ(faults(small_line, {{"belt", "2 m"}}),
            "--set: belt: is a table, not a value; name one of its keys");
  EXPECT_EQ(faults(small_line, {{"belt.width.x", "2 m"}}),
            "--set: belt.width.x: leads through a value that is no table; write it as in "
            "belt.speed");
  EXPECT_EQ(faults(small_line, {{"product.food", "yes"}}),
            "--set: product.food: \"yes\" is a text; give true or false");
  EXPECT_EQ(faults(small_line, {{"format", "1"}}),
            "--set: format: this is not a version number; write format = 1 in the first line");
}

}  // namespace
}  // namespace lossline::linefile
