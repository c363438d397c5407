#include "planner/line/flow.h"

#include <fmt/format.h>

#include <cmath>

#include "planner/line/flow_parts.h"

namespace lossline {
namespace flow_parts {
namespace {

constexpr double per_hour = 3600, per_minute = 60, millimetres = 1000;

Factor rate_factor(const char* key, std::optional<double> rate, double dry_share) {
  Factor factor{key, std::nullopt, per_hour / dry_share, "kg/h"};
  if (rate) factor.value = *rate * dry_share;
  return factor;
}

std::string joined_keys(const std::vector<const Factor*>& factors) {
  std::string text;
  for (std::size_t i = 0; i < factors.size(); ++i) {
    if (i > 0) text += i + 1 == factors.size() ? " and " : ", ";
    text += factors[i]->key;
  }
  return text;
}

}  // namespace

std::string printed(const Factor& factor, double value) {
  const std::string number = fmt::format("{:.4g}", value * factor.scale);
  return factor.unit.empty() ? number : number + ' ' + factor.unit;
}

Factor stated_rate(const Line& line, std::vector<FlowProblem>& problems) {
  const Duty& duty = line.duty;
  std::vector<Factor> stated;
  if (duty.feed_rate)
    stated.push_back(rate_factor("duty.feed_rate", duty.feed_rate, 1 / (1 + duty.feed_moisture)));
  if (duty.product_rate && duty.target_moisture) {
    stated.push_back(
        rate_factor("duty.product_rate", duty.product_rate, 1 / (1 + *duty.target_moisture)));
  } else if (duty.product_rate) {
    problems.push_back({"duty.product_rate", "says nothing without the moisture it is meant at",
                        "give duty.target_moisture as well, or duty.feed_rate instead"});
  }
  if (duty.dry_solids_rate)
    stated.push_back(rate_factor("duty.dry_solids_rate", duty.dry_solids_rate, 1));
  if (stated.empty())
    return rate_factor("duty.feed_rate", std::nullopt, 1 / (1 + duty.feed_moisture));
  for (std::size_t i = 1; i < stated.size(); ++i) {
    Factor first = stated[0];
    (void)close(first, {&stated[i]}, 1, problems);
  }
  return stated[0];
}

Factor stated_density(const Line& line, const ProductCard& card) {
  const bool bed = line.product.kind == ProductKind::granular_bed;
  const double X = line.duty.feed_moisture;
  // Printed as the wet density a line file would state.
  Factor factor{"feed.bulk_density", std::nullopt, 1 + X, "kg/m3"};
  const double swelling = 1 + (card.shrinkage ? card.shrinkage->value : 0.0) * X;
  if (line.feed.bulk_density)
    factor.value = *line.feed.bulk_density / (1 + X);
  else if (!bed && card.dry_piece_density)
    factor.value = card.dry_piece_density->value / swelling;
  else if (card.dry_bulk_density)
    factor.value = card.dry_bulk_density->value / swelling;
  return factor;
}

bool close(Factor& product, std::vector<Factor*> factors, double fixed,
           std::vector<FlowProblem>& problems) {
  std::vector<const Factor*> missing;
  if (!product.value) missing.push_back(&product);
  double right = fixed;
  Factor* unknown = nullptr;
  for (Factor* factor : factors) {
    if (factor->value) {
      right *= *factor->value;
    } else {
      missing.push_back(factor);
      unknown = factor;
    }
  }
  if (missing.size() > 1) {
    problems.push_back(
        {missing.back()->key,
         fmt::format("{} are unknown, and only one of them can follow from "
                     "the rest",
                     joined_keys(missing)),
         fmt::format("give {}", missing.size() == 2 ? "one of them" : "all of them but one")});
    return false;
  }
  for (const Factor* factor : factors) {
    if (factor->value && !(*factor->value > 0 && std::isfinite(*factor->value))) {
      problems.push_back({factor->key, fmt::format("is {}", printed(*factor, *factor->value)),
                          "it must be above zero"});
      return false;
    }
  }
  if (!product.value) {
    product.value = right;
    return true;
  }
  if (unknown != nullptr) {
    unknown->value = *product.value / right;
    return true;
  }
  const double error = std::abs(right / *product.value - 1);
  if (error <= flow_closing_tolerance) return true;
  std::vector<const Factor*> others(factors.begin(), factors.end());
  std::string repair;
  for (const Factor* factor : factors) {
    if (!repair.empty()) repair += ", or ";
    repair += fmt::format("{} = \"{}\"", factor->key,
                          printed(*factor, *factor->value * *product.value / right));
  }
  problems.push_back(
      {product.key,
       fmt::format("is {}, but {} give{} {}: a closing error of {:.2g} %",
                   printed(product, *product.value), joined_keys(others),
                   others.size() == 1 ? "s" : "", printed(product, right), 100 * error),
       fmt::format("leave one of them out, or use {} = \"{}\", or {}", product.key,
                   printed(product, right), repair)});
  return false;
}

}  // namespace flow_parts

namespace {

using namespace flow_parts;

/// Bed and slab: solids = density x width x depth x speed.
ProductFlow resolve_sheet(const Line& line, const ProductCard& card,
                          std::vector<FlowProblem>& problems) {
  Factor rate = stated_rate(line, problems);
  if (!problems.empty()) return {};
  Factor density = stated_density(line, card);
  Factor width{"feed.width", line.feed.width, millimetres, "mm"};
  Factor depth{"feed.depth", line.feed.depth, millimetres, "mm"};
  Factor speed{"belt.speed", line.belt.speed, per_minute, "m/min"};
  ProductFlow flow;
  if (!close(rate, {&density, &width, &depth, &speed}, 1, problems)) return flow;
  flow.dry_solids = *rate.value;
  flow.width = *width.value;
  flow.depth = *depth.value;
  flow.speed = *speed.value;
  // Rounding in the inputs goes into the density, so that the stated rate is kept exactly.
  flow.dry_areal_mass = flow.dry_solids / (flow.width * flow.speed);
  flow.dry_density = flow.dry_areal_mass / flow.depth;
  return flow;
}

/// Profile: solids = mass per length x speed; mass per length = density x width x depth.
ProductFlow resolve_profile(const Line& line, const ProductCard& card,
                            std::vector<FlowProblem>& problems) {
  const double dry_share = 1 / (1 + line.duty.feed_moisture);
  Factor rate = stated_rate(line, problems);
  if (!problems.empty()) return {};
  Factor linear{"feed.mass_per_length", std::nullopt, 1 / dry_share, "kg/m"};
  if (line.feed.mass_per_length) linear.value = *line.feed.mass_per_length * dry_share;
  Factor speed{"belt.speed", line.belt.speed, per_minute, "m/min"};
  Factor density = stated_density(line, card);
  Factor width{"feed.width", line.feed.width, millimetres, "mm"};
  Factor depth{"feed.depth", line.feed.depth, millimetres, "mm"};
  ProductFlow flow;
  if (!close(rate, {&linear, &speed}, 1, problems)) return flow;
  linear.value = *rate.value / *speed.value;
  if (!close(linear, {&density, &width, &depth}, 1, problems)) return flow;
  flow.dry_solids = *rate.value;
  flow.speed = *speed.value;
  flow.width = *width.value;
  flow.depth = *depth.value;
  flow.dry_areal_mass = *linear.value / flow.width;
  flow.dry_density = flow.dry_areal_mass / flow.depth;
  return flow;
}

}  // namespace

ProductFlow resolve_flow(const Line& line, const ProductCard& card,
                         std::vector<FlowProblem>& problems) {
  ProductFlow flow;
  switch (line.product.kind) {
    case ProductKind::granular_bed:
    case ProductKind::slab:
      flow = resolve_sheet(line, card, problems);
      break;
    case ProductKind::profile:
      flow = resolve_profile(line, card, problems);
      break;
    case ProductKind::pieces:
      flow = resolve_pieces(line, card, problems);
      break;
  }
  if (!problems.empty()) return flow;
  flow.feed = flow.dry_solids * (1 + line.duty.feed_moisture);
  if (line.belt.width > 0 && !(flow.width <= line.belt.width * (1 + 1e-9)))
    problems.push_back({"feed.width",
                        fmt::format("the loaded width is {:.4g} mm on a belt of {:.4g} mm",
                                    millimetres * flow.width, millimetres * line.belt.width),
                        "the product cannot be wider than the belt"});
  return flow;
}

}  // namespace lossline
