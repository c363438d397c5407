// Cautions about the product: the dry end, metal, fire, vapour, pressure, hygiene, and data used
// outside the range it was measured in.

#include <fmt/format.h>

#include <algorithm>

#include "planner/verdict/caution_rules.h"
#include "planner/water/saturation_line.h"

namespace lossline::verdict {
namespace {

/// Overpressure from which a burst is worth a caution [Pa]. Own choice.
constexpr double worth_a_burst_caution = 1000;
/// Distance to boiling of the hottest product from which it is, too [K]. Own choice.
constexpr double near_boiling = 5;

/// A cavity in which the product heats faster and faster while less and less evaporates.
std::string unstable_dry_end(const CautionCase& c) {
  const std::vector<Station>& p = c.solution.profile;
  constexpr double rise = 1.02, fall = 0.98;
  constexpr double heat_of_evaporation = 2.3e6, counts = 0.05;  // of the heat, to matter at all
  for (std::size_t i = 0; i + 2 < p.size(); ++i) {
    const Station &a = p[i], &b = p[i + 1], &d = p[i + 2];
    if (a.stretch != d.stretch || a.stretch >= c.line.stretches.size()) continue;
    if (c.line.stretches[a.stretch].kind != StretchKind::microwave) continue;
    if (!(a.heating_rate > 0)) continue;
    if (!(a.evaporation * heat_of_evaporation > counts * a.product_power)) continue;
    if (b.heating_rate > rise * a.heating_rate && d.heating_rate > rise * b.heating_rate &&
        b.evaporation < fall * a.evaporation && d.evaporation < fall * b.evaporation)
      return c.line.stretches[a.stretch].name;
  }
  return "";
}

void add_state_cautions(const CautionCase& c, std::vector<Caution>& out) {
  const Answer& answer = c.solution.answer;
  if (const std::string where = unstable_dry_end(c); !where.empty())
    out.push_back({"C08", "Dry end",
                   "the product heats faster while less evaporates: lower the last power, even out "
                   "the air, end wetter, control on moisture or surface temperature",
                   where, deciding("trial"), false});
  const double boiling_margin =
      water::saturation_line::temperature(c.line.pressure) - answer.hottest_temperature;
  if (dries(c.solution) &&
      (boiling_margin < near_boiling || answer.highest_overpressure > worth_a_burst_caution))
    out.push_back({"C15", "Pressure inside the product",
                   fmt::format("up to {:.2g} kPa over the tunnel at {:.1f} m{}: ramp slowly; tight "
                               "pieces crack or burst near boiling",
                               1e-3 * answer.highest_overpressure, answer.highest_overpressure_x,
                               c.card.permeability ? "" : ", permeability not known"),
                   "", deciding("trial on the real product"), false});
  for (const CavityReport& cavity : c.solution.cavities)
    for (const field::ValidityFlag& flag : cavity.validity)
      if (flag.grade == field::ValidityGrade::unusable)
        out.push_back({"C27", "Outside the model", flag.sentence, cavity.name,
                       deciding("a field solution or a trial"), false});
  std::string outside;
  for (const EvidenceItem& item : c.solution.evidence)
    if (item.flags.has(flag::extrapolated | flag::clamped))
      outside += (outside.empty() ? "" : ", ") + item.quantity;
  if (!outside.empty())
    out.push_back({"C27", "Outside the data",
                   outside + " used outside the range of its source; the result rests on more than "
                             "was measured",
                   "", deciding("the cited source's range"), false});
}

void add_declared_cautions(const CautionCase& c, std::vector<Caution>& out) {
  const Product& p = c.line.product;
  auto add = [&](bool raised, const char* id, const char* title, std::string text,
                 const char* document) {
    if (raised) out.push_back({id, title, std::move(text), "", deciding(document), false});
  };
  add(p.contains_metal, "C09", "Metal",
      "detector with reject upstream, arc detection, no sharp edges; charred crumbs act like metal",
      "ISO 12100 risk assessment");
  add(p.combustible, "C10", "Fire",
      "fire study with the insurer, cleaning plan, detectors in tunnel and exhaust, an agent "
      "tested "
      "on the product, a rule for fans and doors",
      "NFPA 86 or ISO 13577-1");
  add(p.dusty, "C11", "Dust cloud",
      "study of explosive areas: none inside the tunnel unless built for it; earth everything",
      "IEC 60079-10-2, Directive 1999/92/EC");
  add(!p.flammable_vapour.empty(), "C12", "Flammable vapour",
      p.flammable_vapour +
          ": not accepted here. Needs the worst release rate, the flammable limit when hot (at "
          "most "
          "a quarter of it by ventilation alone), fan failure, start-up purge",
      "EN 1539, NFPA 86");
  add(p.fumes, "C13", "Fumes", "extraction at both ends; no exposure limit is held here",
      "the local occupational exposure list");
  add(p.food, "C22", "Hygiene", "materials, cleaning, allergens and validation are not assessed",
      "EN 1672-2");
}

}  // namespace

void add_product_cautions(const CautionCase& c, std::vector<Caution>& out) {
  add_state_cautions(c, out);
  add_declared_cautions(c, out);
}

}  // namespace lossline::verdict
