#pragma once
// A course along the belt drawn in one line of text.

#include <string>
#include <vector>

namespace lossline::report {

/// Draws y over x as one row of `columns` characters, low to high between the extremes of y.
///
///   x, y     same length, x not decreasing; where x repeats (a step) the later value counts
///   columns  > 1
///   unicode  eighth blocks; otherwise eight ASCII characters of growing darkness
///   returns  the row; empty when there are fewer than two points
[[nodiscard]] std::string trace(const std::vector<double>& x, const std::vector<double>& y,
                                int columns, bool unicode);

/// A bar of up to `columns` characters for a share of 0 to 1.
[[nodiscard]] std::string bar(double share, int columns, bool unicode);

}  // namespace lossline::report
