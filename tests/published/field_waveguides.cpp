// Waveguides and openings against published figures.
//
// [Chart]  a published waveguide chart of EIA RS-261-B sizes: cut-offs rounded to 1 MHz.
// [Pozar]  D. M. Pozar, Microwave Engineering, 4th ed., Wiley 2012 (from memory), eq. 3.96 and
//          example 3.1.
// waveguides.csv holds the same textbook formulas evaluated with other software.

#include <gtest/gtest.h>

#include <cmath>
#include <stdexcept>
#include <string>

#include "planner/field/openings.h"
#include "planner/field/waveguide.h"
#include "tests/published/product_csv.h"

namespace lossline::field {
namespace {

constexpr double aluminium = 1 / 3.816e7, copper = 1 / 5.813e7;  // ohm m, [Pozar] appendix F

const StandardSection& section(const std::string& eia) {
  for (const StandardSection& s : standard_sections())
    if (eia == s.eia) return s;
  throw std::out_of_range(eia);
}

// D1. 0.001 GHz: the chart's rounding.
TEST(PublishedWaveguides, CutoffsMatchTheChart) {
  const struct {
    const char *eia, *iec;
    double GHz;
  } chart[] = {{"WR-975", "R9", 0.605},  {"WR-770", "R12", 0.766}, {"WR-650", "R14", 0.908},
               {"WR-430", "R22", 1.372}, {"WR-340", "R26", 1.736}, {"WR-284", "R32", 2.078},
               {"WR-187", "R48", 3.152}, {"WR-159", "R58", 3.712}, {"WR-137", "R70", 4.301}};
  for (const auto& row : chart) {
    EXPECT_NEAR(te10_cutoff(section(row.eia).width) * 1e-9, row.GHz, 0.001) << row.eia;
    EXPECT_STREQ(section(row.eia).iec, row.iec);
  }
  EXPECT_NEAR(section("WR-975").width, 9.750 * 0.0254, 1e-12);
  EXPECT_NEAR(section("WR-340").height, 1.700 * 0.0254, 1e-12);
}

// D2, D3. 0.01 %: five printed digits.
TEST(PublishedWaveguides, GuideWavelengths) {
  const struct {
    const char* eia;
    double MHz, mm;
  } table[] = {{"WR-975", 915, 436.89},  {"WR-975", 896, 453.78},  {"WR-975", 922, 431.04},
               {"WR-340", 2450, 173.38}, {"WR-430", 2450, 147.72}, {"WR-284", 2450, 230.98}};
  for (const auto& row : table) {
    const double found = guide_wavelength(row.MHz * 1e6, section(row.eia).width) * 1e3;
    EXPECT_NEAR(found / row.mm, 1, 1e-4) << row.eia;
  }
}

// D4. Next modes at 2.7448 and 1.2105 GHz.
TEST(PublishedWaveguides, OneModeOnlyWhereItShouldBe) {
  const StandardSection &small = section("WR-430"), &large = section("WR-975");
  EXPECT_TRUE(single_mode(2450e6, small.width, small.height));
  EXPECT_TRUE(single_mode(915e6, large.width, large.height));
  EXPECT_FALSE(single_mode(2450e6, large.width, large.height));
  EXPECT_FALSE(single_mode(915e6, small.width, small.height));
  EXPECT_NEAR(next_cutoff(small.width, small.height) * 1e-9, 2.7448, 5e-5);
  EXPECT_NEAR(next_cutoff(large.width, large.height) * 1e-9, 1.2105, 5e-5);
}

// D5. 1 %: three to four printed digits and the conductivity; a real guide may lose 20 to 50 %
// more.
TEST(PublishedWaveguides, WallLossOfAluminiumGuides) {
  auto loss = [](const char* eia, double f) {
    return te10_wall_loss(f, section(eia).width, section(eia).height, aluminium);
  };
  EXPECT_NEAR(loss("WR-975", 915e6) / 0.00347, 1, 0.01);
  EXPECT_NEAR(loss("WR-340", 2450e6) / 0.01809, 1, 0.01);
  EXPECT_NEAR(loss("WR-430", 2450e6) / 0.01066, 1, 0.01);
}

// D6. [Pozar] example 3.1, PTFE-filled copper guide 10.7 x 4.3 mm at 15 GHz: 0.119 Np/m = 1.03
// dB/m, 0.050 Np/m = 0.434 dB/m, cut-off 9.72 GHz. 1 %: two and three printed digits.
TEST(PublishedWaveguides, PolymerFilledGuide) {
  const double a = 0.0107, b = 0.0043, eps = 2.08;
  const Guide guide{a, b, {eps, -eps * 0.0004}};
  EXPECT_NEAR(te10_filling_loss(15e9, guide) / 1.03, 1, 0.01);
  EXPECT_NEAR(te10_filling_loss(15e9, guide) / decibels_per_neper / 0.119, 1, 0.01);
  EXPECT_NEAR(te10_wall_loss(15e9, a, b, copper, eps) / 0.434, 1, 0.01);
  EXPECT_NEAR(te10_cutoff(a, eps) * 1e-9 / 9.72, 1, 0.01);
}

// Every row of the table; tolerances are half a unit of the last printed digit, and a little for
// the conductivity in the loss.
TEST(PublishedWaveguides, TableOfStandardSections) {
  int rows = 0;
  for (const auto& row : lossline::test::table("waveguides.csv")) {
    const double a = std::stod(row[2]) * 1e-3, b = std::stod(row[3]) * 1e-3;
    const double f = std::stod(row[6]) * 1e9;
    EXPECT_NEAR(section(row[0]).width, a, 1e-9) << row[0];
    EXPECT_NEAR(section(row[0]).height, b, 1e-9) << row[0];
    EXPECT_EQ(section(row[0]).iec, row[1]);
    EXPECT_NEAR(te10_cutoff(a) * 1e-9, std::stod(row[4]), 6e-5);
    EXPECT_NEAR(next_cutoff(a, b) * 1e-9, std::stod(row[5]), 6e-5);
    EXPECT_NEAR(guide_wavelength(f, a) * 1e3, std::stod(row[7]), 6e-3);
    EXPECT_NEAR(te10_impedance(f, a), std::stod(row[8]), 6e-3);
    EXPECT_NEAR(te10_wall_loss(f, a, b, aluminium), std::stod(row[9]), 6e-6);
    EXPECT_NEAR(te10_wall_loss(f, a, b, copper), std::stod(row[10]), 6e-6);
    ++rows;
  }
  EXPECT_EQ(rows, 18);
}

// D7. 8.686 * 2 * 1.84118 and 8.686 pi at vanishing frequency, per diameter and per width; 0.01 dB.
TEST(PublishedOpenings, LimitFarBelowCutoff) {
  EXPECT_NEAR(tube_attenuation(1e3, 0.02) * 0.02, 31.98, 0.01);
  EXPECT_NEAR(slot_attenuation(1e3, 0.02, 0.01) * 0.02, 27.29, 0.01);
}

// D8 to D11. 0.1 %: four printed digits.
TEST(PublishedOpenings, TubesAndSlots) {
  EXPECT_NEAR(tube_attenuation(2450e6, 0.0127) * 0.0127 / 31.48, 1, 1e-3);
  EXPECT_NEAR(tube_attenuation(5800e6, 0.0127) * 0.0127 / 29.04, 1, 1e-3);
  EXPECT_NEAR(tube_attenuation(2450e6, 0.038) * 0.038 / 27.13, 1, 1e-3);
  EXPECT_NEAR(tube_attenuation(915e6, 0.038) * 0.038 / 31.35, 1, 1e-3);
  EXPECT_NEAR(slot_attenuation(2450e6, 0.050, 0.030) * 0.2 / 62.90, 1, 1e-3);
  EXPECT_NEAR(slot_attenuation(915e6, 0.050, 0.030) * 0.2 / 103.94, 1, 1e-3);
  EXPECT_NEAR(slot_attenuation(915e6, 0.150, 0.030) * 0.5 / 36.57, 1, 1e-3);
  // No attenuation from half a wavelength on, 61.18 mm at 2.45 GHz.
  EXPECT_GT(slot_attenuation(2450e6, 0.06118, 0.030), 0);
  EXPECT_EQ(slot_attenuation(2450e6, 0.06119, 0.030), 0);
}

}  // namespace
}  // namespace lossline::field
