// One loaded cavity against reference values of an independent implementation of the same balance
// in another language, digits as printed there.

#include <gtest/gtest.h>

#include <cmath>

#include "planner/field/conductor.h"
#include "planner/field/openings.h"
#include "tests/field/sample_cavity.h"

namespace lossline::field {
namespace {

using test::sample_cavity;
using test::sample_section;

constexpr double fully_mixed = 1e6;

CavityResult solved(const CavityInput& cavity, const AngleClasses& classes,
                    std::complex<double> eps, double depth, bool exact_sides) {
  const BedSection s = sample_section(cavity, eps, depth);
  BedOptics o = bed_optics(classes, s);
  if (exact_sides) test::use_exact_sides(classes, s, o);
  return test::solve_even(cavity, classes, o);
}

// Seven printed digits.
TEST(CavitySinks, MatchSkinDepthWallAndPort) {
  const Conductor steel{1 / 1.39e6, 1, 1};
  EXPECT_NEAR(skin_depth(2450e6, steel), 8.624416e-6, 1e-12);
  EXPECT_NEAR(wall_cross_section(2450e6, 1, steel), 2.952322e-4, 1e-10);
  EXPECT_NEAR(skin_depth(915e6, steel), 1.411244e-5, 1e-11);
  EXPECT_NEAR(wall_cross_section(915e6, 1, steel), 1.804227e-4, 1e-10);
  const double lambda = speed_of_light / 2450e6;
  EXPECT_NEAR(lambda * lambda / (8 * pi), 5.957573e-4, 1e-10);
  // Resistivity 7.2e-7: whole sample box 1.748e-3 m2, four digits.
  EXPECT_NEAR(wall_cross_section(2450e6, 2 * (1.2 + 1.2 * 0.8 + 0.8), {7.2e-7, 1, 1}), 1.748e-3,
              5e-7);
}

// The wall sink of the angle classes is the textbook wall Q when mixed: an empty box with closed
// ends and no launcher sink would have no other.
TEST(CavitySinks, WallsOfTheClassesMakeTheTextbookWall) {
  CavityInput c = sample_cavity();
  c.launchers = 0;
  c.mixing = fully_mixed;
  const AngleClasses classes(12);
  c.transmitted.assign(12, 0.4);
  const CavityResult r = solve_network(classes, {&c, 1}, {}).cavities[0];
  const Conductor steel{c.wall_resistivity, 1, 1};
  // Both volumes are equal and fully linked here, so S is the same everywhere to l/a = 1e-2.
  EXPECT_NEAR(
      wall_cross_section(c.frequency, 5.92, steel) * 0.5 * (r.S_upper_mean + r.S_lower_mean), 1,
      1e-6);
}

// Six printed digits, 32 classes.
TEST(MixedCavity, MatchesWetAndDryBed) {
  CavityInput c = sample_cavity();
  c.mixing = fully_mixed;
  const AngleClasses classes(32);
  const CavityResult wet = solved(c, classes, {10, -2}, 0.05, true);
  EXPECT_NEAR(wet.bed_W, 0.984438, 1e-4);
  EXPECT_NEAR(wet.belt_W, 0.000396, 1e-4);
  EXPECT_NEAR(wet.walls_W, 0.006072, 1e-4);
  EXPECT_NEAR(wet.returned_W, 0.009095, 1e-4);
  EXPECT_NEAR(wet.S_upper_mean, 5.08849, 1e-3);
  EXPECT_NEAR(wet.S_lower_mean, 1.85954, 1e-3);
  const CavityResult dry = solved(c, classes, {2.2, -0.03}, 0.01, true);
  EXPECT_NEAR(dry.bed_W, 0.698469, 1e-4);
  EXPECT_NEAR(dry.belt_W, 0.043069, 1e-4);
  EXPECT_NEAR(dry.walls_W, 0.12702, 1e-4);
  EXPECT_NEAR(dry.returned_W, 0.131441, 1e-4);
  EXPECT_NEAR(dry.S_upper_mean, 73.54273, 0.02);
  EXPECT_NEAR(dry.S_lower_mean, 71.80815, 0.02);
}

// Four printed digits: more launchers take more back from a dry bed.
TEST(MixedCavity, MatchesReturnedShareOverLaunchers) {
  const double table[][5] = {{1, .7305, .0450, .1328, .0916},
                             {2, .6985, .0431, .1270, .1314},
                             {4, .6422, .0396, .1168, .2014},
                             {8, .5531, .0341, .1006, .3122}};
  CavityInput c = sample_cavity();
  c.mixing = fully_mixed;
  const AngleClasses classes(32);
  for (const auto& row : table) {
    c.launchers = static_cast<int>(row[0]);
    const CavityResult r = solved(c, classes, {2.2, -0.03}, 0.01, true);
    EXPECT_NEAR(r.bed_W, row[1], 1.5e-4);
    EXPECT_NEAR(r.belt_W, row[2], 1.5e-4);
    EXPECT_NEAR(r.walls_W, row[3], 1.5e-4);
    EXPECT_NEAR(r.returned_W, row[4], 1.5e-4);
  }
}

// 96 classes, seven digits; the reference has the exact slab on the side faces.
TEST(UnmixedCavity, MatchesSevenDigitsOfNinetySixClasses) {
  CavityInput c = sample_cavity();
  const AngleClasses classes(96);
  c.mixing = 0.05;
  const CavityResult wet = solved(c, classes, {10, -2}, 0.05, true);
  EXPECT_NEAR(wet.bed_W, 0.9777233, 1e-5);
  EXPECT_NEAR(wet.returned_W, 0.0134587, 1e-5);
  const CavityResult dry = solved(c, classes, {2.2, -0.03}, 0.01, true);
  EXPECT_NEAR(dry.bed_W, 0.6954728, 1e-5);
  EXPECT_NEAR(dry.returned_W, 0.1344686, 1e-5);
  c.mixing = 0;
  const CavityResult bare = solved(c, classes, {10, -2}, 0.05, true);
  EXPECT_NEAR(bare.bed_W, 0.9715447, 1e-5);
  EXPECT_NEAR(bare.returned_W, 0.0173151, 1e-5);
}

// What the planner runs, 12 classes and fringe-free side faces, against those values. Lossy beds
// agree to 1e-6. In the weak bed the exact slab of 0.800 m stands on one side of its fringes: its
// mean over widths is higher by 4e-4 of the launched power.
TEST(UnmixedCavity, TwelveClassesComeCloseToNinetySix) {
  CavityInput c = sample_cavity();
  const AngleClasses classes;
  c.mixing = 0.05;
  EXPECT_NEAR(solved(c, classes, {10, -2}, 0.05, false).bed_W, 0.9777233, 1e-5);
  EXPECT_NEAR(solved(c, classes, {2.2, -0.03}, 0.01, false).bed_W, 0.6954728, 5e-4);
  c.mixing = 0;
  EXPECT_NEAR(solved(c, classes, {10, -2}, 0.05, false).bed_W, 0.9715447, 1e-5);
}

struct Shares {
  std::complex<double> eps;
  double depth, bed, bed_mixed, walls, walls_mixed, back, back_mixed;
};

// Three printed digits; rho = 7.2e-7 ohm m. 2e-3 where a bed is weak (side faces, see above).
TEST(UnmixedCavity, MatchesTheSharesOfTwelveBeds) {
  const Shares small[] = {{{30, -8}, .005, .906, .945, .041, .025, .051, .029},
                          {{30, -8}, .050, .970, .983, .011, .007, .019, .010},
                          {{10, -2}, .005, .887, .948, .050, .023, .060, .026},
                          {{10, -2}, .020, .964, .983, .014, .007, .021, .009},
                          {{4, -.3}, .020, .918, .941, .035, .026, .043, .028},
                          {{2.2, -.03}, .005, .549, .561, .185, .179, .197, .185},
                          {{2.2, -.03}, .050, .914, .918, .033, .032, .038, .034}};
  const Shares large[] = {{{30, -8}, .005, .849, .935, .029, .013, .120, .051},
                          {{10, -2}, .050, .952, .975, .008, .004, .039, .020},
                          {{4, -.3}, .020, .837, .878, .031, .025, .128, .094},
                          {{2.2, -.03}, .010, .458, .467, .108, .108, .404, .395},
                          {{2.2, -.03}, .100, .849, .862, .029, .029, .117, .104}};
  const AngleClasses classes;
  auto compare = [&](CavityInput c, std::span<const Shares> table) {
    c.wall_resistivity = 7.2e-7;
    for (const Shares& row : table) {
      const double tolerance = row.eps.real() < 3 ? 2e-3 : 6e-4;
      for (const double s : {0.0, fully_mixed}) {
        c.mixing = s;
        const CavityResult r = solved(c, classes, row.eps, row.depth, false);
        EXPECT_NEAR(r.bed_W, s > 0 ? row.bed_mixed : row.bed, tolerance) << row.depth;
        EXPECT_NEAR(r.walls_W, s > 0 ? row.walls_mixed : row.walls, tolerance) << row.depth;
        EXPECT_NEAR(r.returned_W, s > 0 ? row.back_mixed : row.back, tolerance) << row.depth;
      }
    }
  };
  compare(sample_cavity(), small);
  compare(test::large_cavity(), large);
}

}  // namespace
}  // namespace lossline::field
