#include "planner/field/openings.h"

#include <algorithm>
#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/field/range.h"
#include "planner/field/waveguide.h"

namespace lossline::field {
namespace {

constexpr double tiny = std::numeric_limits<double>::min();
constexpr double te11_root = 1.8411837813406593;  // first zero of J1', Abramowitz, Stegun table 9.5
constexpr double euler_gamma = 0.5772156649015329;

double wave_number(double frequency) {
  return 2 * pi * frequency_in_range(frequency) / speed_of_light;
}

void check_opening(double width, double height) {
  in_range("opening width", width, "m", tiny, largest_length);
  in_range("opening height", height, "m", tiny, largest_length);
}

/// [dB/m] of a mode with cut-off wave number kc, 0 when it propagates.
double below_cutoff(double kc, double frequency, double filling) {
  in_range("eps' of the filling", filling, "(1)", 1, 1e6);
  const double k = wave_number(frequency) * std::sqrt(filling);
  return k < kc ? decibels_per_neper * std::sqrt((kc - k) * (kc + k)) : 0.0;
}

}  // namespace

long long propagating_channels(double frequency, double width, double height) {
  check_opening(width, height);
  const double k = wave_number(frequency);
  in_range("number of channels", k * k * width * height / (2 * pi), "(1)", 0, 1e9);
  long long count = 0;
  for (long long m = 0;; ++m) {
    const double x = static_cast<double>(m) * pi / width;
    if (!(x < k)) break;
    for (long long n = m == 0 ? 1 : 0;; ++n) {
      const double y = static_cast<double>(n) * pi / height;
      if (!(x * x + y * y < k * k)) break;
      count += m > 0 && n > 0 ? 2 : 1;
    }
  }
  return count;
}

double opening_cross_section(double frequency, double width, double height, double passed_share) {
  in_range("passed share", passed_share, "(1)", 0, 1);
  const auto channels = static_cast<double>(propagating_channels(frequency, width, height));
  const double lambda = speed_of_light / frequency;
  return channels * lambda * lambda / (8 * pi) * passed_share;
}

bool wide_slot(double frequency, double width, double height, double filling) {
  return !(slot_attenuation(frequency, width, height, filling) > 0);
}

double slot_attenuation(double frequency, double width, double height, double filling) {
  check_opening(width, height);
  return below_cutoff(pi / std::max(width, height), frequency, filling);
}

double tube_attenuation(double frequency, double bore, double filling) {
  in_range("bore", bore, "m", tiny, largest_length);
  return below_cutoff(2 * te11_root / bore, frequency, filling);
}

double leaving_power(double S, double channels_m2, double attenuation_dB) {
  in_range("power density", S, "W/m2", 0, 1e18);
  in_range("cross section of the opening", channels_m2, "m2", 0, 1e6);
  in_range("attenuation", attenuation_dB, "dB", 0, 1e6);
  return S * channels_m2 * std::pow(10.0, -attenuation_dB / 10);
}

LeakEstimate leak_estimate(double frequency, double width, double height, double leaving_W,
                           double distance) {
  check_opening(width, height);
  in_range("leaving power", leaving_W, "W", 0, 1e9);
  in_range("distance", distance, "m", 0, largest_length);
  const double half_wave = pi / wave_number(frequency);
  LeakEstimate out;
  out.surface = width * height + pi * distance * (width + height) + 2 * pi * distance * distance;
  out.mean = leaving_W / out.surface;
  const double speckles = std::max(1.0, out.surface / (half_wave * half_wave));
  out.peak = out.mean * std::max(1.0, euler_gamma + std::log(speckles));
  out.low = out.mean / 10;
  out.high = std::max(10 * out.mean, out.peak);
  return out;
}

}  // namespace lossline::field
