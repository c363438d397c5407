#include "planner/verdict/cautions.h"

#include <fmt/format.h>

#include <algorithm>

#include "planner/verdict/caution_rules.h"
#include "planner/verdict/radio_band.h"

namespace lossline::verdict {
namespace {

void add_always(std::vector<Caution>& out) {
  auto add = [&](const char* id, const char* title, const char* text, const char* document) {
    out.push_back({id, title, text, "", deciding(document), true});
  };
  add("C03", "Near-field readings",
      "meters misread close to a source: take the calibrated distance and the meter's statement of "
      "near-field error into the survey",
      "the meter's calibration and IEC 60519-6");
  add("C05", "High voltage",
      "qualified staff only: lock out, discharge, never defeat a cabinet switch; the supply stores "
      "lethal energy after switch-off",
      "IEC 60204-1, IEC 60519-1; in the United States 29 CFR 1910.147");
  add("C19", "Cooling water",
      "trip on flow and temperature at tube, circulator and water load; mind conductivity and "
      "frost",
      "the tube supplier's data sheet");
  add("C21", "Implants and pregnancy",
      "access rule for wearers of implants and for pregnant staff from the occupational physician",
      "Directive 2013/35/EU or the local equivalent");
  add("C23", "Doors and maintenance",
      "dual monitored door interlocks, captive fasteners, leakage check after every opening",
      "IEC 60519-6, ISO 14119");
}

void add_plant(const CautionCase& c, std::vector<Caution>& out) {
  const Solution& s = c.solution;
  for (const Surface& surface : c.line.surfaces) {
    for (const AirReport& air : s.air) {
      if (air.name != surface.air) continue;
      const double distance = surface.temperature - air.exhaust_dew_point;
      if (distance >= condensation_distance) continue;
      out.push_back({"C14", "Condensation",
                     fmt::format("{} stands {:.1f} K {} the dew point of '{}': drip, corrosion, "
                                 "arcing; warm walls before product enters, purge dry afterwards",
                                 surface.name, std::abs(distance),
                                 distance >= 0 ? "above" : "below", air.name),
                     surface.name, deciding("common practice: 10 K distance"), false});
    }
  }
  for (const AirReport& air : s.air)
    if (air.fog)
      out.push_back({"C14", "Condensation", "air is saturated somewhere in this loop", air.name,
                     deciding("common practice"), false});
  if (c.line.surfaces.empty() && dries(s))
    out.push_back({"C14", "Condensation",
                   "no cold surface is named, so the distance to the dew point is unknown: name "
                   "the coldest wall, duct and stack",
                   "", deciding("common practice: 10 K distance"), false});
  double hottest = s.answer.hottest_temperature;
  for (const AirReport& air : s.air) hottest = std::max(hottest, air.supply_temperature);
  if (hottest > hot_surface)
    out.push_back({"C16", "Hot surfaces and steam",
                   "product or supply air is hotter than 65 degC: guards, signs, steam at the ends",
                   "", deciding("ISO 13732-1"), false});
  if (!(c.line.pressure >= 60e3 && c.line.pressure <= 110e3))
    out.push_back({"C17", "Vacuum or pressure",
                   fmt::format("{:.4g} kPa is no open tunnel: vessels under vacuum or pressure are "
                               "outside what is planned here",
                               1e-3 * c.line.pressure),
                   "", deciding("the pressure equipment rules"), false});
  bool fans = false;
  for (const AirLoop& air : c.line.air) fans = fans || air.fan_power > 0;
  if (fans)
    out.push_back({"C25", "Noise", "fans: measure at the operators' places", "",
                   deciding("the local noise rules"), false});
}

void add_radio(const CautionCase& c, std::vector<Caution>& out) {
  std::vector<double> seen;
  for (const Generator& g : c.line.generators) {
    if (std::find(seen.begin(), seen.end(), g.frequency) != seen.end()) continue;
    seen.push_back(g.frequency);
    const std::string where = fmt::format("{:.5g} MHz", 1e-6 * g.frequency);
    const BandAnswer band = radio_band(g.frequency, c.line.duty.country);
    if (band.status != BandStatus::listed)
      out.push_back({"C04", "Radio licence",
                     band.text + ": ask the radio authority before ordering and keep its answer",
                     where, deciding(band.document), false});
    const bool wireless = g.frequency >= 2400e6 && g.frequency <= 2500e6;
    const bool mobile = g.frequency >= 890e6 && g.frequency <= 930e6;
    if (wireless || mobile)
      out.push_back({"C26", "Interference with the plant",
                     fmt::format("{} lies beside {}: plan the spectrum, filter weigh cells; a "
                                 "thermocouple in the field reads wrong",
                                 where, wireless ? "Wi-Fi at 2.4 GHz" : "mobile service"),
                     where, deciding("CISPR 11, group 2"), false});
  }
}

}  // namespace

std::string deciding(const std::string& document) {
  return document + "; verify the edition and national law";
}

std::vector<Caution> cautions(const Line& line, const ProductCard& card, const Solution& solution,
                              const Margins& margins) {
  const CautionCase c{line, card, solution, margins};
  std::vector<Caution> out;
  const bool power = !line.generators.empty();
  if (power) {
    add_field_cautions(c, out);
    add_radio(c, out);
  }
  add_product_cautions(c, out);
  add_plant(c, out);
  std::stable_sort(out.begin(), out.end(),
                   [](const Caution& a, const Caution& b) { return a.id < b.id; });
  if (power) add_always(out);
  return out;
}

std::vector<std::string> not_assessed() {
  return {
      "C18 inert atmosphere: oxygen monitoring of the room if one is used",
      "C20 X-rays and beryllia: ask the tube supplier for a statement and disposal rules",
      "explosive areas, machine safety and integrity levels: IEC 60079, ISO 12100, ISO 13849-1"};
}

}  // namespace lossline::verdict
