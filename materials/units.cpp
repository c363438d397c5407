#include "materials/units.h"

#include <array>
#include <charconv>
#include <cmath>

namespace lossline::materials {
namespace {

struct Unit {
  std::string_view name;
  double factor;
  std::string_view si;
};

// Exact factors by definition (SI Brochure, 9th edition, 2019), except degC and the moistures,
// which are not factors and are handled below.
constexpr std::array units = {
    Unit{"1", 1, "1"},
    Unit{"%", 0.01, "1"},
    Unit{"kg/kg db", 1, "kg/kg db"},
    Unit{"% db", 0.01, "kg/kg db"},
    Unit{"K", 1, "K"},
    Unit{"degC difference", 1, "K"},
    Unit{"1/K", 1, "1/K"},
    Unit{"1/degC", 1, "1/K"},
    Unit{"1/degC2", 1, "1/K2"},
    Unit{"1/K2", 1, "1/K2"},
    Unit{"Hz", 1, "Hz"},
    Unit{"MHz", 1e6, "Hz"},
    Unit{"GHz", 1e9, "Hz"},
    Unit{"Pa", 1, "Pa"},
    Unit{"kPa", 1e3, "Pa"},
    Unit{"MPa", 1e6, "Pa"},
    Unit{"1/Pa", 1, "1/Pa"},
    Unit{"kg/m3", 1, "kg/m3"},
    Unit{"g/cm3", 1e3, "kg/m3"},
    Unit{"J/kg", 1, "J/kg"},
    Unit{"kJ/kg", 1e3, "J/kg"},
    Unit{"J/g", 1e3, "J/kg"},
    Unit{"J/mol", 1, "J/mol"},
    Unit{"kJ/mol", 1e3, "J/mol"},
    Unit{"J/(kg K)", 1, "J/(kg K)"},
    Unit{"kJ/(kg K)", 1e3, "J/(kg K)"},
    Unit{"J/(kg K2)", 1, "J/(kg K2)"},
    Unit{"kJ/(kg K2)", 1e3, "J/(kg K2)"},
    Unit{"W/(m K)", 1, "W/(m K)"},
    Unit{"W/(m K2)", 1, "W/(m K2)"},
    Unit{"m2/s", 1, "m2/s"},
    Unit{"m2", 1, "m2"},
    Unit{"m", 1, "m"},
    Unit{"mm", 1e-3, "m"},
    Unit{"cm", 1e-2, "m"},
    Unit{"S/m", 1, "S/m"},
    Unit{"V/m", 1, "V/m"},
    Unit{"s", 1, "s"},
    Unit{"min", 60, "s"},
    Unit{"1/s", 1, "1/s"},
    Unit{"1/min", 1.0 / 60, "1/s"},
    Unit{"K/s", 1, "K/s"},
    Unit{"K/min", 1.0 / 60, "K/s"},
};

constexpr double celsius_zero = 273.15;

}  // namespace

std::optional<double> number(std::string_view text) {
  if (!text.empty() && text.front() == '+') text.remove_prefix(1);
  double value = 0;
  const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), value);
  if (error != std::errc{} || end != text.data() + text.size() || !std::isfinite(value))
    return std::nullopt;
  return value;
}

std::optional<UnitValue> to_si(double value, std::string_view unit) {
  if (unit == "degC") return UnitValue{value + celsius_zero, "K", {}};
  if (unit == "% wb" || unit == "kg/kg wb") {
    const double M = unit == "% wb" ? value / 100 : value;
    if (M >= 0 && M < 1) return UnitValue{M / (1 - M), "kg/kg db", {}};
    return std::nullopt;
  }
  for (const Unit& row : units)
    if (row.name == unit) return UnitValue{value * row.factor, std::string(row.si), {}};
  return std::nullopt;
}

std::optional<UnitValue> unit_value(std::string_view text) {
  const std::size_t space = text.find(' ');
  if (space == std::string_view::npos) return std::nullopt;
  const auto value = number(text.substr(0, space));
  if (!value) return std::nullopt;
  auto out = to_si(*value, text.substr(space + 1));
  if (out) out->printed = text;
  return out;
}

std::string known_units() {
  std::string out = "degC, % wb, kg/kg wb";
  for (const Unit& row : units) out += ", " + std::string(row.name);
  return out;
}

}  // namespace lossline::materials
