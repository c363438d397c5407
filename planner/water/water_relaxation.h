#pragma once
// Parts shared by the equations for pure and salt water: range check, one and two relaxations.
// Sources in permittivity.h.

#include <cmath>
#include <complex>

#include "planner/base/constants.h"
#include "planner/water/permittivity.h"
#include "planner/water/range_check.h"

namespace lossline::water {

/// Refuses what lies outside the range of the model or, when extrapolating, outside liquid water.
inline void check_state(const char* model, const ModelRange& range, double frequency, double T,
                        Beyond beyond) {
  if (beyond == Beyond::extrapolate) {
    checked("temperature of water", "K", T, extrapolation_T_min, extrapolation_T_max);
    checked("frequency", "Hz", frequency, model_frequency_min, extrapolation_frequency_max);
    return;
  }
  if (T >= range.T_min && T <= range.T_max && frequency >= model_frequency_min &&
      frequency <= range.frequency_max)
    return;
  throw Error(ErrorKind::out_of_range,
              fmt::format("permittivity of water by {} at {} K and {} Hz is outside [{}, {}] K, "
                          "[{}, {}] Hz",
                          model, T, frequency, range.T_min, range.T_max, model_frequency_min,
                          range.frequency_max));
}

/// [K89]: static value, high-frequency value, relaxation time [s].
struct KaatzeParameters {
  double eps_s, eps_inf, tau;
};

inline KaatzeParameters kaatze_parameters(double T) {
  const double t = T - celsius_zero;
  return {std::pow(10.0, 1.94404 - 1.991e-3 * t), 5.77 - 2.74e-2 * t,
          3.745e-15 * (1 + 7e-5 * (t - 27.5) * (t - 27.5)) * std::exp(2295.7 / T)};
}

/// Two Debye relaxations at the frequencies f1, f2 [Hz].
struct TwoRelaxations {
  double eps_s, eps_1, eps_inf, f1, f2;

  [[nodiscard]] std::complex<double> at(double frequency) const {
    using Complex = std::complex<double>;
    return (eps_s - eps_1) / Complex(1, frequency / f1) +
           (eps_1 - eps_inf) / Complex(1, frequency / f2) + eps_inf;
  }
};

/// [MW04] for pure water: equation 8 with a0 .. a10 of Table III.
inline TwoRelaxations meissner_wentz_parameters(double T) {
  const double t = T - celsius_zero;
  return {(37088.6 - 82.168 * t) / (421.854 + t), 5.7230 + t * (2.2379e-2 + t * -7.1237e-4),
          3.6143 + t * 2.8841e-2, 1e9 * (45 + t) / (5.0478 + t * (-7.0315e-2 + t * 6.0059e-4)),
          1e9 * (45 + t) / (0.13652 + t * (1.4825e-3 + t * 2.4166e-4))};
}

}  // namespace lossline::water
