// Cautions about the field: what leaves, what comes back, what stands in it.

#include <fmt/format.h>

#include <algorithm>
#include <optional>

#include "planner/base/constants.h"
#include "planner/field/openings.h"
#include "planner/verdict/caution_rules.h"
#include "planner/verdict/outside_field.h"

namespace lossline::verdict {
namespace {

double half_wavelength(double frequency) {
  return speed_of_light / frequency / 2;
}

double highest_frequency(const Line& line) {
  double f = 0;
  for (const Generator& g : line.generators) f = std::max(f, g.frequency);
  return f;
}

const EndTrap* trap_named(const Line& line, const std::string& name) {
  for (const auto* trap : {&line.inlet_trap, &line.outlet_trap})
    if (*trap && (*trap)->name == name) return &**trap;
  return nullptr;
}

void add_leakage(const CautionCase& c, std::vector<Caution>& out) {
  std::string where, estimate;
  for (const EndReport& end : c.solution.ends) {
    const EndTrap* trap = trap_named(c.line, end.name);
    if (trap == nullptr) continue;
    const std::optional<OutsideField> outside = outside_field(*trap, end);
    if (!outside) continue;
    estimate += fmt::format(
        "; estimate at {}: {} the strictest level of {:.3g} W/m2 (band {:.1e} "
        "to {:.1e} W/m2 at 5 cm, levels unverified)",
        end.name, outside->word, outside->level, outside->low, outside->high);
    if (outside->word != "below") where += (where.empty() ? "" : ", ") + end.name;
  }
  out.push_back({"C01", "Leakage",
                 "nothing here is a measurement: survey on site with a calibrated meter at the "
                 "stated distance, with product and empty, at every opening height" +
                     estimate,
                 where, deciding("IEC 60519-6 and the exposure rules"), where.empty()});
}

/// The product as a wave path, and openings too wide for their height to help.
void add_openings(const CautionCase& c, std::vector<Caution>& out) {
  const double frequency = highest_frequency(c.line);
  const bool continuous = c.line.product.kind != ProductKind::pieces;
  const double depth = c.solution.answer.flow.depth;
  for (const auto* trap : {&c.line.inlet_trap, &c.line.outlet_trap}) {
    if (!*trap) continue;
    const EndTrap& t = **trap;
    const double filled = t.opening.height > 0 ? depth / t.opening.height : 0.0;
    if (continuous || filled > filled_opening_share)
      out.push_back({"C02", "Product as wave path",
                     fmt::format("the product fills {:.0f} % of the opening's height{}: it can "
                                 "carry power out as a guide; probe along the load itself and keep "
                                 "the reach distance",
                                 100 * filled, continuous ? " and runs through without a gap" : ""),
                     t.name, deciding("IEC 60519-6"), false});
    const double widest = std::max(t.opening.width, t.opening.height);
    if (frequency > 0 && widest > 0 && field::wide_slot(frequency, widest, widest))
      out.push_back(
          {"C02b", "Wide opening",
           fmt::format(
               "{:.0f} mm is wider than half a wavelength ({:.0f} mm at 2450 MHz, {:.0f} mm "
               "at 915 MHz), so a low height holds nothing back: the reflective and "
               "absorbing sections must, with product in place; guaranteed by: {}",
               1000 * widest, 1000 * half_wavelength(2450e6), 1000 * half_wavelength(915e6),
               t.guaranteed_by.empty() ? "nobody yet" : t.guaranteed_by),
           t.name, deciding("IEC 60519-6"), false});
  }
}

/// Lowest temperature limit that holds at a moisture [K]; none when no limit is known.
std::optional<double> temperature_limit(const CautionCase& c, double moisture) {
  std::optional<double> limit = c.line.limits.product_temperature;
  for (const ProductLimit& l : c.card.limits) {
    if (l.kind != LimitKind::product_temperature && l.kind != LimitKind::runaway_temperature)
      continue;
    if ((l.moisture_from && moisture < *l.moisture_from) ||
        (l.moisture_to && moisture > *l.moisture_to))
      continue;
    if (!limit || l.value < *limit) limit = l.value;
  }
  return limit;
}

/// How long the product bears a stopped belt: shortest time along the belt from its state to the
/// limit there, power on, no evaporation.
std::string halt_text(const CautionCase& c) {
  std::string unknown = "how long the product bears the power is unknown";
  const ProductFlow& flow = c.solution.answer.flow;
  if (!c.card.dry_heat_capacity || !(flow.speed > 0)) return unknown;
  std::optional<double> shortest;
  double limit = 0;
  for (const Station& s : c.solution.profile) {
    const std::optional<double> here = temperature_limit(c, s.moisture);
    if (!here || !(s.product_power > 0)) continue;
    const double capacity =
        flow.dry_solids / flow.speed * (c.card.dry_heat_capacity->value + 4190.0 * s.moisture);
    const double seconds = (*here - s.temperature) * capacity / s.product_power;
    if (shortest && seconds >= *shortest) continue;
    shortest = seconds;
    limit = *here;
  }
  if (!shortest) return unknown;
  if (*shortest <= 0) return "the product is beyond a temperature limit even while it moves";
  return fmt::format(
      "with power on and no evaporation the product's mean reaches {:.0f} degC in "
      "about {:.0f} s, hot spots sooner",
      limit - celsius_zero, *shortest);
}

void add_power_cautions(const CautionCase& c, std::vector<Caution>& out) {
  out.push_back({"C06", "Belt stop",
                 halt_text(c) + ": power off on loss of belt motion must be hard-wired, apart from "
                                "the control software; keep extraction running",
                 "", deciding("ISO 12100, ISO 13849-1"), false});
  std::string thin, reflected;
  for (const CavityReport& cavity : c.solution.cavities)
    if (cavity.launched > 0 && cavity.bed < thin_load_share * cavity.launched)
      thin += (thin.empty() ? "" : ", ") + cavity.name;
  for (const Margin& m : c.margins.all)
    if (m.name == "reflected over output" && m.standing != Standing::within)
      reflected += (reflected.empty() ? "" : ", ") + m.where;
  if (!thin.empty() || !reflected.empty()) {
    std::string why;
    if (!thin.empty()) why = "less than half of the launched power is in the product in " + thin;
    if (!reflected.empty())
      why += (why.empty() ? "" : "; ") +
             ("reflected power is near its limit or has none stated at " + reflected);
    out.push_back({"C07", "Thin or missing load",
                   why + ": interlock power to product presence and reflected power; isolator and "
                         "water load sized for full reflection",
                   thin.empty() ? reflected : thin, deciding("the generator supplier's data sheet"),
                   false});
  }
  for (std::size_t i = 0; i < c.solution.topology.cavities.size(); ++i) {
    if (c.solution.topology.feeders[i].size() < 2) continue;
    const std::string& name = c.line.stretches[c.solution.topology.cavities[i]].name;
    out.push_back({"C24", "Crosstalk",
                   fmt::format("{} generators share this cavity: each one's reflected reading "
                               "includes its neighbours' power",
                               c.solution.topology.feeders[i].size()),
                   name, deciding("the generator supplier's data sheet"), false});
  }
}

}  // namespace

void add_field_cautions(const CautionCase& c, std::vector<Caution>& out) {
  add_leakage(c, out);
  add_openings(c, out);
  add_power_cautions(c, out);
}

}  // namespace lossline::verdict
