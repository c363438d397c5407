#pragma once
// The product stream that follows from a line's duty, feed and belt: any consistent set of
// rate, speed, width, depth and density is enough, and a contradicting set is reported with its
// closing error.
//
// Identity: dry-solids flow = dry density x loaded width x depth x coverage x belt speed.

#include <string>
#include <vector>

#include "planner/line/line.h"
#include "planner/product/card.h"

namespace lossline {

/// The resolved stream. SI; moisture dry basis.
struct ProductFlow {
  double dry_solids = 0;      ///< [kg/s]
  double feed = 0;            ///< wet product in [kg/s]
  double speed = 0;           ///< belt [m/s]
  double width = 0;           ///< loaded width [m]
  double depth = 0;           ///< at feed moisture [m]
  double coverage = 1;        ///< share of width x length really covered, 0..1
  double dry_areal_mass = 0;  ///< dry solid per covered area [kg/m2]
  double dry_density = 0;     ///< dry solid per bed or piece volume at feed moisture [kg/m3]
};

/// A contradiction or gap among the inputs, in terms of line-file keys.
struct FlowProblem {
  std::string key;    ///< the key to blame, "belt.speed"
  std::string wrong;  ///< with the closing error in % where one exists
  std::string right;
};

/// Closing errors up to this are rounding in the inputs, and the stated rate is kept.
inline constexpr double flow_closing_tolerance = 0.005;

/// Resolves the stream.
///
///   line, card  the card supplies the dry bulk density where the line file gives none
///   problems    receives what is missing or contradicts; empty afterwards means success
///   returns     the stream; meaningless when problems is not empty
[[nodiscard]] ProductFlow resolve_flow(const Line& line, const ProductCard& card,
                                       std::vector<FlowProblem>& problems);

}  // namespace lossline
