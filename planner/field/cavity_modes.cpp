#include "planner/field/cavity_modes.h"

#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/field/range.h"
#include "planner/field/waveguide.h"

namespace lossline::field {
namespace {

constexpr double tiny = std::numeric_limits<double>::min();
constexpr double infinite = std::numeric_limits<double>::infinity();

void check(double frequency, const Box& box) {
  frequency_in_range(frequency);
  in_range("box length", box.length, "m", tiny, largest_length);
  in_range("box width", box.width, "m", tiny, largest_length);
  in_range("box height", box.height, "m", tiny, largest_length);
}

double checked_volume(double volume) {
  return in_range("volume", volume, "m3", tiny, 1e9);
}

double wavelength(double frequency) {
  return speed_of_light / frequency_in_range(frequency);
}

}  // namespace

double smooth_mode_count(double frequency, const Box& box) {
  check(frequency, box);
  const double x = frequency / speed_of_light;
  return 8 * pi / 3 * box.volume() * x * x * x - (box.length + box.width + box.height) * x + 0.5;
}

double mode_density(double frequency, const Box& box) {
  check(frequency, box);
  const double x = frequency / speed_of_light;
  return (8 * pi * box.volume() * x * x - (box.length + box.width + box.height)) / speed_of_light;
}

long long mode_count(double frequency, const Box& box) {
  in_range("number of modes", smooth_mode_count(frequency, box), "(1)", -1e9, 1e9);
  // (m/a)^2 + (n/b)^2 + (p/d)^2 <= (2f/c)^2
  const double radius = 2 * frequency / speed_of_light;
  long long count = 0;
  const auto most_m = static_cast<long long>(radius * box.length);
  for (long long m = 0; m <= most_m; ++m) {
    const double x = static_cast<double>(m) / box.length;
    const double left_m = radius * radius - x * x;
    if (!(left_m >= 0)) continue;
    const auto most_n = static_cast<long long>(std::sqrt(left_m) * box.width);
    for (long long n = 0; n <= most_n; ++n) {
      if (m == 0 && n == 0) continue;  // two zeros: no field
      const double y = static_cast<double>(n) / box.width;
      const double left = left_m - y * y;
      if (!(left >= 0)) continue;
      const auto most_p = static_cast<long long>(std::sqrt(left) * box.height);
      if (m > 0 && n > 0)
        count += 1 + 2 * most_p;  // p = 0 once, every other p twice
      else
        count += most_p;  // p = 0 has two zeros
    }
  }
  return count;
}

long long modes_in_band(double from, double to, const Box& box) {
  in_range("upper end of the band", to, "Hz", from, highest_frequency);
  return mode_count(to, box) - mode_count(from, box);
}

double modal_overlap(double frequency, double length, double width, double height, double Q) {
  in_range("quality factor", Q, "(1)", 0, infinite);
  const double density = mode_density(frequency, {length, width, height});
  return Q > 0 ? density * frequency / Q : infinite;
}

double hot_spot_pitch(double frequency) {
  return wavelength(frequency) / 2;
}

double frequency_of_pitch(double pitch) {
  return speed_of_light / (2 * in_range("pitch of hot spots", pitch, "m", 1e-6, largest_length));
}

double wall_quality(double frequency, const Box& box, const Conductor& metal) {
  check(frequency, box);
  return 3 * box.volume() /
         (2 * metal.relative_permeability * box.surface() * skin_depth(frequency, metal) *
          metal.roughness_factor);
}

double absorber_quality(double frequency, double volume, double sigma) {
  in_range("absorption cross section", sigma, "m2", 0, 1e9);
  return 2 * pi * checked_volume(volume) / (wavelength(frequency) * sigma);
}

double leak_quality(double frequency, double volume, double sigma) {
  return 2 * absorber_quality(frequency, volume, sigma);
}

double port_quality(double frequency, double volume) {
  const double lambda = wavelength(frequency);
  return 16 * pi * pi * checked_volume(volume) / (lambda * lambda * lambda);
}

double hole_cross_section(double frequency, double radius) {
  in_range("hole radius", radius, "m", tiny, largest_length);
  const double ka = 2 * pi / wavelength(frequency) * radius, area = radius * radius;
  return ka >= 1.3 ? pi * area / 2 : 16 / (9 * pi) * ka * ka * ka * ka * area;
}

double joint_quality(double Q1, double Q2, double Q3, double Q4) {
  double sum = 0;
  for (const double Q : {Q1, Q2, Q3, Q4})
    sum += 1 / in_range("quality factor", Q, "(1)", tiny, infinite);
  return 1 / sum;
}

double mean_square_field(double frequency, double volume, double Q, double power) {
  in_range("quality factor", Q, "(1)", 0, std::numeric_limits<double>::max());
  in_range("power", power, "W", 0, 1e12);
  return Q * power /
         (2 * pi * frequency_in_range(frequency) * electric_constant * checked_volume(volume));
}

double te10l_length(double frequency, double width, int half_waves, double filling) {
  in_range("half waves", half_waves, "(1)", 1, 1e6);
  return half_waves * guide_wavelength(frequency, width, filling) / 2;
}

double te10l_frequency(const ResonantGuide& guide) {
  in_range("guide width", guide.width, "m", tiny, largest_length);
  in_range("guide height", guide.height, "m", tiny, largest_length);
  in_range("resonator length", guide.length, "m", tiny, largest_length);
  in_range("half waves", guide.half_waves, "(1)", 1, 1e6);
  in_range("eps' of the filling", guide.filling.real(), "(1)", 1, 1e6);
  in_range("eps'' of the filling", -guide.filling.imag(), "(1)", 0, 1e6);
  return speed_of_light / (2 * std::sqrt(guide.filling.real())) *
         std::hypot(1 / guide.width, guide.half_waves / guide.length);
}

double te10l_wall_quality(const ResonantGuide& guide, const Conductor& metal) {
  const double f = te10l_frequency(guide), index = std::sqrt(guide.filling.real());
  const double a = guide.width, b = guide.height, d = guide.length, l = guide.half_waves;
  const double k = 2 * pi * f / speed_of_light * index, kad = k * a * d;
  const double a3 = a * a * a, d3 = d * d * d;
  return kad * kad * kad * b * (vacuum_impedance / index) /
         (2 * pi * pi * surface_resistance(f, metal)) /
         (2 * l * l * a3 * b + 2 * b * d3 + l * l * a3 * d + a * d3);
}

double te10l_quality(const ResonantGuide& guide, const Conductor& metal) {
  return 1 / (1 / te10l_wall_quality(guide, metal) - guide.filling.imag() / guide.filling.real());
}

}  // namespace lossline::field
