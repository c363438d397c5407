#include "planner/field/cavity_network.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>
#include <random>

#include "planner/base/error.h"
#include "tests/field/sample_cavity.h"

namespace lossline::field {
namespace {

using test::sample_cavity;
using test::sample_section;

double parts(const CavityResult& r) {
  return r.bed_W + r.belt_W + r.walls_W + r.returned_W + r.ends_W + r.links_W;
}

/// A line of cavities whose beds dry along the way, three stations each.
std::vector<CavityInput> drying_line(const AngleClasses& classes, std::size_t count, double mixing,
                                     unsigned seed) {
  std::mt19937 engine(seed);
  std::uniform_real_distribution<double> unit(0, 1);
  std::vector<CavityInput> line;
  for (std::size_t c = 0; c < count; ++c) {
    CavityInput cavity = sample_cavity();
    cavity.mixing = mixing * unit(engine);
    cavity.launched_W = 1e4 * unit(engine);
    cavity.belt_height_share = 0.2 + 0.6 * unit(engine);
    cavity.open_upper_m2 = 1e-3 * unit(engine);
    cavity.open_lower_m2 = 1e-4 * unit(engine);
    for (int k = 0; k < 3; ++k) {
      BedSection s =
          sample_section(cavity, {2 + 20 * unit(engine), -std::pow(10, -2.5 + 3 * unit(engine))},
                         0.005 + 0.05 * unit(engine));
      s.coverage = 0.5 + 0.5 * unit(engine);
      add_station(cavity, classes, bed_optics(classes, s), cavity.length / 3);
    }
    line.push_back(std::move(cavity));
  }
  return line;
}

std::vector<CavityLink> chain(std::size_t count) {
  std::vector<CavityLink> links;
  for (std::size_t c = 0; c + 1 < count; ++c) links.push_back({c, c + 1, 2e-3});
  return links;
}

TEST(CavityNetwork, SharesSumToOneAtAnyMixing) {
  const AngleClasses classes;
  for (const double mixing : {0.0, 0.1, 10.0, 1e6})
    for (unsigned seed = 1; seed <= 10; ++seed) {
      const auto line = drying_line(classes, 6, mixing, seed);
      const NetworkResult result = solve_network(classes, line, chain(6));
      double launched = 0, gone = 0, outflow = 0;
      for (std::size_t c = 0; c < line.size(); ++c) {
        launched += line[c].launched_W;
        gone += parts(result.cavities[c]);
        outflow += result.cavities[c].links_W;
        for (const double S : result.cavities[c].S_lower) EXPECT_GT(S, 0);
      }
      EXPECT_NEAR(gone / launched, 1, 1e-12);
      EXPECT_NEAR(outflow / launched, 0, 1e-12);
      EXPECT_LT(result.residual, 1e-12);
    }
}

TEST(CavityNetwork, HeatOfTheStationsSumsToTheBedOfTheCavity) {
  const AngleClasses classes;
  CavityInput cavity = sample_cavity();
  std::vector<BedOptics> stations;
  for (int k = 0; k < 8; ++k) {
    stations.push_back(
        bed_optics(classes, sample_section(cavity, {10.0 - k, -2.0 + 0.2 * k}, 0.05 - 0.002 * k)));
    add_station(cavity, classes, stations.back(), cavity.length / 8);
  }
  const CavityResult r = solve_network(classes, {&cavity, 1}, {}).cavities[0];
  double sum = 0;
  for (const BedOptics& o : stations)
    sum += cavity.length / 8 * bed_heat_per_length(classes, o, r, cavity.bed_width, o.depth);
  EXPECT_NEAR(sum, r.bed_W, 1e-14);
  EXPECT_NEAR(r.bed_W, r.bed_top_W + r.bed_bottom_W + r.bed_side_W, 1e-15);
}

TEST(CavityNetwork, StrongMixingMakesAllClassesEqual) {
  const AngleClasses classes;
  const auto line = drying_line(classes, 3, 1e7, 5);
  for (const CavityResult& r : solve_network(classes, line, chain(3)).cavities)
    for (std::size_t i = 0; i < classes.size(); ++i) {
      EXPECT_NEAR(r.S_upper[i] / r.S_upper_mean, 1, 1e-5);
      EXPECT_NEAR(r.S_lower[i] / r.S_lower_mean, 1, 1e-5);
    }
}

TEST(CavityNetwork, IsLinearInTheLaunchedPower) {
  const AngleClasses classes;
  auto line = drying_line(classes, 4, 0.1, 9);
  const NetworkResult once = solve_network(classes, line, chain(4));
  for (CavityInput& c : line) c.launched_W *= 3;
  const NetworkResult thrice = solve_network(classes, line, chain(4));
  for (std::size_t c = 0; c < 4; ++c)
    EXPECT_NEAR(thrice.cavities[c].bed_W / once.cavities[c].bed_W, 3, 1e-12);
}

TEST(CavityNetwork, WhatAGivesBBGivesA) {
  // Reciprocity: power per launched watt in the other of two unequal cavities, per cross section.
  const AngleClasses classes;
  auto line = drying_line(classes, 2, 0.2, 4);
  line[0].launchers = line[1].launchers = 0;
  auto field_over_there = [&](std::size_t from, std::size_t to) {
    for (CavityInput& c : line) c.launched_W = 0;
    line[from].launched_W = 1;
    return solve_network(classes, line, chain(2)).cavities[to].S_upper_mean;
  };
  const double forth = field_over_there(0, 1), back = field_over_there(1, 0);
  EXPECT_GT(forth, 0);
  EXPECT_NEAR(forth / back, 1, 1e-12);
}

TEST(CavityNetwork, LinksMayJoinAnyTwoCavities) {
  // The same ring of three cavities under two numberings.
  const AngleClasses classes;
  const auto line = drying_line(classes, 3, 0.1, 2);
  const CavityLink ring[] = {{0, 1, 1e-3}, {1, 2, 2e-3}, {2, 0, 3e-3}};
  const std::vector<CavityInput> turned{line[2], line[0], line[1]};
  const CavityLink same[] = {{1, 2, 1e-3}, {2, 0, 2e-3}, {0, 1, 3e-3}};
  const NetworkResult a = solve_network(classes, line, ring);
  const NetworkResult b = solve_network(classes, turned, same);
  EXPECT_NEAR(a.cavities[0].bed_W / b.cavities[1].bed_W, 1, 1e-12);
  EXPECT_NEAR(a.cavities[2].links_W / b.cavities[0].links_W, 1, 1e-9);
}

TEST(CavityNetwork, AnIdleCavityLivesOnItsNeighbour) {
  const AngleClasses classes;
  auto line = drying_line(classes, 2, 0, 3);
  line[1].launched_W = 0;
  const NetworkResult r = solve_network(classes, line, chain(2));
  EXPECT_GT(r.cavities[1].bed_W, 0);
  EXPECT_NEAR(-r.cavities[1].links_W, parts(r.cavities[1]) - r.cavities[1].links_W, 1e-9);
  // No port radiates there, so none gets the enhanced share: two idle ports, not three.
  const double lambda = speed_of_light / line[1].frequency;
  EXPECT_NEAR(r.cavities[1].returned_W, 2 * lambda * lambda / (8 * pi) * r.cavities[1].S_upper_mean,
              1e-12);
}

TEST(CavityNetwork, AVanishingLoadSendsEverythingElsewhere) {
  const AngleClasses classes;
  double before = 1;
  for (const double loss : {1e-1, 1e-3, 1e-5, 0.0}) {
    CavityInput c = sample_cavity();
    BedSection s = sample_section(c, {2.2, -loss}, 0.01);
    s.belt_eps = {2.6, 0};
    const CavityResult r = test::solve_even(c, classes, bed_optics(classes, s));
    EXPECT_LT(r.bed_W, before);
    EXPECT_NEAR(parts(r), 1, 1e-12);
    before = r.bed_W;
  }
  EXPECT_EQ(before, 0);
}

TEST(CavityNetwork, NoPowerMakesNoField) {
  const AngleClasses classes;
  CavityInput c = sample_cavity();
  c.launched_W = 0;
  const NetworkResult r = solve_network(classes, {&c, 1}, {});
  EXPECT_EQ(r.cavities[0].S_upper_mean, 0);
  EXPECT_EQ(r.residual, 0);
  EXPECT_TRUE(solve_network(classes, {}, {}).cavities.empty());
}

TEST(CavityNetwork, ALauncherAimedAtTheBedHeatsItMoreFromAbove) {
  const AngleClasses classes;
  CavityInput c = sample_cavity();
  const BedOptics o = bed_optics(classes, sample_section(c, {10, -2}, 0.05));
  const CavityResult broad = test::solve_even(c, classes, o);
  double sum = 0;
  for (std::size_t i = 0; i < classes.size(); ++i) {
    c.launch.push_back(std::pow(classes.mu(i), 8));
    sum += classes.weight(i) * c.launch.back();
  }
  for (double& g : c.launch) g /= sum;
  const CavityResult aimed = test::solve_even(c, classes, o);
  EXPECT_GT(aimed.bed_top_W, broad.bed_top_W);
  EXPECT_NEAR(parts(aimed), 1, 1e-12);
}

TEST(CavityNetwork, FieldStrengthFollowsFromPowerDensity) {
  EXPECT_NEAR(rms_field(377), 376.865, 1e-3);  // eta0 = 376.730: sqrt(376.730 * 377)
  EXPECT_EQ(rms_field(0), 0);
}

TEST(CavityNetwork, RefusesWhatItCannotUse) {
  const AngleClasses classes;
  const auto line = drying_line(classes, 2, 0.1, 1);
  auto refused = [&](auto change, std::vector<CavityLink> links = {}) {
    auto bad = line;
    change(bad[1]);
    EXPECT_THROW(solve_network(classes, bad, links), Error);
  };
  refused([](CavityInput& c) { c.frequency = 0; });
  refused([](CavityInput& c) { c.height = -1; });
  refused([](CavityInput& c) { c.bed_width = 1.5; });
  refused([](CavityInput& c) { c.wall_resistivity = 0; });
  refused([](CavityInput& c) { c.mixing = std::numeric_limits<double>::quiet_NaN(); });
  refused([](CavityInput& c) { c.backscatter = 3; });
  refused([](CavityInput& c) { c.launched_W = -1; });
  refused([](CavityInput& c) { c.bed_top.resize(5); });
  refused([](CavityInput& c) { c.bed_top[0] = -1e-3; });
  refused([](CavityInput& c) { c.launch.assign(12, 2.0); });
  refused([](CavityInput&) {}, {{0, 2, 1e-3}});
  refused([](CavityInput&) {}, {{1, 1, 1e-3}});
  refused([](CavityInput&) {}, {{0, 1, -1e-3}});
  refused([](CavityInput& c) { c.frequency = 915e6; }, {{0, 1, 1e-3}});
}

}  // namespace
}  // namespace lossline::field
