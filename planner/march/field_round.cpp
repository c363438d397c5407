#include "planner/march/field_round.h"

#include <algorithm>

namespace lossline::march {
namespace {

field::CavityInput cavity_input(const Setup& setup, const Cavity& cavity) {
  const Stretch& stretch = setup.line.stretches[cavity.stretch];
  field::CavityInput input;
  input.frequency = cavity.frequency;
  input.length = stretch.length;
  input.width = stretch.width;
  input.height = stretch.height;
  input.belt_height_share = stretch.belt_height_share;
  input.bed_width = setup.flow.width;
  input.wall_resistivity = stretch.wall_resistivity;
  input.wall_relative_permeability = stretch.wall_relative_permeability;
  input.wall_roughness_factor = stretch.wall_roughness_factor;
  input.launchers = stretch.launchers;
  input.mixing = stretch.mixing;
  input.launched_W = cavity.launched;
  input.open_upper_m2 = cavity.open_upper;
  return input;
}

}  // namespace

std::size_t heat_nodes(const Setup& setup) {
  std::size_t n = 0;
  for (const Cavity& cavity : setup.cavities) n += setup.grid.count[cavity.stretch] + 1;
  return n;
}

std::vector<double> even_heat(const Setup& setup, double share) {
  std::vector<double> heat;
  for (const Cavity& cavity : setup.cavities) {
    const double area = setup.line.stretches[cavity.stretch].length * setup.covered_width();
    heat.insert(heat.end(), setup.grid.count[cavity.stretch] + 1, share * cavity.launched / area);
  }
  return heat;
}

FieldRound solve_field(const Setup& setup, const Pass& pass) {
  FieldRound round;
  round.stations.reserve(heat_nodes(setup));
  for (const Cavity& cavity : setup.cavities) {
    const std::size_t first = setup.grid.first[cavity.stretch];
    const std::size_t n = setup.grid.count[cavity.stretch];
    const double dx = setup.line.stretches[cavity.stretch].length / static_cast<double>(n);
    field::CavityInput input = cavity_input(setup, cavity);
    for (std::size_t j = 0; j <= n; ++j) {
      const State& y = pass.nodes[first + j];
      const double T = bed::temperature(setup.material, y[E], y[X], y[alpha]);
      StationOptics station;
      station.eps = setup.bed_permittivity(std::max(y[X], 0.0), T, cavity.frequency);
      round.flags |= station.eps.flags;
      field::BedSection section;
      section.frequency = cavity.frequency;
      section.eps = station.eps.value;
      section.depth = setup.depth(y[X]);
      section.width = setup.flow.width;
      section.belt_eps = setup.line.belt.eps;
      section.belt_thickness = setup.line.belt.thickness;
      section.coverage = setup.flow.coverage;
      station.optics = field::bed_optics(setup.classes, section);
      field::add_station(input, setup.classes, station.optics, j == 0 || j == n ? 0.5 * dx : dx);
      round.stations.push_back(std::move(station));
    }
    round.inputs.push_back(std::move(input));
  }
  auto network = field::solve_network(setup.classes, round.inputs, setup.links);
  round.residual = network.residual;
  round.results = std::move(network.cavities);
  std::size_t at = 0;
  for (std::size_t c = 0; c < setup.cavities.size(); ++c) {
    const std::size_t first = setup.grid.first[setup.cavities[c].stretch];
    for (std::size_t j = 0; j <= setup.grid.count[setup.cavities[c].stretch]; ++j, ++at) {
      const double depth = setup.depth(pass.nodes[first + j][X]);
      round.heat.push_back(field::bed_heat_per_length(setup.classes, round.stations[at].optics,
                                                      round.results[c], setup.flow.width, depth) /
                           setup.covered_width());
    }
  }
  return round;
}

std::vector<double> bed_share_with_mixing(const Setup& setup, const FieldRound& round, double s) {
  auto inputs = round.inputs;
  for (auto& input : inputs) input.mixing = s;
  const auto network = field::solve_network(setup.classes, inputs, setup.links);
  std::vector<double> shares;
  for (std::size_t c = 0; c < inputs.size(); ++c)
    shares.push_back(inputs[c].launched_W > 0 ? network.cavities[c].bed_W / inputs[c].launched_W
                                              : 0.0);
  return shares;
}

}  // namespace lossline::march
