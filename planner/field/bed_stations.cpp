// The two sums that join bed and cavity: the sinks a place of the bed adds, and the heat the
// solved field leaves there. They stand side by side because they must stay the same sum.

#include <cmath>

#include "planner/base/constants.h"
#include "planner/field/cavity_network.h"
#include "planner/field/range.h"

namespace lossline::field {

void add_station(CavityInput& cavity, const AngleClasses& classes, const BedOptics& optics,
                 double dx) {
  const std::size_t n = classes.size();
  const double count = static_cast<double>(n);
  in_range("length of a station", dx, "m", 0, largest_length);
  in_range("bed width", cavity.bed_width, "m", 0, cavity.width);
  in_range("classes of the bed", static_cast<double>(optics.bed_top.size()), "(1)", count, count);
  for (auto* list : {&cavity.bed_top, &cavity.bed_bottom, &cavity.belt_top, &cavity.belt_bottom,
                     &cavity.bed_side, &cavity.transmitted})
    if (list->empty()) list->resize(n, 0.0);
  for (std::size_t i = 0; i < n; ++i) {
    const double face = 0.5 * classes.mu(i) * dx;
    const double bed = face * cavity.bed_width;
    cavity.bed_top[i] += bed * optics.bed_top[i];
    cavity.bed_bottom[i] += bed * optics.bed_bottom[i];
    cavity.belt_top[i] += bed * optics.belt_top[i];
    cavity.belt_bottom[i] += bed * optics.belt_bottom[i];
    cavity.transmitted[i] += bed * optics.transmitted[i] + face * (cavity.width - cavity.bed_width);
    cavity.bed_side[i] += dx * optics.depth * optics.side[i];  // two faces, each depth/2 per metre
  }
}

double bed_heat_per_length(const AngleClasses& classes, const BedOptics& optics,
                           const CavityResult& field, double bed_width, double depth) {
  double faces = 0, sides = 0;
  for (std::size_t i = 0; i < classes.size(); ++i) {
    const double weight = classes.weight(i);
    faces += weight * classes.mu(i) *
             (field.S_upper[i] * optics.bed_top[i] + field.S_lower[i] * optics.bed_bottom[i]);
    sides += weight * (field.S_upper[i] + field.S_lower[i]) * optics.side[i];
  }
  return 0.5 * (bed_width * faces + depth * sides);
}

double rms_field(double S) {
  return std::sqrt(vacuum_impedance * in_range("power density", S, "W/m2", 0, 1e18));
}

}  // namespace lossline::field
