// The user's own series: taken in, ranked first, refused twice, taken back.

#include "materials/import.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/materials/fixtures.h"

namespace lossline::materials {
namespace {

using test::Folder;
using test::message_of;
using ::testing::Contains;
using ::testing::HasSubstr;

const char* const measured =
    "# material=rubber_compound; quantity=eps; of_phase=bulk; bulk_density=1150\n"
    "# instrument=cavity perturbation; calibrated=2026-02-03; operator=AB; method=resonator\n"
    "X,T,f,eps_re,eps_im\n1,degC,MHz,1,1\n"
    "0,90,2450,9,1.2\n"
    "0,200,2450,8,1.5\n"
    "0,90,2450,9,1.2\n"
    "0,95,2450,0.2,1.2\n";

class Import : public ::testing::Test {
 protected:
  ImportReport take(const std::string& text, const std::string& name = "s.csv") {
    test::write_text(folder / name, text);
    return import_series(Store::open(test::shipped(), user()), user(), folder / name, "2026-03-01");
  }
  [[nodiscard]] std::string user() const { return folder / "data/user.db"; }
  [[nodiscard]] Store store() const { return Store::open(test::shipped(), user()); }
  Folder folder;
};

TEST_F(Import, TakesGoodRowsAndReportsTheDirt) {
  const ImportReport report = take(measured);
  EXPECT_EQ(report.accepted, 2);
  ASSERT_EQ(report.rejected.size(), 2u);
  EXPECT_EQ(report.rejected[0].line, 7);
  EXPECT_THAT(report.rejected[0].reason, HasSubstr("same f, T and moisture as line 5"));
  EXPECT_EQ(report.rejected[1].line, 8);
  EXPECT_EQ(report.grade, 'B');
  EXPECT_EQ(report.evidence, "user_measured");
  const Database db = Database::open_user(user());
  EXPECT_EQ(db.integer("SELECT rows_ok FROM import_batch"), 2);
  EXPECT_EQ(db.integer("SELECT rows_rejected FROM import_batch"), 2);
  EXPECT_EQ(db.integer("SELECT length(sha256) FROM import_batch"), 64);
  EXPECT_EQ(db.integrity_fault(), "");
}

TEST_F(Import, GivesAMaterialWithoutPermittivityOne) {
  EXPECT_EQ(Store::open(test::shipped()).card("rubber_compound").permittivity, nullptr);
  (void)take(measured);
  const ProductCard card = store().card("rubber_compound");
  ASSERT_NE(card.permittivity, nullptr);
  EXPECT_EQ(card.permittivity_provenance.evidence, Evidence::user_measured);
  EXPECT_NEAR(-card.permittivity->at(0, 363.15, 2450e6).value.imag(), 1.2, 1e-12);
  // The shipped values of the same material stay.
  EXPECT_TRUE(card.dry_heat_capacity.has_value());
}

TEST_F(Import, OutRanksAShippedRowAndNeverChangesIt) {
  const std::string before = test::read_text(test::shipped());
  (void)take(
      "# material=gypsum_board; of_phase=bulk; bulk_density=800\n"
      "# instrument=probe; calibrated=2026-02-03\n"
      "X,T,f,eps_re,eps_im\n1,degC,MHz,1,1\n0,20,915,2.5,0.1\n0.3,20,915,8,1\n");
  const ProductCard card = store().card("gypsum_board");
  EXPECT_EQ(card.permittivity_provenance.grade, 'B');
  EXPECT_EQ(card.permittivity_low, nullptr);
  EXPECT_DOUBLE_EQ(card.permittivity->at(0.3, 293.15, 915e6).value.real(), 8.0);
  EXPECT_EQ(test::read_text(test::shipped()), before);
  // Asked at a frequency that was not measured it says what is there.
  EXPECT_THAT(message_of([&] { (void)card.permittivity->at(0.3, 293.15, 2450e6); }),
              HasSubstr("available: 915 MHz, moisture 0 to 0.3 dry basis"));
}

TEST_F(Import, WithoutCalibrationIsAnEstimateOfGradeE) {
  const ImportReport report = take(
      "# material=carrot; of_phase=particle\n"
      "X,T,f,eps_re,eps_im\n1,degC,MHz,1,1\n0.1,20,915,3,0.3\n2,20,915,30,6\n");
  EXPECT_EQ(report.grade, 'E');
  EXPECT_EQ(report.evidence, "user_estimate");
  EXPECT_THAT(report.missing, Contains(HasSubstr("no instrument and calibration date")));
  EXPECT_THAT(report.missing, Contains(HasSubstr("2 moistures")));
}

TEST_F(Import, AMeasurementRanksBeforeALaterEstimate) {
  (void)take(measured);
  (void)take(
      "# material=rubber_compound; of_phase=bulk; bulk_density=1150\n"
      "X,T,f,eps_re,eps_im\n1,degC,MHz,1,1\n0,90,2450,5,0.5\n0,200,2450,5,0.5\n",
      "guess.csv");
  EXPECT_EQ(store().card("rubber_compound").permittivity_provenance.grade, 'B');
}

TEST_F(Import, RefusesTheSameFileTwice) {
  (void)take(measured);
  EXPECT_THAT(message_of([&] { (void)take(measured, "other-name.csv"); }),
              HasSubstr("already imported on 2026-03-01 as number 1"));
  EXPECT_EQ(Database::open_user(user()).integer("SELECT count(*) FROM dataset"), 1);
}

TEST_F(Import, IsTakenBackAsAWhole) {
  const ImportReport report = take(measured);
  undo_import(user(), report.import_id);
  const Database db = Database::open_user(user());
  for (const char* table :
       {"dataset", "point", "axis_range", "provenance", "import_batch", "material", "source"})
    EXPECT_EQ(db.integer("SELECT count(*) FROM " + std::string(table)), 0) << table;
  EXPECT_EQ(store().card("rubber_compound").permittivity, nullptr);
  EXPECT_NO_THROW((void)take(measured));  // and may come again
  EXPECT_THAT(message_of([&] { undo_import(user(), 99); }), HasSubstr("there is no import 99"));
}

TEST_F(Import, MakesANewMaterialOfTheUsersOwn) {
  (void)take(
      "# material=my_tile; name=My tile; family=mineral; form=sheet; of_phase=bulk\n"
      "# bulk_density=900 kg/m3\n"
      "X,T,f,eps_re,eps_im\n1,degC,MHz,1,1\n0.1,20,915,3,0.3\n0.2,20,915,4,0.5\n");
  EXPECT_EQ(store().card("my_tile").name, "My tile");
  EXPECT_TRUE(store().describe("my_tile").summary.user_data);
}

TEST_F(Import, LeavesNothingBehindWhenTheFileCannotBeUsed) {
  const std::string rows = "X,T,f,eps_re,eps_im\n1,degC,MHz,1,1\n";
  EXPECT_THAT(message_of([&] { (void)take("# material=carrot; of_phase=particle\n" + rows); }),
              HasSubstr("no usable row, 0 rejected"));
  EXPECT_THAT(message_of([&] { (void)take("# of_phase=bulk\n" + rows + "0.1,20,915,3,0.3\n"); }),
              HasSubstr("which material?"));
  EXPECT_THAT(message_of([&] { (void)take("# material=carrot\n" + rows + "0.1,20,915,3,0.3\n"); }),
              HasSubstr("on the bed as it lies, or on one piece?"));
  EXPECT_THAT(message_of([&] {
                (void)take("# material=new_one; of_phase=bulk\n" + rows + "0.1,20,915,3,0.3\n");
              }),
              HasSubstr("'new_one' is not in the database"));
  EXPECT_THAT(message_of([&] {
                (void)take("# material=carrot; of_phase=particle\n" + rows +
                           "0.1,20,915,3,0.3\n0.1,60,915,3,0.3\n0.2,60,915,4,0.3\n");
              }),
              HasSubstr("single moisture"));
  EXPECT_EQ(store().card("carrot").permittivity_provenance.dataset, "carrot.eps.estimate");
}

}  // namespace
}  // namespace lossline::materials
