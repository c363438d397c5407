#include "planner/march/air_loops.h"

#include <algorithm>

namespace lossline::march {
namespace {

/// Temperature [K] at which air of humidity Y leaves when `heat` [W] over the dry-air flow G is
/// left to share between the air and a shell of conductance UA towards the room.
double exhaust_temperature(double G, double Y, double heat, double UA, double room) {
  double T = water::air_temperature(heat / G, Y);
  for (int i = 0; i < 20; ++i) {
    const double next = water::air_temperature((heat - UA * (T - room)) / G, Y);
    // The shell takes a small share, so plain substitution with a Newton-like damping settles fast.
    const double slope = UA / (G * (bed::dry_air_heat_capacity + bed::vapour_heat_capacity * Y));
    const double step = (next - T) / (1 + slope);
    T += step;
    if (std::abs(step) < 1e-12 * T) break;
  }
  return T;
}

/// State of the loop's outside air: fresh, or another loop's exhaust as far as it reaches.
Air outside_air(const Setup& setup, std::size_t loop, const std::vector<AirReport>& reports) {
  const AirLoop& air = setup.line.air[loop];
  const Air fresh{air.fresh_temperature, air.fresh_humidity};
  if (air.takes_from.empty()) return fresh;
  const auto donor = std::find_if(setup.line.air.begin(), setup.line.air.end(),
                                  [&](const AirLoop& a) { return a.name == air.takes_from; });
  if (donor == setup.line.air.end()) return fresh;
  const auto& exhaust = reports[static_cast<std::size_t>(donor - setup.line.air.begin())];
  const double need = (1 - air.recycle) * air.dry_air_flow;
  const double offered = (1 - donor->recycle) * donor->dry_air_flow;
  const double share = need > 0 ? std::min(1.0, offered / need) : 0.0;
  const double Y = share * exhaust.exhaust_humidity + (1 - share) * fresh.Y;
  const double H =
      share * water::air_enthalpy(exhaust.exhaust_temperature, exhaust.exhaust_humidity) +
      (1 - share) * water::air_enthalpy(fresh.T, fresh.Y);
  return {water::air_temperature(H, Y), Y};
}

void balance_exhaust(const Setup& setup, std::size_t loop, const Air& supply, const Pass& pass,
                     AirReport& report) {
  const AirLoop& air = setup.line.air[loop];
  const double G = air.dry_air_flow;
  double water = 0, heat = 0;
  for (const std::size_t stretch : setup.topology.loop_stretches[loop]) {
    for (std::size_t i = 0; i < setup.grid.count[stretch]; ++i) {
      const SegmentFlows& flows = pass.flows[setup.grid.first[stretch] + i];
      water += flows.water;
      heat += flows.enthalpy;
    }
  }
  report.name = air.name;
  report.dry_air_flow = G;
  report.fresh_air_flow = (1 - air.recycle) * G;
  report.supply_temperature = supply.T;
  report.supply_humidity = supply.Y;
  report.water_taken = water;
  report.exhaust_humidity = supply.Y + water / G;
  const double total = G * water::air_enthalpy(supply.T, supply.Y) + heat;
  const double room = setup.line.room_temperature;
  report.exhaust_temperature =
      exhaust_temperature(G, report.exhaust_humidity, total, air.shell_conductance, room);
  report.shell_loss = air.shell_conductance * (report.exhaust_temperature - room);
  report.fan_power = air.fan_power;
  const double P = setup.line.pressure;
  const double p = bed::vapour_pressure(std::max(report.exhaust_humidity, 1e-9), P);
  report.exhaust_relative_humidity =
      p / water::fast_saturation_pressure(report.exhaust_temperature);
  report.exhaust_dew_point = water::dew_point(std::max(report.exhaust_humidity, 1e-9), P);
  report.fog = report.exhaust_relative_humidity > 1 ||
               bed::vapour_pressure(supply.Y, P) > water::fast_saturation_pressure(supply.T);
}

Air next_supply(const Setup& setup, std::size_t loop, const std::vector<AirReport>& reports,
                AirReport& report) {
  const AirLoop& air = setup.line.air[loop];
  const double G = air.dry_air_flow, r = air.recycle;
  const Air outside = outside_air(setup, loop, reports);
  const double Y = r * report.exhaust_humidity + (1 - r) * outside.Y;
  const double mixed =
      r * water::air_enthalpy(report.exhaust_temperature, report.exhaust_humidity) +
      (1 - r) * water::air_enthalpy(outside.T, outside.Y) + air.fan_power / G;
  double H = mixed;
  if (air.supply_temperature) H = std::max(H, water::air_enthalpy(*air.supply_temperature, Y));
  report.heater_duty = G * (H - mixed);
  report.heater_bought =
      air.heater_efficiency > 0 ? report.heater_duty / air.heater_efficiency : 0.0;
  return {water::air_temperature(H, Y), Y};
}

}  // namespace

Iterate first_air(const Setup& setup) {
  Iterate z;
  for (std::size_t loop = 0; loop < setup.line.air.size(); ++loop) {
    const AirLoop& air = setup.line.air[loop];
    z.supply.push_back(
        {air.supply_temperature.value_or(air.fresh_temperature), air.fresh_humidity});
    if (air.pattern != AirPattern::counter) continue;
    for (const std::size_t stretch : setup.topology.loop_stretches[loop])
      z.counter.insert(z.counter.end(), setup.grid.count[stretch] + 1, z.supply.back());
  }
  return z;
}

AirRound solve_air(const Setup& setup, const Iterate& z, const Pass& pass) {
  AirRound out;
  const std::size_t loops = setup.line.air.size();
  out.reports.resize(loops);
  out.supply = z.supply;
  for (std::size_t loop = 0; loop < loops; ++loop)
    balance_exhaust(setup, loop, z.supply[loop], pass, out.reports[loop]);
  for (std::size_t loop = 0; loop < loops; ++loop)
    out.supply[loop] = next_supply(setup, loop, out.reports, out.reports[loop]);

  for (std::size_t loop = 0; loop < loops; ++loop) {
    if (setup.line.air[loop].pattern != AirPattern::counter) continue;
    // The air enters where the product leaves: walk the loop's stretches backwards.
    std::vector<Air> profile;
    const double G = setup.line.air[loop].dry_air_flow;
    double H = water::air_enthalpy(z.supply[loop].T, z.supply[loop].Y), Y = z.supply[loop].Y;
    const auto& stretches = setup.topology.loop_stretches[loop];
    for (std::size_t k = stretches.size(); k-- > 0;) {
      profile.push_back({water::air_temperature(H, Y), Y});
      for (std::size_t i = setup.grid.count[stretches[k]]; i-- > 0;) {
        const SegmentFlows& flows = pass.flows[setup.grid.first[stretches[k]] + i];
        H += flows.enthalpy / G;
        Y += flows.water / G;
        profile.push_back({water::air_temperature(H, Y), Y});
      }
    }
    out.counter.insert(out.counter.end(), profile.rbegin(), profile.rend());
  }
  return out;
}

}  // namespace lossline::march
