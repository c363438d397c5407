#pragma once
// How the heat of every angle class is spread through the depth of the bed, for the march that
// resolves the depth. Same layered solution as planner/field/bed_optics.h, cut into cells.

#include <cstddef>
#include <span>
#include <vector>

#include "planner/field/bed_optics.h"
#include "planner/field/cavity_network.h"

namespace lossline::field {

/// Absorptance per class and cell; the sum over the cells of a class is BedOptics::bed_top or
/// bed_bottom of that class.
struct BedProfile {
  std::size_t cells = 0;
  std::vector<double> from_above, from_below;  ///< [class * cells + cell], cell 0 at the top
  std::vector<double> cell_share;              ///< thickness of a cell over the bed's depth
};

/// The profile on given cells.
///
///   boundaries  cell faces as shares of the depth from the top, ascending from 0 to 1, 2 or more
///   throws      Error out_of_range
BedProfile bed_profile(const AngleClasses& classes, const BedSection& section,
                       std::span<const double> boundaries);

/// The profile on equal cells, 1 .. 10000.
BedProfile bed_profile(const AngleClasses& classes, const BedSection& section, int cells);

/// Heat per length of belt in every cell. The side faces heat all depths alike. The sum over the
/// cells is bed_heat_per_length of the same place.
///
///   optics   of the same section
///   heat     room for profile.cells numbers [W/m], filled
///   throws   Error out_of_range when the room does not fit
void cell_heat_per_length(const AngleClasses& classes, const BedProfile& profile,
                          const BedOptics& optics, const CavityResult& field, double bed_width,
                          std::span<double> heat);

}  // namespace lossline::field
