#include <fmt/format.h>

#include "planner/linefile/checks.h"
#include "planner/water/moist_air.h"

namespace lossline::linefile {
namespace {

namespace q = quantity;

/// Air holds no more vapour than saturation allows.
void check_saturation(Checker& c, const std::string& temperature_key, double T,
                      const std::string& humidity_key, double W) {
  if (!c.sound({temperature_key, humidity_key, "line.pressure"})) return;
  if (!(T >= water::moist_air_T_min && T <= water::moist_air_T_max)) return;
  if (!(water::moist_air_saturation_pressure(T) < c.line.pressure)) return;  // above boiling
  const double most = water::humidity_ratio_from_relative_humidity(T, 1, c.line.pressure);
  if (!(W <= most))
    c.report(humidity_key,
             fmt::format("air at {} holds {} at most", shown(T, q::temperature),
                         shown(most, q::humidity)),
             "lower the humidity or check the temperature");
}

void check_loop(Checker& c, const AirLoop& loop, const std::string& path) {
  const bool heated = loop.supply_temperature.has_value();
  const bool own_air = loop.takes_from.empty();
  if (heated && loop.heat_source != HeatSource::none && !c.given(path + ".heater_efficiency"))
    c.report(path + ".heater_efficiency", "is missing",
             "a heater has one, heat to the air over energy bought, as in "
             "heater_efficiency = \"85 %\"");
  if (heated && own_air && c.sound({path + ".supply_temperature", path + ".fresh_temperature"}) &&
      !(*loop.supply_temperature >= loop.fresh_temperature))
    c.report(path + ".supply_temperature",
             fmt::format("{} is below the fresh air's {}",
                         shown(*loop.supply_temperature, q::temperature),
                         shown(loop.fresh_temperature, q::temperature)),
             "a heater does not cool; leave the key out for air as it comes");
  if (heated && loop.heat_source == HeatSource::none && c.sound({path + ".heat_source"}))
    c.report(path + ".heat_source", "no heater holds the supply temperature",
             "name its heat source, or leave supply_temperature out");
  if (own_air)
    check_saturation(c, path + ".fresh_temperature", loop.fresh_temperature,
                     path + ".fresh_humidity", loop.fresh_humidity);
}

}  // namespace

void check_air(Checker& c) {
  for (std::size_t l = 0; l < c.line.air.size(); ++l)
    check_loop(c, c.line.air[l], member_path("air", l));
  check_saturation(c, "line.room_temperature", c.line.room_temperature, "line.room_humidity",
                   c.line.room_humidity);
}

}  // namespace lossline::linefile
