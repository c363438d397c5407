#pragma once
// What a line file may not say although every single value is possible: things that do not fit
// into each other, names that lead nowhere, products that leave wetter than they came.

#include <initializer_list>
#include <string>

#include "planner/line/line.h"
#include "planner/linefile/positions.h"
#include "planner/linefile/table_reader.h"

namespace lossline::linefile {

/// A line with what is known about its keys.
class Checker {
 public:
  Checker(const Line& checked, const Positions& positions, Findings& findings)
      : line(checked), positions_(positions), findings_(findings) {}

  const Line& line;

  /// Whether the file gives the key.
  [[nodiscard]] bool given(const std::string& key) const;
  /// Whether none of the keys was found bad, so that their values may be compared.
  [[nodiscard]] bool sound(std::initializer_list<std::string> keys) const;
  void report(const std::string& key, std::string wrong, std::string right);

 private:
  const Positions& positions_;
  Findings& findings_;
};

void check_duty(Checker& c);      ///< duty, limits, evidence of what is given
void check_geometry(Checker& c);  ///< bed, belt, cavities, passages, traps
void check_power(Checker& c);     ///< generators, runs, shares
void check_air(Checker& c);       ///< loops and surfaces
void check_names(Checker& c);     ///< names are unique and lead somewhere

/// "1.65 m" as a person reads it, for messages.
[[nodiscard]] std::string shown(double value, const QuantityKind& kind);

}  // namespace lossline::linefile
