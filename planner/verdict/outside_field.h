#pragma once
// A word on the field outside an open end, never more: the estimate carries a band of a factor of
// ten either way and is compared with the strictest level that may apply. Measure on site.
//
// Levels: [60519] 50 W/m2 at 5 cm from any accessible place, normal operation: IEC 60519-6, 2011
//   edition, from memory, unverified. [ICNIRP] whole body, occupational: f/40 W/m2 with f in MHz
//   from 400 to 2000 MHz, 50 W/m2 above: ICNIRP 1998 tables as reprinted in a public manual.

#include <optional>
#include <string>

#include "planner/line/line.h"
#include "planner/march/solution.h"

namespace lossline::verdict {

/// Where the survey is made [m].
inline constexpr double survey_distance = 0.05;
inline constexpr double equipment_level = 50.0;  ///< [W/m2], [60519], unverified

/// The estimate at one open end.
struct OutsideField {
  double low = 0, high = 0;  ///< band [W/m2]
  double level = 0;          ///< strictest level compared with [W/m2]
  std::string word;          ///< "below", "near" or "above"; never "safe"
};

/// Strictest level at a frequency [W/m2].
[[nodiscard]] double strictest_level(double frequency);

/// The estimate at one end; none when no field was calculated there.
[[nodiscard]] std::optional<OutsideField> outside_field(const EndTrap& trap, const EndReport& end);

}  // namespace lossline::verdict
