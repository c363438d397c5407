#include "planner/water/permittivity.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/water/salt_permittivity.h"
#include "tests/numerics/sweep.h"

namespace lossline::water {

constexpr double nan = std::numeric_limits<double>::quiet_NaN();

TEST(PureWater, ModelsAgreeWhereTheirRangesMeet) {
  // 3.1 % in eps'': the spread between the published models at 0 .. 40 degC, largest at 0 degC and
  // 915 MHz. In eps' 1 % at 915 and 2450 MHz; 1.8 % at 5.8 GHz, where one relaxation (Kaatze) and
  // three (Ellison) part in cold water.
  struct Band {
    double frequency, spread;
  };
  for (const double T : test::sweep(273.15, 313.15, 1))
    for (const Band& band : {Band{0.915e9, 0.01}, Band{2.45e9, 0.01}, Band{5.8e9, 0.018}}) {
      const double f = band.frequency;
      const std::complex<double> e = pure_water_ellison(f, T);
      for (const auto other :
           {pure_water_kaatze(f, T), pure_water_meissner_wentz(f, T), pure_water_itu(f, T)}) {
        EXPECT_NEAR(other.real() / e.real(), 1, band.spread) << T << ' ' << f;
        EXPECT_NEAR(other.imag() / e.imag(), 1, 0.031) << T << ' ' << f;
      }
    }
}

TEST(PureWater, EllisonStaysSmoothAndLossyWhenExtrapolated) {
  double before = -pure_water_ellison(2.45e9, 373.15).imag();
  for (const double T : test::sweep(374, extrapolation_T_max, 1)) {
    const std::complex<double> e = pure_water_ellison(2.45e9, T, Beyond::extrapolate);
    EXPECT_GT(e.real(), 30);
    EXPECT_GT(-e.imag(), 0);
    EXPECT_LT(-e.imag(), before);
    before = -e.imag();
  }
}

TEST(PureWater, RefusesWhatIsOutsideTheStatedRange) {
  EXPECT_NO_THROW((void)pure_water_ellison(2.45e9, 273.15));
  EXPECT_NO_THROW((void)pure_water_ellison(2.45e9, 373.15));
  EXPECT_THROW((void)pure_water_ellison(2.45e9, 373.2), Error);
  EXPECT_THROW((void)pure_water_ellison(2.45e9, 273.1), Error);
  EXPECT_THROW((void)pure_water_ellison(31e9, 300), Error);
  EXPECT_THROW((void)pure_water_ellison(0, 300), Error);
  EXPECT_THROW((void)pure_water_kaatze(2.45e9, 333.2), Error);
  EXPECT_THROW((void)pure_water_meissner_wentz(2.45e9, 313.2), Error);
  EXPECT_THROW((void)pure_water_itu(2.45e9, 313.2), Error);
  for (const Beyond beyond : {Beyond::refuse, Beyond::extrapolate}) {
    EXPECT_THROW((void)pure_water_ellison(nan, 300, beyond), Error);
    EXPECT_THROW((void)pure_water_ellison(2.45e9, nan, beyond), Error);
    EXPECT_THROW((void)pure_water_kaatze(2.45e9, nan, beyond), Error);
    EXPECT_THROW((void)pure_water_meissner_wentz(2.45e9, nan, beyond), Error);
    EXPECT_THROW((void)pure_water_itu(nan, 300, beyond), Error);
    EXPECT_THROW((void)pure_water_itu(2.45e9, 451, beyond), Error);
  }
}

TEST(SaltWater, IsPureWaterWithoutSalt) {
  for (const double T : test::sweep(278.15, 307, 3)) {
    EXPECT_EQ(salt_water_meissner_wentz(2.45e9, T, 0), pure_water_meissner_wentz(2.45e9, T));
    // The correlation of Peyman is not forced through pure water: within 1 % at zero molarity.
    const auto none = sodium_chloride_peyman(2.45e9, T, 0), water = pure_water_kaatze(2.45e9, T);
    EXPECT_NEAR(std::abs(none - water) / std::abs(water), 0, 0.01) << T;
  }
}

// Dissolved salt lowers eps' and raises eps'' at microwave heating frequencies.
TEST(SaltWater, LosesMoreWithMoreSalt) {
  double loss = 0, real = 100;
  for (const double M : test::sweep(0, 1, 0.1)) {
    const auto e = sodium_chloride_peyman(2.45e9, 298.15, M);
    EXPECT_GT(-e.imag(), loss);
    EXPECT_LT(e.real(), real);
    loss = -e.imag();
    real = e.real();
  }
}

// At the hand-over at 35 degC the extrapolation meets the correlation: the dipoles are those of
// pure water instead of the solution, 5 % of eps' at 0.154 mol/L, and the conductivities differ by
// the 2 % per K that is from memory.
TEST(SaltWater, HotSolutionMeetsTheMeasuredRange) {
  const auto measured = sodium_chloride_peyman(0.915e9, 308.15, 0.154);
  const auto carried = hot_sodium_chloride(0.915e9, 308.15, 0.154);
  EXPECT_NEAR(carried.real() / measured.real(), 1, 0.05);
  EXPECT_NEAR(carried.imag() / measured.imag(), 1, 0.05);
}

TEST(SaltWater, RefusesWhatIsOutsideTheStatedRange) {
  EXPECT_THROW((void)salt_water_meissner_wentz(2.45e9, 307.2, 35), Error);
  EXPECT_THROW((void)salt_water_meissner_wentz(2.45e9, 300, 40.1), Error);
  EXPECT_THROW((void)salt_water_meissner_wentz(2.45e9, 300, nan), Error);
  EXPECT_THROW((void)salt_water_meissner_wentz(nan, 300, 35), Error);
  EXPECT_THROW((void)sea_salt_conductivity(nan, 35), Error);
  EXPECT_THROW((void)sodium_chloride_peyman(0.1e9, 300, 0.1), Error);
  EXPECT_THROW((void)sodium_chloride_peyman(2.45e9, 310, 0.1), Error);
  EXPECT_THROW((void)sodium_chloride_peyman(2.45e9, 300, 1.01), Error);
  EXPECT_THROW((void)sodium_chloride_peyman(2.45e9, 300, nan), Error);
  EXPECT_THROW((void)hot_sodium_chloride(2.45e9, nan, 0.1), Error);
  EXPECT_THROW((void)hot_sodium_chloride(2.45e9, 374, 0.1), Error);
}

TEST(SplitLoss, RecoversConductionAndDipolesItWasMadeFrom) {
  const double f1 = 0.915e9, f2 = 2.45e9, sigma = 0.3, slope = 2e-9;
  const auto split =
      split_loss(f1, slope * f1 + ionic_loss(sigma, f1), f2, slope * f2 + ionic_loss(sigma, f2));
  ASSERT_TRUE(split);
  EXPECT_NEAR(split->conductivity, sigma, 1e-12);
  EXPECT_NEAR(split->dipole_slope / slope, 1, 1e-12);
  EXPECT_NEAR(split->loss(5.8e9), slope * 5.8e9 + ionic_loss(sigma, 5.8e9), 1e-11);
}

TEST(SplitLoss, GivesNothingWhenAPartWouldBeNegative) {
  EXPECT_FALSE(split_loss(0.915e9, 1.0, 2.45e9, 4.0));   // rises faster than f
  EXPECT_FALSE(split_loss(0.915e9, 10.0, 2.45e9, 3.0));  // falls faster than 1/f
  EXPECT_THROW((void)split_loss(1e9, 1, 1e9, 1), Error);
  EXPECT_THROW((void)split_loss(1e9, nan, 2e9, 1), Error);
  EXPECT_THROW((void)split_loss(nan, 1, 2e9, 1), Error);
  EXPECT_THROW((void)split_loss(1e9, -1, 2e9, 1), Error);
  EXPECT_THROW((void)ionic_loss(nan, 1e9), Error);
}

}  // namespace lossline::water
