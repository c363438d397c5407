#pragma once
// The field side of a round: what every station would absorb in its present state, all cavities
// solved as one linear system, and the heat that follows for every node.

#include <vector>

#include "planner/field/bed_optics.h"
#include "planner/march/pass.h"

namespace lossline::march {

/// What a station's permittivity is, with marks.
struct StationOptics {
  Valued<std::complex<double>> eps;
  field::BedOptics optics;
};

/// The solved field of one pass.
struct FieldRound {
  std::vector<double> heat;                  ///< next guess, as Iterate::heat
  std::vector<field::CavityInput> inputs;    ///< per cavity
  std::vector<field::CavityResult> results;  ///< per cavity
  std::vector<StationOptics> stations;       ///< per cavity node, cavity by cavity
  Flags flags;                               ///< of the permittivity, all stations
  double residual = 0;                       ///< of the linear system
};

/// Total heat nodes of all cavities.
[[nodiscard]] std::size_t heat_nodes(const Setup& setup);

/// First guess: every cavity hands `share` of its launched power to the bed, evenly.
[[nodiscard]] std::vector<double> even_heat(const Setup& setup, double share);

/// Evaluates all cavities after a pass. Cavities without power absorb nothing.
[[nodiscard]] FieldRound solve_field(const Setup& setup, const Pass& pass);

/// Share of launched power in the bed per cavity if the mixing were `s` everywhere, at the state
/// of the round.
[[nodiscard]] std::vector<double> bed_share_with_mixing(const Setup& setup, const FieldRound& round,
                                                        double s);

}  // namespace lossline::march
