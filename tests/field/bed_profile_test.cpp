#include "planner/field/bed_profile.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numeric>

#include "planner/base/error.h"
#include "tests/field/sample_cavity.h"

namespace lossline::field {
namespace {

using test::sample_cavity;
using test::sample_section;

TEST(BedProfile, CellsSumToTheAbsorptanceOfTheClass) {
  const AngleClasses classes;
  BedSection s = sample_section(sample_cavity(), {10, -2}, 0.05);
  s.coverage = 0.9;
  const BedOptics o = bed_optics(classes, s);
  const std::vector<double> uneven{0, 0.02, 0.1, 0.4, 0.41, 1};
  for (const BedProfile& p : {bed_profile(classes, s, 24), bed_profile(classes, s, uneven)}) {
    for (std::size_t i = 0; i < classes.size(); ++i) {
      double above = 0, below = 0;
      for (std::size_t c = 0; c < p.cells; ++c) {
        above += p.from_above[i * p.cells + c];
        below += p.from_below[i * p.cells + c];
      }
      EXPECT_NEAR(above, o.bed_top[i], 1e-13);
      EXPECT_NEAR(below, o.bed_bottom[i], 1e-13);
    }
  }
}

TEST(BedProfile, UnevenCellsAreSumsOfEvenOnes) {
  const AngleClasses classes(3);
  const BedSection s = sample_section(sample_cavity(), {4, -0.3}, 0.05);
  const BedProfile fine = bed_profile(classes, s, 10);
  const std::vector<double> faces{0, 0.3, 1};
  const BedProfile coarse = bed_profile(classes, s, faces);
  for (std::size_t i = 0; i < classes.size(); ++i) {
    const double* a = fine.from_above.data() + i * 10;
    const double* b = fine.from_below.data() + i * 10;
    EXPECT_NEAR(coarse.from_above[2 * i], std::accumulate(a, a + 3, 0.0), 1e-13);
    EXPECT_NEAR(coarse.from_below[2 * i + 1], std::accumulate(b + 3, b + 10, 0.0), 1e-13);
  }
}

TEST(BedProfile, WithoutABeltBothDirectionsMirrorEachOther) {
  const AngleClasses classes;
  BedSection s = sample_section(sample_cavity(), {10, -2}, 0.05);
  s.belt_thickness = 0;
  const BedProfile p = bed_profile(classes, s, 8);
  for (std::size_t i = 0; i < classes.size(); ++i)
    for (std::size_t c = 0; c < 8; ++c)
      EXPECT_NEAR(p.from_above[8 * i + c], p.from_below[8 * i + 7 - c], 1e-13);
}

TEST(BedProfile, CellHeatSumsToTheHeatOfThePlace) {
  const AngleClasses classes;
  const CavityInput cavity = sample_cavity();
  const BedSection s = sample_section(cavity, {10, -2}, 0.05);
  const BedOptics o = bed_optics(classes, s);
  const CavityResult field = test::solve_even(cavity, classes, o);
  const BedProfile p = bed_profile(classes, s, 24);
  std::vector<double> heat(24);
  cell_heat_per_length(classes, p, o, field, cavity.bed_width, heat);
  const double whole = bed_heat_per_length(classes, o, field, cavity.bed_width, s.depth);
  EXPECT_NEAR(std::accumulate(heat.begin(), heat.end(), 0.0), whole, 1e-13);
  EXPECT_GT(heat.front(), heat[12]);  // heated from both faces
  EXPECT_GT(heat.back(), heat[12]);
}

TEST(BedProfile, RefusesFacesOutOfOrder) {
  const AngleClasses classes;
  const BedSection s = sample_section(sample_cavity(), {10, -2}, 0.05);
  const std::vector<double> disordered{0, 0.6, 0.4, 1}, open{0, 0.5}, single{0};
  EXPECT_THROW(bed_profile(classes, s, disordered), Error);
  EXPECT_THROW(bed_profile(classes, s, open), Error);
  EXPECT_THROW(bed_profile(classes, s, single), Error);
  EXPECT_THROW(bed_profile(classes, s, 0), Error);
}

}  // namespace
}  // namespace lossline::field
