#pragma once
// The permittivity of a product as the march asks for it: one virtual call per state, whatever
// stands behind it (a measured table, a published equation, an estimate from composition).
// Convention: relative permittivity eps = eps' - j eps'' (time factor exp(+jwt)).

#include <complex>

#include "planner/product/flags.h"

namespace lossline {

/// What a stored permittivity describes; see materials of a bed against the bed itself.
enum class Phase {
  bulk,      ///< the bed as it lies on the belt, air between the pieces included
  particle,  ///< one piece (kernel, leaf, bead, blank) without the air around it
};

/// Permittivity against moisture, temperature and frequency. Immutable; any thread.
class Permittivity {
 public:
  virtual ~Permittivity() = default;

  /// Relative complex permittivity.
  ///
  ///   moisture     dry basis [kg/kg], >= 0
  ///   temperature  [K]
  ///   frequency    [Hz]
  ///   returns      eps with eps' >= 1 and eps'' >= 0, and marks: in range, edge, extrapolated,
  ///                clamped, estimated ...
  ///   throws       Error out_of_range, listing the ranges available, where the data forbid
  ///                an answer
  [[nodiscard]] virtual Valued<std::complex<double>> at(double moisture, double temperature,
                                                        double frequency) const = 0;
};

}  // namespace lossline
