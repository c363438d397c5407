#include <gtest/gtest.h>

#include <cmath>

#include "planner/march/march.h"
#include "tests/march/sample_lines.h"

namespace lossline {
namespace {

void expect_closed(const Solution& s) {
  ASSERT_EQ(s.status, Status::solved) << s.reason;
  EXPECT_LE(s.balances.water, 1e-9);
  EXPECT_LE(s.balances.energy, 1e-6);
  EXPECT_LE(s.balances.power, 1e-6);
}

}  // namespace

TEST(Solve, ClosesItsBalancesForEveryAirPattern) {
  for (const AirPattern pattern : {AirPattern::co, AirPattern::counter, AirPattern::cross}) {
    Line line = sample::small_line(3);
    line.air[0].pattern = pattern;
    const Solution s = solve(line, sample::open_card());
    expect_closed(s);
    EXPECT_LT(s.answer.final_moisture, 0.40);
    EXPECT_GT(s.answer.share_of_forward, 0.5);
  }
}

TEST(Solve, ClosesWithAirThroughAGranularBed) {
  Line line = sample::small_line(2);
  line.product.kind = ProductKind::granular_bed;
  line.feed.piece_size = 0.008;
  line.feed.void_share = 0.4;
  line.air[0].pattern = AirPattern::through;
  expect_closed(solve(line, sample::open_card()));
}

TEST(Solve, HeatsNothingWithoutLoss) {
  Line line = sample::small_line(2);
  line.air.clear();
  for (Stretch& s : line.stretches) {
    s.air.clear();
    s.heat_transfer_top = 0;
  }
  ProductCard card = sample::open_card(0.0);
  const Solution s = solve(line, card);
  ASSERT_EQ(s.status, Status::solved) << s.reason;
  EXPECT_NEAR(s.answer.final_temperature, line.duty.feed_temperature, 1e-9);
  EXPECT_NEAR(s.power.bed, 0.0, 1e-6);
  EXPECT_LE(s.balances.power, 1e-6);
}

// Half the speed with half the power gives the same product at every place: residence doubles,
// heat per time halves. Only without air, whose film does not scale.
TEST(Solve, GivesTheSameProductAtHalfSpeedAndHalfPower) {
  Line line = sample::small_line(2);
  line.air.clear();
  for (Stretch& s : line.stretches) {
    s.air.clear();
    s.heat_transfer_top = 0;
  }
  ProductCard card = sample::open_card();
  const Solution full = solve(line, card);
  *line.belt.speed *= 0.5;
  for (Generator& g : line.generators) g.set_point *= 0.5;
  const Solution half = solve(line, card);
  ASSERT_EQ(full.status, Status::solved);
  ASSERT_EQ(half.status, Status::solved);
  ASSERT_EQ(full.profile.size(), half.profile.size());
  for (std::size_t i = 0; i < full.profile.size(); ++i) {
    // The boiling overpressure needs half the flow, which moves T by hundredths of a kelvin.
    EXPECT_NEAR(full.profile[i].moisture, half.profile[i].moisture, 2e-4) << i;
    EXPECT_NEAR(full.profile[i].temperature, half.profile[i].temperature, 0.2) << i;
  }
}

TEST(Solve, SettlesAtSecondOrderOrBetterInTheStations) {
  Line line = sample::small_line(2);
  // Below boiling all along, so that nothing has a kink: heat and loss factor vary smoothly.
  line.belt.speed = 0.002;
  for (Generator& g : line.generators) g.set_point = 3e3;
  for (Stretch& s : line.stretches) s.heat_transfer_top = 60;
  const ProductCard card = sample::open_card(0.3);
  double X[3];
  std::size_t n = 12;
  for (double& x : X) {
    SolveOptions options;
    options.cavity_segments = n;
    options.step_tolerance = 1e-9;
    options.tolerance = 1e-10;
    const Solution s = solve(line, card, options);
    ASSERT_EQ(s.status, Status::solved);
    x = s.answer.final_moisture;
    n *= 2;
  }
  const double order = std::log2(std::abs(X[0] - X[1]) / std::abs(X[1] - X[2]));
  EXPECT_GT(order, 1.8) << X[0] << ' ' << X[1] << ' ' << X[2];
  EXPECT_NEAR(X[0], X[2], 1e-4 * X[2]);
}

TEST(Solve, NeverHandsTheProductMoreThanTheGeneratorsGive) {
  for (const double loss : {0.01, 0.1, 1.0, 5.0}) {
    const Solution s = solve(sample::small_line(2), sample::open_card(loss));
    ASSERT_EQ(s.status, Status::solved) << s.reason;
    EXPECT_LE(s.power.bed, s.power.forward);
    EXPECT_GT(s.power.bed, 0);
  }
}

TEST(Solve, StampsTheConstantShare) {
  Line line = sample::small_line(2);
  line.solve.balance = Balance::constant_share;
  line.solve.load_share = 0.8;
  const Solution s = solve(line, sample::open_card());
  expect_closed(s);
  EXPECT_EQ(s.balance, Balance::constant_share);
  double launched = 0;
  for (const CavityReport& c : s.cavities) launched += c.launched;
  EXPECT_NEAR(s.power.bed, 0.8 * launched, 1e-6);
  EXPECT_GT(s.power.other, 0);
}

TEST(Solve, RefusesWithAReasonWhenNoPermittivityIsKnown) {
  ProductCard card = sample::open_card();
  card.permittivity = nullptr;
  const Solution s = solve(sample::small_line(1), card);
  EXPECT_EQ(s.status, Status::refused);
  EXPECT_NE(s.reason.find("permittivity"), std::string::npos);
}

TEST(Solve, StopsWhenTold) {
  const std::atomic<bool> stop{true};
  SolveOptions options;
  options.stop = &stop;
  const Solution s = solve(sample::small_line(2), sample::open_card(), options);
  EXPECT_EQ(s.status, Status::interrupted);
}

TEST(Solve, AddsUpTheProductsOwnLedger) {
  const Solution s = solve(sample::small_line(2), sample::open_card());
  ASSERT_EQ(s.status, Status::solved);
  const ProductLedger& p = s.product;
  EXPECT_NEAR(p.sensible_solids + p.sensible_water + p.evaporation + p.bound_water - p.reaction,
              p.field + p.air, 1e-6 * (p.field + std::abs(p.air)));
}

}  // namespace lossline
