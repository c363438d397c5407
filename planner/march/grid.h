#pragma once
// Stations along the belt: every stretch is cut into equal segments, and quantities that vary
// along a stretch (heat from the field, air in counter-flow) are piecewise linear between nodes.
// Integrals of such a quantity are then exact trapezoid sums, so that what the cavity balance
// hands out and what the product receives agree to rounding.

#include <cstddef>
#include <vector>

#include "planner/line/line.h"

namespace lossline::march {

/// One segment between two neighbouring nodes.
struct Segment {
  std::size_t stretch = 0;  ///< index into Line::stretches
  double x0 = 0, x1 = 0;    ///< [m] from the start of the line
};

/// The cut line.
struct Grid {
  std::vector<Segment> segments;          ///< in belt order; node i lies before segment i
  std::vector<std::size_t> first, count;  ///< per stretch: first segment and how many
  [[nodiscard]] std::size_t nodes() const { return segments.size() + 1; }
};

/// Segments per microwave stretch and per other stretch.
struct GridChoice {
  std::size_t cavity = 12;
  std::size_t other = 6;
};

/// Cuts the stretches of a line.
[[nodiscard]] inline Grid cut(const Line& line, const GridChoice& choice) {
  Grid grid;
  double start = 0;
  for (std::size_t s = 0; s < line.stretches.size(); ++s) {
    const Stretch& stretch = line.stretches[s];
    const std::size_t n = stretch.kind == StretchKind::microwave ? choice.cavity : choice.other;
    grid.first.push_back(grid.segments.size());
    grid.count.push_back(n);
    for (std::size_t i = 0; i < n; ++i) {
      const double a = static_cast<double>(i) / static_cast<double>(n);
      const double b = static_cast<double>(i + 1) / static_cast<double>(n);
      grid.segments.push_back({s, start + a * stretch.length, start + b * stretch.length});
    }
    start += stretch.length;
  }
  return grid;
}

}  // namespace lossline::march
