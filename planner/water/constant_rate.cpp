#include "planner/water/constant_rate.h"

#include <cmath>

#include "planner/water/if97.h"
#include "planner/water/range_check.h"

namespace lossline::water {

double parallel_flow_film(double mass_flux) {
  checked("mass flux of air", "kg/(m2 s)", mass_flux, parallel_flow_min, parallel_flow_max);
  return 0.0204 * std::pow(3600 * mass_flux, 0.8);
}

double constant_rate_evaporation(double film, double T_air, double T_surface) {
  checked("film coefficient", "W/(m2 K)", film, 0, 1e5);
  checked("temperature of air", "K", T_air, T_surface, vapour_T_max);
  return film * (T_air - T_surface) / latent_heat(T_surface);
}

}  // namespace lossline::water
