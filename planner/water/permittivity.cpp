#include "planner/water/permittivity.h"

#include <cmath>

#include "planner/base/constants.h"
#include "planner/water/water_relaxation.h"

namespace lossline::water {

using Complex = std::complex<double>;

Complex pure_water_ellison(double frequency, double T, Beyond beyond) {
  check_state("Ellison 2007", ellison_range, frequency, T, beyond);
  struct Relaxation {
    double a, b, c, d;  // 1, 1/degC, s, degC
  };
  // [E07] Table 2.
  static constexpr Relaxation relaxations[] = {{79.23882, 0.004300598, 1.382264e-13, 652.7648},
                                               {3.815866, 0.01117295, 3.510354e-16, 1249.533},
                                               {1.634967, 0.006841548, 6.30035e-15, 405.5169}};
  constexpr double tc = 133.1383;
  const double t = T - celsius_zero, w = 2 * pi * frequency;
  const double eps_s = 87.9144 + t * (-0.404399 + t * (9.58726e-4 + t * -1.32802e-6));
  double real = eps_s, loss = 0;
  for (const Relaxation& r : relaxations) {
    const double x = w * r.c * std::exp(r.d / (t + tc));
    const double part = r.a * std::exp(-r.b * t) * x / (1 + x * x);
    real -= part * x;
    loss += part;
  }
  return {real, -loss};
}

Complex pure_water_kaatze(double frequency, double T, Beyond beyond) {
  check_state("Kaatze 1989", kaatze_range, frequency, T, beyond);
  const KaatzeParameters k = kaatze_parameters(T);
  return k.eps_inf + (k.eps_s - k.eps_inf) / Complex(1, 2 * pi * frequency * k.tau);
}

Complex pure_water_meissner_wentz(double frequency, double T, Beyond beyond) {
  check_state("Meissner & Wentz 2004", meissner_wentz_range, frequency, T, beyond);
  return meissner_wentz_parameters(T).at(frequency);
}

Complex pure_water_itu(double frequency, double T, Beyond beyond) {
  check_state("ITU-R P.527-4", itu_range, frequency, T, beyond);
  const double theta = 300 / T - 1;
  TwoRelaxations m;
  m.eps_s = 77.66 + 103.3 * theta;
  m.eps_1 = 0.0671 * m.eps_s;
  m.eps_inf = 3.52 - 7.52 * theta;
  m.f1 = 1e9 * (20.20 + theta * (-146.4 + theta * 316));
  m.f2 = 39.8 * m.f1;
  return m.at(frequency);
}

double ionic_loss(double conductivity, double frequency) {
  checked("conductivity", "S/m", conductivity, 0, 1e8);
  checked("frequency", "Hz", frequency, model_frequency_min, extrapolation_frequency_max);
  return conductivity / (2 * pi * frequency * electric_constant);
}

double LossSplit::loss(double frequency) const {
  return dipole_slope * frequency + ionic_loss(conductivity, frequency);
}

std::optional<LossSplit> split_loss(double frequency_1, double loss_1, double frequency_2,
                                    double loss_2) {
  for (const double f : {frequency_1, frequency_2})
    checked("frequency", "Hz", f, model_frequency_min, extrapolation_frequency_max);
  for (const double loss : {loss_1, loss_2}) checked("loss factor", "1", loss, 0, 1e9);
  if (frequency_1 == frequency_2)
    throw Error(ErrorKind::out_of_range,
                fmt::format("loss factors at one frequency, {} Hz, cannot be split", frequency_1));
  LossSplit split;
  split.conductivity = 2 * pi * electric_constant * (loss_1 / frequency_1 - loss_2 / frequency_2) /
                       (1 / (frequency_1 * frequency_1) - 1 / (frequency_2 * frequency_2));
  if (!(split.conductivity >= 0)) return std::nullopt;
  split.dipole_slope = (loss_2 - ionic_loss(split.conductivity, frequency_2)) / frequency_2;
  if (!(split.dipole_slope >= 0)) return std::nullopt;
  return split;
}

}  // namespace lossline::water
