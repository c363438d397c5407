// Random but possible lines: none may fail, and every balance must close. Seeds are fixed.

#include <gtest/gtest.h>

#include <cmath>
#include <random>

#include "planner/march/march.h"
#include "tests/march/sample_lines.h"

namespace lossline {
namespace {

class Dice {
 public:
  explicit Dice(unsigned seed) : engine_(seed) {}
  double between(double low, double high) {
    return low + (high - low) * static_cast<double>(engine_() >> 11) * 0x1.0p-53;
  }
  double log_between(double low, double high) {
    return std::exp(between(std::log(low), std::log(high)));
  }
  int one_of(int n) { return static_cast<int>(engine_() % static_cast<unsigned>(n)); }

 private:
  std::mt19937_64 engine_;
};

Line random_line(Dice& dice) {
  Line line = sample::small_line(1 + dice.one_of(6));
  line.pressure = dice.one_of(4) == 0 ? dice.between(8e3, 60e3) : 101325.0;
  line.duty.feed_moisture = dice.log_between(0.02, 2.5);
  line.duty.feed_temperature = dice.between(283, 333);
  if (line.pressure < 1e5) line.duty.feed_temperature = dice.between(283, 300);
  line.belt.speed = dice.log_between(0.0015, 0.1);
  line.belt.open_share = dice.between(0, 0.5);
  line.feed.depth = dice.log_between(0.004, 0.10);
  const bool high = dice.one_of(2) == 0;
  for (Generator& g : line.generators) {
    g.frequency = high ? 2.45e9 : 0.915e9;
    g.run = {};
    g.rated = 75e3;
    g.set_point = dice.one_of(8) == 0 ? 0.0 : dice.log_between(500, 40e3);
  }
  for (Stretch& s : line.stretches) {
    s.mixing = dice.one_of(2) == 0 ? 0.0 : dice.between(0, 0.3);
    s.heat_transfer_top = dice.log_between(3, 120);
    s.heat_transfer_belt = dice.one_of(2) == 0 ? 0.0 : dice.log_between(3, 40);
  }
  AirLoop& air = line.air[0];
  air.pattern = static_cast<AirPattern>(dice.one_of(4));
  air.dry_air_flow = dice.log_between(0.05, 3);
  air.recycle = dice.one_of(3) == 0 ? 0.0 : dice.between(0, 0.9);
  if (dice.one_of(5) == 0)
    air.supply_temperature.reset();
  else
    air.supply_temperature = dice.between(303, 433);
  if (air.pattern == AirPattern::through) {
    line.product.kind = ProductKind::granular_bed;
    line.feed.piece_size = dice.log_between(0.002, 0.02);
    line.feed.void_share = dice.between(0.3, 0.5);
  }
  return line;
}

ProductCard random_card(Dice& dice) {
  ProductCard card = sample::open_card(dice.log_between(0.02, 3));
  card.dry_heat_capacity->value = dice.between(700, 2200);
  card.dry_bulk_density->value = dice.between(150, 1800);
  card.permeability->value = dice.log_between(1e-15, 1e-9);
  card.diffusivity->value = dice.log_between(1e-11, 1e-8);
  card.conductivity->value = dice.between(0.05, 1.5);
  card.vapour_factor->value = dice.between(0.01, 0.6);
  if (dice.one_of(3) != 0) {
    product::Oswin oswin;
    oswin.k0 = dice.between(0.01, 0.2);
    oswin.n0 = dice.between(0.25, 0.6);
    card.sorption = std::make_shared<const product::Sorption>(
        product::Isotherm(oswin), 330.0,
        product::SorptionHeat{dice.between(0, 6e5), dice.between(0.02, 0.15)});
  }
  return card;
}

}  // namespace

TEST(RandomLines, SolveWithClosedBalances) {
  constexpr int lines = 600;
  int solved = 0, most_rounds = 0;
  double slowest = 0;
  for (unsigned seed = 1; seed <= lines; ++seed) {
    SCOPED_TRACE("seed " + std::to_string(seed));
    Dice dice(seed);
    const Line line = random_line(dice);
    const ProductCard card = random_card(dice);
    const Solution s = solve(line, card);
    most_rounds = std::max(most_rounds, s.rounds);
    slowest = std::max(slowest, s.wall_time);
    EXPECT_EQ(s.status, Status::solved) << s.reason;
    if (s.status != Status::solved) continue;
    ++solved;
    EXPECT_LE(s.balances.water, 1e-9);
    EXPECT_LE(s.balances.energy, 1e-6);
    EXPECT_LE(s.balances.power, 1e-6);
    for (const Station& station : s.profile) {
      ASSERT_TRUE(std::isfinite(station.temperature) && std::isfinite(station.moisture));
      ASSERT_GT(station.moisture, -1e-6);
    }
  }
  RecordProperty("solved", solved);
  std::printf("%d of %d random lines solved; at most %d rounds, slowest %.1f ms\n", solved, lines,
              most_rounds, slowest * 1e3);
}

}  // namespace lossline
