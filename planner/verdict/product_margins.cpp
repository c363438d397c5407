// Limits of the product: temperature, rates, pressure, moisture, cure, heat per mass and area.

#include <algorithm>
#include <cmath>
#include <functional>

#include "planner/verdict/margin_rules.h"

namespace lossline::verdict {
namespace {

struct Peak {
  double value = 0, x = 0;
  std::size_t stretch = 0;
};

/// Moisture range a limit holds in; open ends mean any.
struct Range {
  std::optional<double> from, to;
  [[nodiscard]] bool holds(double X) const { return (!from || X >= *from) && (!to || X <= *to); }
};

/// The highest value along the belt where the range holds; none when it holds nowhere.
std::optional<Peak> peak(const Case& c, const std::function<double(const Station&)>& what,
                         const Range& range) {
  std::optional<Peak> best;
  for (const Station& s : c.solution.profile) {
    if (!range.holds(s.moisture)) continue;
    const double v = what(s);
    if (!best || !(v <= best->value)) best = Peak{v, s.x, s.stretch};
  }
  return best;
}

struct Rule {
  const char* name;
  Measure measure;
  std::function<double(const Station&)> what;
};

double wet_mass_per_length(const Case& c, const Station& s) {
  const ProductFlow& flow = c.solution.answer.flow;
  return flow.speed > 0 ? flow.dry_solids * (1 + s.moisture) / flow.speed : 0.0;
}

void add_peak(const Case& c, const Rule& rule, double limit, const Range& range,
              const std::string& origin, const std::string& reason, std::vector<Margin>& out) {
  Margin m;
  m.name = origin == "card" ? std::string(rule.name) + ", card" : rule.name;
  m.origin = origin;
  m.reason = reason;
  m.measure = rule.measure;
  m.limit = limit;
  if (c.solved()) {
    const std::optional<Peak> found = peak(c, rule.what, range);
    if (!found) return;  // the product is never in the moisture range the limit is about
    m.value = found->value;
    m.x = found->x;
    m.where = c.stretch_name(found->stretch);
  }
  out.push_back(judged(std::move(m)));
}

const Rule temperature{"product temperature", Measure::temperature,
                       [](const Station& s) { return s.temperature; }};
const Rule heating{"heating rate", Measure::heating_rate,
                   [](const Station& s) { return s.heating_rate; }};
const Rule drying{"drying rate", Measure::drying_rate,
                  [](const Station& s) { return s.drying_rate; }};
const Rule overpressure{"overpressure inside", Measure::pressure,
                        [](const Station& s) { return s.overpressure; }};

void add_field(const Case& c, double limit, const std::string& origin, const std::string& reason,
               std::vector<Margin>& out) {
  Margin m;
  m.name = origin == "card" ? "field in cavity, card" : "field in cavity, mean rms";
  m.origin = origin;
  m.reason = reason;
  m.measure = Measure::field;
  m.limit = limit;
  for (const CavityReport& cavity : c.solution.cavities) {
    const double field = std::max(cavity.field_above, cavity.field_below);
    if (!(field > 0) || (m.value && field <= *m.value)) continue;
    m.value = field;
    m.where = cavity.name;
  }
  if (!m.value) m.reason = "no field was calculated";
  out.push_back(judged(std::move(m)));
}

void add_line_limits(const Case& c, std::vector<Margin>& out) {
  const Limits& limits = c.line.limits;
  const Solution& s = c.solution;
  const std::string origin = "line file";
  auto add = [&](const Rule& rule, const std::optional<double>& limit, const Range& range = {}) {
    if (limit) add_peak(c, rule, *limit, range, origin, "", out);
  };
  add(temperature, limits.product_temperature);
  add(heating, limits.heating_rate, {limits.heating_rate_above_moisture, std::nullopt});
  add(drying, limits.drying_rate);
  add(overpressure, limits.overpressure);
  add({"heat per wet mass", Measure::specific_power,
       [&](const Station& p) {
         const double mass = wet_mass_per_length(c, p);
         return mass > 0 ? p.product_power / mass : 0.0;
       }},
      limits.specific_power);
  const double covered = s.answer.flow.width * s.answer.flow.coverage;
  add({"heat per covered belt area", Measure::areal_power,
       [&](const Station& p) { return covered > 0 ? p.product_power / covered : 0.0; }},
      limits.areal_power);
  if (limits.field_strength) add_field(c, *limits.field_strength, origin, "", out);
}

void add_card_limits(const Case& c, std::vector<Margin>& out) {
  for (const ProductLimit& limit : c.card.limits) {
    const Range range{limit.moisture_from, limit.moisture_to};
    auto add = [&](const Rule& rule) {
      add_peak(c, rule, limit.value, range, "card", limit.reason, out);
    };
    switch (limit.kind) {
      case LimitKind::product_temperature:
        add(temperature);
        break;
      case LimitKind::runaway_temperature:
        add({"self-heating temperature", Measure::temperature, temperature.what});
        break;
      case LimitKind::internal_pressure:
        add(overpressure);
        break;
      case LimitKind::heating_rate:
        add(heating);
        break;
      case LimitKind::drying_rate:
        add(drying);
        break;
      case LimitKind::field_strength:
        add_field(c, limit.value, "card", limit.reason, out);
        break;
      case LimitKind::final_moisture_low: {
        Margin m;
        m.name = "final moisture, card";
        m.origin = "card";
        m.reason = limit.reason;
        m.measure = Measure::moisture;
        m.at_least = true;
        m.limit = limit.value;
        m.value = c.solution.answer.final_moisture_low;
        m.where = "outlet";
        out.push_back(judged(std::move(m)));
        break;
      }
    }
  }
}

void add_outcome(const Case& c, const char* name, Measure measure, double value, double limit,
                 bool at_least, double reserve, const char* origin, std::vector<Margin>& out) {
  Margin m;
  m.name = name;
  m.origin = origin;
  m.measure = measure;
  m.at_least = at_least;
  m.value = value;
  m.limit = limit;
  m.reserve = reserve;
  m.where = "outlet";
  if (!c.solved()) m.value.reset();
  out.push_back(judged(std::move(m)));
}

void add_outcomes(const Case& c, std::vector<Margin>& out) {
  const Duty& duty = c.line.duty;
  const Limits& limits = c.line.limits;
  const Answer& answer = c.solution.answer;
  if (duty.target_moisture && duty.moisture_tolerance) {
    // Two-sided: the nearer edge counts, and its reserve is a tenth of the tolerance.
    const double target = *duty.target_moisture, tolerance = *duty.moisture_tolerance;
    const bool dry = answer.final_moisture < target;
    add_outcome(c, dry ? "final moisture, low edge" : "final moisture, high edge",
                Measure::moisture, answer.final_moisture,
                dry ? target - tolerance : target + tolerance, dry, relative_reserve * tolerance,
                "duty", out);
  } else if (duty.target_moisture) {
    add_outcome(c, "final moisture", Measure::moisture, answer.final_moisture,
                *duty.target_moisture, false, 0, "duty", out);
  }
  if (limits.moisture_low)
    add_outcome(c, "final moisture, driest", Measure::moisture, answer.final_moisture_low,
                *limits.moisture_low, true, 0, "line file", out);
  if (limits.moisture_high)
    add_outcome(c, "final moisture, wettest", Measure::moisture, answer.final_moisture_high,
                *limits.moisture_high, false, 0, "line file", out);
  if (duty.target_cure)
    add_outcome(c, "degree of cure", Measure::cure, answer.degree_of_cure, *duty.target_cure, true,
                0, "duty", out);
  if (limits.cure_high)
    add_outcome(c, "degree of cure, highest", Measure::cure, answer.degree_of_cure,
                *limits.cure_high, false, 0, "line file", out);
}

}  // namespace

void add_product_margins(const Case& c, std::vector<Margin>& out) {
  add_line_limits(c, out);
  add_card_limits(c, out);
  add_outcomes(c, out);
}

}  // namespace lossline::verdict
