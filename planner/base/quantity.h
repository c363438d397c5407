#pragma once
// Quantities as people write them, "75 kW" or "25 % wb", at the border of the program: line files,
// command line, tables. Inside, everything is a double in SI.
//
// Every value carries its unit. A temperature is not a temperature difference, and moisture says
// its basis: it is kept dry basis [kg water / kg dry solid]. Numbers do not depend on the locale.

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

#include "planner/base/units.h"

namespace lossline {

/// How the text of a quantity is read.
enum class QuantityForm {
  dimensional,             ///< any unit expression of the dimension
  temperature,             ///< on a scale: degC, degF or K
  temperature_difference,  ///< K, "degC diff" or "degF diff"
  moisture,                ///< wet or dry basis, kept dry basis
  moisture_difference,     ///< dry basis only
  humidity,                ///< mass of vapour per mass of dry air
  share,                   ///< per cent
  number,                  ///< without unit
  count,                   ///< whole and without unit
};

/// What a value is: its name, how it is written and in which units it is shown.
struct QuantityKind {
  std::string_view noun;     ///< "mass flow"
  std::string_view example;  ///< "1.8 t/h"
  Dimension dimension{};
  std::string_view si_unit;  ///< shown in UnitSet::si_engineering
  std::string_view us_unit;  ///< shown in UnitSet::us_customary
  QuantityForm form = QuantityForm::dimensional;
};

enum class UnitSet { si_engineering, us_customary };

/// Why a text is not a quantity of its kind.
struct QuantityFault {
  std::string wrong;       ///< what is wrong, with the text in quotes
  std::string right;       ///< what to write instead
  std::size_t column = 1;  ///< where in the text, 1-based, in code points
};

/// The value of a text or what is wrong with it; exactly one is present.
struct QuantityResult {
  std::optional<double> value;  ///< SI
  QuantityFault fault;          ///< meaningful when value is absent
};

/// Reads a quantity.
///
///   text     "<number> <unit>"; the blank may be left out
///   returns  the SI value, always finite, or the fault
/// Thread safe; about a microsecond.
[[nodiscard]] QuantityResult read_quantity(std::string_view text, const QuantityKind& kind);

/// Reads a quantity.
///
///   returns  the SI value, finite
///   throws   Error bad_input with the fault in one sentence
[[nodiscard]] double parse_quantity(std::string_view text, const QuantityKind& kind);

/// Writes a quantity so that read_quantity reads it again.
///
///   value               SI
///   significant_digits  1..17
///   returns             "<number> <unit>", or "<number>" for numbers and counts
[[nodiscard]] std::string format_quantity(double value, const QuantityKind& kind,
                                          UnitSet set = UnitSet::si_engineering,
                                          int significant_digits = 4);

/// Writes a quantity in SI engineering units with the fewest digits that read back to the same
/// double, or to the one beside it where no decimal text of the unit hits it.
[[nodiscard]] std::string exact_quantity(double value, const QuantityKind& kind);

}  // namespace lossline
