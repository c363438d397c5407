// [[generator]], [[air]], [[surface]].

#include <array>
#include <string>

#include "planner/linefile/keys.h"

namespace lossline::linefile {
namespace {

const std::array<std::string, 4> patterns{"co", "counter", "cross", "through"};
const std::array<std::string, 4> heat_sources{"none", "electric", "gas", "steam"};

/// A generator that feeds one stretch needs no shares.
void feed_branch_fields(Fields& f, std::vector<FeedBranch>& feeds) {
  std::vector<std::string> names;
  std::vector<double> shares;
  for (const FeedBranch& branch : feeds) {
    names.push_back(branch.stretch);
    shares.push_back(branch.share);
  }
  const bool alone = shares.size() == 1 && shares[0] == 1;
  f.texts("feeds", names, Need::required);
  if (f.reading() || !alone) f.shares("shares", shares);
  if (!f.reading()) return;
  feeds.clear();
  for (std::size_t i = 0; i < names.size(); ++i)
    feeds.push_back({names[i], i < shares.size() ? shares[i] : 1.0});
}

void run_fields(Fields& f, Run& run) {
  const Run fresh;
  f.optional("run_width", run.width, range::run_side, fresh.width);
  f.optional("run_height", run.height, range::run_side, fresh.height);
  f.optional("run_length", run.length, range::run_length, fresh.length);
  f.optional("run_resistivity", run.resistivity, range::resistivity, fresh.resistivity);
  f.optional("run_excess_factor", run.excess_factor, range::run_excess, fresh.excess_factor);
}

}  // namespace

void generator_fields(Fields& f, Generator& generator) {
  const Generator fresh;
  f.text("name", generator.name, Need::required);
  f.required("frequency", generator.frequency, range::frequency);
  f.required("rated", generator.rated, range::rated_power);
  f.power("set_point", generator.set_point, generator.rated, range::power, Need::required);
  f.power("minimum_stable", generator.minimum_stable, generator.rated, range::power,
          Need::optional);
  f.required("tube_efficiency", generator.tube_efficiency, range::efficiency);
  f.required("supply_efficiency", generator.supply_efficiency, range::efficiency);
  f.optional("reflected_limit", generator.reflected_limit, range::reflection);
  f.optional("launcher_reflection", generator.launcher_reflection, range::launcher_reflection,
             fresh.launcher_reflection);
  feed_branch_fields(f, generator.feeds);
  run_fields(f, generator.run);
}

void air_fields(Fields& f, AirLoop& loop) {
  const AirLoop fresh;
  f.text("name", loop.name, Need::required);
  f.choice("pattern", patterns, loop.pattern, Need::required);
  f.required("dry_air_flow", loop.dry_air_flow, range::air_flow);
  f.optional("supply_temperature", loop.supply_temperature, range::air_temperature);
  f.optional("fresh_temperature", loop.fresh_temperature, range::air_temperature,
             fresh.fresh_temperature);
  f.optional("fresh_humidity", loop.fresh_humidity, range::air_humidity, fresh.fresh_humidity);
  f.optional("recycle", loop.recycle, range::recycle, fresh.recycle);
  f.text("takes_from", loop.takes_from, Need::optional);
  f.choice("heat_source", heat_sources, loop.heat_source, Need::optional);
  f.optional("heater_efficiency", loop.heater_efficiency, range::efficiency, 0);
  f.optional("fan_power", loop.fan_power, range::fan_power, fresh.fan_power);
  f.optional("shell_conductance", loop.shell_conductance, range::conductance,
             fresh.shell_conductance);
  f.optional("piece_heat_transfer", loop.piece_heat_transfer, range::piece_film);
}

void surface_fields(Fields& f, Surface& surface) {
  f.text("name", surface.name, Need::required);
  f.text("air", surface.air, Need::required);
  f.required("temperature", surface.temperature, range::air_temperature);
}

}  // namespace lossline::linefile
