#include "planner/water/salt_permittivity.h"

#include <cmath>

#include "planner/water/water_relaxation.h"

namespace lossline::water {
namespace {

using Complex = std::complex<double>;
constexpr Complex j{0, 1};

}  // namespace

double sea_salt_conductivity(double T, double salinity) {
  checked("temperature of salt water", "K", T, sea_salt_T_min, sea_salt_T_max);
  const double S = checked("salinity", "g/kg", salinity, 0, sea_salinity_max);
  const double t = T - celsius_zero;
  const double s35 =
      2.903602 + t * (8.607e-2 + t * (4.738817e-4 + t * (-2.991e-6 + t * 4.3047e-9)));
  const double r15 = S * (37.5109 + S * (5.45216 + S * 1.4409e-2)) / (1004.75 + S * (182.283 + S));
  const double al0 = (6.9431 + S * (3.2841 - S * 9.9486e-2)) / (84.850 + S * (69.024 + S));
  const double al1 = 49.843 + S * (-0.2276 + S * 0.198e-2);
  return s35 * r15 * (1 + (t - 15) * al0 / (al1 + t));
}

Complex salt_water_meissner_wentz(double frequency, double T, double salinity) {
  const double sigma = sea_salt_conductivity(T, salinity);
  checked("frequency", "Hz", frequency, model_frequency_min, meissner_wentz_range.frequency_max);
  const double t = T - celsius_zero, S = salinity;
  TwoRelaxations m = meissner_wentz_parameters(T);
  m.eps_s *= std::exp(S * (-3.56417e-3 + 4.74868e-6 * S + 1.15574e-5 * t));
  m.f1 *= 1 + S * (2.39357e-3 + t * (-3.13530e-5 + t * 2.52477e-7));
  m.eps_1 *= std::exp(S * (-6.28908e-3 + 1.76032e-4 * S - 9.22144e-5 * t));
  m.f2 *= 1 + S * (-1.99723e-2 + 1.81176e-4 * t);
  m.eps_inf *= 1 + S * (-2.04265e-3 + 1.57883e-4 * t);
  return m.at(frequency) - j * ionic_loss(sigma, frequency);
}

double sodium_chloride_conductivity(double T, double molarity) {
  checked("temperature of salt solution", "K", T, sodium_chloride_T_min, sodium_chloride_T_max);
  const double M = checked("molarity", "mol/L", molarity, 0, sodium_chloride_molarity_max);
  return M * (0.174 * (T - celsius_zero) - 1.582 * M + 5.923);
}

Complex sodium_chloride_peyman(double frequency, double T, double molarity) {
  const double sigma = sodium_chloride_conductivity(T, molarity);
  checked("frequency", "Hz", frequency, sodium_chloride_frequency_min,
          sodium_chloride_frequency_max);
  const double t = T - celsius_zero, M = molarity;
  const KaatzeParameters water = kaatze_parameters(T);
  const double eps_s =
      water.eps_s * (1 + M * (-3.742e-4 * t + 0.034 * M - 0.178) + t * (1.515e-4 - 4.929e-6 * t));
  const double tau =
      water.tau * (1.012 + M * (-5.282e-3 * t + 0.032 * M - 0.01) + t * (-1.724e-3 + 3.766e-5 * t));
  const double alpha = M * (-6.348e-4 * t - 5.1e-2 * M + 9e-2);
  const Complex spread = std::pow(j * (2 * pi * frequency * tau), 1 - alpha);
  return water.eps_inf + (eps_s - water.eps_inf) / (1.0 + spread) -
         j * ionic_loss(sigma, frequency);
}

Complex hot_sodium_chloride(double frequency, double T, double molarity) {
  checked("temperature of hot salt solution", "K", T, sodium_chloride_T_max, ellison_range.T_max);
  constexpr double reference_T = 298.15, rise = 0.02;
  const double sigma =
      sodium_chloride_conductivity(reference_T, molarity) * (1 + rise * (T - reference_T));
  return pure_water_ellison(frequency, T) - j * ionic_loss(sigma, frequency);
}

}  // namespace lossline::water
