// Every shipped material through one and the same line: it solves with closed balances and honest
// marks, or it is refused with a reason that names what is missing.

#include <gtest/gtest.h>

#include "materials/store.h"
#include "planner/base/error.h"
#include "planner/march/march.h"
#include "tests/march/sample_lines.h"

namespace lossline {
namespace {

Line line_for(double frequency) {
  Line line = sample::small_line(2);
  for (Generator& g : line.generators) {
    g.frequency = frequency;
    g.run = {};
  }
  line.duty.feed_moisture = 0.15;
  line.belt.speed = 0.02;
  return line;
}

}  // namespace

TEST(Cards, SolveWithClosedBalancesOrSayWhatIsMissing) {
  const auto store = materials::Store::open(LOSSLINE_MATERIALS_DB);
  const auto materials = store.list();
  ASSERT_GE(materials.size(), 16u);
  int solved = 0, estimated = 0, refused = 0;
  for (const auto& material : materials) {
    for (const double frequency : {0.915e9, 2.45e9}) {
      SCOPED_TRACE(material.id);
      ProductCard card = store.card(material.id);
      if (!card.dry_bulk_density) card.dry_bulk_density = Property{500, {}};
      Solution s;
      try {
        s = solve(line_for(frequency), card);
      } catch (const Error& error) {
        EXPECT_FALSE(std::string(error.what()).empty());
        ++refused;
        continue;
      }
      if (s.status == Status::refused) {
        EXPECT_NE(s.reason.find(material.id), std::string::npos) << s.reason;
        ++refused;
        continue;
      }
      ASSERT_EQ(s.status, Status::solved) << s.reason;
      ++solved;
      EXPECT_LE(s.balances.water, 1e-9);
      EXPECT_LE(s.balances.energy, 1e-6);
      EXPECT_LE(s.balances.power, 1e-6);
      EXPECT_TRUE(std::isfinite(s.answer.final_temperature));
      const bool from_composition =
          card.permittivity_provenance.evidence == Evidence::model_derived &&
          card.permittivity_low != nullptr;
      if (!from_composition) continue;
      ++estimated;
      EXPECT_TRUE(s.flags.has(flag::estimated));
      ASSERT_TRUE(s.band.has_value());
      EXPECT_TRUE(s.band->converged);
    }
  }
  // Both ways of ending must really occur, or this test would say nothing.
  EXPECT_GT(solved, 20);
  EXPECT_GT(estimated, 4);
  EXPECT_GT(refused, 0);
}

}  // namespace lossline
