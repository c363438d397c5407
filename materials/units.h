#pragma once
// The units accepted in authored material files and imported series, and their way to SI.
// A value is written as number, space, unit: "0.1031 kJ/(kg K)", "20 degC", "79 % wb", "3 1".

#include <optional>
#include <string>
#include <string_view>

namespace lossline::materials {

/// A value in SI with what was printed.
struct UnitValue {
  double value = 0;     ///< in `si`
  std::string si;       ///< SI unit; "1" for pure numbers; "kg/kg db" for moisture
  std::string printed;  ///< the text as written
};

/// Reads a number exactly as std::from_chars does, the whole text and finite.
[[nodiscard]] std::optional<double> number(std::string_view text);

/// Converts a number with a unit to SI. Wet-basis moisture ("% wb", "kg/kg wb") becomes dry basis
/// by X = M / (1 - M); refused at M >= 1.
///
///   returns  the value, or nothing when the unit is not in the table (see known_units) or the
///            moisture is impossible
[[nodiscard]] std::optional<UnitValue> to_si(double value, std::string_view unit);

/// Reads "number unit".
[[nodiscard]] std::optional<UnitValue> unit_value(std::string_view text);

/// All accepted units in one line, for messages.
[[nodiscard]] std::string known_units();

}  // namespace lossline::materials
