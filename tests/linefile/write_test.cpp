#include "planner/linefile/write.h"

#include <limits>

#include "small_line.h"

namespace lossline::linefile {
namespace {

std::string scenario(const std::string& name) {
  return LOSSLINE_SOURCE_DIR "/scenarios/" + name + ".toml";
}

const std::vector<std::string> names{"quillfen", "tarnwick", "ostrevik", "velnarrow",
                                     "brackenmoor"};

/// Equal, or one step of a double apart where no decimal text of the unit hits the number.
void expect_same(double a, double b, const char* what) {
  EXPECT_LE(std::abs(a - b), 2 * std::numeric_limits<double>::epsilon() * std::abs(a)) << what;
}
void expect_same(const std::optional<double>& a, const std::optional<double>& b, const char* what) {
  ASSERT_EQ(a.has_value(), b.has_value()) << what;
  if (a) expect_same(*a, *b, what);
}

TEST(Write, WhatIsWrittenReadsBackToTheSameLine) {
  for (const std::string& name : names) {
    SCOPED_TRACE(name);
    const Line a = read(scenario(name)).line;
    const Line b = read_text(write(a), "written").line;
    EXPECT_EQ(a.name, b.name);
    EXPECT_EQ(a.note, b.note);
    expect_same(a.duty.feed_moisture, b.duty.feed_moisture, "feed moisture");
    expect_same(a.duty.feed_rate, b.duty.feed_rate, "feed rate");
    expect_same(a.duty.product_rate, b.duty.product_rate, "product rate");
    expect_same(a.duty.hours_per_year, b.duty.hours_per_year, "hours");
    EXPECT_EQ(a.product.material, b.product.material);
    EXPECT_EQ(a.product.kind, b.product.kind);
    EXPECT_EQ(a.product.contains_metal, b.product.contains_metal);
    const ProductOverrides &p = a.product.overrides, &q = b.product.overrides;
    EXPECT_EQ(p.provenance.evidence, q.provenance.evidence);
    EXPECT_EQ(p.provenance.source, q.provenance.source);
    expect_same(p.dry_heat_capacity, q.dry_heat_capacity, "heat capacity");
    expect_same(p.vapour_factor, q.vapour_factor, "vapour factor");
    ASSERT_EQ(p.sorption.has_value(), q.sorption.has_value());
    EXPECT_EQ(p.sorption->free_water, q.sorption->free_water);
    expect_same(p.sorption->oswin_scale, q.sorption->oswin_scale, "Oswin scale");
    ASSERT_EQ(p.cure.has_value(), q.cure.has_value());
    if (p.cure) expect_same(p.cure->activation_energy, q.cure->activation_energy, "activation");
    ASSERT_EQ(p.permittivity.size(), q.permittivity.size());
    for (std::size_t i = 0; i < p.permittivity.size(); ++i) {
      EXPECT_EQ(p.permittivity[i].eps, q.permittivity[i].eps);
      expect_same(p.permittivity[i].temperature, q.permittivity[i].temperature, "temperature");
    }
    EXPECT_EQ(a.belt.eps, b.belt.eps);
    EXPECT_EQ(a.belt.eps_provenance.evidence, b.belt.eps_provenance.evidence);
    expect_same(a.belt.speed, b.belt.speed, "speed");
    expect_same(a.feed.depth, b.feed.depth, "depth");
    expect_same(a.feed.piece_rate, b.feed.piece_rate, "piece rate");
    ASSERT_EQ(a.stretches.size(), b.stretches.size());
    for (std::size_t i = 0; i < a.stretches.size(); ++i) {
      EXPECT_EQ(a.stretches[i].name, b.stretches[i].name);
      EXPECT_EQ(a.stretches[i].kind, b.stretches[i].kind);
      EXPECT_EQ(a.stretches[i].air, b.stretches[i].air);
      EXPECT_EQ(a.stretches[i].launchers, b.stretches[i].launchers);
      expect_same(a.stretches[i].length, b.stretches[i].length, "length");
      expect_same(a.stretches[i].width, b.stretches[i].width, "width");
      expect_same(a.stretches[i].mixing, b.stretches[i].mixing, "mixing");
    }
    ASSERT_TRUE(b.inlet_trap && b.outlet_trap);
    expect_same(a.inlet_trap->opening.height, b.inlet_trap->opening.height, "opening");
    EXPECT_EQ(a.outlet_trap->name, b.outlet_trap->name);
    ASSERT_EQ(a.generators.size(), b.generators.size());
    for (std::size_t i = 0; i < a.generators.size(); ++i) {
      expect_same(a.generators[i].set_point, b.generators[i].set_point, "set point");
      expect_same(a.generators[i].minimum_stable, b.generators[i].minimum_stable, "minimum");
      ASSERT_EQ(a.generators[i].feeds.size(), b.generators[i].feeds.size());
      for (std::size_t k = 0; k < a.generators[i].feeds.size(); ++k) {
        EXPECT_EQ(a.generators[i].feeds[k].stretch, b.generators[i].feeds[k].stretch);
        expect_same(a.generators[i].feeds[k].share, b.generators[i].feeds[k].share, "share");
      }
      expect_same(a.generators[i].run.width, b.generators[i].run.width, "run");
    }
    ASSERT_EQ(a.air.size(), b.air.size());
    for (std::size_t i = 0; i < a.air.size(); ++i) {
      EXPECT_EQ(a.air[i].pattern, b.air[i].pattern);
      EXPECT_EQ(a.air[i].heat_source, b.air[i].heat_source);
      expect_same(a.air[i].heater_efficiency, b.air[i].heater_efficiency, "heater");
      expect_same(a.air[i].supply_temperature, b.air[i].supply_temperature, "supply");
    }
    ASSERT_EQ(a.surfaces.size(), b.surfaces.size());
    expect_same(a.limits.product_temperature, b.limits.product_temperature, "limit");
    expect_same(a.limits.heating_rate, b.limits.heating_rate, "limit");
    expect_same(a.prices.electricity, b.prices.electricity, "price");
  }
}

// Every key goes the same way through one description, so a text that is stable says that each
// value written was also read.
TEST(Write, WritingWhatWasReadGivesTheSameText) {
  for (const std::string& name : names) {
    const std::string once = write(read(scenario(name)).line);
    EXPECT_EQ(write(read_text(once, "written").line), once) << name;
  }
}

TEST(Write, KeepsWhatTheScenariosDoNotUse) {
  Line line = read_text(small_line, "test.toml").line;
  line.note = "a \"quoted\"\nnote \\ with a tab\t";
  line.stretches[0].passage = Opening{1.3, 0.2};
  line.stretches[0].belt_height_share = 0.4;
  line.air[0].takes_from = "";
  line.solve.balance = Balance::constant_share;
  line.solve.load_share = 0.8;
  line.prices = {"EUR", 140 / 3.6e9, std::nullopt};
  const Line back = read_text(write(line), "written").line;
  EXPECT_EQ(back.note, line.note);
  ASSERT_TRUE(back.stretches[0].passage.has_value());
  EXPECT_EQ(back.stretches[0].passage->height, 0.2);
  EXPECT_EQ(back.stretches[0].belt_height_share, 0.4);
  EXPECT_EQ(back.solve.balance, Balance::constant_share);
  EXPECT_EQ(back.solve.load_share, 0.8);
  EXPECT_EQ(back.prices.currency, "EUR");
  EXPECT_EQ(back.prices.electricity, line.prices.electricity);
}

}  // namespace
}  // namespace lossline::linefile
