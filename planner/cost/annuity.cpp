#include "planner/cost/annuity.h"

#include <fmt/format.h>

#include <cmath>
#include <limits>

#include "planner/base/error.h"

namespace lossline::cost {
namespace {

void require(const char* quantity, double value, const char* unit, double low, double high) {
  if (value >= low && value <= high) return;
  throw Error(ErrorKind::out_of_range, fmt::format("{} = {:g} {} is outside [{:g}, {:g}] {}",
                                                   quantity, value, unit, low, high, unit));
}

}  // namespace

double capital_recovery_factor(double interest, double years) {
  require("interest", interest, "per year", 0, 1);
  require("term of the loan", years, "years", 1e-3, 100);
  if (interest == 0) return 1 / years;
  return interest / -std::expm1(-years * std::log1p(interest));
}

double annuity(double capital, double interest, double years) {
  require("capital", capital, "currency", 0, std::numeric_limits<double>::max());
  return capital * capital_recovery_factor(interest, years);
}

}  // namespace lossline::cost
