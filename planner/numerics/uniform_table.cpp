#include "planner/numerics/uniform_table.h"

#include <fmt/core.h>

#include <cmath>

#include "planner/base/error.h"

namespace lossline::numerics {

UniformTable::UniformTable(double low, double high, std::vector<ValueSlope> entries,
                           Outside outside)
    : low_(low), high_(high), entries_(std::move(entries)), outside_(outside) {
  if (!(std::isfinite(low) && std::isfinite(high) && low < high && entries_.size() >= 2))
    throw Error(ErrorKind::bad_input,
                fmt::format("a table of {} entries on [{}, {}] cannot be formed", entries_.size(),
                            low, high));
  for (const ValueSlope& e : entries_)
    if (!(std::isfinite(e.value) && std::isfinite(e.slope)))
      throw Error(ErrorKind::bad_input,
                  fmt::format("an entry of a table is not finite: {}, {}", e.value, e.slope));
  last_ = static_cast<double>(entries_.size() - 1);
  step_ = (high - low) / last_;
  per_step_ = last_ / (high - low);
}

ValueSlope UniformTable::beyond(double x) const {
  if (std::isnan(x)) return {x, x};
  const bool below = x < low_;
  const ValueSlope& end = below ? entries_.front() : entries_.back();
  if (outside_ == Outside::hold) return {end.value, 0};
  return {end.value + end.slope * (x - (below ? low_ : high_)), end.slope};
}

}  // namespace lossline::numerics
