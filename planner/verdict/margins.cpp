#include "planner/verdict/margins.h"

#include <algorithm>
#include <cmath>
#include <limits>

#include "planner/verdict/margin_rules.h"

namespace lossline::verdict {

const char* standing_word(Standing standing) {
  switch (standing) {
    case Standing::within:
      return "within";
    case Standing::near:
      return "near";
    case Standing::beyond:
      return "beyond";
    case Standing::unknown:
      break;
  }
  return "unknown";
}

const char* measure_unit(Measure measure) {
  switch (measure) {
    case Measure::temperature:
    case Measure::temperature_step:
      return "K";
    case Measure::moisture:
      return "kg/kg_db";
    case Measure::drying_rate:
      return "1/s_db";
    case Measure::heating_rate:
      return "K/s";
    case Measure::pressure:
      return "Pa";
    case Measure::power:
      return "W";
    case Measure::specific_power:
      return "W/kg";
    case Measure::areal_power:
      return "W/m2";
    case Measure::field:
      return "V/m";
    case Measure::specific_energy:
      return "J/kg";
    case Measure::share:
    case Measure::cure:
    case Measure::none:
      break;
  }
  return "1";
}

bool dries(const Solution& solution) {
  return solution.answer.evaporated > 0.01 * solution.answer.product_rate;
}

double Margin::relative() const {
  if (!margin) return std::numeric_limits<double>::infinity();
  return *margin / std::max(reserve, 1e-300);
}

std::size_t Margins::count(Standing standing) const {
  return static_cast<std::size_t>(std::count_if(
      all.begin(), all.end(), [&](const Margin& m) { return m.standing == standing; }));
}

std::string Case::stretch_name(std::size_t stretch) const {
  return stretch < line.stretches.size() ? line.stretches[stretch].name : std::string();
}

double usual_reserve(Measure measure, double limit) {
  switch (measure) {
    case Measure::temperature:
    case Measure::temperature_step:
      return temperature_reserve;
    case Measure::cure:
      return std::max(relative_reserve * (1 - limit), 1e-3);
    default:
      return relative_reserve * std::abs(limit);
  }
}

Margin judged(Margin m) {
  m.standing = Standing::unknown;
  m.margin.reset();
  if (!m.value || !m.limit || !std::isfinite(*m.value) || !std::isfinite(*m.limit)) {
    if (m.value && !std::isfinite(*m.value)) m.value.reset();
    return m;
  }
  const double room = m.at_least ? *m.value - *m.limit : *m.limit - *m.value;
  m.margin = room;
  if (!(m.reserve > 0)) m.reserve = usual_reserve(m.measure, *m.limit);
  if (room >= m.reserve)
    m.standing = Standing::within;
  else
    m.standing = room >= 0 ? Standing::near : Standing::beyond;
  return m;
}

Margins margins(const Line& line, const ProductCard& card, const Solution& solution) {
  Margins out;
  const Case c{line, card, solution};
  add_product_margins(c, out.all);
  add_plant_margins(c, out.all);
  if (!c.solved()) {
    for (Margin& m : out.all) {
      if (m.origin == "plan") continue;  // does not rest on the solution
      m.margin.reset();
      m.value.reset();
      m.standing = Standing::unknown;
      m.reason = "the line was not solved";
    }
  }
  auto rank = [](const Margin& m) {
    if (m.standing == Standing::unknown) return std::numeric_limits<double>::infinity();
    return m.margin ? m.relative() : -std::numeric_limits<double>::max();
  };
  std::stable_sort(out.all.begin(), out.all.end(),
                   [&](const Margin& a, const Margin& b) { return rank(a) < rank(b); });
  for (std::size_t i = 0; i < out.all.size() && !out.binding; ++i)
    if (out.all[i].margin) out.binding = i;
  return out;
}

}  // namespace lossline::verdict
