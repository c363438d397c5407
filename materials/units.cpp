#include "materials/units.h"

#include <array>
#include <charconv>
#include <cmath>

#include "planner/base/constants.h"
#include "planner/base/units.h"

namespace lossline::materials {
namespace {

/// The SI units values are kept in. Where two share a dimension the written unit decides: a unit
/// of "Hz" is kept in Hz, any other per time in 1/s.
constexpr std::array si_units{"1",        "K",    "1/K",   "1/K2",     "1/Pa",      "Pa",
                              "kg/m3",    "J/kg", "J/mol", "J/(kg K)", "J/(kg K2)", "W/(m K)",
                              "W/(m K2)", "m2/s", "m2",    "m",        "S/m",       "V/m",
                              "s",        "1/s",  "K/s"};

std::optional<Unit> parsed(std::string_view unit) {
  const auto read = read_unit(unit);
  if (const Unit* u = std::get_if<Unit>(&read)) return *u;
  return std::nullopt;
}

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
  if (unit == "degC" || unit == "°C") return UnitValue{value + celsius_zero, "K", {}};
  // Alone it would be read as a difference of temperatures, which nobody means.
  if (unit == "degF" || unit == "°F") return std::nullopt;
  if (unit == "degC difference") return UnitValue{value, "K", {}};
  if (unit == "% wb" || unit == "kg/kg wb") {
    const double M = unit == "% wb" ? value / 100 : value;
    if (M >= 0 && M < 1) return UnitValue{M / (1 - M), "kg/kg db", {}};
    return std::nullopt;
  }
  if (unit == "% db") return UnitValue{value / 100, "kg/kg db", {}};
  if (unit == "kg/kg db") return UnitValue{value, "kg/kg db", {}};
  const std::optional<Unit> written = parsed(unit);
  if (!written) return std::nullopt;
  if (unit.find("Hz") != std::string_view::npos) return UnitValue{written->to_si(value), "Hz", {}};
  for (const char* si : si_units)
    if (parsed(si)->dimension == written->dimension)
      return UnitValue{written->to_si(value), si, {}};
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
  std::string out = "degC, % wb, kg/kg wb, % db, kg/kg db, Hz";
  for (const char* si : si_units) out += std::string(", ") + si;
  return out + " and their multiples";
}

}  // namespace lossline::materials
