#pragma once
// Unit expressions such as "kJ/(kg K)", "W/m2/K" or "BTU/(h ft2 degF)", read into a dimension and
// the factor to SI. Temperatures here are differences; scales with an offset are quantity.h's.
//
// Grammar: expression = factor { [ "*" | "." | "·" | " " ] factor | "/" factor };
//          factor = ( symbol | "1" | "(" expression ")" ) [ [ "^" ] whole number | "²" | "³" ].
// A division holds for the next factor only: "W/m2/K" or "W/(m2 K)", not "W/m2 K".

#include <array>
#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

namespace lossline {

/// Exponents of kg, m, s, K, A, mol, currency unit, decibel and radian. The last three are no SI
/// dimensions; they keep money, levels and angles from passing as plain numbers.
using Dimension = std::array<signed char, 9>;

[[nodiscard]] constexpr Dimension dimension(int kg, int m = 0, int s = 0, int K = 0, int A = 0,
                                            int mol = 0, int money = 0, int dB = 0, int rad = 0) {
  const auto c = [](int exponent) { return static_cast<signed char>(exponent); };
  return {c(kg), c(m), c(s), c(K), c(A), c(mol), c(money), c(dB), c(rad)};
}

/// A unit: SI value = value * up / down. The factor is kept as a fraction so that "8 mm" is 8/1000,
/// the double nearest to 0.008, and not 8 times a rounded thousandth.
struct Unit {
  Dimension dimension{};
  double up = 1, down = 1;

  [[nodiscard]] double to_si(double value) const { return value * up / down; }
  [[nodiscard]] double from_si(double value) const { return value * down / up; }
};

/// Why an expression is not a unit.
struct UnitFault {
  std::string message;
  std::size_t begin = 0;   ///< byte where the fault is
  std::size_t length = 0;  ///< bytes of the unknown symbol; 0 for faults of another kind
};

/// Reads a unit expression.
///
///   text     without surrounding blanks
///   returns  the unit, or what is wrong and where
[[nodiscard]] std::variant<Unit, UnitFault> read_unit(std::string_view text);

/// Every symbol that read_unit knows, with and without prefixes.
[[nodiscard]] std::vector<std::string> known_symbols();

}  // namespace lossline
