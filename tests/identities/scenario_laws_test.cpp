// The laws every scenario in the repository must obey, whatever its numbers.

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <filesystem>
#include <string>
#include <vector>

#include "materials/store.h"
#include "planner/bed/vapour.h"
#include "planner/linefile/read.h"
#include "planner/march/march.h"

namespace lossline {
namespace {

std::vector<std::string> scenario_files() {
  std::vector<std::string> files;
  for (const auto& entry :
       std::filesystem::directory_iterator(std::string(LOSSLINE_SOURCE_DIR) + "/scenarios"))
    if (entry.path().extension() == ".toml") files.push_back(entry.path().string());
  std::sort(files.begin(), files.end());
  return files;
}

std::string name_of(const testing::TestParamInfo<std::string>& info) {
  return std::filesystem::path(info.param).stem().string();
}

struct Loaded {
  Line line;
  ProductCard card;
};

Loaded load(const std::string& file) {
  Loaded out;
  out.line = linefile::read(file).line;
  const auto store = materials::Store::open(LOSSLINE_MATERIALS_DB);
  out.card = with_overrides(store.card(out.line.product.material), out.line.product.overrides);
  return out;
}

class Scenario : public testing::TestWithParam<std::string> {
 protected:
  void SetUp() override {
    loaded_ = load(GetParam());
    solution_ = solve(loaded_.line, loaded_.card);
    ASSERT_EQ(solution_.status, Status::solved) << solution_.reason;
  }
  Loaded loaded_;
  Solution solution_;
};

}  // namespace

TEST_P(Scenario, ClosesWaterEnergyAndPower) {
  EXPECT_LE(solution_.balances.water, 1e-9);
  EXPECT_LE(solution_.balances.energy, 1e-6);
  EXPECT_LE(solution_.balances.power, 1e-6);
}

TEST_P(Scenario, EvaporatesWhatTheProductLoses) {
  const Answer& a = solution_.answer;
  EXPECT_NEAR(a.feed_rate - a.product_rate, a.evaporated, 1e-9 * a.feed_rate);
}

TEST_P(Scenario, PutsNoMorePowerInTheProductThanTheGeneratorsGive) {
  EXPECT_LE(solution_.power.bed, solution_.power.forward);
  for (const CavityReport& c : solution_.cavities)
    EXPECT_LE(c.bed + c.belt + c.walls + c.returned + c.ends + c.links,
              c.launched * (1 + 1e-6) + 1e-6)
        << c.name;
}

TEST_P(Scenario, HeatsNothingInALosslessProduct) {
  ProductCard card = loaded_.card;
  class Lossless : public Permittivity {
   public:
    [[nodiscard]] Valued<std::complex<double>> at(double, double, double) const override {
      return {{4.0, 0.0}, {}};
    }
  };
  card.permittivity = std::make_shared<const Lossless>();
  card.permittivity_low = card.permittivity_high = nullptr;
  const Solution s = solve(loaded_.line, card);
  ASSERT_EQ(s.status, Status::solved) << s.reason;
  EXPECT_NEAR(s.power.bed, 0.0, 1e-9 * s.power.forward);
  EXPECT_LE(s.balances.power, 1e-6);
}

TEST_P(Scenario, MovesLittleWhenStationsAreDoubled) {
  SolveOptions fine;
  fine.cavity_segments = 2 * fine.cavity_segments;
  fine.other_segments = 2 * fine.other_segments;
  const Solution s = solve(loaded_.line, loaded_.card, fine);
  ASSERT_EQ(s.status, Status::solved) << s.reason;
  // The stations' own error is far below what the model can claim: 0.2 % of the moisture removed.
  const double removed = loaded_.line.duty.feed_moisture - solution_.answer.final_moisture;
  EXPECT_NEAR(s.answer.final_moisture, solution_.answer.final_moisture,
              0.002 * std::abs(removed) + 1e-6);
  EXPECT_NEAR(s.answer.final_temperature, solution_.answer.final_temperature, 0.5);
}

TEST_P(Scenario, NeverDriesBelowWhatTheAirAllowsWithoutTheField) {
  Line line = loaded_.line;
  for (Generator& g : line.generators) g.set_point = 0;
  const Solution s = solve(line, loaded_.card);
  ASSERT_EQ(s.status, Status::solved) << s.reason;
  for (const Station& station : s.profile) {
    // The surface may not be drier than equilibrium with the air at the surface's temperature;
    // 1e-9 for rounding. Where the air is moister than the surface, water condenses instead.
    const double air = bed::vapour_pressure(station.air_humidity, line.pressure);
    const double aw = air / water::fast_saturation_pressure(station.temperature);
    if (aw >= 1 || !loaded_.card.sorption || station.evaporation <= 0) continue;
    const double equilibrium = loaded_.card.sorption->equilibrium_moisture(aw, station.temperature);
    EXPECT_GE(station.surface_moisture, equilibrium - 1e-6) << "x = " << station.x;
  }
}

TEST_P(Scenario, GivesTheSameAnswerTwice) {
  const Solution again = solve(loaded_.line, loaded_.card);
  EXPECT_EQ(again.answer.final_moisture, solution_.answer.final_moisture);
  EXPECT_EQ(again.power.bed, solution_.power.bed);
  EXPECT_EQ(again.rounds, solution_.rounds);
}

INSTANTIATE_TEST_SUITE_P(All, Scenario, testing::ValuesIn(scenario_files()), name_of);

}  // namespace lossline
