// The check values stored in the shipped database, run by the shipped models.

#include "materials/goldens.h"

#include <gtest/gtest.h>

#include <set>

#include "tests/materials/fixtures.h"

namespace lossline::materials {
namespace {

TEST(Goldens, AreAllMetByTheModels) {
  const Database db = Database::open_read_only(test::shipped());
  const auto goldens = run_goldens(db);
  EXPECT_GT(goldens.size(), 100u);
  for (const GoldenResult& g : goldens)
    EXPECT_TRUE(g.passed) << g.id << ", " << g.state << ": " << g.failure;
}

TEST(Goldens, CanFail) {
  const test::Folder folder;
  test::write_text(folder / "m.db", test::read_text(test::shipped()));
  {
    const Database db = Database::open_user(folder / "m.db");
    db.execute(
        "UPDATE golden SET expect = expect * 1.2 WHERE golden_id ="
        " 'softwood.cp.glass_zelinka.01'");
  }
  int failed = 0;
  for (const GoldenResult& g : run_goldens(Database::open_read_only(folder / "m.db")))
    failed += g.passed ? 0 : 1;
  EXPECT_EQ(failed, 1);
}

// Every form of the list is used by some data set, so that no formula ships untested.
TEST(Goldens, ReachMostForms) {
  const Database db = Database::open_read_only(test::shipped());
  EXPECT_EQ(db.integer("SELECT count(*) FROM model_form WHERE form_id NOT IN"
                       " (SELECT form_id FROM dataset_model)"),
            0);
  Statement rows = db.prepare(
      "SELECT DISTINCT form_id FROM dataset_model WHERE form_id NOT IN (SELECT form_id FROM"
      " golden JOIN dataset_model USING(dataset_id))");
  std::set<std::string> without;
  while (rows.step()) without.insert(rows.text(0));
  // A plain power of p/psat: its source prints no example and its value is read off directly.
  EXPECT_EQ(without, std::set<std::string>{"freundlich"});
}

TEST(Goldens, HoldPrintedValuesToTheirLastDigit) {
  const Database db = Database::open_read_only(test::shipped());
  EXPECT_GE(db.integer("SELECT count(*) FROM golden WHERE origin = 'printed'"), 2);
  // Nothing may be waved through: no tolerance above 3 %, which is half a digit of "0.0x".
  EXPECT_EQ(db.integer("SELECT count(*) FROM golden WHERE tol_rel > 0.03"), 0);
}

}  // namespace
}  // namespace lossline::materials
