#pragma once
// Evenly spaced numbers for loops over temperatures and the like.

#include <cstddef>
#include <vector>

namespace lossline::test {

/// low, low + step, ... up to high (included when it is hit to rounding).
inline std::vector<double> sweep(double low, double high, double step) {
  std::vector<double> out;
  for (std::size_t i = 0; low + static_cast<double>(i) * step <= high + 1e-9 * step; ++i)
    out.push_back(low + static_cast<double>(i) * step);
  return out;
}

}  // namespace lossline::test
