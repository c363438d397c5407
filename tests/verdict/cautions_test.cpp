#include "planner/verdict/cautions.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <algorithm>

#include "planner/verdict/radio_band.h"
#include "tests/verdict/sample_solution.h"

namespace lossline::verdict {
namespace {

using ::testing::HasSubstr;

std::vector<Caution> of(const Line& line, const Solution& s, const ProductCard& card = {}) {
  return cautions(line, card, s, margins(line, card, s));
}

bool raised(const std::vector<Caution>& all, const std::string& id) {
  return std::any_of(all.begin(), all.end(), [&](const Caution& c) { return c.id == id; });
}

std::string text(const std::vector<Caution>& all, const std::string& id) {
  for (const Caution& c : all)
    if (c.id == id) return c.text;
  return "";
}

TEST(Cautions, AlwaysNameTheDecidingDocument) {
  Line line = sample::solved_line();
  line.product.contains_metal = line.product.combustible = line.product.dusty = true;
  line.product.food = line.product.fumes = true;
  line.product.flammable_vapour = "ethanol";
  for (const Caution& c : of(line, sample::solved())) {
    EXPECT_THAT(c.document, HasSubstr("verify the edition and national law")) << c.id;
    EXPECT_FALSE(c.text.empty()) << c.id;
    EXPECT_FALSE(c.title.empty()) << c.id;
  }
}

TEST(Cautions, AboutPowerAreRaisedForEveryLineWithPowerOnly) {
  Line line = sample::solved_line();
  const auto all = of(line, sample::solved());
  for (const char* id : {"C01", "C03", "C05", "C06", "C19", "C21", "C23"})
    EXPECT_TRUE(raised(all, id)) << id;
  line.generators.clear();
  Solution s = sample::solved();
  s.generators.clear();
  const auto none = of(line, s);
  for (const char* id : {"C01", "C02b", "C05", "C06", "C19", "C21", "C23"})
    EXPECT_FALSE(raised(none, id)) << id;
}

TEST(Cautions, SayThatALowWideSlotHoldsNothingBack) {
  Line line = sample::solved_line();
  line.outlet_trap->opening = {0.15, 0.1};  // narrower than half of 328 mm
  const auto all = of(line, sample::solved());
  EXPECT_EQ(std::count_if(all.begin(), all.end(), [](const Caution& c) { return c.id == "C02b"; }),
            1);
  EXPECT_THAT(text(all, "C02b"), HasSubstr("61 mm at 2450 MHz"));
  EXPECT_THAT(text(all, "C02b"), HasSubstr("164 mm at 915 MHz"));
  EXPECT_THAT(text(all, "C02b"), HasSubstr("guaranteed by: supplier"));
}

TEST(Cautions, FollowTheDeclaredProperties) {
  const std::pair<const char*, void (*)(Product&)> cases[] = {
      {"C09", [](Product& p) { p.contains_metal = true; }},
      {"C10", [](Product& p) { p.combustible = true; }},
      {"C11", [](Product& p) { p.dusty = true; }},
      {"C12", [](Product& p) { p.flammable_vapour = "acetone"; }},
      {"C13", [](Product& p) { p.fumes = true; }},
      {"C22", [](Product& p) { p.food = true; }}};
  for (const auto& [id, set] : cases) {
    Line line = sample::solved_line();
    EXPECT_FALSE(raised(of(line, sample::solved()), id)) << id;
    set(line.product);
    EXPECT_TRUE(raised(of(line, sample::solved()), id)) << id;
  }
}

TEST(Cautions, TellTheTimeToTheLimitAfterABeltStop) {
  Line line = sample::solved_line();
  line.limits.product_temperature = 373.15;
  ProductCard card;
  EXPECT_THAT(text(of(line, sample::solved(), card), "C06"), HasSubstr("is unknown"));
  card.dry_heat_capacity = Property{1500, {}};
  // Shortest at 360 K: 10 kg/m x (1500 + 4186 x 0.12) J/(kg K) x 13.15 K / 25 kW/m = 10.5 s.
  EXPECT_THAT(text(of(line, sample::solved(), card), "C06"), HasSubstr("about 11 s"));
}

TEST(Cautions, SeeADryEndThatRunsAway) {
  Line line = sample::solved_line();
  Solution s = sample::solved();
  EXPECT_FALSE(raised(of(line, s), "C08"));
  for (std::size_t i = 2; i <= 4; ++i) {
    s.profile[i].heating_rate = 0.02 * static_cast<double>(i);
    s.profile[i].evaporation = 0.1 / static_cast<double>(i);
  }
  EXPECT_TRUE(raised(of(line, s), "C08"));
}

TEST(Cautions, SeeThinLoadsSharedCavitiesAndBurstPressure) {
  Line line = sample::solved_line();
  Solution s = sample::solved();
  EXPECT_FALSE(raised(of(line, s), "C07"));
  s.cavities[0].bed = 0.4 * s.cavities[0].launched;
  EXPECT_TRUE(raised(of(line, s), "C07"));
  EXPECT_FALSE(raised(of(line, s), "C24"));
  s.topology.feeders[0] = {0, 1};
  EXPECT_TRUE(raised(of(line, s), "C24"));
  EXPECT_FALSE(raised(of(line, s), "C15"));
  s.answer.highest_overpressure = 2000;
  EXPECT_TRUE(raised(of(line, s), "C15"));
}

TEST(Cautions, WarnOfCondensationUnderTenKelvin) {
  Line line = sample::solved_line();
  Solution s = sample::solved();  // 12 K
  EXPECT_FALSE(raised(of(line, s), "C14"));
  s.air[0].exhaust_dew_point = 325;
  EXPECT_THAT(text(of(line, s), "C14"), HasSubstr("5.0 K below"));
  line.surfaces.clear();
  EXPECT_THAT(text(of(line, s), "C14"), HasSubstr("unknown"));
}

TEST(Cautions, PrintTheQuantitiesUsedOutsideTheirData) {
  Solution s = sample::solved();
  EXPECT_FALSE(raised(of(sample::solved_line(), s), "C27"));
  s.evidence[0].flags = flag::extrapolated;
  EXPECT_THAT(text(of(sample::solved_line(), s), "C27"), HasSubstr("permittivity"));
}

// 47 CFR 18.301: 915 +- 13 MHz; ITU Radio Regulations No. 5.150 for the rest.
TEST(RadioBand, IsNeverASilentYes) {
  EXPECT_EQ(radio_band(915e6, "USA").status, BandStatus::listed);
  EXPECT_EQ(radio_band(902e6, "United States").status, BandStatus::listed);
  EXPECT_EQ(radio_band(930e6, "USA").status, BandStatus::unlisted);
  EXPECT_EQ(radio_band(915e6, "Norway").status, BandStatus::national);
  EXPECT_EQ(radio_band(896e6, "United Kingdom").status, BandStatus::national);
  EXPECT_EQ(radio_band(2450e6, "Norway").status, BandStatus::listed);
  EXPECT_EQ(radio_band(2450e6, "").status, BandStatus::unknown);
  EXPECT_EQ(radio_band(1300e6, "Norway").status, BandStatus::unlisted);
}

}  // namespace
}  // namespace lossline::verdict
