#include "planner/field/bed_profile.h"

#include <array>

#include "planner/base/constants.h"
#include "planner/field/range.h"
#include "planner/field/stack_kernel.h"

namespace lossline::field {
namespace {

using kernel::Complex;
using kernel::LayerWave;

/// Adds the heat of one traced direction, cells in the order in which the wave meets them:
/// from cell 0 on, or upwards from the last one.
void add_cells(double k0, double mu, bool tm, double factor, const kernel::Amplitude& bed,
               std::span<const LayerWave> slices, bool upwards, std::span<Complex> returned,
               std::span<double> out) {
  const std::size_t n = slices.size();
  auto met = [&](std::size_t k) { return upwards ? n - 1 - k : k; };
  returned[n - 1] = bed.returned;
  for (std::size_t k = n - 1; k-- > 0;)
    returned[k] = kernel::times(returned[k + 1], slices[met(k + 1)].twice);
  double forward = bed.forward_square;
  for (std::size_t k = 0; k < n; ++k) {
    const LayerWave& slice = slices[met(k)];
    out[met(k)] += factor * kernel::absorbed(k0, slice, {forward, returned[k]}, mu, tm);
    forward *= kernel::squared(slice.once);
  }
}

}  // namespace

BedProfile bed_profile(const AngleClasses& classes, const BedSection& section,
                       std::span<const double> boundaries) {
  check_section(section);
  in_range("number of cell faces", static_cast<double>(boundaries.size()), "(1)", 2, 1e5);
  in_range("first cell face", boundaries.front(), "(1)", 0, 0);
  in_range("last cell face", boundaries.back(), "(1)", 1, 1);
  BedProfile out;
  const std::size_t cells = boundaries.size() - 1;
  out.cells = cells;
  for (std::size_t c = 0; c < cells; ++c) {
    in_range("cell face", boundaries[c + 1], "(1)", boundaries[c], 1);
    out.cell_share.push_back(boundaries[c + 1] - boundaries[c]);
  }
  out.from_above.assign(classes.size() * cells, 0.0);
  out.from_below.assign(classes.size() * cells, 0.0);
  const double k0 = 2 * pi * section.frequency / speed_of_light;
  std::vector<LayerWave> slices(cells);
  std::vector<Complex> returned(cells);
  std::array<Complex, 3> reflected;
  std::array<kernel::Amplitude, 2> at;
  const double factor = 0.5 * section.coverage;
  for (std::size_t i = 0; i < classes.size(); ++i) {
    const double mu = classes.mu(i);
    const LayerWave bed = kernel::layer_wave(k0, section.eps, section.depth, mu);
    const LayerWave belt = kernel::layer_wave(k0, section.belt_eps, section.belt_thickness, mu);
    for (std::size_t c = 0; c < cells; ++c)
      slices[c] = c > 0 && out.cell_share[c] == out.cell_share[c - 1]
                      ? slices[c - 1]
                      : kernel::layer_wave(k0, section.eps, section.depth * out.cell_share[c], mu);
    const std::array<LayerWave, 2> down{bed, belt}, up{belt, bed};
    const std::span<double> above(out.from_above.data() + i * cells, cells);
    const std::span<double> below(out.from_below.data() + i * cells, cells);
    for (const bool tm : {false, true}) {
      kernel::trace(down, mu, tm, false, reflected, at);
      add_cells(k0, mu, tm, factor, at[0], slices, false, returned, above);
      kernel::trace(up, mu, tm, false, reflected, at);
      add_cells(k0, mu, tm, factor, at[1], slices, true, returned, below);
    }
  }
  return out;
}

BedProfile bed_profile(const AngleClasses& classes, const BedSection& section, int cells) {
  in_range("number of cells", cells, "(1)", 1, 1e4);
  std::vector<double> boundaries;
  for (int c = 0; c <= cells; ++c) boundaries.push_back(static_cast<double>(c) / cells);
  return bed_profile(classes, section, boundaries);
}

void cell_heat_per_length(const AngleClasses& classes, const BedProfile& profile,
                          const BedOptics& optics, const CavityResult& field, double bed_width,
                          std::span<double> heat) {
  const double cells = static_cast<double>(profile.cells);
  in_range("room for cells", static_cast<double>(heat.size()), "(1)", cells, cells);
  double side = 0;
  for (std::size_t i = 0; i < classes.size(); ++i)
    side += classes.weight(i) * (field.S_upper[i] + field.S_lower[i]) * optics.side[i];
  side *= 0.5 * optics.depth;
  for (std::size_t c = 0; c < profile.cells; ++c) heat[c] = side * profile.cell_share[c];
  for (std::size_t i = 0; i < classes.size(); ++i) {
    const double area = 0.5 * classes.weight(i) * classes.mu(i) * bed_width;
    const double above = area * field.S_upper[i], below = area * field.S_lower[i];
    const double* from_above = profile.from_above.data() + i * profile.cells;
    const double* from_below = profile.from_below.data() + i * profile.cells;
    for (std::size_t c = 0; c < profile.cells; ++c)
      heat[c] += above * from_above[c] + below * from_below[c];
  }
}

}  // namespace lossline::field
