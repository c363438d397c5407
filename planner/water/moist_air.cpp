#include "planner/water/moist_air.h"

#include <cmath>

#include "planner/base/constants.h"
#include "planner/numerics/root.h"
#include "planner/water/bed_water.h"
#include "planner/water/range_check.h"

namespace lossline::water {
namespace {

/// Where the equation over ice hands over to that over liquid water [K].
constexpr double triple_T = 273.16;

double checked_T(double T) {
  return checked("temperature of moist air", "K", T, moist_air_T_min, moist_air_T_max);
}
double checked_p(double p) {
  return checked("pressure of moist air", "Pa", p, moist_air_p_min, moist_air_p_max);
}
double checked_W(double W) {
  return checked("humidity ratio", "kg/kg", W, 0, humidity_ratio_max);
}

// [ASHRAE] equations 5 and 6.
double log_saturation_pressure(double T) {
  if (T <= triple_T)
    return -5.6745359e3 / T + 6.3925247 +
           T * (-9.6778430e-3 + T * (6.2215701e-7 + T * (2.0747825e-9 + T * -9.4840240e-13))) +
           4.1635019 * std::log(T);
  return -5.8002206e3 / T + 1.3914993 +
         T * (-4.8640239e-2 + T * (4.1764768e-5 + T * -1.4452093e-8)) + 6.5459673 * std::log(T);
}

double humidity_ratio(double vapour, double p) {
  return molar_mass_ratio * vapour / (p - vapour);
}

}  // namespace

double moist_air_saturation_pressure(double T) {
  return std::exp(log_saturation_pressure(checked_T(T)));
}

double vapour_pressure(double W, double p) {
  return checked_p(p) * checked_W(W) / (molar_mass_ratio + W);
}

double humidity_ratio_from_relative_humidity(double T, double rh, double p) {
  checked_p(p);
  const double vapour =
      checked("relative humidity", "1", rh, 0, 1) * moist_air_saturation_pressure(T);
  const double highest = p * humidity_ratio_max / (molar_mass_ratio + humidity_ratio_max);
  return humidity_ratio(checked("vapour pressure", "Pa", vapour, 0, highest), p);
}

double humidity_ratio_from_dew_point(double T_dew, double p) {
  return humidity_ratio_from_relative_humidity(T_dew, 1, p);
}

double relative_humidity(double T, double W, double p) {
  return vapour_pressure(W, p) / moist_air_saturation_pressure(T);
}

double dew_point(double W, double p) {
  const double vapour = vapour_pressure(W, p);
  const double wanted = std::log(vapour);  // minus infinity for dry air
  if (wanted <= log_saturation_pressure(moist_air_T_min)) return moist_air_T_min;
  numerics::RootControl control;
  control.absolute = 1e-10;
  const numerics::Root root =
      numerics::find_root([&](double T) { return log_saturation_pressure(T) - wanted; },
                          moist_air_T_min, moist_air_T_max, control);
  if (root.found()) return root.x;
  throw Error(ErrorKind::internal, fmt::format("no dew point of humidity ratio {} at {} Pa", W, p));
}

double ashrae_enthalpy(double T, double W) {
  const double t = checked_T(T) - celsius_zero;
  return 1e3 * (1.006 * t + checked_W(W) * (2501 + 1.86 * t));
}

double specific_volume(double T, double W, double p) {
  // 0.287042 kJ/(kg K) and kPa in the source.
  return 287.042 * checked_T(T) * (1 + 1.607858 * checked_W(W)) / checked_p(p);
}

double standard_pressure_at(double altitude) {
  checked("altitude", "m", altitude, altitude_min, altitude_max);
  return standard_pressure * std::pow(1 - 2.25577e-5 * altitude, 5.2559);
}

double air_enthalpy(double T, double Y) {
  return dry_air_heat_capacity * (T - celsius_zero) + Y * vapour_enthalpy(T);
}

double air_temperature(double h, double Y) {
  constexpr double end = celsius_zero + vapour_fit_end;
  const double over = h - air_enthalpy(end, Y);
  if (over > 0) return end + over / (dry_air_heat_capacity + Y * vapour_h1_above);
  // (h2 Y) t^2 + (cp + h1 Y) t = h - h0 Y; the root that stays finite for Y = 0.
  const double right = h - Y * vapour_h0;
  const double b = dry_air_heat_capacity + Y * vapour_h1;
  return celsius_zero + 2 * right / (b + std::sqrt(b * b + 4 * Y * vapour_h2 * right));
}

}  // namespace lossline::water
