// [line], [duty], [limits], [solve], [prices] and the order of the tables.

#include <array>
#include <string>

#include "planner/linefile/keys.h"

namespace lossline::linefile {
namespace {

const std::array<std::string, 2> balances{"full", "constant share"};

void name_fields(Fields& f, Line& line) {
  const Line fresh;
  f.text("name", line.name, Need::required);
  f.text("note", line.note, Need::optional);
  f.optional("pressure", line.pressure, range::pressure, fresh.pressure);
  f.optional("room_temperature", line.room_temperature, range::room_temperature,
             fresh.room_temperature);
  f.optional("room_humidity", line.room_humidity, range::air_humidity, fresh.room_humidity);
}

void trap_table(Fields& ends, const char* key, std::optional<EndTrap>& trap) {
  EndTrap written = trap.value_or(EndTrap{});
  const bool there = ends.table(key, trap.has_value(), Need::optional,
                                [&](Fields& f) { end_trap_fields(f, written); });
  if (ends.reading() && there) {
    written.name = key;
    trap = written;
  }
}

}  // namespace

void duty_fields(Fields& f, Duty& duty) {
  const Duty fresh;
  f.optional("feed_rate", duty.feed_rate, range::mass_flow);
  f.optional("product_rate", duty.product_rate, range::mass_flow);
  f.optional("dry_solids_rate", duty.dry_solids_rate, range::mass_flow);
  f.required("feed_moisture", duty.feed_moisture, range::moisture);
  f.required("feed_temperature", duty.feed_temperature, range::product_temperature);
  f.optional("feed_cure", duty.feed_cure, range::cure, fresh.feed_cure);
  f.optional("target_moisture", duty.target_moisture, range::moisture);
  f.optional("moisture_tolerance", duty.moisture_tolerance, range::moisture_difference);
  f.optional("target_cure", duty.target_cure, range::cure);
  f.optional("hours_per_year", duty.hours_per_year, range::yearly_hours);
  f.text("country", duty.country, Need::optional);
}

void limit_fields(Fields& f, Limits& limits) {
  f.optional("product_temperature", limits.product_temperature, range::limit_temperature);
  f.optional("heating_rate", limits.heating_rate, range::heating_rate);
  f.optional("heating_rate_above_moisture", limits.heating_rate_above_moisture, range::moisture);
  f.optional("drying_rate", limits.drying_rate, range::drying_rate);
  f.optional("moisture_low", limits.moisture_low, range::moisture);
  f.optional("moisture_high", limits.moisture_high, range::moisture);
  f.optional("specific_power", limits.specific_power, range::specific_power);
  f.optional("areal_power", limits.areal_power, range::areal_power);
  f.optional("dew_point_margin", limits.dew_point_margin, range::dew_point_margin);
  f.optional("overpressure", limits.overpressure, range::overpressure);
  f.optional("cure_high", limits.cure_high, range::cure);
  f.optional("field_strength", limits.field_strength, range::field_strength);
}

void solve_fields(Fields& f, SolveChoices& solve) {
  const SolveChoices fresh;
  f.choice("balance", balances, solve.balance, Need::optional);
  f.optional("load_share", solve.load_share, range::load_share, fresh.load_share);
}

void price_fields(Fields& f, Prices& prices) {
  f.text("currency", prices.currency, Need::optional);
  f.money(prices.currency);
  f.optional("electricity", prices.electricity, range::energy_price);
  f.optional("fuel", prices.fuel, range::energy_price);
}

void line_file_fields(Fields& f, Line& line) {
  f.table("line", true, Need::required, [&](Fields& t) { name_fields(t, line); });
  f.table("duty", true, Need::required, [&](Fields& t) { duty_fields(t, line.duty); });
  std::optional<ProductKind> kind;
  f.table("product", true, Need::required, [&](Fields& t) {
    if (product_fields(t, line.product)) kind = line.product.kind;
  });
  f.table("belt", true, Need::required, [&](Fields& t) { belt_fields(t, line.belt); });
  f.table("feed", true, Need::required, [&](Fields& t) { feed_fields(t, line.feed, kind); });
  f.list("stretch", line.stretches, Need::required, stretch_fields);
  f.table("endtrap", line.inlet_trap || line.outlet_trap, Need::optional, [&](Fields& ends) {
    trap_table(ends, "inlet", line.inlet_trap);
    trap_table(ends, "outlet", line.outlet_trap);
  });
  f.list("generator", line.generators, Need::optional, generator_fields);
  f.list("air", line.air, Need::optional, air_fields);
  f.list("surface", line.surfaces, Need::optional, surface_fields);
  f.table("limits", true, Need::optional, [&](Fields& t) { limit_fields(t, line.limits); });
  f.table("solve", line.solve.balance != Balance::full, Need::optional,
          [&](Fields& t) { solve_fields(t, line.solve); });
  f.table("prices", true, Need::optional, [&](Fields& t) { price_fields(t, line.prices); });
}

}  // namespace lossline::linefile
