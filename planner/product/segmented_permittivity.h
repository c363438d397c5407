#pragma once
// Permittivity against moisture in two straight segments that meet at a critical moisture: bound
// water below with a small slope, freer water above with a steep one. The form is that of the
// rapeseed model in Materials 15(14), 4844, 2022 (abstract seen), which has sqrt(eps') linear.

#include <complex>

namespace lossline::product {

/// A quantity in two segments: value at the critical moisture and the slopes on either side.
struct TwoSegments {
  double at_critical = 0;  ///< unit of the quantity
  double slope_below = 0;  ///< per dry-basis moisture
  double slope_above = 0;  ///< per dry-basis moisture
};

/// The model at one temperature and one frequency.
struct SegmentedPermittivity {
  double critical_moisture = 0;  ///< x_c, dry basis [kg/kg]
  TwoSegments root;              ///< sqrt(eps')
  TwoSegments loss;              ///< eps''
};

/// The value at a moisture.
///
///   moisture  dry basis [kg/kg], 0 .. 100
///   returns   eps with eps' >= 1 and eps'' >= 0 (held there when a segment runs below)
///   throws    Error out_of_range
[[nodiscard]] std::complex<double> segmented_permittivity(const SegmentedPermittivity& model,
                                                          double moisture);

}  // namespace lossline::product
