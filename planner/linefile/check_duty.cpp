#include <fmt/format.h>

#include <array>

#include "planner/linefile/checks.h"

namespace lossline::linefile {
namespace {

namespace q = quantity;

std::string both_bases(double X) {
  return fmt::format("{} ({:.4g} % wb)", shown(X, q::moisture), 100 * X / (1 + X));
}

void check_targets(Checker& c) {
  const Duty& duty = c.line.duty;
  if (duty.target_moisture && c.sound({"duty.target_moisture", "duty.feed_moisture"}) &&
      !(*duty.target_moisture <= duty.feed_moisture))
    c.report("duty.target_moisture",
             fmt::format("the product would leave with {} and enters with {}",
                         both_bases(*duty.target_moisture), both_bases(duty.feed_moisture)),
             "a dryer takes water out and puts none in");
  if (duty.target_cure && c.sound({"duty.target_cure", "duty.feed_cure"}) &&
      !(*duty.target_cure >= duty.feed_cure))
    c.report("duty.target_cure",
             fmt::format("the product would leave {} cured and enters {} cured",
                         shown(*duty.target_cure, q::share), shown(duty.feed_cure, q::share)),
             "cure does not run backwards");
  if (duty.moisture_tolerance && !duty.target_moisture && c.sound({"duty.target_moisture"}))
    c.report("duty.moisture_tolerance", "there is no target it could be a tolerance of",
             "give duty.target_moisture");
}

void check_limits(Checker& c) {
  const Limits& limits = c.line.limits;
  const Duty& duty = c.line.duty;
  if (limits.moisture_low && limits.moisture_high &&
      c.sound({"limits.moisture_low", "limits.moisture_high"}) &&
      !(*limits.moisture_low <= *limits.moisture_high))
    c.report("limits.moisture_low",
             fmt::format("the lowest final moisture is {} and the highest {}",
                         both_bases(*limits.moisture_low), both_bases(*limits.moisture_high)),
             "the lowest lies below the highest");
  if (duty.target_moisture && c.sound({"duty.target_moisture"})) {
    if (limits.moisture_low && c.sound({"limits.moisture_low"}) &&
        !(*duty.target_moisture >= *limits.moisture_low))
      c.report("limits.moisture_low",
               fmt::format("the target of {} is below it", both_bases(*duty.target_moisture)),
               "a line cannot keep a limit and miss it");
    if (limits.moisture_high && c.sound({"limits.moisture_high"}) &&
        !(*duty.target_moisture <= *limits.moisture_high))
      c.report("limits.moisture_high",
               fmt::format("the target of {} is above it", both_bases(*duty.target_moisture)),
               "a line cannot keep a limit and miss it");
  }
  if (limits.product_temperature &&
      c.sound({"limits.product_temperature", "duty.feed_temperature"}) &&
      !(*limits.product_temperature > duty.feed_temperature))
    c.report("limits.product_temperature",
             fmt::format("the product enters at {}", shown(duty.feed_temperature, q::temperature)),
             "the highest temperature lies above that of the feed");
  if (limits.cure_high && duty.target_cure && c.sound({"limits.cure_high", "duty.target_cure"}) &&
      !(*limits.cure_high >= *duty.target_cure))
    c.report("limits.cure_high",
             fmt::format("the target of {} is above it", shown(*duty.target_cure, q::share)),
             "a line cannot keep a limit and miss it");
  if (limits.heating_rate_above_moisture && !limits.heating_rate &&
      c.sound({"limits.heating_rate"}))
    c.report("limits.heating_rate_above_moisture", "there is no heating rate it could bound",
             "give limits.heating_rate");
}

/// Values that a file puts in place of the database's say how they came to be known.
void check_evidence(Checker& c) {
  static const std::array<std::string, 15> scalars{"dry_heat_capacity",
                                                   "dry_heat_capacity_slope",
                                                   "dry_bulk_density",
                                                   "dry_piece_density",
                                                   "solid_density",
                                                   "shrinkage",
                                                   "conductivity",
                                                   "conductivity_slope",
                                                   "diffusivity",
                                                   "diffusivity_activation",
                                                   "diffusivity_half_moisture",
                                                   "permeability",
                                                   "vapour_factor",
                                                   "saturation_moisture",
                                                   "heat_of_reaction"};
  const auto ask = [&](const std::string& table) {
    if (!c.given(table + ".evidence"))
      c.report(table + ".evidence", "is missing",
               "say how the values are known: measured, published, quoted, handbook, assumed or "
               "invented");
  };
  bool any = false;
  for (const std::string& key : scalars) any = any || c.given("product.override." + key);
  if (any) ask("product.override");
  if (c.given("product.permittivity")) ask("product.permittivity");
  if (c.given("belt.eps_real") || c.given("belt.loss_factor")) ask("belt");
}

}  // namespace

void check_duty(Checker& c) {
  check_targets(c);
  check_limits(c);
  check_evidence(c);
  if (c.line.solve.balance == Balance::full && c.given("solve.load_share") &&
      c.sound({"solve.balance"}))
    c.report("solve.load_share", "the cavity balance decides the share itself",
             "give balance = \"constant share\" or leave it out");
}

}  // namespace lossline::linefile
