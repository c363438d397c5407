#include "planner/field/bed_optics.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/field/layered.h"
#include "tests/field/sample_cavity.h"

namespace lossline::field {
namespace {

using test::sample_cavity;
using test::sample_section;

double half_sum(double frequency, std::span<const Layer> layers, double mu, std::size_t layer) {
  return 0.5 * (stack_response(frequency, layers, mu, Polarisation::te).absorptance[layer] +
                stack_response(frequency, layers, mu, Polarisation::tm).absorptance[layer]);
}

TEST(BedOptics, IsTheLayeredSolutionOfBedOnBelt) {
  const AngleClasses classes;
  for (const std::complex<double> eps : {std::complex<double>{10, -2}, {2.2, -0.03}, {60, -12}}) {
    const BedSection s = sample_section(sample_cavity(), eps, 0.03);
    const BedOptics o = bed_optics(classes, s);
    const Layer down[] = {{s.eps, s.depth}, {s.belt_eps, s.belt_thickness}};
    const Layer up[] = {down[1], down[0]};
    for (std::size_t i = 0; i < classes.size(); ++i) {
      const double mu = classes.mu(i);
      EXPECT_NEAR(o.bed_top[i], half_sum(s.frequency, down, mu, 0), 1e-14);
      EXPECT_NEAR(o.belt_top[i], half_sum(s.frequency, down, mu, 1), 1e-14);
      EXPECT_NEAR(o.bed_bottom[i], half_sum(s.frequency, up, mu, 1), 1e-14);
      EXPECT_NEAR(o.belt_bottom[i], half_sum(s.frequency, up, mu, 0), 1e-14);
    }
  }
}

TEST(BedOptics, PartCoverageIsTheMeanOfBedAndBareBelt) {
  const AngleClasses classes;
  BedSection s = sample_section(sample_cavity(), {10, -2}, 0.03);
  const BedOptics full = bed_optics(classes, s);
  s.coverage = 0.7;
  const BedOptics part = bed_optics(classes, s);
  s.coverage = 1;
  s.depth = 0;
  const BedOptics bare = bed_optics(classes, s);
  for (std::size_t i = 0; i < classes.size(); ++i) {
    EXPECT_NEAR(part.bed_top[i], 0.7 * full.bed_top[i], 1e-14);
    EXPECT_NEAR(part.belt_top[i], 0.7 * full.belt_top[i] + 0.3 * bare.belt_top[i], 1e-14);
    EXPECT_NEAR(part.belt_bottom[i], 0.7 * full.belt_bottom[i] + 0.3 * bare.belt_bottom[i], 1e-14);
    EXPECT_NEAR(part.transmitted[i], 0.7 * full.transmitted[i] + 0.3 * bare.transmitted[i], 1e-14);
    EXPECT_NEAR(part.side[i], 0.7 * full.side[i], 1e-14);
    EXPECT_EQ(bare.bed_top[i], 0);
    EXPECT_EQ(bare.side[i], 0);
  }
}

TEST(BedOptics, WithoutLossNothingIsAbsorbed) {
  BedSection s = sample_section(sample_cavity(), {4, 0}, 0.03);
  s.belt_eps = {2.6, 0};
  const AngleClasses classes;
  const BedOptics o = bed_optics(classes, s);
  for (std::size_t i = 0; i < classes.size(); ++i) {
    EXPECT_EQ(o.bed_top[i], 0);
    EXPECT_EQ(o.bed_bottom[i], 0);
    EXPECT_EQ(o.belt_top[i], 0);
    EXPECT_EQ(o.side[i], 0);
  }
}

// A lossy bed is opaque from side to side: the exact slab has no fringes and the two must agree.
// 1e-4: six azimuth nodes here against 16 equally spaced ones, which are themselves good to that.
TEST(BedOptics, SideFaceOfALossyBedIsTheExactSlab) {
  const AngleClasses classes;
  for (const std::complex<double> eps : {std::complex<double>{10, -2}, {4, -0.3}}) {
    const BedSection s = sample_section(sample_cavity(), eps, 0.05);
    const BedOptics o = bed_optics(classes, s);
    BedOptics exact = o;
    test::use_exact_sides(classes, s, exact);
    for (std::size_t i = 0; i < classes.size(); ++i)
      EXPECT_NEAR(o.side[i] / exact.side[i], 1, 5e-4) << i;
  }
}

// In a weak bed the exact slab's fringes depend on a quarter wavelength of width that nobody knows.
// Averaged over widths they must give the fringe-free form; 2 % of it remains at angles where few
// fringes fit into the range of widths.
TEST(BedOptics, SideFaceOfAWeakBedIsTheMeanOverItsFringes) {
  const AngleClasses classes;
  BedSection s = sample_section(sample_cavity(), {2.2, -0.03}, 0.01);
  const BedOptics o = bed_optics(classes, s);
  std::vector<double> mean(classes.size(), 0.0);
  constexpr int widths = 60;
  for (int k = 0; k < widths; ++k) {
    BedSection other = s;
    other.width = 0.7 + 0.2 * (k + 0.5) / widths;
    BedOptics exact = o;
    test::use_exact_sides(classes, other, exact);
    for (std::size_t i = 0; i < classes.size(); ++i) mean[i] += exact.side[i] / widths;
  }
  for (std::size_t i = 0; i < classes.size(); ++i) EXPECT_NEAR(o.side[i] / mean[i], 1, 0.02) << i;
}

TEST(BedOptics, HeatFromTheSideFadesOverThePenetrationDepth) {
  // Low loss: alpha = 2 k0 eps''/(2 sqrt(eps')), 1 % at tan delta 0.1.
  const double k0 = 2 * pi * 2450e6 / speed_of_light;
  EXPECT_NEAR(side_penetration_depth(2450e6, {4, -0.4}) * k0 * 0.4 / 2, 1, 0.01);
  EXPECT_EQ(side_penetration_depth(2450e6, {4, 0}), std::numeric_limits<double>::infinity());
}

// The mean over both faces of the diffuse averages, here with 24 classes.
TEST(BedOptics, MeanAbsorptanceIsTheDiffuseAverage) {
  const AngleClasses classes(24);
  const BedSection s = sample_section(sample_cavity(), {10, -2}, 0.05);
  const double mean = mean_bed_absorptance(classes, bed_optics(classes, s));
  EXPECT_NEAR(mean, 0.5 * (0.5438952 + 0.5534794), 2e-5);
}

TEST(BedOptics, RefusesWhatItCannotUse) {
  const AngleClasses classes;
  const BedSection good = sample_section(sample_cavity(), {10, -2}, 0.05);
  const double nan = std::numeric_limits<double>::quiet_NaN();
  BedSection s = good;
  s.depth = -1e-3;
  EXPECT_THROW(bed_optics(classes, s), Error);
  s = good;
  s.eps = {0.5, -2};
  EXPECT_THROW(bed_optics(classes, s), Error);
  s = good;
  s.eps = {10, nan};
  EXPECT_THROW(bed_optics(classes, s), Error);
  s = good;
  s.coverage = 1.01;
  EXPECT_THROW(bed_optics(classes, s), Error);
  s = good;
  s.width = 0;
  EXPECT_THROW(bed_optics(classes, s), Error);
}

}  // namespace
}  // namespace lossline::field
