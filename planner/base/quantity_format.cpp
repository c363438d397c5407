#include <fmt/format.h>

#include <algorithm>
#include <charconv>
#include <cmath>
#include <limits>

#include "planner/base/quantity.h"
#include "planner/base/scales.h"

namespace lossline {
namespace {

/// The value in a unit the kind is shown in.
double in_unit(double value, const QuantityKind& kind, std::string_view name) {
  if (kind.form == QuantityForm::number || kind.form == QuantityForm::count) return value;
  if (kind.form != QuantityForm::dimensional) {
    const Scale* scale = find_scale(kind.form, name);
    return scale == nullptr ? value : scale->from_si(value);
  }
  const auto unit = read_unit(name);
  const Unit* good = std::get_if<Unit>(&unit);
  return good == nullptr ? value : good->from_si(value);
}

/// Significant digits without the locale; an exponent only beyond nine places.
std::string digits_of(double value, int digits) {
  std::string text = fmt::format("{:.{}g}", value, digits);
  if (text.find("e+") == std::string::npos || !(std::abs(value) < 1e9)) return text;
  double rounded = 0;
  std::from_chars(text.data(), text.data() + text.size(), rounded);
  return fmt::format("{:.0f}", rounded);
}

}  // namespace

std::string format_quantity(double value, const QuantityKind& kind, UnitSet set,
                            int significant_digits) {
  const std::string_view unit = set == UnitSet::si_engineering ? kind.si_unit : kind.us_unit;
  const int digits = std::clamp(significant_digits, 1, 17);
  std::string text = digits_of(in_unit(value, kind, unit), digits);
  if (!unit.empty()) text += fmt::format(" {}", unit);
  return text;
}

std::string exact_quantity(double value, const QuantityKind& kind) {
  constexpr int most_digits = std::numeric_limits<double>::max_digits10;
  std::string near_text;
  for (int digits = 1; digits <= most_digits; ++digits) {
    std::string text = format_quantity(value, kind, UnitSet::si_engineering, digits);
    const auto read = read_quantity(text, kind);
    if (!read.value) continue;
    if (*read.value == value) return text;
    const double slack = std::numeric_limits<double>::epsilon() * std::abs(value);
    if (near_text.empty() && std::abs(*read.value - value) <= slack) near_text = text;
  }
  return near_text.empty() ? format_quantity(value, kind, UnitSet::si_engineering, most_digits)
                           : near_text;
}

}  // namespace lossline
