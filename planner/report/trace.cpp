#include "planner/report/trace.h"

#include <algorithm>
#include <array>
#include <cmath>

namespace lossline::report {
namespace {

constexpr int levels = 8;
constexpr std::array<const char*, levels> blocks{"\u2581", "\u2582", "\u2583", "\u2584",
                                                 "\u2585", "\u2586", "\u2587", "\u2588"};
constexpr std::array<const char*, levels> plain{"_", ".", ":", "-", "=", "+", "*", "#"};

double value_at(const std::vector<double>& x, const std::vector<double>& y, double where) {
  const auto after = std::upper_bound(x.begin(), x.end(), where);
  if (after == x.end()) return y.back();
  if (after == x.begin()) return y.front();
  const auto i = static_cast<std::size_t>(after - x.begin());
  const double t = (where - x[i - 1]) / (x[i] - x[i - 1]);
  return y[i - 1] + t * (y[i] - y[i - 1]);
}

}  // namespace

std::string trace(const std::vector<double>& x, const std::vector<double>& y, int columns,
                  bool unicode) {
  std::string out;
  if (x.size() < 2 || x.size() != y.size() || !(x.back() > x.front()) || columns < 2) return out;
  if (!std::all_of(y.begin(), y.end(), [](double v) { return std::isfinite(v); })) return out;
  const auto [low, high] = std::minmax_element(y.begin(), y.end());
  const double span = *high - *low;
  for (int i = 0; i < columns; ++i) {
    const double where = x.front() + (x.back() - x.front()) * (i + 0.5) / columns;
    const double share = span > 0 ? (value_at(x, y, where) - *low) / span : 0.0;
    const auto level = static_cast<std::size_t>(
        std::clamp(static_cast<int>(std::floor(share * levels)), 0, levels - 1));
    out += unicode ? blocks[level] : plain[level];
  }
  return out;
}

std::string bar(double share, int columns, bool unicode) {
  std::string out;
  if (!(share > 0)) return out;
  const int full = std::clamp(static_cast<int>(std::lround(share * columns)), 0, columns);
  for (int i = 0; i < full; ++i) out += unicode ? "\u2588" : "#";
  if (full == 0) out += unicode ? "\u258f" : ".";
  return out;
}

}  // namespace lossline::report
