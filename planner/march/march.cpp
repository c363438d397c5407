#include "planner/march/march.h"

#include <fmt/format.h>

#include <algorithm>
#include <chrono>
#include <cmath>

#include "planner/base/version.h"
#include "planner/march/assemble.h"
#include "planner/numerics/anderson.h"

namespace lossline {
namespace {

using namespace march;

/// Scales that make the iterated quantities comparable: heat over its mean, air temperature over
/// 100 K, humidity over 0.1.
struct Scales {
  double heat = 1;
};
constexpr double scale_T = 100, scale_Y = 0.1;

std::vector<double> pack(const Iterate& z, const Scales& scales) {
  std::vector<double> out;
  out.reserve(z.heat.size() + 2 * (z.supply.size() + z.counter.size()));
  for (const double q : z.heat) out.push_back(q / scales.heat);
  for (const auto* airs : {&z.supply, &z.counter}) {
    for (const Air& air : *airs) {
      out.push_back(air.T / scale_T);
      out.push_back(air.Y / scale_Y);
    }
  }
  return out;
}

/// Back to physical values, held inside what the models can be asked.
void unpack(const std::vector<double>& v, const Scales& scales, Iterate& z) {
  std::size_t i = 0;
  for (double& q : z.heat) q = std::max(v[i++], 0.0) * scales.heat;
  for (auto* airs : {&z.supply, &z.counter}) {
    for (Air& air : *airs) {
      air.T = std::clamp(v[i++] * scale_T, 255.0, 900.0);
      air.Y = std::max(v[i++] * scale_Y, 0.0);
    }
  }
}

double largest_change(const std::vector<double>& a, const std::vector<double>& b) {
  double change = 0;
  for (std::size_t i = 0; i < a.size(); ++i) change = std::max(change, std::abs(a[i] - b[i]));
  return change;
}

bool powered(const Setup& setup) {
  return std::any_of(setup.cavities.begin(), setup.cavities.end(),
                     [](const Cavity& c) { return c.launched > 0; });
}

/// The fixed point of one setup. Returns the last complete round.
LastRound iterate(const Setup& setup, const SolveOptions& options, Solution& out) {
  const bool constant = setup.line.solve.balance == Balance::constant_share;
  const bool field_needed = powered(setup) && !constant;
  LastRound last;
  last.iterate = first_air(setup);
  last.iterate.heat = even_heat(setup, constant ? setup.line.solve.load_share : 0.9);
  double mean_heat = 0;
  for (const double q : last.iterate.heat) mean_heat = std::max(mean_heat, q);
  const Scales scales{mean_heat > 0 ? mean_heat : 1.0};
  numerics::Anderson anderson;
  Iterate z = last.iterate;
  out.status = Status::not_converged;
  for (out.rounds = 1; out.rounds <= options.most_rounds; ++out.rounds) {
    last.iterate = z;
    last.pass = march_belt(setup, z);
    out.steps += last.pass.count.accepted + last.pass.count.rejected;
    if (!last.pass.failure.empty()) {
      out.reason = last.pass.failure;
      return last;
    }
    Iterate next = z;
    if (field_needed) {
      last.field = solve_field(setup, last.pass);
      next.heat = last.field.heat;
      ++out.cavity_rounds;
    }
    last.air = solve_air(setup, z, last.pass);
    next.supply = last.air.supply;
    next.counter = last.air.counter;
    const std::vector<double> from = pack(z, scales), to = pack(next, scales);
    out.residual = largest_change(from, to);
    if (out.residual <= options.tolerance) {
      out.status = Status::solved;
      out.reason = fmt::format("converged in {} rounds", out.rounds);
      return last;
    }
    if (options.stop != nullptr && options.stop->load()) {
      out.status = Status::interrupted;
      out.reason = fmt::format(
          "interrupted after {} rounds; the numbers are not converged "
          "(last relative change {:.1e})",
          out.rounds, out.residual);
      return last;
    }
    unpack(anderson.next(from, to), scales, z);
  }
  out.rounds = options.most_rounds;
  out.reason = fmt::format(
      "no steady answer after {} rounds: the last relative change was {:.1e}, "
      "wanted {:.0e}",
      out.rounds, out.residual, options.tolerance);
  return last;
}

Solution solve_one(const Line& line, const ProductCard& card, const SolveOptions& options) {
  Solution out;
  out.level = options.level;
  out.balance = line.solve.balance;
  out.version = program_version;
  if (options.level != Level::mean) {
    out.reason = "only the level 'mean' is available";
    return out;
  }
  std::string refusal;
  const Setup setup = prepare(line, card, options, refusal);
  out.topology = setup.topology;
  if (!refusal.empty()) {
    out.reason = refusal;
    return out;
  }
  const LastRound last = iterate(setup, options, out);
  if (last.pass.nodes.size() == setup.grid.nodes()) assemble(setup, last, out);
  return out;
}

/// The two ends of an estimated permittivity, as its own small answer.
EstimateBand solve_band(const Line& line, const ProductCard& card, const SolveOptions& options) {
  EstimateBand band;
  ProductCard end = card;
  end.permittivity = card.permittivity_low;
  const Solution low = solve_one(line, end, options);
  end.permittivity = card.permittivity_high;
  const Solution high = solve_one(line, end, options);
  band.converged = low.status == Status::solved && high.status == Status::solved;
  band.final_moisture_low_loss = low.answer.final_moisture;
  band.final_moisture_high_loss = high.answer.final_moisture;
  band.share_low_loss = low.answer.share_of_forward;
  band.share_high_loss = high.answer.share_of_forward;
  band.hottest_low_loss = low.answer.hottest_temperature;
  band.hottest_high_loss = high.answer.hottest_temperature;
  return band;
}

}  // namespace

Solution solve(const Line& line, const ProductCard& card, const SolveOptions& options) {
  const auto start = std::chrono::steady_clock::now();
  Solution out = solve_one(line, card, options);
  const bool estimated = card.permittivity_low && card.permittivity_high;
  if (estimated && options.estimate_band && out.status == Status::solved &&
      line.solve.balance == Balance::full)
    out.band = solve_band(line, card, options);
  out.wall_time = std::chrono::duration<double>(std::chrono::steady_clock::now() - start).count();
  return out;
}

}  // namespace lossline
