#include "planner/report/shown.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "planner/base/constants.h"

namespace lossline::report {
namespace {

struct Unit {
  double scale;
  const char* name;
};

// Exact by definition: foot 0.3048 m, pound 0.45359237 kg, pound-force per square inch
// 6894.757293 Pa (NIST SP 811, 2008, appendix B).
constexpr double foot = 0.3048, pound = 0.45359237, psi = 6894.757293, kWh = 3.6e6;

Unit unit_of(Shown kind, UnitSet set) {
  const bool si = set == UnitSet::si_engineering;
  auto choose = [&](Unit a, Unit b) { return si ? a : b; };
  switch (kind) {
    case Shown::temperature:
    case Shown::temperature_step:
      return choose({1, "K"}, {1.8, "F"});
    case Shown::length:
      return choose({1, "m"}, {1 / foot, "ft"});
    case Shown::small_length:
      return choose({1e3, "mm"}, {12 / foot, "in"});
    case Shown::speed:
      return choose({60, "m/min"}, {60 / foot, "ft/min"});
    case Shown::mass_rate:
      return choose({3600, "kg/h"}, {3600 / pound, "lb/h"});
    case Shown::power:
      return {1e-3, "kW"};
    case Shown::energy_per_mass:
      return choose({1 / kWh, "kWh/kg"}, {pound / kWh, "kWh/lb"});
    case Shown::energy_per_product:
      return choose({1000 / kWh, "kWh/t"}, {2000 * pound / kWh, "kWh/short ton"});
    case Shown::areal_mass:
      return choose({1, "kg/m2"}, {foot * foot / pound, "lb/ft2"});
    case Shown::pressure:
      return choose({1e-3, "kPa"}, {1 / psi, "psi"});
    case Shown::heating_rate:
      return choose({60, "K/min"}, {108, "F/min"});
    case Shown::drying_rate:
      return {6000, "%/min db"};
    case Shown::specific_power:
      return choose({1, "W/kg"}, {pound, "W/lb"});
    case Shown::areal_power:
      return choose({1e-3, "kW/m2"}, {1e-3 * foot * foot, "kW/ft2"});
    case Shown::field:
      return {1e-3, "kV/m"};
    case Shown::time:
      return {1.0 / 60, "min"};
    case Shown::share:
      return {100, "%"};
    case Shown::number:
      break;
  }
  return {1, ""};
}

}  // namespace

double in_unit(Shown kind, double si, UnitSet units) {
  const double value = si * unit_of(kind, units).scale;
  if (kind != Shown::temperature) return value;
  return units == UnitSet::si_engineering ? value - celsius_zero : value - 459.67;
}

std::string unit_name(Shown kind, const Setting& setting) {
  const bool si = setting.units == UnitSet::si_engineering;
  const char* degree = setting.unicode ? "\u00b0" : "deg";
  if (kind == Shown::temperature) return std::string(degree) + (si ? "C" : "F");
  if (!si && (kind == Shown::temperature_step || kind == Shown::heating_rate))
    return degree + std::string(unit_of(kind, setting.units).name);
  return unit_of(kind, setting.units).name;
}

std::string figures(double value, int digits) {
  if (!std::isfinite(value)) return "?";
  if (value == 0) return "0";
  const int before = static_cast<int>(std::floor(std::log10(std::abs(value)))) + 1;
  const int decimals = std::clamp(digits - before, 0, 6);
  return fmt::format("{:.{}f}", value, decimals);
}

std::string with_unit(Shown kind, double si, const Setting& setting, int digits) {
  double value = in_unit(kind, si, setting.units);
  std::string number = figures(value, digits);
  // A temperature near the zero of its scale does not become more exact there.
  if (kind == Shown::temperature) number = fmt::format("{:.1f}", value);
  const std::string unit = unit_name(kind, setting);
  return unit.empty() ? number : number + ' ' + unit;
}

std::string moisture_figures(double dry_basis) {
  if (!std::isfinite(dry_basis) || std::abs(dry_basis) >= 0.001) return figures(dry_basis);
  return fmt::format("{:.5f}", dry_basis);
}

std::string both_bases(double dry_basis) {
  const double percent = 100 * dry_basis / (1 + dry_basis);
  return fmt::format("{} % wb ({} db)",
                     percent < 0.1 ? fmt::format("{:.3f}", percent) : figures(percent),
                     moisture_figures(dry_basis));
}

Shown shown_as(verdict::Measure measure) {
  using verdict::Measure;
  switch (measure) {
    case Measure::temperature:
      return Shown::temperature;
    case Measure::temperature_step:
      return Shown::temperature_step;
    case Measure::drying_rate:
      return Shown::drying_rate;
    case Measure::heating_rate:
      return Shown::heating_rate;
    case Measure::pressure:
      return Shown::pressure;
    case Measure::power:
      return Shown::power;
    case Measure::share:
      return Shown::share;
    case Measure::specific_power:
      return Shown::specific_power;
    case Measure::areal_power:
      return Shown::areal_power;
    case Measure::field:
      return Shown::field;
    case Measure::specific_energy:
      return Shown::energy_per_mass;
    case Measure::moisture:
    case Measure::cure:
    case Measure::none:
      break;
  }
  return Shown::number;
}

}  // namespace lossline::report
