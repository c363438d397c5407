#pragma once
// A function tabulated at equal distances for hot loops: value and slope in a few nanoseconds,
// continuous in both (cubic between neighbours).

#include <cstddef>
#include <utility>
#include <vector>

#include "planner/numerics/monotone_cubic.h"

namespace lossline::numerics {

/// The table. Immutable after construction; any thread.
class UniformTable {
 public:
  /// From values and slopes at `entries.size()` equally spaced places from low to high.
  ///
  ///   throws   Error bad_input: fewer than two entries, low not below high, not finite
  UniformTable(double low, double high, std::vector<ValueSlope> entries, Outside outside);

  /// From a function that returns ValueSlope, taken at n places; error falls with the fourth
  /// power of the distance.
  template <class F>
  static UniformTable of(F&& f, double low, double high, std::size_t n, Outside outside) {
    std::vector<ValueSlope> entries(n);
    for (std::size_t i = 0; i < n; ++i) {
      const double s = static_cast<double>(i) / static_cast<double>(n - 1);
      entries[i] = f(low + (high - low) * s);
    }
    return UniformTable(low, high, std::move(entries), outside);
  }

  /// Value and slope at x. NaN gives NaN.
  [[nodiscard]] ValueSlope at(double x) const {
    const double place = (x - low_) * per_step_;
    if (place >= 0 && place <= last_) {
      auto i = static_cast<std::size_t>(place);
      if (i + 2 > entries_.size()) i = entries_.size() - 2;
      return hermite(entries_[i], entries_[i + 1], step_, place - static_cast<double>(i));
    }
    return beyond(x);
  }

  [[nodiscard]] double low() const { return low_; }
  [[nodiscard]] double high() const { return high_; }

 private:
  [[nodiscard]] ValueSlope beyond(double x) const;

  double low_, high_, step_ = 1, per_step_ = 1, last_ = 1;
  std::vector<ValueSlope> entries_;
  Outside outside_;
};

}  // namespace lossline::numerics
