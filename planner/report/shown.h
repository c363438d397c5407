#pragma once
// Numbers for people: the two unit sets of planner/base/quantity.h, cut to the three figures an
// engineer reads, in units fit for a table. Machines read JSON, which is SI throughout.

#include <string>

#include "planner/base/quantity.h"
#include "planner/verdict/margins.h"

namespace lossline::report {

/// What a number is, which decides the unit it is shown in.
enum class Shown {
  temperature,
  temperature_step,
  length,
  small_length,
  speed,
  mass_rate,
  power,
  energy_per_mass,     ///< kWh/kg, kWh/lb
  energy_per_product,  ///< kWh/t, kWh per short ton
  areal_mass,
  pressure,
  heating_rate,
  drying_rate,  ///< per cent of dry mass a minute
  specific_power,
  areal_power,
  field,
  time,  ///< minutes in both sets
  share,
  number,
};

/// How the page is set.
struct Setting {
  UnitSet units = UnitSet::si_engineering;
  bool unicode = false;  ///< otherwise plain ASCII
};

/// Value in the unit shown.
[[nodiscard]] double in_unit(Shown kind, double si, UnitSet units);
/// Name of the unit, "degC" or with the degree sign.
[[nodiscard]] std::string unit_name(Shown kind, const Setting& setting);
/// Three significant figures without exponents: "0.0672", "61.2", "1203".
[[nodiscard]] std::string figures(double value, int digits = 3);
/// Value with its unit: "61.2 degC".
[[nodiscard]] std::string with_unit(Shown kind, double si, const Setting& setting, int digits = 3);
/// Dry-basis moisture: three figures, five decimals at most.
[[nodiscard]] std::string moisture_figures(double dry_basis);
/// Moisture on both bases: "6.3 % wb (0.067 db)".
[[nodiscard]] std::string both_bases(double dry_basis);

/// How a margin's numbers are shown.
[[nodiscard]] Shown shown_as(verdict::Measure measure);

}  // namespace lossline::report
