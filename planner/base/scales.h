#pragma once
// The units of quantities that are not products of symbols: temperature scales, temperature
// differences, moisture with its basis, humidity ratio, shares.

#include <string>
#include <string_view>

#include "planner/base/quantity.h"

namespace lossline {

/// One such unit: SI value = (value + shift) * up / down + offset; then dry from wet basis.
struct Scale {
  QuantityForm form;
  std::string_view name;
  double shift, up, down, offset;
  bool wet_basis = false;

  [[nodiscard]] double to_si(double value) const { return (value + shift) * up / down + offset; }
  [[nodiscard]] double from_si(double value) const { return (value - offset) * down / up - shift; }
};

/// The unit of that form, blanks inside its name counted as one or none; null when there is none.
[[nodiscard]] const Scale* find_scale(QuantityForm form, std::string_view name);

/// The unit of that form most likely meant by another text; empty when none is near.
[[nodiscard]] std::string nearest_scale(QuantityForm form, std::string_view name);

}  // namespace lossline
