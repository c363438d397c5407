// What `lossline materials` prints.

#include "materials/commands.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <sstream>

#include "tests/materials/fixtures.h"

namespace lossline::materials {
namespace {

using ::testing::AllOf;
using ::testing::HasSubstr;

/// Longest line of a text in characters.
std::size_t widest(const std::string& text) {
  std::istringstream in(text);
  std::string line;
  std::size_t width = 0;
  while (std::getline(in, line)) width = std::max(width, line.size());
  return width;
}

TEST(MaterialsList, HasOneLineAMaterialWithinThePage) {
  const Store store = Store::open(test::shipped());
  std::ostringstream out;
  list(out, store);
  EXPECT_LE(widest(out.str()), 100u);
  for (const MaterialSummary& m : store.list()) EXPECT_THAT(out.str(), HasSubstr("\n" + m.id));
}

TEST(MaterialsShow, HoldsCardSourcesRangesLimitsAndCheckValuesOfEveryMaterial) {
  const Store store = Store::open(test::shipped());
  for (const MaterialSummary& m : store.list()) {
    std::ostringstream out;
    show(out, store, m.id);
    EXPECT_LE(widest(out.str()), 100u) << m.id;
    EXPECT_THAT(out.str(), HasSubstr("Card")) << m.id;
  }
  std::ostringstream out;
  show(out, store, "softwood");
  EXPECT_THAT(out.str(), AllOf(HasSubstr("Simpson"), HasSubstr("Check values"),
                               HasSubstr("range: T 7 degC to 147 degC"), HasSubstr("Limits")));
}

TEST(MaterialsShow, SaysWhichMeasurementIsNeededWhereThereIsNoPermittivity) {
  std::ostringstream out;
  show(out, Store::open(test::shipped()), "rubber_compound");
  EXPECT_THAT(out.str(), HasSubstr("needs: eps of this very compound at the line frequency"));
}

TEST(MaterialsCheck, PassesOnTheShippedDatabaseAndListsTheUnverified) {
  std::ostringstream out;
  EXPECT_TRUE(check(out, Store::open(test::shipped())));
  EXPECT_THAT(out.str(), AllOf(HasSubstr("sound"), HasSubstr("unverified"), HasSubstr("carrot")));
  EXPECT_LE(widest(out.str()), 100u);
}

TEST(MaterialsCheck, FailsWhenACheckValueIsNotMet) {
  const test::Folder folder;
  test::write_text(folder / "m.db", test::read_text(test::shipped()));
  Database::open_user(folder / "m.db").execute("UPDATE golden SET expect = 1.5 * expect");
  std::ostringstream out;
  EXPECT_FALSE(check(out, Store::open(folder / "m.db")));
  EXPECT_THAT(out.str(), HasSubstr("FAILED"));
}

}  // namespace
}  // namespace lossline::materials
