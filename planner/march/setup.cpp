#include "planner/march/setup.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "planner/bed/piece_film.h"
#include "planner/field/openings.h"
#include "planner/field/waveguide.h"

namespace lossline::march {
namespace {

double share_passed(double attenuation_dB) {
  return std::pow(10.0, -attenuation_dB / 10);
}

/// The passage between a stretch and its neighbours: its own, else the trap's, else full.
Opening passage(const Line& line, const Stretch& stretch) {
  if (stretch.passage) return *stretch.passage;
  if (line.inlet_trap) return line.inlet_trap->opening;
  if (line.outlet_trap) return line.outlet_trap->opening;
  return {stretch.width, stretch.height};
}

void add_branches(Setup& setup) {
  for (std::size_t g = 0; g < setup.line.generators.size(); ++g) {
    const Generator& generator = setup.line.generators[g];
    const Run& run = generator.run;
    const double loss_dB = run.width > 0 ? run.excess_factor * run.length *
                                               field::te10_wall_loss(generator.frequency, run.width,
                                                                     run.height, run.resistivity)
                                         : 0.0;
    for (const FeedBranch& feed : generator.feeds) {
      for (std::size_t c = 0; c < setup.cavities.size(); ++c) {
        Cavity& cavity = setup.cavities[c];
        if (setup.line.stretches[cavity.stretch].name != feed.stretch) continue;
        Branch branch;
        branch.generator = g;
        branch.cavity = c;
        branch.output = generator.set_point * feed.share;
        branch.run_share = 1 - share_passed(loss_dB);
        const double arriving = branch.output * (1 - branch.run_share);
        branch.direct = arriving * generator.launcher_reflection;
        branch.launched = arriving - branch.direct;
        cavity.frequency = generator.frequency;
        cavity.launched += branch.launched;
        setup.branches.push_back(branch);
      }
    }
  }
  // An idle cavity sees its neighbours' field; it takes the frequency of the nearest fed one.
  for (std::size_t c = 0; c < setup.cavities.size(); ++c) {
    for (std::size_t d = 1; setup.cavities[c].frequency == 0 && d < setup.cavities.size(); ++d) {
      if (c >= d && setup.cavities[c - d].frequency > 0)
        setup.cavities[c].frequency = setup.cavities[c - d].frequency;
      else if (c + d < setup.cavities.size() && setup.cavities[c + d].frequency > 0)
        setup.cavities[c].frequency = setup.cavities[c + d].frequency;
    }
  }
}

/// Cross section of all channels of an opening, nothing sent back [m2].
double channels(double frequency, const Opening& opening) {
  return field::opening_cross_section(frequency, opening.width, opening.height);
}

void add_links_and_ends(Setup& setup) {
  const std::size_t n = setup.cavities.size();
  for (std::size_t c = 0; c + 1 < n; ++c) {
    const Opening a = passage(setup.line, setup.line.stretches[setup.cavities[c].stretch]);
    const Opening b = passage(setup.line, setup.line.stretches[setup.cavities[c + 1].stretch]);
    const double fa = setup.cavities[c].frequency, fb = setup.cavities[c + 1].frequency;
    if (fa == fb) {
      setup.links.push_back({c, c + 1, std::min(channels(fa, a), channels(fb, b))});
    } else {  // a neighbour at another band only takes
      setup.cavities[c].open_upper += channels(fa, a);
      setup.cavities[c + 1].open_upper += channels(fb, b);
    }
  }
  auto add_end = [&](std::size_t c, const std::optional<EndTrap>& trap) {
    if (!trap) return;
    TunnelEnd end;
    end.cavity = c;
    end.trap = &*trap;
    end.channels_area = channels(setup.cavities[c].frequency, trap->opening);
    end.passed_share = share_passed(trap->reflective_attenuation);
    setup.cavities[c].open_upper += end.channels_area * end.passed_share;
    setup.ends.push_back(end);
  };
  if (n == 0) return;
  add_end(0, setup.line.inlet_trap);
  add_end(n - 1, setup.line.outlet_trap);
}

double loop_area(const Setup& setup, std::size_t loop) {
  double area = 0;
  for (const std::size_t s : setup.topology.loop_stretches[loop])
    area += setup.line.stretches[s].length * setup.covered_width();
  return area;
}

void add_surroundings(Setup& setup) {
  const Feed& feed = setup.line.feed;
  double side_area = 0;
  if (setup.line.product.kind == ProductKind::pieces && feed.piece_length && feed.piece_width)
    side_area = 2 * setup.flow.depth * (1 / *feed.piece_length + 1 / *feed.piece_width);
  for (std::size_t s = 0; s < setup.line.stretches.size(); ++s) {
    const Stretch& stretch = setup.line.stretches[s];
    bed::Surroundings around;
    around.pressure = setup.line.pressure;
    around.dry_areal_mass = setup.flow.dry_areal_mass;
    around.heat_top = stretch.heat_transfer_top;
    around.heat_belt = stretch.heat_transfer_belt;
    around.belt_open = setup.line.belt.open_share;
    around.side_area = side_area;
    std::size_t found = Setup::no_loop;
    for (std::size_t l = 0; l < setup.line.air.size(); ++l)
      if (setup.line.air[l].name == stretch.air) found = l;
    setup.loop_of.push_back(found);
    if (found != Setup::no_loop && setup.line.air[found].pattern == AirPattern::through) {
      const AirLoop& air = setup.line.air[found];
      around.through = true;
      around.through_flow = air.dry_air_flow / loop_area(setup, found);
      around.piece_heat = air.piece_heat_transfer.value_or(
          bed::granule_heat_transfer(around.through_flow, 2 * setup.material.piece_radius,
                                     air.supply_temperature.value_or(air.fresh_temperature)));
      if (!air.piece_heat_transfer)
        setup.assumptions.push_back(
            {"piece_heat_transfer",
             fmt::format("{:.0f} W/(m2 K) from the packed-bed correlation ({})", around.piece_heat,
                         air.name)});
    }
    setup.around.push_back(around);
  }
}

}  // namespace

Valued<std::complex<double>> Setup::bed_permittivity(double X, double T, double frequency) const {
  Valued<std::complex<double>> eps = card.permittivity->at(X, T, frequency);
  if (solid_share < 1) {
    // A bed of loose pieces: cube roots are linear in the share of solid volume
    // (Landau, Lifshitz; Looyenga 1965), the rule the grain standards use for bulk density.
    const std::complex<double> root = 1.0 + solid_share * (std::pow(eps.value, 1.0 / 3) - 1.0);
    eps.value = root * root * root;
  }
  return eps;
}

double Setup::depth(double X) const {
  return flow.dry_areal_mass / material.dry_density * (1 + material.shrinkage * std::max(X, 0.0));
}

Setup prepare(const Line& line, const ProductCard& card, const SolveOptions& options,
              std::string& refusal) {
  Setup setup{line, card, options, {}, topology(line), {}, {}, {}, field::AngleClasses(), {}, {},
              {},   {},   {},      {}};
  std::vector<FlowProblem> problems;
  setup.flow = resolve_flow(line, card, problems);
  if (!problems.empty())
    refusal = fmt::format("{}: {}; {}", problems[0].key, problems[0].wrong, problems[0].right);
  else if (!setup.topology.problems.empty())
    refusal = fmt::format("{}: {}; {}", setup.topology.problems[0].key,
                          setup.topology.problems[0].wrong, setup.topology.problems[0].right);
  else if (!card.permittivity && line.solve.balance == Balance::full && !line.generators.empty())
    refusal = fmt::format(
        "material '{}' has no permittivity and none can be estimated; measure it at the line's "
        "frequency and give it as [[product.permittivity.point]]",
        card.id);
  if (!refusal.empty()) return setup;
  setup.material = bed::bed_material(line, card, setup.flow, setup.assumptions);
  if (line.product.kind == ProductKind::granular_bed && card.permittivity_phase == Phase::particle)
    setup.solid_share = 1 - setup.material.void_share;
  setup.grid = cut(line, {options.cavity_segments, options.other_segments});
  for (const std::size_t s : setup.topology.cavities) setup.cavities.push_back({s, 0, 0, 0});
  add_branches(setup);
  add_links_and_ends(setup);
  add_surroundings(setup);
  return setup;
}

}  // namespace lossline::march
