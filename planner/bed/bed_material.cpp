#include "planner/bed/bed_material.h"

#include <fmt/format.h>

#include <algorithm>

#include "planner/base/error.h"

namespace lossline::bed {
namespace {

double known_or(const std::optional<Property>& property, double fallback, const char* quantity,
                const char* unit, std::vector<Assumption>& assumptions) {
  if (property) return property->value;
  assumptions.push_back({quantity, fmt::format("{:g} {} assumed: no value known", fallback, unit)});
  return fallback;
}

/// Moisture with every pore full, from the pore volume of the piece where densities allow.
double saturation_from_pores(double dry_density, const ProductCard& card) {
  constexpr double water_density = 1000.0;
  if (!card.solid_density || !(card.solid_density->value > dry_density)) return 0;
  return water_density * (1 / dry_density - 1 / card.solid_density->value);
}

void fill_granules(BedMaterial& out, const Line& line, const ProductCard& card,
                   std::vector<Assumption>& assumptions) {
  if (line.feed.void_share) {
    out.void_share = *line.feed.void_share;
  } else if (card.dry_piece_density && card.dry_piece_density->value > out.dry_density) {
    out.void_share = 1 - out.dry_density / card.dry_piece_density->value;
  } else {
    out.void_share = assumed::void_share;
    assumptions.push_back(
        {"void_share", fmt::format("{:g} assumed: no piece density known", out.void_share)});
  }
  out.piece_dry_density = out.dry_density / (1 - out.void_share);
  out.piece_radius = 0.5 * line.feed.piece_size.value_or(0);
}

}  // namespace

BedMaterial bed_material(const Line& line, const ProductCard& card, const ProductFlow& flow,
                         std::vector<Assumption>& assumptions) {
  if (!card.dry_heat_capacity) {
    throw Error(ErrorKind::bad_line_file,
                "product.override.dry_heat_capacity: material '" + card.id +
                    "' has no heat capacity; give one with its evidence, as in "
                    "dry_heat_capacity = \"1.4 kJ/(kg K)\"");
  }
  BedMaterial out;
  out.sorption = card.sorption;
  if (!out.sorption) {
    out.sorption = std::make_shared<const product::Sorption>(product::Sorption::free_water());
    assumptions.push_back({"sorption", "no isotherm known: all water assumed free"});
  }
  out.cure = card.cure;
  if (card.heat_of_reaction && card.cure) out.heat_of_reaction = card.heat_of_reaction->value;
  out.heat_capacity = card.dry_heat_capacity->value;
  if (card.dry_heat_capacity_slope) out.heat_capacity_slope = card.dry_heat_capacity_slope->value;
  out.shrinkage = card.shrinkage ? card.shrinkage->value : 0.0;
  const double X_feed = line.duty.feed_moisture;
  out.dry_density = flow.dry_density * (1 + out.shrinkage * X_feed);

  out.conductivity =
      known_or(card.conductivity, assumed::conductivity, "conductivity", "W/(m K)", assumptions);
  if (card.conductivity_slope)
    out.conductivity_slope = card.conductivity_slope->value;
  else if (!card.conductivity)
    out.conductivity_slope = assumed::conductivity_slope;
  out.diffusivity =
      known_or(card.diffusivity, assumed::diffusivity, "diffusivity", "m2/s", assumptions);
  out.diffusivity_activation = card.diffusivity_activation ? card.diffusivity_activation->value
                                                           : assumed::diffusivity_activation;
  out.diffusivity_half_moisture = card.diffusivity_half_moisture
                                      ? card.diffusivity_half_moisture->value
                                      : assumed::diffusivity_half_moisture;
  out.permeability =
      known_or(card.permeability, assumed::permeability, "permeability", "m2", assumptions);
  out.vapour_factor =
      known_or(card.vapour_factor, assumed::vapour_factor, "vapour_factor", "", assumptions);

  if (line.product.kind == ProductKind::granular_bed) fill_granules(out, line, card, assumptions);
  const double pore_density = out.piece_dry_density > 0 ? out.piece_dry_density : out.dry_density;
  if (card.saturation_moisture)
    out.saturation_moisture = card.saturation_moisture->value;
  else
    out.saturation_moisture = saturation_from_pores(pore_density, card);
  // The gas paths close at saturation; a feed wetter than its pores allow is bulging with water,
  // and a few per cent of gas are left so that vapour can still leave.
  out.saturation_moisture = std::max({out.saturation_moisture, 1.05 * X_feed, 1e-3});
  return out;
}

}  // namespace lossline::bed
