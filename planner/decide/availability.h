#pragma once
// How often enough units of a group work: k out of n independent, equal units.
//
// Source: IEC 61078, Reliability block diagrams (from memory); the binomial sum itself is textbook.

namespace lossline::decide {

/// Probability that at least k of n units work.
///
///   k, n          0 <= k <= n, 1 <= n <= 1000
///   availability  of one unit, 0..1
///   returns       0..1
///   throws        Error out_of_range
///
/// Sums whichever tail is shorter, from logarithms of the binomial terms: good to about 1e-12
/// absolute for any n allowed.
[[nodiscard]] double k_out_of_n(int k, int n, double availability);

}  // namespace lossline::decide
