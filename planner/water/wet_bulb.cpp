// Wet bulb of moist air: [ASHRAE] equations 33 (liquid water on the wick) and 35 (ice).

#include <algorithm>
#include <cmath>

#include "planner/base/constants.h"
#include "planner/numerics/root.h"
#include "planner/water/moist_air.h"
#include "planner/water/range_check.h"

namespace lossline::water {
namespace {

// Balance of the wick in kJ/kg: W (cold) = evaporated (hot) - sensible, written as
// W weight = gain Ws - 1.006 (t - t*). t in degC.
struct Wick {
  double gain, weight, sensible;
};

Wick wick(double t, double t_wet) {
  const double sensible = 1.006 * (t - t_wet);
  if (t_wet >= 0) return {2501 - 2.326 * t_wet, 2501 + 1.86 * t - 4.186 * t_wet, sensible};
  return {2830 - 0.24 * t_wet, 2830 + 1.86 * t - 2.1 * t_wet, sensible};
}

}  // namespace

double humidity_ratio_from_wet_bulb(double T, double T_wet, double p) {
  checked("temperature of moist air", "K", T, moist_air_T_min, moist_air_T_max);
  checked("wet bulb", "K", T_wet, moist_air_T_min, T);
  const double saturated = humidity_ratio_from_dew_point(T_wet, p);
  const Wick w = wick(T - celsius_zero, T_wet - celsius_zero);
  return std::max(0.0, (w.gain * saturated - w.sensible) / w.weight);
}

double wet_bulb(double T, double W, double p) {
  if (!(relative_humidity(T, W, p) <= 1 + 1e-9))
    throw Error(ErrorKind::out_of_range,
                fmt::format("air of {} K, humidity ratio {} kg/kg and {} Pa is supersaturated: "
                            "relative humidity {} is outside [0, 1]",
                            T, W, p, relative_humidity(T, W, p)));
  const double t = T - celsius_zero;
  // Multiplied by (p - saturation pressure), the balance has no pole at boiling and stays positive
  // beyond it, so that hot air needs no special case.
  const auto balance = [&](double t_wet) {
    const double vapour =
        moist_air_saturation_pressure(std::max(t_wet + celsius_zero, moist_air_T_min));
    const Wick w = wick(t, t_wet);
    return w.gain * molar_mass_ratio * vapour - (p - vapour) * (w.sensible + W * w.weight);
  };
  const double coldest = moist_air_T_min - celsius_zero;
  numerics::RootControl control;
  control.absolute = 1e-10;
  const bool liquid = t >= 0 && balance(0) <= 0;
  const double low = liquid ? 0 : coldest;
  const double high = liquid ? t : std::min(t, -1e-12);
  if (!(balance(high) > 0)) return high + celsius_zero;  // saturated to rounding
  const numerics::Root root = numerics::find_root(balance, low, high, control);
  if (root.found()) return root.x + celsius_zero;
  throw Error(ErrorKind::internal, fmt::format("no wet bulb of air of {} K, humidity ratio {} "
                                               "kg/kg and {} Pa",
                                               T, W, p));
}

}  // namespace lossline::water
