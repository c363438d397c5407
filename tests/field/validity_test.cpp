#include "planner/field/validity.h"

#include <gtest/gtest.h>

#include <limits>

#include "planner/base/error.h"

namespace lossline::field {
namespace {

ValidityInput good() {
  ValidityInput in;
  in.frequency = 2450e6;
  in.length = 1.2;
  in.width = 1.0;
  in.height = 0.8;
  in.bed_depth = 0.05;
  in.modal_overlap = 20;
  in.bed_share = 0.9;
  return in;
}

TEST(Validity, ALargeCavityWithAStrongBedRaisesNothing) {
  EXPECT_TRUE(validity_flags(good()).empty());
}

TEST(Validity, SmallCavitiesAreDoubtfulThenUnusable) {
  ValidityInput in = good();
  in.height = 0.4;  // 3.3 wavelengths
  auto flags = validity_flags(in);
  ASSERT_EQ(flags.size(), 1U);
  EXPECT_EQ(flags[0].kind, ValidityKind::small_cavity);
  EXPECT_EQ(flags[0].grade, ValidityGrade::caution);
  EXPECT_NE(flags[0].sentence.find("3.3 wavelengths"), std::string::npos) << flags[0].sentence;
  in.height = 0.2;
  flags = validity_flags(in);
  ASSERT_EQ(flags.size(), 1U);
  EXPECT_EQ(flags[0].grade, ValidityGrade::unusable);
}

TEST(Validity, FewModesAreDoubtfulThenUnusable) {
  ValidityInput in = good();
  in.modal_overlap = 3;
  auto flags = validity_flags(in);
  ASSERT_EQ(flags.size(), 1U);
  EXPECT_EQ(flags[0].kind, ValidityKind::few_modes);
  EXPECT_EQ(flags[0].grade, ValidityGrade::caution);
  in.modal_overlap = 0.5;
  flags = validity_flags(in);
  ASSERT_EQ(flags.size(), 1U);
  EXPECT_EQ(flags[0].grade, ValidityGrade::unusable);
}

TEST(Validity, ThinAndWeakBedsAreNamed) {
  ValidityInput in = good();
  in.bed_depth = 0.010;
  in.bed_absorptance = 0.02;
  const auto flags = validity_flags(in);
  ASSERT_EQ(flags.size(), 2U);
  EXPECT_EQ(flags[0].kind, ValidityKind::thin_bed);
  EXPECT_EQ(flags[1].kind, ValidityKind::weak_bed);
  in = good();
  in.bed_share = 0.3;
  EXPECT_EQ(validity_flags(in).at(0).kind, ValidityKind::weak_bed);
  in.bed_depth = 0;  // an empty belt has no bed to doubt
  EXPECT_TRUE(validity_flags(in).empty());
}

TEST(Validity, CautiousShareIsThreeQuartersOfTheRatio) {
  EXPECT_NEAR(cautious_bed_share(0.8), 3 / 4.0, 1e-15);  // ratio 4 becomes 3
  EXPECT_EQ(cautious_bed_share(0), 0);
  EXPECT_EQ(cautious_bed_share(1), 1);
  EXPECT_EQ(cautious_bed_share(1.3), 1);
  EXPECT_THROW(cautious_bed_share(std::numeric_limits<double>::quiet_NaN()), Error);
}

TEST(Validity, RefusesWhatItCannotJudge) {
  ValidityInput in = good();
  in.modal_overlap = std::numeric_limits<double>::quiet_NaN();
  EXPECT_THROW(validity_flags(in), Error);
  in = good();
  in.width = 0;
  EXPECT_THROW(validity_flags(in), Error);
}

}  // namespace
}  // namespace lossline::field
