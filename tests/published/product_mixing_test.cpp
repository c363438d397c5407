// Mixing rules, penetration depth and heating against values computed from the published formulas
// with an independent program (Python, complex arithmetic). They check the arithmetic of the code,
// the formulas themselves being those named in the headers. Tolerance: half a unit in the last
// printed digit, times 1.05 for the rounding of the inputs.

#include <gtest/gtest.h>

#include <array>
#include <cmath>
#include <complex>

#include "planner/product/mixing.h"
#include "planner/product/propagation.h"

namespace lossline::product {
namespace {

using Complex = std::complex<double>;
// Ellison's water at 25 degC and 2.45 GHz, to three decimals; a mineral solid.
constexpr Complex water{77.163, -9.277}, solid{4, -0.05};

void expect_complex(Complex got, double re, double loss, double tolerance) {
  EXPECT_NEAR(got.real(), re, tolerance);
  EXPECT_NEAR(-got.imag(), loss, tolerance);
}

}  // namespace

// Bruggeman's value at 0.30 is the root of its quadratic equation, 11.638190 - j0.617808.
TEST(MixingRules, MatchTheComparedValuesForWaterInASolid) {
  struct Row {
    double v;
    std::array<double, 14> value;  // Wiener+, CRIM, LLL, Lichtenecker, Bruggeman, MG, Wiener-
    double digits;                 // half a unit of the Wiener+ column
  };
  const double half = 0.53e-5;
  for (const Row& row : {Row{0.05,
                             {7.65815, 0.51135, 5.47432, 0.17892, 5.09854, 0.13147, 4.63923,
                              0.08285, 4.58360, 0.06856, 4.53945, 0.06565, 4.19920, 0.05370},
                             half},
                         Row{0.10,
                             {11.3163, 0.9727, 7.17852, 0.34283, 6.38118, 0.23712, 5.38047, 0.12493,
                              5.33542, 0.09878, 5.12968, 0.08365, 4.41928, 0.05793},
                             10 * half},
                         Row{0.30,
                             {25.9489, 2.8181, 16.29409, 1.34840, 13.63717, 0.95429, 9.73174,
                              0.43476, 11.63819, 0.61781, 8.17477, 0.19109, 5.59145, 0.08280},
                             10 * half}}) {
    SCOPED_TRACE(row.v);
    const std::array<Constituent, 2> parts{{{row.v, water}, {1 - row.v, solid}}};
    const auto& x = row.value;
    expect_complex(wiener_upper(parts), x[0], x[1], row.digits);
    expect_complex(crim(parts), x[2], x[3], half);
    expect_complex(looyenga(parts), x[4], x[5], half);
    expect_complex(lichtenecker(parts), x[6], x[7], half);
    expect_complex(bruggeman(parts), x[8], x[9], half);
    expect_complex(maxwell_garnett(solid, water, row.v), x[10], x[11], half);
    expect_complex(wiener_lower(parts), x[12], x[13], half);
  }
}

TEST(MixingRules, MatchTheComparedValuesForThreePhases) {
  const std::array<Constituent, 3> parts{{{0.4, 1.0}, {0.5, solid}, {0.1, water}}};
  expect_complex(crim(parts), 5.19503, 0.26886, 0.53e-5);
  expect_complex(looyenga(parts), 4.25052, 0.16002, 0.53e-5);
  expect_complex(lichtenecker(parts), 3.09049, 0.05630, 0.53e-5);
  expect_complex(bruggeman(parts), 3.30338, 0.04521, 0.53e-5);
  expect_complex(maxwell_garnett(water, solid, 0.9), 9.16735, 0.68859, 0.53e-5);
}

// ASAE/ASABE D293, density correction (form from memory).
TEST(DensityCorrection, MatchesTheGrainExample) {
  EXPECT_NEAR(at_density(2.6, 770, 850).real(), 2.8274, 0.5e-4);
}

TEST(PenetrationDepth, MatchesTheComparedValues) {
  struct Row {
    Complex eps;
    double frequency, exact_mm, low_loss_mm;
  };
  const double small = 0.915e9, large = 2.45e9;
  for (const Row& row :
       {Row{{57, -17}, large, 8.743, 8.649}, Row{{64, -14.72}, large, 10.653, 10.584},
        Row{{10, -2}, small, 82.857, 82.450}, Row{{10, -2}, large, 30.945, 30.792},
        Row{{3, -0.1}, small, 903.318, 903.193}, Row{{3, -0.1}, large, 337.362, 337.315},
        Row{{2.73, -0.1448}, large, 222.300, 222.222}, Row{{4, -0.8}, large, 48.928, 48.687}}) {
    EXPECT_NEAR(1e3 * penetration_depth(row.eps, row.frequency), row.exact_mm, 0.51e-3)
        << row.eps << row.frequency;
    EXPECT_NEAR(1e3 * penetration_depth_low_loss(row.eps, row.frequency), row.low_loss_mm, 0.51e-3)
        << row.eps << row.frequency;
  }
}

// Water at 20 degC by ITU-R P.527 (its own permittivities, four significant digits in eps''):
// the depths are printed to 0.01 mm; 0.05 % for the digits of eps''.
TEST(PenetrationDepth, MatchesWaterAt20DegC) {
  EXPECT_NEAR(1e3 * penetration_depth({79.857, -4.023}, 0.915e9), 115.86, 0.06);
  EXPECT_NEAR(1e3 * penetration_depth({78.545, -10.583}, 2.45e9), 16.35, 0.01);
  EXPECT_NEAR(1e3 * penetration_depth({72.245, -22.898}, 5.8e9), 3.09, 0.006);
}

// Metaxas and Meredith 1983 (from memory): 2 pi f eps0 eps'' E^2 with E rms; a peak field would
// show as a factor of two.
TEST(VolumetricPower, MatchesOneKilovoltPerMetre) {
  EXPECT_NEAR(volumetric_power(2.45e9, 1, 1e3) * 1e-3, 136.30, 136.30e-4);
  EXPECT_NEAR(volumetric_power(0.915e9, 1, 1e3) * 1e-3, 50.904, 50.904e-4);
  // 5.563e-11 f eps'' E^2 as printed in a review: four digits
  EXPECT_NEAR(volumetric_power(1e9, 1, 1), 5.563e-2, 0.5e-5);
}

// Half-space of water at 20 degC, ITU-R P.527 permittivity: reflected 0.63752, absorbed 36.25 %.
TEST(SurfaceTransmission, MatchesAHalfSpaceOfWater) {
  EXPECT_NEAR(surface_transmission({78.545, -10.583}), 1 - 0.63752, 0.6e-5);
}

}  // namespace lossline::product
