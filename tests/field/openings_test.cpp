#include "planner/field/openings.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"

namespace lossline::field {
namespace {

// Counted by hand from (m/w)^2 + (n/h)^2 < (2/lambda)^2: at 2450 MHz, 0.85 m is 13.89 half waves,
// so TE_10 to TE_13,0 stand across any slot; 0.15 m high lets two half waves stand upright too.
TEST(Openings, CountChannelsOfASlotWhateverItsHeight) {
  EXPECT_EQ(propagating_channels(2450e6, 0.85, 0.010), 13);
  EXPECT_EQ(propagating_channels(2450e6, 0.85, 0.050), 13);
  EXPECT_EQ(propagating_channels(915e6, 0.85, 0.050), 5);
  EXPECT_EQ(propagating_channels(2450e6, 0.05, 0.03), 0);
}

// 55 channels, 3.28e-3 m2 with a tenth let through: an independent count.
TEST(Openings, CountFiftyFiveChannelsOfATallSlot) {
  EXPECT_EQ(propagating_channels(2450e6, 0.85, 0.15), 55);
  EXPECT_NEAR(opening_cross_section(2450e6, 0.85, 0.15, 0.1), 3.28e-3, 5e-6);
}

// N tends to 2 pi A/lambda^2 - the edge term is (w+h)/lambda times order one, 5 % here.
TEST(Openings, TendToAQuarterOfTheAreaWhenLarge) {
  EXPECT_NEAR(opening_cross_section(2450e6, 4, 3) / (4 * 3 / 4.0), 1, 0.05);
}

TEST(Openings, AnswerFourPassages) {
  // 50 x 30 mm at 2450 MHz: 315 dB/m below cut-off. 80 x 30 mm propagates. A belt slot 1500 x 45 mm
  // is no cut-off however low. 50 mm filled with eps' = 9 propagates.
  EXPECT_NEAR(slot_attenuation(2450e6, 0.05, 0.03), 315, 1);
  EXPECT_FALSE(wide_slot(2450e6, 0.05, 0.03));
  EXPECT_TRUE(wide_slot(2450e6, 0.08, 0.03));
  EXPECT_TRUE(wide_slot(2450e6, 1.5, 0.045));
  EXPECT_TRUE(wide_slot(2450e6, 1.5, 0.001));
  EXPECT_TRUE(wide_slot(2450e6, 0.05, 0.03, 9));
  EXPECT_EQ(slot_attenuation(2450e6, 1.5, 0.045), 0);
}

TEST(Openings, TheLargerSideDecidesWhicheverItIs) {
  EXPECT_EQ(slot_attenuation(2450e6, 0.05, 0.03), slot_attenuation(2450e6, 0.03, 0.05));
}

// Printed example: 0.85 x 0.05 m at 2450 MHz, 10 kW in; S per W 5.09, 15.86, 73.5 above the belt;
// 394, 1228 W, 5.7 kW arrive; surface 0.1996 m2, peak factor 4.6; 16.0, 20.9, 27.6 dB bring the
// mean at 5 cm down to 50 W/m2. The printed S have three digits: 0.5 % and 0.05 dB.
TEST(Openings, MatchALeakExample) {
  const double channels = opening_cross_section(2450e6, 0.85, 0.05);
  const double table[][3] = {{5.09, 394, 16.0}, {15.86, 1228, 20.9}, {73.5, 5700, 27.6}};
  for (const auto& row : table) {
    const double arriving = leaving_power(row[0] * 1e4, channels, 0);
    EXPECT_NEAR(arriving / row[1], 1, 5e-3);
    const LeakEstimate open = leak_estimate(2450e6, 0.85, 0.05, arriving, 0.05);
    EXPECT_NEAR(open.surface, 0.1996, 5e-5);
    EXPECT_NEAR(open.peak / open.mean, 4.6, 0.05);
    EXPECT_NEAR(10 * std::log10(open.mean / 50), row[2], 0.06);
    const double trapped = leaving_power(row[0] * 1e4, channels, row[2]);
    EXPECT_NEAR(leak_estimate(2450e6, 0.85, 0.05, trapped, 0.05).mean, 50, 1);
  }
}

TEST(Openings, TheBandOfALeakIsAFactorOfTenEachWay) {
  const LeakEstimate e = leak_estimate(915e6, 0.3, 0.1, 2, 0.05);
  EXPECT_NEAR(e.high / e.mean, 10, 1e-12);
  EXPECT_NEAR(e.mean / e.low, 10, 1e-12);
  EXPECT_LE(e.peak, e.high);
  EXPECT_GE(e.peak, e.mean);
}

TEST(Openings, RefuseWhatTheyCannotUse) {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  EXPECT_THROW(propagating_channels(2450e6, 0, 0.1), Error);
  EXPECT_THROW(propagating_channels(nan, 0.1, 0.1), Error);
  EXPECT_THROW(opening_cross_section(2450e6, 0.1, 0.1, 1.5), Error);
  EXPECT_THROW(slot_attenuation(2450e6, 0.05, 0.03, 0.5), Error);
  EXPECT_THROW(tube_attenuation(2450e6, -0.01), Error);
  EXPECT_THROW(leaving_power(1, 1, -3), Error);
  EXPECT_THROW(leak_estimate(2450e6, 0.85, 0.05, nan, 0.05), Error);
}

}  // namespace
}  // namespace lossline::field
