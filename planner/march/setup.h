#pragma once
// Everything of a solve that does not change from round to round.

#include <string>
#include <vector>

#include "planner/bed/bed_material.h"
#include "planner/field/angle_classes.h"
#include "planner/field/cavity_network.h"
#include "planner/line/flow.h"
#include "planner/line/topology.h"
#include "planner/march/belt_system.h"
#include "planner/march/grid.h"
#include "planner/march/march.h"

namespace lossline::march {

/// One powered or idle cavity.
struct Cavity {
  std::size_t stretch = 0;
  double frequency = 0;   ///< [Hz]; 0 when no generator feeds it
  double launched = 0;    ///< [W]
  double open_upper = 0;  ///< cross section of its open ends [m2]
};

/// A generator's branch with the losses on its way.
struct Branch {
  std::size_t generator = 0;
  std::size_t cavity = 0;  ///< index into Setup::cavities
  double output = 0;       ///< leaves the flange [W]
  double run_share = 0;    ///< lost on one way through the run, 0..1
  double launched = 0;     ///< enters the cavity [W]
  double direct = 0;       ///< sent back at the launcher [W]
};

/// One end of the tunnel.
struct TunnelEnd {
  std::size_t cavity = 0;
  const EndTrap* trap = nullptr;
  double channels_area = 0;  ///< cross section of all channels before the reflective part [m2]
  double passed_share = 0;   ///< not sent back by the reflective part, 0..1
};

/// The fixed part of a solve. Keeps references to line and card.
struct Setup {
  const Line& line;
  const ProductCard& card;
  SolveOptions options;
  ProductFlow flow;
  Topology topology;
  std::vector<bed::Assumption> assumptions;
  bed::BedMaterial material;
  Grid grid;
  field::AngleClasses classes;
  std::vector<Cavity> cavities;
  std::vector<field::CavityLink> links;
  std::vector<Branch> branches;
  std::vector<TunnelEnd> ends;
  std::vector<bed::Surroundings> around;  ///< per stretch
  std::vector<std::size_t> loop_of;       ///< per stretch: air loop, or no_loop
  double solid_share = 1;  ///< pieces over bed volume, turns a piece's permittivity into the bed's

  static constexpr std::size_t no_loop = static_cast<std::size_t>(-1);

  /// Loaded width that is really covered [m].
  [[nodiscard]] double covered_width() const { return flow.width * flow.coverage; }
  /// Permittivity of the bed with marks.
  [[nodiscard]] Valued<std::complex<double>> bed_permittivity(double X, double T,
                                                              double frequency) const;
  /// Depth of the bed at moisture X [m].
  [[nodiscard]] double depth(double X) const;
};

/// Prepares a solve.
///
///   refusal  receives one sentence when the line cannot be solved at all; then the returned
///            setup must not be used
[[nodiscard]] Setup prepare(const Line& line, const ProductCard& card, const SolveOptions& options,
                            std::string& refusal);

}  // namespace lossline::march
