#include "planner/product/range_check.h"

#include <fmt/format.h>

#include "planner/base/error.h"

namespace lossline::product {

double checked(const char* quantity, double value, const char* unit, double low, double high) {
  if (value >= low && value <= high) return value;
  throw Error(ErrorKind::out_of_range, fmt::format("{} = {:g} {} is outside [{:g}, {:g}] {}",
                                                   quantity, value, unit, low, high, unit));
}

}  // namespace lossline::product
