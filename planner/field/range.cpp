#include "planner/field/range.h"

#include <fmt/format.h>

#include <limits>

#include "planner/base/error.h"

namespace lossline::field {

double in_range(const char* quantity, double value, const char* unit, double low, double high) {
  if (value >= low && value <= high) return value;
  throw Error(ErrorKind::out_of_range, fmt::format("{} = {:.6g} {} is outside [{:.6g}, {:.6g}] {}",
                                                   quantity, value, unit, low, high, unit));
}

double frequency_in_range(double frequency) {
  return in_range("frequency", frequency, "Hz", std::numeric_limits<double>::min(),
                  highest_frequency);
}

}  // namespace lossline::field
