#include "planner/field/uniformity.h"

#include <algorithm>
#include <cmath>

#include "planner/base/constants.h"
#include "planner/field/bed_optics.h"
#include "planner/field/range.h"

namespace lossline::field {

double independent_places(double frequency, double travel) {
  in_range("heated length", travel, "m", 0, largest_length);
  return std::max(1.0, 2 * travel * frequency_in_range(frequency) / speed_of_light);
}

double independent_frequencies(double frequency, double quality, double bandwidth) {
  in_range("quality factor", quality, "(1)", 0, 1e12);
  in_range("bandwidth of the source", bandwidth, "Hz", 0, highest_frequency);
  return 1 + bandwidth * quality / (pi * frequency_in_range(frequency));
}

double effective_number(std::span<const double> powers) {
  double sum = 0, squares = 0;
  for (const double p : powers) {
    sum += in_range("power", p, "W", 0, 1e12);
    squares += p * p;
  }
  return squares > 0 ? sum * sum / squares : 0.0;
}

double ideal_variation(const UniformityInput& input) {
  in_range("effective launchers", input.launchers, "(1)", 1, 1e6);
  in_range("effective cavities", input.cavities, "(1)", 1, 1e6);
  in_range("field components", input.polarisations, "(1)", 1, 3);
  const double samples =
      input.polarisations * independent_places(input.frequency, input.travel) *
      independent_frequencies(input.frequency, input.quality, input.source_bandwidth) *
      input.launchers * input.cavities;
  return 1 / std::sqrt(samples);
}

double edge_strip(double frequency, std::complex<double> eps, double bed_width) {
  in_range("bed width", bed_width, "m", 0, largest_length);
  return std::min(side_penetration_depth(frequency, eps), bed_width / 2);
}

}  // namespace lossline::field
