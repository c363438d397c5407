#pragma once
// A solved line made by hand, small enough to check every margin by head: 0.1 kg/s dry solids
// on a belt of 1 m at 0.01 m/s, one cavity of 2 m between two rest stretches.

#include "planner/march/solution.h"
#include "tests/line/sample_line.h"

namespace lossline::sample {

inline Line solved_line() {
  Line l = line();
  l.stretches = {stretch("preheat", StretchKind::air, "main"),
                 stretch("cavity 1", StretchKind::microwave, "main"),
                 stretch("cooling", StretchKind::cooling)};
  l.generators = {generator("g1", "cavity 1")};
  l.generators[0].minimum_stable = 15e3;
  l.generators[0].reflected_limit = 0.2;
  l.product.material = "demo";
  l.duty.feed_moisture = 0.3;
  l.duty.target_moisture = 0.10;
  l.duty.moisture_tolerance = 0.02;
  l.duty.country = "USA";
  l.feed.width = 1;
  l.surfaces = {{"duct wall", "main", 320}};
  return l;
}

inline Station station(double x, std::size_t s, double X, double T) {
  Station out;
  out.x = x;
  out.stretch = s;
  out.moisture = out.surface_moisture = X;
  out.temperature = T;
  out.air_temperature = 350;
  out.air_humidity = 0.03;
  return out;
}

inline Solution solved() {
  Solution s;
  s.status = Status::solved;
  s.reason = "converged in 9 rounds";
  s.version = "0.1.0";
  s.rounds = 9;
  s.answer.flow = {0.1, 0.13, 0.01, 1.0, 0.05, 1.0, 10.0, 200.0};
  s.answer.length = 6;
  s.answer.heated_length = 2;
  s.answer.residence = 600;
  s.answer.heated_residence = 200;
  s.answer.feed_rate = 0.13;
  s.answer.product_rate = 0.111;
  s.answer.dry_solids = 0.1;
  s.answer.evaporated = 0.019;
  s.answer.final_moisture = s.answer.final_moisture_low = s.answer.final_moisture_high = 0.11;
  s.answer.final_temperature = 340;
  s.answer.hottest_temperature = 360;
  s.answer.hottest_x = 4;
  s.answer.share_of_forward = 0.85;
  s.answer.mains_per_water = 116.77e3 / 0.019;
  s.answer.energy_per_water = s.answer.mains_per_water;
  s.answer.mains_per_product = 116.77e3 / 0.111;
  s.answer.energy_floor = 2.59e6;
  s.profile = {station(0, 0, 0.30, 300), station(2, 0, 0.29, 320), station(2, 1, 0.29, 320),
               station(3, 1, 0.20, 345), station(4, 1, 0.12, 360), station(4, 2, 0.12, 360),
               station(6, 2, 0.11, 340)};
  s.profile[2].product_power = 26e3;
  s.profile[3].product_power = 25e3;
  s.profile[4].product_power = 25e3;
  s.profile[3].heating_rate = 0.05;
  s.profile[4].heating_rate = 0.2;
  s.profile[3].drying_rate = 0.0009;
  s.profile[3].overpressure = 300;
  s.profile[3].evaporation = 0.009;
  CavityReport cavity;
  cavity.name = "cavity 1";
  cavity.stretch = 1;
  cavity.frequency = 915e6;
  cavity.launched = 59e3;
  cavity.bed = 51e3;
  cavity.belt = 1e3;
  cavity.walls = 2e3;
  cavity.returned = 4.5e3;
  cavity.ends = 0.5e3;
  cavity.field_above = 4000;
  cavity.field_below = 3000;
  cavity.hot_spot_pitch = 0.164;
  cavity.share_unmixed = 0.84;
  cavity.share_mixed = 0.9;
  cavity.share_low = 0.63;
  s.cavities = {cavity};
  GeneratorReport g;
  g.name = "g1";
  g.rated = 75e3;
  g.output = 60e3;
  g.mains = 71.77e3;
  g.supply_loss = 3.59e3;
  g.tube_loss = 8.18e3;
  g.run_loss = 1e3;
  g.launched = 59e3;
  g.reflected = 4.5e3;
  s.generators = {g};
  s.power = {71.77e3, 3.59e3, 8.18e3, 60e3, 1e3, 4.5e3,    51e3, 1e3,
             2e3,     0.5e3,  0,      40e3, 5e3, 116.77e3, 0};
  AirReport air;
  air.name = "main";
  air.dry_air_flow = 1.5;
  air.fresh_air_flow = 1.5;
  air.supply_temperature = 360;
  air.exhaust_temperature = 330;
  air.exhaust_humidity = 0.04;
  air.exhaust_relative_humidity = 0.4;
  air.exhaust_dew_point = 308;
  air.heater_duty = air.heater_bought = 40e3;
  air.fan_power = 5e3;
  air.water_taken = 0.019;
  s.air = {air};
  s.ends = {{"inlet", 915e6, 50, 5, 0.05}, {"outlet", 915e6, 60, 6, 0.06}};
  s.topology = topology(solved_line());
  s.evidence = {{"permittivity", {Evidence::user_measured, 'B', "trial log", "", "", 0.1}, {}, ""},
                {"conductivity",
                 {Evidence::user_estimate, 'E', "default of the planner", "", "", 0.55},
                 flag::assumed,
                 "0.2 W/(m K) assumed"}};
  s.flags = flag::assumed;
  return s;
}

}  // namespace lossline::sample
