#include "planner/verdict/margins.h"

#include <gtest/gtest.h>

#include <cmath>

#include "tests/verdict/sample_solution.h"

namespace lossline::verdict {
namespace {

/// The margin of that name, or a failure.
Margin find(const Margins& all, const std::string& name) {
  for (const Margin& m : all.all)
    if (m.name == name) return m;
  ADD_FAILURE() << "no margin named " << name;
  return {};
}

Margins of(const Line& line, const Solution& solution, const ProductCard& card = {}) {
  return margins(line, card, solution);
}

TEST(Margins, TellWithinNearAndBeyondApartAtTheirEdges) {
  Line line = sample::solved_line();
  const Solution s = sample::solved();  // hottest 360 K
  auto standing = [&](double limit) {
    line.limits.product_temperature = limit;
    return find(of(line, s), "product temperature").standing;
  };
  EXPECT_EQ(standing(365.0), Standing::within);  // exactly the reserve of 5 K
  EXPECT_EQ(standing(364.9), Standing::near);
  EXPECT_EQ(standing(360.0), Standing::near);
  EXPECT_EQ(standing(359.9), Standing::beyond);
}

TEST(Margins, SayWhereTheHighestValueStands) {
  Line line = sample::solved_line();
  line.limits.product_temperature = 370;
  const Margin m = find(of(line, sample::solved()), "product temperature");
  EXPECT_DOUBLE_EQ(m.value.value(), 360);
  EXPECT_DOUBLE_EQ(m.margin.value(), 10);
  EXPECT_DOUBLE_EQ(m.x.value(), 4);
  EXPECT_EQ(m.where, "cavity 1");
}

TEST(Margins, CountAHeatingRateOnlyInItsMoistureRange) {
  Line line = sample::solved_line();
  line.limits.heating_rate = 0.1;
  EXPECT_EQ(find(of(line, sample::solved()), "heating rate").standing, Standing::beyond);
  line.limits.heating_rate_above_moisture = 0.15;  // leaves the station at 0.20 with 0.05 K/s
  const Margin m = find(of(line, sample::solved()), "heating rate");
  EXPECT_EQ(m.standing, Standing::within);
  EXPECT_DOUBLE_EQ(m.value.value(), 0.05);
}

TEST(Margins, ReadTheCardsLimitsWithTheirMoistureRange) {
  ProductCard card;
  ProductLimit wet{LimitKind::product_temperature,
                   330,
                   0.25,
                   std::nullopt,
                   "gelatinises",
                   Severity::quality,
                   {}};
  card.limits = {wet};
  const Margin m =
      find(of(sample::solved_line(), sample::solved(), card), "product temperature, card");
  EXPECT_DOUBLE_EQ(m.value.value(), 320);  // hottest while wetter than 0.25
  EXPECT_EQ(m.origin, "card");
  EXPECT_EQ(m.reason, "gelatinises");
  card.limits[0].moisture_from = 0.5;  // never that wet
  for (const Margin& all : of(sample::solved_line(), sample::solved(), card).all)
    EXPECT_NE(all.name, "product temperature, card");
}

TEST(Margins, JudgeTheTargetMoistureOnTheNearerSide) {
  Line line = sample::solved_line();
  Solution s = sample::solved();
  Margin m = find(of(line, s), "final moisture, high edge");  // 0.11 in 0.10 +- 0.02
  EXPECT_NEAR(m.margin.value(), 0.01, 1e-12);
  EXPECT_EQ(m.standing, Standing::within);
  s.answer.final_moisture = 0.079;
  m = find(of(line, s), "final moisture, low edge");
  EXPECT_EQ(m.standing, Standing::beyond);
  line.duty.moisture_tolerance.reset();
  s.answer.final_moisture = 0.101;
  EXPECT_EQ(find(of(line, s), "final moisture").standing, Standing::beyond);
}

TEST(Margins, UseTheDriestAndWettestPartForMoistureLimits) {
  Line line = sample::solved_line();
  Solution s = sample::solved();
  line.limits.moisture_low = 0.08;
  line.limits.moisture_high = 0.13;
  s.answer.final_moisture_low = 0.07;
  s.answer.final_moisture_high = 0.14;
  EXPECT_EQ(find(of(line, s), "final moisture, driest").standing, Standing::beyond);
  EXPECT_EQ(find(of(line, s), "final moisture, wettest").standing, Standing::beyond);
}

TEST(Margins, DivideHeatByWetMassAndCoveredArea) {
  Line line = sample::solved_line();
  line.limits.specific_power = 3000;
  line.limits.areal_power = 20e3;
  Solution s = sample::solved();
  // 10 kg dry per metre: 25 kW/m over 11.2 kg/m at X = 0.12.
  EXPECT_NEAR(find(of(line, s), "heat per wet mass").value.value(), 25e3 / 11.2, 1e-9);
  s.answer.flow.coverage = 0.5;
  EXPECT_NEAR(find(of(line, s), "heat per covered belt area").value.value(), 52e3, 1e-9);
}

TEST(Margins, RateGeneratorsAndTheirReflectedPower) {
  Line line = sample::solved_line();
  const Solution s = sample::solved();
  EXPECT_DOUBLE_EQ(find(of(line, s), "output under rating").margin.value(), 15e3);
  EXPECT_DOUBLE_EQ(find(of(line, s), "output over least stable").margin.value(), 45e3);
  EXPECT_NEAR(find(of(line, s), "reflected over output").value.value(), 0.075, 1e-12);
  line.generators[0].reflected_limit.reset();
  const Margin m = find(of(line, s), "reflected over output");
  EXPECT_EQ(m.standing, Standing::unknown);
  EXPECT_FALSE(m.limit.has_value());
}

TEST(Margins, DoNotReadReflectedPowerOffAConstantShare) {
  Line line = sample::solved_line();
  line.solve.balance = Balance::constant_share;
  EXPECT_EQ(find(of(line, sample::solved()), "reflected over output").standing, Standing::unknown);
}

TEST(Margins, MeasureNamedSurfacesAgainstTheDewPoint) {
  Line line = sample::solved_line();
  EXPECT_DOUBLE_EQ(find(of(line, sample::solved()), "surface over dew point").margin.value(), 12);
  line.limits.dew_point_margin = 15;
  EXPECT_EQ(find(of(line, sample::solved()), "surface over dew point").standing, Standing::beyond);
}

TEST(Margins, RefuseWaterThatLeavesForLessThanItsHeat) {
  Solution s = sample::solved();
  s.answer.evaporated = 0.019;  // 116.77 kW / 0.019 kg/s = 6.1 MJ/kg
  EXPECT_EQ(find(of(sample::solved_line(), s), "energy per water").standing, Standing::within);
  s.answer.evaporated = 0.19;  // 0.6 MJ/kg
  EXPECT_EQ(find(of(sample::solved_line(), s), "energy per water").standing, Standing::beyond);
  s.product.reaction = 0.19 * 2.59e6;  // cure pays for it: credited
  EXPECT_NE(find(of(sample::solved_line(), s), "energy per water").standing, Standing::beyond);
}

TEST(Margins, NameTheBindingLimitFirst) {
  Line line = sample::solved_line();
  line.limits.product_temperature = 362;  // 2 K of a 5 K reserve: the least of all
  Solution s = sample::solved();
  s.answer.evaporated = 0.019;
  const Margins all = of(line, s);
  ASSERT_TRUE(all.binding.has_value());
  EXPECT_EQ(all.all[*all.binding].name, "product temperature");
  for (std::size_t i = 0; i + 1 < all.all.size(); ++i)
    EXPECT_LE(all.all[i].relative(), all.all[i + 1].relative());
}

TEST(Margins, NeverPassWithNotANumberOrWithoutASolution) {
  Line line = sample::solved_line();
  line.limits.product_temperature = 500;
  Solution s = sample::solved();
  for (Station& station : s.profile) station.temperature = std::nan("");
  EXPECT_EQ(find(of(line, s), "product temperature").standing, Standing::unknown);
  s = sample::solved();
  s.status = Status::not_converged;
  const Margins all = of(line, s);
  EXPECT_EQ(find(all, "product temperature").standing, Standing::unknown);
  EXPECT_EQ(find(all, "final moisture, high edge").standing, Standing::unknown);
  EXPECT_EQ(find(all, "output under rating").standing, Standing::within);  // rests on the plan
}

TEST(Margins, KeepAFlammableVapourBeyond) {
  Line line = sample::solved_line();
  line.product.flammable_vapour = "isopropanol";
  const Margins all = of(line, sample::solved());
  EXPECT_EQ(all.all.front().name, "flammable vapour: isopropanol");
  EXPECT_EQ(all.all.front().standing, Standing::beyond);
  EXPECT_GE(all.count(Standing::beyond), 1u);
}

}  // namespace
}  // namespace lossline::verdict
