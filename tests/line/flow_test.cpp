#include "planner/line/flow.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

namespace lossline {
namespace {

using ::testing::HasSubstr;

ProductFlow resolved(const Line& line, const ProductCard& card = {}) {
  std::vector<FlowProblem> problems;
  const ProductFlow flow = resolve_flow(line, card, problems);
  for (const FlowProblem& p : problems) ADD_FAILURE() << p.key << ": " << p.wrong;
  return flow;
}

std::vector<FlowProblem> problems_of(const Line& line, const ProductCard& card = {}) {
  std::vector<FlowProblem> problems;
  (void)resolve_flow(line, card, problems);
  return problems;
}

Property value(double v) {
  return {v, {}};
}

/// A belt 1.0 m wide, 50 mm bed, 500 kg/m3, 0.6 m/min: it holds 900 kg/h by multiplication.
Line bed() {
  Line line;
  line.product.kind = ProductKind::granular_bed;
  line.duty.feed_moisture = 0.25;
  line.feed.width = 1.0;
  line.feed.depth = 0.05;
  line.feed.bulk_density = 500;
  line.belt.width = 1.2;
  line.belt.speed = 0.6 / 60;
  return line;
}

TEST(ProductFlow, OfABedIsDensityTimesSectionTimesSpeed) {
  const ProductFlow flow = resolved(bed());
  EXPECT_NEAR(flow.feed * 3600, 900.0, 1e-9);
  EXPECT_NEAR(flow.dry_solids * 3600, 720.0, 1e-9);
  EXPECT_DOUBLE_EQ(flow.dry_density, 400.0);
  EXPECT_DOUBLE_EQ(flow.dry_areal_mass, 20.0);
}

TEST(ProductFlow, GivesBackWhicheverFactorIsLeftOut) {
  Line full = bed();
  full.duty.feed_rate = 900.0 / 3600;
  const auto drop = [&](auto member) {
    Line line = full;
    member(line);
    const ProductFlow flow = resolved(line);
    EXPECT_NEAR(flow.feed * 3600, 900.0, 1e-9);
    EXPECT_NEAR(flow.speed * 60, 0.6, 1e-12);
    EXPECT_NEAR(flow.depth, 0.05, 1e-12);
    EXPECT_NEAR(flow.width, 1.0, 1e-12);
    EXPECT_NEAR(flow.dry_density, 400.0, 1e-9);
  };
  drop([](Line& l) { l.duty.feed_rate.reset(); });
  drop([](Line& l) { l.belt.speed.reset(); });
  drop([](Line& l) { l.feed.depth.reset(); });
  drop([](Line& l) { l.feed.width.reset(); });
  drop([](Line& l) { l.feed.bulk_density.reset(); });
}

TEST(ProductFlow, ReadsAnyOfTheThreeRates) {
  // Finished 800 kg/h at 6 % wet basis from 25 % wet basis: 752 kg/h dry solids.
  Line line = bed();
  line.belt.speed.reset();
  line.duty.feed_moisture = 0.25 / 0.75;
  line.duty.target_moisture = 0.06 / 0.94;
  line.duty.product_rate = 800.0 / 3600;
  const ProductFlow flow = resolved(line);
  EXPECT_NEAR(flow.dry_solids * 3600, 752.0, 1e-9);
  EXPECT_NEAR((flow.feed - 800.0 / 3600) * 3600, 202.6667, 1e-4);  // water to evaporate
  line.duty.dry_solids_rate = 752.0 / 3600;
  EXPECT_NEAR(resolved(line).speed, flow.speed, 1e-12);
  line.duty.dry_solids_rate = 700.0 / 3600;
  EXPECT_THAT(problems_of(line).at(0).wrong, HasSubstr("closing error"));
}

TEST(ProductFlow, TakesTheCardsDensityAndItsShrinkage) {
  Line line = bed();
  line.feed.bulk_density.reset();
  ProductCard card;
  card.dry_bulk_density = value(420);
  card.shrinkage = value(0.2);
  EXPECT_NEAR(resolved(line, card).dry_density, 420 / 1.05, 1e-9);
  line.product.kind = ProductKind::slab;
  card.dry_piece_density = value(600);
  EXPECT_NEAR(resolved(line, card).dry_density, 600 / 1.05, 1e-9);
}

TEST(ProductFlow, KeepsTheStatedRateInsideTheTolerance) {
  Line line = bed();
  line.duty.feed_rate = 903.0 / 3600;
  const ProductFlow flow = resolved(line);
  EXPECT_DOUBLE_EQ(flow.feed, *line.duty.feed_rate);
  EXPECT_NEAR(flow.dry_density * flow.width * flow.depth * flow.coverage * flow.speed,
              flow.dry_solids, 1e-15);
}

TEST(ProductFlow, NamesTheContradictionWithItsClosingError) {
  Line line = bed();
  line.duty.feed_rate = 1000.0 / 3600;
  const auto problems = problems_of(line);
  ASSERT_EQ(problems.size(), 1u);
  EXPECT_EQ(problems[0].key, "duty.feed_rate");
  EXPECT_THAT(problems[0].wrong, HasSubstr("1000 kg/h"));
  EXPECT_THAT(problems[0].wrong, HasSubstr("900 kg/h"));
  EXPECT_THAT(problems[0].wrong, HasSubstr("10 %"));
  EXPECT_THAT(problems[0].right, HasSubstr("belt.speed = \"0.6667 m/min\""));
}

TEST(ProductFlow, AsksForOneOfTwoUnknowns) {
  Line line = bed();
  line.belt.speed.reset();
  const auto problems = problems_of(line);
  ASSERT_EQ(problems.size(), 1u);
  EXPECT_EQ(problems[0].key, "belt.speed");
  EXPECT_THAT(problems[0].wrong, HasSubstr("duty.feed_rate and belt.speed"));
}

TEST(ProductFlow, RefusesZeroNegativeAndNotANumber) {
  for (const double bad : {0.0, -1.0, std::nan("")}) {
    Line line = bed();
    line.feed.depth = bad;
    EXPECT_EQ(problems_of(line).at(0).key, "feed.depth") << bad;
  }
}

TEST(ProductFlow, RefusesABedWiderThanTheBelt) {
  Line line = bed();
  line.feed.width = 1.3;
  EXPECT_EQ(problems_of(line).at(0).key, "feed.width");
}

TEST(ProductFlow, OfAProfileFollowsFromMassPerLength) {
  Line line;
  line.product.kind = ProductKind::profile;
  line.feed.mass_per_length = 0.75;
  line.feed.depth = 0.02;
  line.feed.bulk_density = 1150;
  line.duty.feed_rate = 250.0 / 3600;
  const ProductFlow flow = resolved(line);
  EXPECT_NEAR(flow.speed * 60, 5.5556, 1e-4);  // 250 kg/h over 0.75 kg/m
  EXPECT_NEAR(flow.width, 0.75 / 1150 / 0.02, 1e-12);
  EXPECT_DOUBLE_EQ(flow.coverage, 1);
  line.feed.width = 0.05;
  EXPECT_EQ(problems_of(line).at(0).key, "feed.mass_per_length");
}

/// 40 blanks an hour, 150 x 150 x 160 mm, 6.0 kg dry each.
Line blanks() {
  Line line;
  line.product.kind = ProductKind::pieces;
  line.duty.feed_moisture = 0.22;
  line.feed.piece_rate = 40.0 / 3600;
  line.feed.piece_mass = 6.0;
  line.feed.piece_length = 0.15;
  line.feed.piece_width = 0.15;
  line.feed.piece_height = 0.16;
  line.feed.lanes = 2;
  line.feed.width = 0.5;
  line.belt.width = 0.6;
  line.belt.speed = 0.1 / 60;
  return line;
}

TEST(ProductFlow, OfPiecesFollowsFromRateAndMass) {
  const ProductFlow flow = resolved(blanks());
  EXPECT_NEAR(flow.dry_solids * 3600, 240.0, 1e-9);
  // 20 rows an hour on 6 m of belt an hour: one row every 300 mm, so half of two 150 mm lanes.
  EXPECT_NEAR(flow.coverage, 0.15 * 0.30 / (0.5 * 0.3), 1e-12);
  EXPECT_NEAR(flow.dry_density, 6.0 / (0.15 * 0.15 * 0.16), 1e-9);
  EXPECT_NEAR(flow.dry_density * flow.width * flow.depth * flow.coverage * flow.speed,
              flow.dry_solids, 1e-15);
}

TEST(ProductFlow, FindsPieceRateOrMassFromTheRest) {
  Line line = blanks();
  line.feed.piece_rate.reset();
  line.duty.dry_solids_rate = 240.0 / 3600;
  EXPECT_NEAR(resolved(line).coverage, 0.3, 1e-9);
  line = blanks();
  line.feed.piece_mass.reset();
  ProductCard card;
  card.dry_piece_density = value(6.0 / (0.15 * 0.15 * 0.16));
  EXPECT_NEAR(resolved(line, card).dry_solids * 3600, 240.0, 1e-9);
}

TEST(ProductFlow, RefusesPiecesThatOverlap) {
  Line line = blanks();
  line.belt.speed = 0.04 / 60;
  auto problems = problems_of(line);
  ASSERT_FALSE(problems.empty());
  EXPECT_THAT(problems[0].wrong, HasSubstr("overlap"));
  EXPECT_THAT(problems[0].right, HasSubstr("0.05 m/min"));  // 120 mm pitch to 150 mm
  line = blanks();
  line.feed.width = 0.25;
  EXPECT_EQ(problems_of(line).at(0).key, "feed.lanes");
}

TEST(ProductFlow, NeedsTheSpeedOfPieces) {
  Line line = blanks();
  line.belt.speed.reset();
  EXPECT_EQ(problems_of(line).at(0).key, "belt.speed");
}

}  // namespace
}  // namespace lossline
