#include "planner/decide/availability.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "planner/base/error.h"

namespace lossline::decide {

double k_out_of_n(int k, int n, double availability) {
  if (!(n >= 1 && n <= 1000))
    throw Error(ErrorKind::out_of_range,
                fmt::format("number of units = {} is outside [1, 1000]", n));
  if (!(k >= 0 && k <= n))
    throw Error(ErrorKind::out_of_range,
                fmt::format("number of units needed = {} is outside [0, {}]", k, n));
  if (!(availability >= 0 && availability <= 1))
    throw Error(ErrorKind::out_of_range,
                fmt::format("availability = {:g} is outside [0, 1]", availability));
  if (k == 0 || availability == 1) return 1;
  if (availability == 0) return 0;
  // b(j) = C(n,j) a^j (1-a)^(n-j); from b(j) to b(j+1) multiply by (n-j)/(j+1) a/(1-a)
  const double log_a = std::log(availability), log_b = std::log1p(-availability);
  double log_term = n * log_b, up = 0, down = 0;
  for (int j = 0; j <= n; ++j) {
    (j >= k ? up : down) += std::exp(log_term);
    if (j < n) log_term += std::log(static_cast<double>(n - j) / (j + 1)) + log_a - log_b;
  }
  return up < down ? up : std::max(1 - down, 0.0);
}

}  // namespace lossline::decide
