#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/cli/program.h"

namespace lossline::tests {
namespace {

using ::testing::HasSubstr;
using ::testing::IsEmpty;

TEST(MaterialsCommand, ListsShowsAndChecks) {
  const Outcome list = lossline({"materials", "list"});
  EXPECT_EQ(list.code, 0) << list.err;
  EXPECT_THAT(list.out, HasSubstr("carrot"));
  const Outcome show = lossline({"materials", "show", "carrot"});
  EXPECT_EQ(show.code, 0) << show.err;
  EXPECT_GT(show.out.size(), 500u);
  const Outcome check = lossline({"materials", "check"});
  EXPECT_EQ(check.code, 0) << check.out << check.err;
}

TEST(MaterialsCommand, RefusesAnUnknownMaterial) {
  const Outcome show = lossline({"materials", "show", "carott"});
  EXPECT_EQ(show.code, 2);
  EXPECT_THAT(show.err, HasSubstr("carrot"));
  EXPECT_THAT(show.out, IsEmpty());
}

/// One sentence on standard error and exit code 2, for `list` as for `solve`.
void expect_refused(const std::string& database) {
  for (const std::vector<std::string>& arguments :
       {std::vector<std::string>{"materials", "list"}, {"solve", scenario("quillfen.toml")}}) {
    const Outcome outcome = lossline(arguments, {{"LOSSLINE_MATERIALS", database}});
    EXPECT_EQ(outcome.code, 2) << database;
    EXPECT_THAT(outcome.out, IsEmpty()) << database;
    EXPECT_THAT(outcome.err, HasSubstr("lossline: ")) << database;
    EXPECT_EQ(std::count(outcome.err.begin(), outcome.err.end(), '\n'), 1) << outcome.err;
  }
}

TEST(MaterialsCommand, RefusesADatabaseThatIsMissingCutOrForeign) {
  const Folder folder;
  const std::string whole =
      content(std::filesystem::path(LOSSLINE_PROGRAM).parent_path() / "materials/materials.db");
  ASSERT_GT(whole.size(), 20'000u);
  expect_refused(folder.path("none.db"));
  expect_refused(folder.write("cut.db", whole.substr(0, whole.size() / 2)));
  expect_refused(folder.write("head.db", whole.substr(0, 50)));
  expect_refused(folder.write("empty.db", ""));
  expect_refused(folder.write("text.db", "this is a shopping list\n"));
}

TEST(MaterialsCommand, RefusesToTakeBackAnImportThatNeverWas) {
  const Folder folder;
  const Outcome undo =
      lossline({"materials", "undo", "7"}, {{"LOSSLINE_USER_MATERIALS", folder.path("user.db")}});
  EXPECT_EQ(undo.code, 2);
  EXPECT_FALSE(undo.err.empty());
}

TEST(MaterialsCommand, ImportsAndTakesBackASeries) {
  const Folder folder;
  const Environment own{{"LOSSLINE_USER_MATERIALS", folder.path("user.db")}};
  const Outcome refused =
      lossline({"materials", "import", folder.write("bad.csv", "nothing\nof use\n")}, own);
  EXPECT_EQ(refused.code, 2);
  EXPECT_THAT(refused.err, HasSubstr("bad.csv"));
  const std::string series = folder.write(
      "series.csv",
      "# material=rubber_compound; quantity=eps; of_phase=bulk; bulk_density=1150\n"
      "# instrument=cavity perturbation; calibrated=2026-02-03; operator=AB; method=resonator\n"
      "X,T,f,eps_re,eps_im\n1,degC,MHz,1,1\n"
      "0,90,2450,9,1.2\n0,200,2450,8,1.5\n");
  const Outcome taken = lossline({"materials", "import", series}, own);
  EXPECT_EQ(taken.code, 0) << taken.err;
  EXPECT_EQ(lossline({"materials", "import", series}, own).code, 2);  // twice is once too often
  EXPECT_EQ(lossline({"materials", "undo", "1"}, own).code, 0);
  EXPECT_EQ(lossline({"materials", "undo", "1"}, own).code, 2);
}

}  // namespace
}  // namespace lossline::tests
