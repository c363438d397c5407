#include "planner/product/propagation.h"

#include <cmath>
#include <limits>
#include <numbers>

#include "planner/base/constants.h"
#include "planner/product/range_check.h"

namespace lossline::product {
namespace {

constexpr double tiny = std::numeric_limits<double>::min();
constexpr double huge = std::numeric_limits<double>::max();

void check_wave(std::complex<double> eps, double frequency) {
  checked("eps'", eps.real(), "1", tiny, huge);
  checked("eps''", -eps.imag(), "1", 0, huge);
  checked("frequency", frequency, "Hz", tiny, huge);
}

}  // namespace

double attenuation_constant(std::complex<double> eps, double frequency) {
  check_wave(eps, frequency);
  const double tangent = -eps.imag() / eps.real();
  // sqrt(1+t^2)-1 written without its cancellation at small t
  const double root = std::sqrt(1 + tangent * tangent) + 1;
  return 2 * pi * frequency / speed_of_light * tangent * std::sqrt(0.5 * eps.real() / root);
}

double penetration_depth(std::complex<double> eps, double frequency) {
  return 1 / (2 * attenuation_constant(eps, frequency));
}

double penetration_depth_low_loss(std::complex<double> eps, double frequency) {
  check_wave(eps, frequency);
  return speed_of_light * std::sqrt(eps.real()) / (2 * pi * frequency * -eps.imag());
}

double half_power_depth(std::complex<double> eps, double frequency) {
  return std::numbers::ln2 * penetration_depth(eps, frequency);
}

double volumetric_power(double frequency, double loss, double field_rms) {
  checked("frequency", frequency, "Hz", tiny, huge);
  checked("eps''", loss, "1", 0, huge);
  checked("rms field", field_rms, "V/m", 0, huge);
  return 2 * pi * frequency * electric_constant * loss * field_rms * field_rms;
}

double surface_transmission(std::complex<double> eps) {
  check_wave(eps, 1);
  const std::complex<double> n = std::sqrt(eps);
  // 1 - |(1-n)/(1+n)|^2 = 4 Re n / |1+n|^2
  return 4 * n.real() / std::norm(1.0 + n);
}

}  // namespace lossline::product
