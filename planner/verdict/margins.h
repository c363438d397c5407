#pragma once
// How far a solved line is from every limit it must keep, and which limit binds. Limits come from
// the line file, the product card, the generators and named surfaces, and from physics (no water
// leaves for less than its heat of evaporation).
//
// The reserve that separates "within" from "near" is 5 K for temperatures and 10 % of the limit
// for everything else; own choice, stated with every margin. Margins are ranked by margin over
// reserve: below 0 beyond, below 1 near.

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "planner/line/line.h"
#include "planner/march/solution.h"
#include "planner/product/card.h"

namespace lossline::verdict {

/// Where a value stands. Unknown counts as not passed.
enum class Standing { within, near, beyond, unknown };

/// "within", "near", "beyond", "unknown".
[[nodiscard]] const char* standing_word(Standing standing);

/// What a margin is measured in; SI inside.
enum class Measure {
  temperature,       ///< [K]
  temperature_step,  ///< difference [K]
  moisture,          ///< dry basis [kg/kg]
  drying_rate,       ///< dry basis [1/s]
  heating_rate,      ///< [K/s]
  pressure,          ///< over the tunnel's [Pa]
  power,             ///< [W]
  share,             ///< 1
  specific_power,    ///< per wet mass [W/kg]
  areal_power,       ///< per covered belt area [W/m2]
  field,             ///< rms [V/m]
  cure,              ///< degree of cure, 1
  specific_energy,   ///< [J/kg]
  none,
};

/// SI unit of a measure as JSON prints it: "K", "1/s", "1".
[[nodiscard]] const char* measure_unit(Measure measure);

/// One limit and how far the line is from it.
struct Margin {
  std::string name;    ///< "product temperature"
  std::string origin;  ///< who set the limit: "line file", "card", "generator", "physics"
  std::string reason;  ///< what happens beyond it, or why it is unknown; may be empty
  Measure measure = Measure::none;
  bool at_least = false;         ///< value must be at least the limit; otherwise at most
  std::optional<double> value;   ///< absent when unknown
  std::optional<double> limit;   ///< absent when none is stated
  std::optional<double> margin;  ///< room left, negative beyond; unit as value (differences in K)
  double reserve = 0;            ///< "near" begins here; same unit
  std::optional<double> x;       ///< place along the belt [m]
  std::string where;             ///< stretch, generator or surface
  Standing standing = Standing::unknown;

  /// Margin over reserve; infinite when unknown.
  [[nodiscard]] double relative() const;
};

/// All margins, least first, unknown ones last.
struct Margins {
  std::vector<Margin> all;
  std::optional<std::size_t> binding;  ///< the least known margin

  [[nodiscard]] std::size_t count(Standing standing) const;
};

inline constexpr double temperature_reserve = 5.0;  ///< [K]
inline constexpr double relative_reserve = 0.10;    ///< of the limit
/// Best share of mains that becomes microwave power, upper end at 915 MHz; common practice.
inline constexpr double best_mains_to_microwave = 0.86;

/// Evaporation into air below boiling takes up to this share less than at boiling: the vapour at
/// 20 degC carries 2453.5 kJ/kg over liquid at 20 degC, at 100 degC 2591.7 (IAPWS-IF97).
inline constexpr double cool_evaporation_share = 0.946;

/// Whether enough water leaves for energy per water and condensation to mean something: more than
/// a hundredth of the product. Own choice.
[[nodiscard]] bool dries(const Solution& solution);

/// Reads every limit off a solution.
///
///   line, card  as solved, overrides applied
///   solution    of them; when it is not solved, every margin that needs it is unknown
[[nodiscard]] Margins margins(const Line& line, const ProductCard& card, const Solution& solution);

}  // namespace lossline::verdict
