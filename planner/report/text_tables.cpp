// The tables of the text page: power, stretches, cavities, air.

#include <fmt/format.h>

#include <algorithm>
#include <map>

#include "planner/report/text_parts.h"
#include "planner/report/trace.h"

namespace lossline::report {
namespace {

constexpr int trace_columns = 56, bar_columns = 30;

std::string kilowatts(double watts) {
  return fmt::format("{:.1f}", 1e-3 * watts);
}

std::string percent(double part, double whole) {
  return whole > 0 ? fmt::format("{:.1f}", 100 * part / whole) : std::string("-");
}

const char* kind_word(StretchKind kind) {
  switch (kind) {
    case StretchKind::microwave:
      return "microwave";
    case StretchKind::air:
      return "air";
    case StretchKind::rest:
      return "rest";
    case StretchKind::cooling:
      break;
  }
  return "cooling";
}

const CavityReport* cavity_of(const Solution& s, std::size_t stretch) {
  for (const CavityReport& c : s.cavities)
    if (c.stretch == stretch) return &c;
  return nullptr;
}

const Station* last_station(const Solution& s, std::size_t stretch) {
  const Station* last = nullptr;
  for (const Station& station : s.profile)
    if (station.stretch == stretch) last = &station;
  return last;
}

/// Moisture and temperature along the belt, with the cavities marked beneath.
std::string traces(const Page& page, const Setting& set) {
  const std::vector<Station>& profile = page.solution.profile;
  std::vector<double> x, moisture, temperature;
  double hottest = profile.front().temperature;
  for (const Station& s : profile) {
    x.push_back(s.x);
    moisture.push_back(s.moisture);
    temperature.push_back(s.temperature);
    hottest = std::max(hottest, s.temperature);
  }
  auto T = [&](double kelvin) {
    return fmt::format("{:.0f}", in_unit(Shown::temperature, kelvin, set.units));
  };
  std::string marks;
  const double length = x.back() - x.front();
  for (int i = 0; i < trace_columns && length > 0; ++i) {
    double where = length * (i + 0.5) / trace_columns;
    StretchKind kind = StretchKind::rest;
    for (const Stretch& stretch : page.line.stretches) {
      kind = stretch.kind;
      if (where < stretch.length) break;
      where -= stretch.length;
    }
    marks += kind == StretchKind::microwave ? '~' : (kind == StretchKind::air ? 'a' : '.');
  }
  std::string out =
      fmt::format("moisture     {}  {} to {} db\n", trace(x, moisture, trace_columns, set.unicode),
                  moisture_figures(moisture.front()), moisture_figures(moisture.back()));
  out += fmt::format("temperature  {}  {} to {}, highest {} {}\n",
                     trace(x, temperature, trace_columns, set.unicode), T(temperature.front()),
                     T(temperature.back()), T(hottest), unit_name(Shown::temperature, set));
  return out + "             " + marks + "  ~ cavity, a air; power in kW\n";
}

}  // namespace

std::string power_section(const Page& page, const Setting& set) {
  const PowerLedger& p = page.solution.power;
  std::string out =
      fmt::format("{:<28}{:>9}{:>12}{:>14}\n", "Power", "kW", "% of mains", "% of output");
  auto row = [&](const char* name, double watts, bool after_output, bool always = false) {
    if (watts == 0 && !always) return;
    out += fmt::format("  {:<26}{:>9}{:>12}{:>14}  {}\n", name, kilowatts(watts),
                       percent(watts, p.mains), after_output ? percent(watts, p.forward) : "",
                       bar(p.mains > 0 ? watts / p.mains : 0, bar_columns, set.unicode));
  };
  const bool constant = page.solution.balance == Balance::constant_share;
  row("lost in supplies", p.supply_loss, false);
  row("lost in tubes", p.tube_loss, false);
  row("lost in runs", p.run_loss, true);
  row("reflected to generators", p.reflected, true);
  row("into the product", p.bed, true, p.forward > 0);
  row("into the belt", p.belt, true);
  row("into the walls", p.walls, true);
  row("through the ends", p.ends, true);
  row(constant ? "not assigned" : "other", p.other, true);
  row("air heating, electric", p.mains - p.generator_mains - p.fans, false);
  row("fans", p.fans, false);
  out += fmt::format("  {:<26}{:>9}{:>12}", "mains in all", kilowatts(p.mains),
                     percent(p.mains, p.mains));
  if (p.forward > 0) out += fmt::format("   generator output {} kW", kilowatts(p.forward));
  out += '\n';
  if (p.fuel > 0)
    out += fmt::format("  {:<26}{:>9}   bought beside the mains\n", "gas or steam for air",
                       kilowatts(p.fuel));
  return out;
}

std::string stretch_section(const Page& page, const Setting& set) {
  const Solution& s = page.solution;
  std::string out = fmt::format("{:<14} {:<9} {:>7} {:>7} {:>8} {:>10} {:>9} {:>9} {:>8} {:>8}\n",
                                "Stretch", "", unit_name(Shown::length, set), "min", "db out",
                                unit_name(Shown::temperature, set) + " out", "launched", "product",
                                "of it", "returned");
  const double speed = s.answer.flow.speed;
  for (std::size_t i = 0; i < page.line.stretches.size(); ++i) {
    const Stretch& stretch = page.line.stretches[i];
    std::string row =
        fmt::format("{} {:<9} {:>7} {:>7}", cut(stretch.name, 14), kind_word(stretch.kind),
                    figures(in_unit(Shown::length, stretch.length, set.units)),
                    speed > 0 ? figures(stretch.length / speed / 60) : "-");
    if (const Station* end = last_station(s, i))
      row += fmt::format(" {:>8} {:>10.1f}", moisture_figures(end->moisture),
                         in_unit(Shown::temperature, end->temperature, set.units));
    if (const CavityReport* c = cavity_of(s, i))
      row += fmt::format(" {:>9} {:>9} {:>7}% {:>8}", kilowatts(c->launched), kilowatts(c->bed),
                         percent(c->bed, c->launched),
                         s.balance == Balance::full ? kilowatts(c->returned) : "-");
    out += row + '\n';
  }
  if (s.profile.size() > 1) out += traces(page, set);
  return out;
}

std::string cavity_section(const Page& page, const Setting& set) {
  const Solution& s = page.solution;
  std::string out =
      fmt::format("{:<16} {:>7} {:>12} {:>8} {:>8} {:>8} {:>11} {:>8} {:>10}\n", "Cavity", "MHz",
                  "field, kV/m", "product", "unmixed", "mixed", "uneven", "modes", "hot spots");
  std::map<std::pair<field::ValidityGrade, field::ValidityKind>, std::vector<const CavityReport*>>
      notes;
  bool fed_by_neighbour = false;
  for (const CavityReport& c : s.cavities) {
    out += fmt::format(
        "{} {:>7.5g} {:>5} /{:>5} {:>7}% {:>7}% {:>7}% {:>11} {:>8} {:>10}\n", cut(c.name, 16),
        1e-6 * c.frequency, figures(1e-3 * c.field_above, 2), figures(1e-3 * c.field_below, 2),
        percent(c.bed, c.launched), figures(100 * c.share_unmixed), figures(100 * c.share_mixed),
        fmt::format("{} to {} %", figures(100 * c.uneven_low, 2), figures(100 * c.uneven_high, 2)),
        figures(c.modal_overlap, 2), with_unit(Shown::small_length, c.hot_spot_pitch, set));
    for (const field::ValidityFlag& flag : c.validity) notes[{flag.grade, flag.kind}].push_back(&c);
    fed_by_neighbour = fed_by_neighbour || c.bed > c.launched;
  }
  out +=
      "  field above / below the belt; product: share of launched power, also without and with "
      "mixing\n";
  if (fed_by_neighbour) out += "  above 100 %: power came over from a neighbour cavity\n";
  // One caution often holds for all cavities alike: the first one's numbers stand for them.
  for (const auto& [key, cavities] : notes) {
    std::string names, sentence;
    for (const CavityReport* c : cavities) names.append(names.empty() ? "" : ", ").append(c->name);
    for (const field::ValidityFlag& flag : cavities.front()->validity)
      if (flag.kind == key.second && flag.grade == key.first) sentence = flag.sentence;
    out += wrapped("  ! ", names.append(": ").append(sentence), 4);
  }
  return out;
}

std::string air_section(const Page& page, const Setting& set) {
  std::string out = fmt::format("{:<16} {:>9} {:>9} {:>10} {:>10} {:>10} {:>6} {:>9} {:>10}\n",
                                "Air loop", unit_name(Shown::mass_rate, set), "fresh",
                                unit_name(Shown::temperature, set) + " in", "out", "kg/kg out",
                                "rh %", "dew point", "heater kW");
  auto T = [&](double kelvin) {
    return fmt::format("{:.1f}", in_unit(Shown::temperature, kelvin, set.units));
  };
  auto flow = [&](double kg_per_s) {
    return fmt::format("{:.0f}", in_unit(Shown::mass_rate, kg_per_s, set.units));
  };
  for (const AirReport& a : page.solution.air)
    out += fmt::format("{} {:>9} {:>9} {:>10} {:>10} {:>10.4f} {:>6.0f} {:>9} {:>10}{}\n",
                       cut(a.name, 16), flow(a.dry_air_flow), flow(a.fresh_air_flow),
                       T(a.supply_temperature), T(a.exhaust_temperature), a.exhaust_humidity,
                       100 * a.exhaust_relative_humidity, T(a.exhaust_dew_point),
                       kilowatts(a.heater_duty), a.fog ? " fog" : "");
  return out;
}

}  // namespace lossline::report
