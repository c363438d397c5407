#pragma once
// The one way in which functions of this folder refuse a value. SI units.

#include <fmt/core.h>

#include <string_view>

#include "planner/base/error.h"

namespace lossline::water {

/// The value, when it is inside [low, high]; NaN never is. Throws Error out_of_range otherwise.
inline double checked(std::string_view quantity, const char* unit, double value, double low,
                      double high) {
  if (value >= low && value <= high) return value;
  throw Error(ErrorKind::out_of_range,
              fmt::format("{} = {:.10g} {} is outside [{:.10g}, {:.10g}] {}", quantity, value, unit,
                          low, high, unit));
}

}  // namespace lossline::water
