#include <algorithm>
#include <cmath>

#include "planner/field/cavity_modes.h"
#include "planner/field/uniformity.h"
#include "planner/field/validity.h"
#include "planner/march/assemble.h"

namespace lossline::march {
namespace {

/// Heat that the pass really put into the bed along one cavity [W]: the trapezoid sum is the exact
/// integral of the piecewise linear heat.
double heat_received(const Setup& setup, const LastRound& last, std::size_t cavity,
                     std::size_t offset) {
  const std::size_t stretch = setup.cavities[cavity].stretch;
  const std::size_t n = setup.grid.count[stretch];
  const double dx = setup.line.stretches[stretch].length / static_cast<double>(n);
  double sum = 0;
  for (std::size_t j = 0; j < n; ++j)
    sum += 0.5 * dx * (last.iterate.heat[offset + j] + last.iterate.heat[offset + j + 1]);
  return sum * setup.covered_width();
}

void describe_field(const Setup& setup, const LastRound& last, std::size_t c, std::size_t offset,
                    CavityReport& report) {
  const field::CavityInput& input = last.field.inputs[c];
  const field::CavityResult& result = last.field.results[c];
  report.bed_top = result.bed_top_W;
  report.bed_bottom = result.bed_bottom_W;
  report.bed_side = result.bed_side_W;
  report.belt = result.belt_W;
  report.walls = result.walls_W;
  report.returned = result.returned_W;
  report.ends = result.ends_W;
  report.links = result.links_W;
  report.field_above = field::rms_field(result.S_upper_mean);
  report.field_below = field::rms_field(result.S_lower_mean);
  const double f = input.frequency;
  report.hot_spot_pitch = field::hot_spot_pitch(f);
  // Loaded quality factor of the two volumes together: stored energy times 2 pi f over the power.
  const double volume = input.length * input.width * input.height;
  const double below = volume * input.belt_height_share, above = volume - below;
  const double sum = result.bed_W + result.belt_W + result.walls_W + result.returned_W +
                     result.ends_W + std::max(result.links_W, 0.0);
  const double Q = sum > 0 ? 2 * pi * f / speed_of_light *
                                 (result.S_upper_mean * above + result.S_lower_mean * below) / sum
                           : 0.0;
  report.modal_overlap = field::modal_overlap(f, input.length, input.width, input.height, Q);
  const field::UniformityInput uniform{f, input.length, Q, static_cast<double>(input.launchers)};
  const double ideal = field::ideal_variation(uniform);
  report.uneven_low = field::real_factor_low * ideal;
  report.uneven_high = field::real_factor_high * ideal;
  const std::size_t first = setup.grid.first[setup.cavities[c].stretch];
  const std::size_t last_node = first + setup.grid.count[setup.cavities[c].stretch];
  field::ValidityInput valid;
  valid.frequency = f;
  valid.length = input.length;
  valid.width = input.width;
  valid.height = input.height;
  valid.bed_depth = setup.depth(last.pass.nodes[last_node][X]);
  valid.modal_overlap = report.modal_overlap;
  valid.bed_share = report.launched > 0 ? report.bed / report.launched : 0.0;
  valid.bed_absorptance = field::mean_bed_absorptance(
      setup.classes,
      last.field.stations[offset + setup.grid.count[setup.cavities[c].stretch]].optics);
  report.validity = field::validity_flags(valid);
}

void fill_cavities(const Setup& setup, const LastRound& last, Solution& out) {
  std::vector<double> unmixed, mixed;
  const bool field = !last.field.results.empty();
  if (field) {
    unmixed = bed_share_with_mixing(setup, last.field, 0);
    mixed = bed_share_with_mixing(setup, last.field, 1e6);
  }
  std::size_t offset = 0;
  for (std::size_t c = 0; c < setup.cavities.size(); ++c) {
    const Cavity& cavity = setup.cavities[c];
    CavityReport report;
    report.name = setup.line.stretches[cavity.stretch].name;
    report.stretch = cavity.stretch;
    report.frequency = cavity.frequency;
    report.launched = cavity.launched;
    report.bed = heat_received(setup, last, c, offset);
    if (field) {
      describe_field(setup, last, c, offset, report);
      report.share_unmixed = unmixed[c];
      report.share_mixed = mixed[c];
      report.share_low = field::cautious_bed_share(unmixed[c]);
    } else if (setup.line.solve.balance == Balance::constant_share) {
      report.other = cavity.launched - report.bed;
    }
    offset += setup.grid.count[cavity.stretch] + 1;
    out.cavities.push_back(std::move(report));
  }
}

/// Hands the power a cavity returns to its branches: what a launcher radiated comes back to it
/// with the share 2/(N+1) of N equal launchers, the rest spreads evenly over all branches.
std::vector<double> returned_by_branch(const Setup& setup, const Solution& out) {
  std::vector<double> returned(setup.branches.size(), 0.0);
  for (std::size_t c = 0; c < out.cavities.size(); ++c) {
    std::size_t count = 0;
    for (const Branch& b : setup.branches) count += b.cavity == c ? 1 : 0;
    if (count == 0) continue;
    const double launchers = setup.line.stretches[setup.cavities[c].stretch].launchers;
    const double own = count > 1 ? 2 / (launchers + 1) : 1.0;
    for (std::size_t b = 0; b < setup.branches.size(); ++b) {
      if (setup.branches[b].cavity != c) continue;
      const double part = out.cavities[c].launched > 0
                              ? setup.branches[b].launched / out.cavities[c].launched
                              : 1.0 / static_cast<double>(count);
      returned[b] =
          out.cavities[c].returned * (own * part + (1 - own) / static_cast<double>(count));
    }
  }
  return returned;
}

void fill_generators(const Setup& setup, Solution& out) {
  const std::vector<double> returned = returned_by_branch(setup, out);
  for (std::size_t g = 0; g < setup.line.generators.size(); ++g) {
    const Generator& generator = setup.line.generators[g];
    GeneratorReport report;
    report.name = generator.name;
    report.rated = generator.rated;
    report.output = generator.set_point;
    const double anode = generator.set_point / generator.tube_efficiency;
    report.mains = anode / generator.supply_efficiency;
    report.supply_loss = report.mains - anode;
    report.tube_loss = anode - generator.set_point;
    for (std::size_t b = 0; b < setup.branches.size(); ++b) {
      const Branch& branch = setup.branches[b];
      if (branch.generator != g) continue;
      const double back = branch.direct + returned[b];
      report.launched += branch.launched;
      report.run_loss += branch.run_share * (branch.output + back);
      report.reflected += back * (1 - branch.run_share);
    }
    out.generators.push_back(report);
  }
}

}  // namespace

void fill_power(const Setup& setup, const LastRound& last, Solution& out) {
  fill_cavities(setup, last, out);
  fill_generators(setup, out);
  PowerLedger& power = out.power;
  for (const CavityReport& cavity : out.cavities) {
    power.bed += cavity.bed;
    power.belt += cavity.belt;
    power.walls += cavity.walls;
    power.ends += cavity.ends;
    power.other += cavity.other;
  }
  for (const GeneratorReport& generator : out.generators) {
    power.generator_mains += generator.mains;
    power.supply_loss += generator.supply_loss;
    power.tube_loss += generator.tube_loss;
    power.forward += generator.output;
    power.run_loss += generator.run_loss;
    power.reflected += generator.reflected;
  }
  power.mains = power.generator_mains;
  for (std::size_t l = 0; l < out.air.size(); ++l) {
    const AirReport& air = out.air[l];
    power.air_heating += air.heater_bought;
    power.fans += air.fan_power;
    if (setup.line.air[l].heat_source == HeatSource::electric)
      power.mains += air.heater_bought;
    else
      power.fuel += air.heater_bought;
    power.mains += air.fan_power;
  }
  for (const TunnelEnd& end : setup.ends) {
    EndReport report;
    report.name = end.trap->name;
    report.frequency = setup.cavities[end.cavity].frequency;
    if (!last.field.results.empty()) {
      report.arriving = last.field.results[end.cavity].S_upper_mean * end.channels_area;
      report.taken = report.arriving * end.passed_share;
      report.leaving = report.taken * std::pow(10.0, -end.trap->absorbing_attenuation / 10);
    }
    out.ends.push_back(report);
  }
}

}  // namespace lossline::march
