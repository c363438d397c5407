#include "planner/field/bed_optics.h"

#include <array>
#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/field/range.h"
#include "planner/field/stack_kernel.h"

namespace lossline::field {
namespace {

using kernel::Complex;
using kernel::LayerWave;

/// Shares of one class, summed over both polarisations.
struct ClassShares {
  double bed_top = 0, bed_bottom = 0, belt_top = 0, belt_bottom = 0, transmitted = 0;
};

ClassShares covered(double k0, double mu, const LayerWave& bed, const LayerWave& belt) {
  const std::array<LayerWave, 2> down{bed, belt}, up{belt, bed};
  std::array<Complex, 3> reflected;
  std::array<kernel::Amplitude, 2> at;
  ClassShares sum;
  for (const bool tm : {false, true}) {
    sum.transmitted += kernel::trace(down, mu, tm, false, reflected, at).transmittance;
    sum.bed_top += kernel::absorbed(k0, bed, at[0], mu, tm);
    sum.belt_top += kernel::absorbed(k0, belt, at[1], mu, tm);
    kernel::trace(up, mu, tm, false, reflected, at);
    sum.belt_bottom += kernel::absorbed(k0, belt, at[0], mu, tm);
    sum.bed_bottom += kernel::absorbed(k0, bed, at[1], mu, tm);
  }
  return sum;
}

void add_bare_belt(double k0, double mu, const LayerWave& belt, double coverage, ClassShares& sum) {
  std::array<Complex, 2> reflected;
  std::array<kernel::Amplitude, 1> at;
  double passed = 0, taken = 0;
  for (const bool tm : {false, true}) {
    passed += kernel::trace({&belt, 1}, mu, tm, false, reflected, at).transmittance;
    taken += kernel::absorbed(k0, belt, at[0], mu, tm);
  }
  const double bare = 1 - coverage;
  sum.bed_top *= coverage;
  sum.bed_bottom *= coverage;
  sum.belt_top = coverage * sum.belt_top + bare * taken;
  sum.belt_bottom = coverage * sum.belt_bottom + bare * taken;
  sum.transmitted = coverage * sum.transmitted + bare * passed;
}

/// Mean of x a(x) over the azimuths of a class, both polarisations averaged.
double side_mean(double k0, Complex eps, double width, std::span<const double> cosines,
                 std::span<const double> weights, bool opaque) {
  double sum = 0;
  for (std::size_t k = 0; k < cosines.size(); ++k) {
    const double x = cosines[k];
    const Complex kz = kernel::decaying_root({(eps.real() - 1) + x * x, eps.imag()});
    const Complex tm = x * eps;
    // Power that enters a half-space, without the cancellation of 1 - R.
    const double in_te = 4 * x * kz.real() / kernel::squared(kz + x);
    const double in_tm =
        4 * (tm.real() * kz.real() + tm.imag() * kz.imag()) / kernel::squared(tm + kz);
    if (opaque) {
      sum += weights[k] * x * (in_te + in_tm);
    } else {
      const double lost = -std::expm1(2 * k0 * kz.imag() * width), left = 1 - lost;
      // The written form stays finite without loss, where both parts vanish.
      sum += weights[k] * x *
             (in_te * lost / (lost + in_te * left) + in_tm * lost / (lost + in_tm * left));
    }
  }
  return 0.5 * sum;
}

}  // namespace

void check_section(const BedSection& section) {
  constexpr double most = 1e6;
  frequency_in_range(section.frequency);
  in_range("eps' of the bed", section.eps.real(), "(1)", 1, most);
  in_range("eps'' of the bed", -section.eps.imag(), "(1)", 0, most);
  in_range("bed depth", section.depth, "m", 0, largest_length);
  in_range("bed width", section.width, "m", std::numeric_limits<double>::min(), largest_length);
  in_range("eps' of the belt", section.belt_eps.real(), "(1)", 1, most);
  in_range("eps'' of the belt", -section.belt_eps.imag(), "(1)", 0, most);
  in_range("belt thickness", section.belt_thickness, "m", 0, largest_length);
  in_range("coverage", section.coverage, "(1)", 0, 1);
}

BedOptics bed_optics(const AngleClasses& classes, const BedSection& section) {
  check_section(section);
  const std::size_t n = classes.size();
  const double k0 = 2 * pi * section.frequency / speed_of_light;
  BedOptics out;
  for (auto* list : {&out.bed_top, &out.bed_bottom, &out.belt_top, &out.belt_bottom,
                     &out.transmitted, &out.side})
    list->resize(n);
  out.depth = section.depth;
  // Wide against the penetration depth: what enters a side face does not come out of the other.
  const bool opaque = section.width > 20 * side_penetration_depth(section.frequency, section.eps);
  for (std::size_t i = 0; i < n; ++i) {
    const double mu = classes.mu(i);
    const LayerWave bed = kernel::layer_wave(k0, section.eps, section.depth, mu);
    const LayerWave belt = kernel::layer_wave(k0, section.belt_eps, section.belt_thickness, mu);
    ClassShares sum = covered(k0, mu, bed, belt);
    if (section.coverage < 1) add_bare_belt(k0, mu, belt, section.coverage, sum);
    out.bed_top[i] = 0.5 * sum.bed_top;
    out.bed_bottom[i] = 0.5 * sum.bed_bottom;
    out.belt_top[i] = 0.5 * sum.belt_top;
    out.belt_bottom[i] = 0.5 * sum.belt_bottom;
    out.transmitted[i] = 0.5 * sum.transmitted;
    if (section.depth > 0 && section.eps.imag() < 0)
      out.side[i] =
          section.coverage * side_mean(k0, section.eps, section.width, classes.lateral_cosines(i),
                                       classes.lateral_weights(), opaque);
  }
  return out;
}

double side_penetration_depth(double frequency, std::complex<double> eps) {
  frequency_in_range(frequency);
  in_range("eps'", eps.real(), "(1)", 1, 1e12);
  in_range("eps''", -eps.imag(), "(1)", 0, 1e12);
  const double alpha = -4 * pi * frequency / speed_of_light * kernel::decaying_root(eps).imag();
  return alpha > 0 ? 1 / alpha : std::numeric_limits<double>::infinity();
}

double mean_bed_absorptance(const AngleClasses& classes, const BedOptics& optics) {
  double sum = 0;
  for (std::size_t i = 0; i < classes.size(); ++i)
    sum += classes.weight(i) * classes.mu(i) * (optics.bed_top[i] + optics.bed_bottom[i]);
  return sum;
}

}  // namespace lossline::field
