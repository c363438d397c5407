// Limits of the plant: generators, condensation on named surfaces, the heat of evaporation as a
// floor, and what a document must settle before anything may be called within.

#include <algorithm>
#include <cmath>

#include "planner/verdict/margin_rules.h"

namespace lossline::verdict {
namespace {

void add_set_points(const Case& c, std::vector<Margin>& out) {
  for (const Generator& g : c.line.generators) {
    if (!(g.set_point > 0)) continue;
    Margin m;
    m.origin = "plan";
    m.measure = Measure::power;
    m.where = g.name;
    m.value = g.set_point;
    if (g.rated > 0) {
      m.name = "output under rating";
      m.limit = g.rated;
      out.push_back(judged(m));
    }
    if (g.minimum_stable > 0) {
      m.name = "output over least stable";
      m.limit = g.minimum_stable;
      m.at_least = true;
      out.push_back(judged(m));
    }
  }
}

void add_reflected(const Case& c, std::vector<Margin>& out) {
  std::string unlimited;
  const bool field = c.line.solve.balance == Balance::full;
  for (std::size_t i = 0; i < c.line.generators.size(); ++i) {
    const Generator& g = c.line.generators[i];
    if (!(g.set_point > 0)) continue;
    if (!g.reflected_limit) {
      unlimited += (unlimited.empty() ? "" : ", ") + g.name;
      continue;
    }
    Margin m;
    m.name = "reflected over output";
    m.origin = "generator";
    m.measure = Measure::share;
    m.where = g.name;
    m.limit = g.reflected_limit;
    if (field && i < c.solution.generators.size() && c.solution.generators[i].output > 0)
      m.value = c.solution.generators[i].reflected / c.solution.generators[i].output;
    else
      m.reason = "a constant share says nothing about reflected power";
    out.push_back(judged(std::move(m)));
  }
  if (!unlimited.empty()) {
    Margin m;
    m.name = "reflected over output";
    m.origin = "generator";
    m.measure = Measure::share;
    m.where = unlimited;
    m.reason = "no limit on reflected power is stated";
    out.push_back(judged(std::move(m)));
  }
}

void add_dew_points(const Case& c, std::vector<Margin>& out) {
  for (const Surface& surface : c.line.surfaces) {
    Margin m;
    m.name = "surface over dew point";
    m.origin = c.line.limits.dew_point_margin ? "line file" : "physics";
    m.measure = Measure::temperature_step;
    m.at_least = true;
    m.where = surface.name;
    m.limit = c.line.limits.dew_point_margin.value_or(0.0);
    for (const AirReport& air : c.solution.air)
      if (air.name == surface.air) m.value = surface.temperature - air.exhaust_dew_point;
    out.push_back(judged(std::move(m)));
  }
}

/// Heat that reached the product without being bought [W]: cure, product that leaves colder than
/// it came, and fresh or room air beyond what the heaters put in.
double credited_heat(const Solution& s) {
  double heaters = 0;
  for (const AirReport& air : s.air) heaters += air.heater_duty;
  const double cooled = s.product.sensible_solids + s.product.sensible_water;
  return std::max(s.product.reaction, 0.0) + std::max(-cooled, 0.0) +
         std::max(s.product.air - heaters, 0.0);
}

void add_energy_floor(const Case& c, std::vector<Margin>& out) {
  const Answer& answer = c.solution.answer;
  if (!dries(c.solution) || !(answer.energy_floor > 0)) return;
  const PowerLedger& power = c.solution.power;
  Margin m;
  m.name = "energy per water";
  m.origin = "physics";
  m.reason = "no water leaves for less; below it the inputs or the balance are wrong";
  m.measure = Measure::specific_energy;
  m.at_least = true;
  m.where = "whole line";
  m.limit = cool_evaporation_share * answer.energy_floor;
  // Common practice: mains to microwave is 0.70 to 0.86 at best; better than that is suspicious.
  m.reserve = answer.energy_floor / best_mains_to_microwave - *m.limit;
  m.value = (power.mains + power.fuel + credited_heat(c.solution)) / answer.evaporated;
  out.push_back(judged(std::move(m)));
}

/// A flammable vapour in a line with power on stays beyond until a document settles it.
void add_vapour(const Case& c, std::vector<Margin>& out) {
  if (c.line.product.flammable_vapour.empty() || c.line.generators.empty()) return;
  Margin m;
  m.name = "flammable vapour: " + c.line.product.flammable_vapour;
  m.origin = "plan";
  m.where = "whole line";
  m.reason =
      "not assessed here: needs release rate, flammable limit when hot, air flow, fan "
      "failure, start-up purge and the deciding document";
  m.standing = Standing::beyond;
  out.push_back(std::move(m));
}

}  // namespace

void add_plant_margins(const Case& c, std::vector<Margin>& out) {
  add_set_points(c, out);
  add_reflected(c, out);
  add_dew_points(c, out);
  add_energy_floor(c, out);
  add_vapour(c, out);
}

}  // namespace lossline::verdict
