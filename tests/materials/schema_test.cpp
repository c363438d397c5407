// The rules the database keeps by itself, whoever writes to it.

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "materials/database.h"
#include "tests/materials/fixtures.h"

namespace lossline::materials {
namespace {

using test::message_of;
using ::testing::HasSubstr;

class Schema : public ::testing::Test {
 protected:
  Schema() : db(Database::in_memory(test::read_text(test::schema_file()))) {
    db.execute(
        "INSERT INTO source(source_id, kind, title, obtained) VALUES('s','book','t','full_text');"
        "INSERT INTO quantity(quantity_id, si_unit, description) VALUES('eps','1','d');"
        "INSERT INTO material(material_id, name, family, form, status, created)"
        " VALUES('m','M','food','pieces','screening','2026-01-01')");
  }
  void provenance(const std::string& values) const {
    db.execute(
        "INSERT INTO provenance(evidence, grade, source_id, entered_by, entered_on, checked_by)"
        " VALUES(" +
        values + ")");
  }
  void dataset(const std::string& rest) const {
    db.execute(
        "INSERT INTO dataset(dataset_id, material_id, quantity_id, kind, moisture_basis,"
        " of_phase, prov_id, rel_unc, unc_kind, priority, origin) VALUES('d','m','eps',"
        "'points','dry','bulk'," +
        rest + ")");
  }
  Database db;
};

TEST_F(Schema, RefusesAValueFromMemoryWithGradeB) {
  EXPECT_THAT(message_of([&] { provenance("'from_memory','B','s','x','d',NULL"); }),
              HasSubstr("from_memory_is_d_or_e"));
  EXPECT_NO_THROW(provenance("'from_memory','D','s','x','d',NULL"));
}

TEST_F(Schema, RefusesAValueReadInAPrimarySourceWithoutTheSource) {
  EXPECT_THAT(message_of([&] { provenance("'primary_read','B',NULL,'x','d',NULL"); }),
              HasSubstr("evidence_read_needs_source"));
}

TEST_F(Schema, RefusesGradeDFromMemoryWithoutANamedSource) {
  EXPECT_THAT(message_of([&] { provenance("'from_memory','D',NULL,'x','d',NULL"); }),
              HasSubstr("from_memory_without_source_is_e"));
  EXPECT_NO_THROW(provenance("'from_memory','E',NULL,'x','d',NULL"));
}

TEST_F(Schema, RefusesGradeAWithoutASecondSignature) {
  EXPECT_THAT(message_of([&] { provenance("'primary_read','A','s','x','d',NULL"); }),
              HasSubstr("grade_a_needs_second_signature"));
  EXPECT_THAT(message_of([&] { provenance("'primary_read','A','s','x','d','x'"); }),
              HasSubstr("grade_a_needs_second_signature"));
  EXPECT_NO_THROW(provenance("'primary_read','A','s','x','d','y'"));
}

TEST_F(Schema, RefusesAModelAboveGradeCAndAGuessAboveE) {
  EXPECT_THAT(message_of([&] { provenance("'model_derived','B','s','x','d',NULL"); }),
              HasSubstr("model_is_c_to_e"));
  EXPECT_THAT(message_of([&] { provenance("'user_estimate','D','s','x','d',NULL"); }),
              HasSubstr("user_estimate_is_e"));
}

TEST_F(Schema, RefusesALimitOnGradeE) {
  provenance("'from_memory','E',NULL,'x','d',NULL");
  const auto insert = [&] {
    db.execute(
        "INSERT INTO limit_value(material_id, kind, value, unit, reason, severity, prov_id)"
        " VALUES('m','T_product_max',350,'K','r','damage',1)");
  };
  EXPECT_THAT(message_of(insert), HasSubstr("a limit cannot rest on a value of grade E"));
}

TEST_F(Schema, RefusesADatasetWithoutProvenanceAndOneOfAnUnknownSource) {
  EXPECT_THAT(message_of([&] { dataset("NULL,0.1,'std',100,'shipped'"); }), HasSubstr("NOT NULL"));
  EXPECT_THAT(message_of([&] { dataset("7,0.1,'std',100,'shipped'"); }), HasSubstr("FOREIGN KEY"));
}

TEST_F(Schema, KeepsUserRowsBeforeShippedRows) {
  provenance("'from_memory','E',NULL,'x','d',NULL");
  EXPECT_THAT(message_of([&] { dataset("1,0.1,'std',100,'user'"); }),
              HasSubstr("user_rows_rank_first"));
  EXPECT_THAT(message_of([&] { dataset("1,0.1,'std',50,'shipped'"); }),
              HasSubstr("shipped_rows_rank_after"));
}

TEST_F(Schema, RefusesAMeasurementOfGradeBWithoutItsCalibration) {
  provenance("'user_measured','B','s','x','d',NULL");
  EXPECT_THAT(message_of([&] { dataset("1,0.1,'std',50,'user'"); }),
              HasSubstr("needs its calibration record"));
}

TEST_F(Schema, RefusesTextInANumberColumnAndANegativeLoss) {
  provenance("'from_memory','E',NULL,'x','d',NULL");
  dataset("1,0.1,'std',100,'shipped'");
  EXPECT_NE(message_of([&] {
              db.execute("INSERT INTO point(dataset_id, seq, value) VALUES('d',1,'two')");
            }),
            "");
  EXPECT_NE(message_of([&] {
              db.execute("INSERT INTO point(dataset_id, seq, value, value_im) VALUES('d',1,2,-1)");
            }),
            "");
}

}  // namespace
}  // namespace lossline::materials
