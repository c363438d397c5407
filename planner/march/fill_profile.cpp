#include <algorithm>

#include "planner/march/assemble.h"
#include "planner/product/propagation.h"

namespace lossline::march {
namespace {

/// Rates of change at one end of a segment, by the same system the stepper used.
void fill_rates(const Setup& setup, const BeltSystem& system, double x, const State& y,
                Station& station) {
  State rate{};
  system.rate(x, y, rate);
  const double T = bed::temperature(setup.material, y[E], y[X], y[alpha]);
  const auto ex = system.exchange<double>(x, y[X], T, y[air_H], y[air_Y]);
  station.surface_moisture = ex.surface_moisture;
  station.overpressure = ex.over;
  const double width = setup.covered_width();
  station.evaporation = ex.water * width;
  station.air_heat = ex.heat * width;
  // Temperature along the belt by a short step on the state; E, X and alpha move together.
  const double step = 1e-6 * (system.x1 - system.x0);
  const double ahead = bed::temperature(setup.material, y[E] + step * rate[E],
                                        y[X] + step * rate[X], y[alpha] + step * rate[alpha]);
  station.heating_rate = (ahead - T) / step * setup.flow.speed;
  station.drying_rate = -rate[X] * setup.flow.speed;
  if (system.mode == AirMode::with_belt) {
    station.air_temperature = water::air_temperature(y[air_H], y[air_Y]);
    station.air_humidity = y[air_Y];
  } else {
    const bool at_end = system.mode == AirMode::lagged && x > 0.5 * (system.x0 + system.x1);
    station.air_temperature = at_end ? system.air1.T : system.air0.T;
    station.air_humidity = at_end ? system.air1.Y : system.air0.Y;
  }
}

}  // namespace

void fill_profile(const Setup& setup, const LastRound& last, Solution& out) {
  // Both ends of every stretch are stations, so that a change of surroundings shows as a step.
  for (std::size_t s = 0; s < setup.line.stretches.size(); ++s) {
    std::size_t optics = 0;
    const auto cavity = std::find_if(setup.cavities.begin(), setup.cavities.end(),
                                     [&](const Cavity& c) { return c.stretch == s; });
    for (auto it = setup.cavities.begin(); it != cavity; ++it)
      optics += setup.grid.count[it->stretch] + 1;
    const std::size_t first = setup.grid.first[s], n = setup.grid.count[s];
    for (std::size_t j = 0; j <= n; ++j) {
      const std::size_t segment = first + std::min(j, n - 1);
      const BeltSystem system = segment_system(setup, last.iterate, segment);
      // A stretch of co-flow air begins with the loop's state, not with what y carried before.
      const State& y = last.pass.nodes[first + j];
      Station station;
      station.x = j < n ? system.x0 : system.x1;
      station.stretch = s;
      station.moisture = y[X];
      station.temperature = bed::temperature(setup.material, y[E], y[X], y[alpha]);
      station.cure = y[alpha];
      fill_rates(setup, system, station.x, y, station);
      if (cavity != setup.cavities.end()) {
        station.product_power = last.iterate.heat[optics + j] * setup.covered_width();
        if (!last.field.stations.empty()) {
          const auto eps = last.field.stations[optics + j].eps.value;
          station.eps_real = eps.real();
          station.loss_factor = -eps.imag();
          station.penetration_depth = product::penetration_depth(eps, cavity->frequency);
        }
      }
      out.profile.push_back(station);
    }
  }
}

}  // namespace lossline::march
