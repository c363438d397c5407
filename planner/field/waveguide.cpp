#include "planner/field/waveguide.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/field/conductor.h"
#include "planner/field/range.h"

namespace lossline::field {
namespace {

constexpr double tiny = std::numeric_limits<double>::min();

/// [EIA] inch sizes: width and height.
constexpr double inch = 0.0254;
constexpr std::array sections{
    StandardSection{11.5 * inch, 5.75 * inch, "R8", "WR-1150"},
    StandardSection{9.75 * inch, 4.875 * inch, "R9", "WR-975"},
    StandardSection{7.7 * inch, 3.85 * inch, "R12", "WR-770"},
    StandardSection{6.5 * inch, 3.25 * inch, "R14", "WR-650"},
    StandardSection{4.3 * inch, 2.15 * inch, "R22", "WR-430"},
    StandardSection{3.4 * inch, 1.7 * inch, "R26", "WR-340"},
    StandardSection{2.84 * inch, 1.34 * inch, "R32", "WR-284"},
    StandardSection{1.872 * inch, 0.872 * inch, "R48", "WR-187"},
    StandardSection{1.59 * inch, 0.795 * inch, "R58", "WR-159"},
    StandardSection{1.372 * inch, 0.622 * inch, "R70", "WR-137"},
};

/// sqrt(1 - (fc/f)^2) above cut-off.
double slowing(double frequency, double width, double filling) {
  frequency_in_range(frequency);
  const double ratio = te10_cutoff(width, filling) / frequency;
  if (ratio < 1) return std::sqrt(1 - ratio * ratio);
  throw Error(ErrorKind::out_of_range,
              fmt::format("frequency = {:.4g} MHz does not propagate in a guide {:.4g} mm wide; it "
                          "must be above {:.4g} MHz",
                          frequency * 1e-6, width * 1e3, ratio * frequency * 1e-6));
}

double wave_number(double frequency, double filling) {
  return 2 * pi * frequency / speed_of_light * std::sqrt(filling);
}

}  // namespace

std::span<const StandardSection> standard_sections() {
  return sections;
}

double te10_cutoff(double width, double filling) {
  in_range("guide width", width, "m", tiny, largest_length);
  in_range("eps' of the filling", filling, "(1)", 1, 1e6);
  return speed_of_light / (2 * width * std::sqrt(filling));
}

double next_cutoff(double width, double height, double filling) {
  in_range("guide height", height, "m", tiny, width);
  return te10_cutoff(std::max(width / 2, height), filling);
}

bool single_mode(double frequency, double width, double height, double filling) {
  frequency_in_range(frequency);
  return frequency > te10_cutoff(width, filling) && frequency < next_cutoff(width, height, filling);
}

double guide_wavelength(double frequency, double width, double filling) {
  const double s = slowing(frequency, width, filling);
  return 2 * pi / (wave_number(frequency, filling) * s);
}

double te10_impedance(double frequency, double width, double filling) {
  const double s = slowing(frequency, width, filling);
  return vacuum_impedance / (std::sqrt(filling) * s);
}

double te10_wall_loss(double frequency, double width, double height, double resistivity,
                      double filling) {
  in_range("guide height", height, "m", tiny, largest_length);
  const double s = slowing(frequency, width, filling);
  const double k = wave_number(frequency, filling);
  const double Rs = surface_resistance(frequency, {resistivity, 1, 1});
  const double nepers =
      Rs * (2 * height * pi * pi + width * width * width * k * k) /
      (width * width * width * height * k * s * k * vacuum_impedance / std::sqrt(filling));
  return decibels_per_neper * nepers;
}

double te10_filling_loss(double frequency, const Guide& guide) {
  in_range("eps'' of the filling", -guide.filling.imag(), "(1)", 0, 1e6);
  const double s = slowing(frequency, guide.width, guide.filling.real());
  const double k = wave_number(frequency, guide.filling.real());
  const double tangent = -guide.filling.imag() / guide.filling.real();
  return decibels_per_neper * k * tangent / (2 * s);
}

double run_loss(double length, double loss_dB_per_m, double excess_factor) {
  in_range("run length", length, "m", 0, 1e5);
  in_range("loss of the guide", loss_dB_per_m, "dB/m", 0, 1e6);
  in_range("excess factor", excess_factor, "(1)", 1, 100);
  return length * loss_dB_per_m * excess_factor;
}

double lost_share(double decibels) {
  return -std::expm1(-in_range("loss", decibels, "dB", 0, 1e9) * (std::log(10.0) / 10));
}

}  // namespace lossline::field
