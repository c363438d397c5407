// Checks of the energy chain that need a line, a product flow or a product on a belt.

#include <gtest/gtest.h>

#include <filesystem>
#include <limits>
#include <vector>

#include "planner/base/quantity.h"
#include "planner/base/quantity_kinds.h"
#include "planner/line/flow.h"
#include "planner/linefile/read.h"
#include "planner/march/belt_system.h"
#include "planner/march/march.h"
#include "planner/verdict/margins.h"
#include "tests/march/sample_lines.h"

namespace lossline {
namespace {

std::vector<Line> scenario_lines() {
  std::vector<Line> lines;
  for (const auto& entry :
       std::filesystem::directory_iterator(std::string(LOSSLINE_SOURCE_DIR) + "/scenarios"))
    if (entry.path().extension() == ".toml")
      lines.push_back(linefile::read(entry.path().string()).line);
  return lines;
}

}  // namespace

// Heat balance: 1 kg of water, 1 kW, 60 s, cp 4.1868 kJ/(kg K): 14.33 K. Tolerance 0.1 %: the bed
// uses 4.190 kJ/(kg K). A kilogram of "solid" without heat capacity of its own carries the water.
TEST(PublishedLine, HeatsAKilogramOfWaterByAKilowattForAMinute) {
  bed::BedMaterial m;
  m.sorption = std::make_shared<const product::Sorption>(product::Sorption::free_water());
  m.heat_capacity = 1e-6;
  m.dry_density = 1000;
  m.conductivity = 0.6;
  m.saturation_moisture = 2;
  march::BeltSystem s;
  s.material = &m;
  s.around.dry_areal_mass = 1;
  s.x1 = 60;
  s.q0 = s.q1 = 1000;
  march::State y{};
  y[march::X] = 1;
  y[march::E] = bed::enthalpy(m, 293.15, 1, 0);
  constexpr double free = std::numeric_limits<double>::infinity();
  numerics::StepCount count;
  double h = 1;
  ASSERT_EQ(numerics::integrate(s, 0.0, 60.0, y, {1e-3, 1e-9, 1e-9, 1, 1, free, free, free},
                                {1e-9, 1000}, h, count),
            numerics::StepOutcome::reached);
  const double T = bed::temperature(m, y[march::E], y[march::X], y[march::alpha]);
  EXPECT_NEAR(T - 293.15, 14.33, 0.001 * 14.33);
}

// Identity: 25 % wet basis is a third dry basis, exactly.
TEST(PublishedLine, KnowsWetFromDryBasis) {
  EXPECT_DOUBLE_EQ(parse_quantity("25 % wb", quantity::moisture), 1.0 / 3);
}

// Water removed from 1000 kg/h between 20 and 12 % wet basis: 90.909 kg/h, by the shrink formula
// (M0 - Mf)/(100 - Mf) as North Dakota State University extension printed it in 2009.
TEST(PublishedLine, RemovesWaterByTheShrinkFormula) {
  const double in = parse_quantity("20 % wb", quantity::moisture);
  const double out = parse_quantity("12 % wb", quantity::moisture);
  const double feed = parse_quantity("1000 kg/h", quantity::mass_flow);
  const double solids = feed / (1 + in);
  EXPECT_NEAR((solids * in - solids * out) * 3600, 90.909, 0.0005);
}

// Identity: six cavities of 1.2 m at 0.6 m/min take 12 minutes.
TEST(PublishedLine, SpendsLengthOverSpeedInTheCavities) {
  Line line = sample::small_line(6);
  line.belt.speed = 0.6 / 60;
  const Solution s = solve(line, sample::open_card());
  ASSERT_EQ(s.status, Status::solved) << s.reason;
  EXPECT_NEAR(s.answer.heated_residence, 12.0 * 60, 1e-9);
}

// Identity: rho w h v. 1.0 m wide, 50 mm deep, 500 kg/m3, 0.6 m/min carry 900 kg/h.
TEST(PublishedLine, CarriesDensityTimesSectionTimesSpeed) {
  Line line = sample::small_line(1);
  line.belt.width = 1.1;
  line.feed.width = 1.0;
  line.feed.depth = 0.05;
  line.feed.bulk_density = 500;
  line.belt.speed = 0.6 / 60;
  std::vector<FlowProblem> problems;
  const ProductFlow flow = resolve_flow(line, sample::open_card(), problems);
  ASSERT_TRUE(problems.empty()) << problems[0].wrong;
  EXPECT_NEAR(flow.feed * 3600, 900, 1e-9);
}

// Common practice, no source: a magnetron turns 0.60 to 0.72 of its anode power into microwaves at
// 2.45 GHz and 0.80 to 0.90 at 915 MHz; supplies and auxiliaries keep 0.85 to 0.97.
TEST(PublishedLine, ScenariosClaimNoBetterGeneratorsThanTheTradeKnows) {
  const std::vector<Line> lines = scenario_lines();
  ASSERT_GE(lines.size(), 5u);
  for (const Line& line : lines) {
    for (const Generator& g : line.generators) {
      const bool high = g.frequency > 2e9;
      EXPECT_GE(g.tube_efficiency, high ? 0.60 : 0.80) << line.name << ' ' << g.name;
      EXPECT_LE(g.tube_efficiency, high ? 0.72 : 0.90) << line.name << ' ' << g.name;
      EXPECT_GE(g.supply_efficiency, 0.85) << line.name << ' ' << g.name;
      EXPECT_LE(g.supply_efficiency, 0.97) << line.name << ' ' << g.name;
      const double chain = g.tube_efficiency * g.supply_efficiency;
      EXPECT_GE(chain, high ? 0.50 : 0.70) << line.name;
      EXPECT_LE(chain, high ? 0.68 : 0.86) << line.name;
    }
  }
}

// No plan may report less than 0.7199 kWh per kg of water from 20 degC at one atmosphere (IAPWS
// R7-97: 2591.5 kJ/kg) unless other heat is credited, and below that over 0.86, the best chain from
// mains to microwave (common practice), it must warn.
TEST(PublishedLine, WarnsOfEnergyBelowWhatTheBestGeneratorsCouldDo) {
  Line line = sample::small_line(2);
  line.air.clear();
  for (Stretch& s : line.stretches) {
    s.air.clear();
    s.heat_transfer_top = 0;
  }
  line.duty.feed_temperature = 293.15;
  line.belt.speed = 0.004;
  for (Generator& g : line.generators) {
    g.run = {};
    g.launcher_reflection = 0;
    g.tube_efficiency = g.supply_efficiency = 0.99;  // nobody can
  }
  const ProductCard card = sample::open_card();
  const Solution s = solve(line, card);
  ASSERT_EQ(s.status, Status::solved) << s.reason;
  EXPECT_NEAR(s.answer.energy_floor / 3.6e6, 0.71987, 0.001 * 0.71987);
  EXPECT_GE(s.answer.mains_per_water, s.answer.energy_floor);
  const auto margins = verdict::margins(line, card, s);
  bool found = false;
  for (const auto& m : margins.all) {
    if (m.name != "energy per water") continue;
    found = true;
    const bool suspicious = s.answer.mains_per_water < s.answer.energy_floor / 0.86;
    EXPECT_EQ(m.standing == verdict::Standing::near, suspicious);
  }
  EXPECT_TRUE(found);
}

}  // namespace lossline
