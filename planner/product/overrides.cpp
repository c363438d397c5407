#include "planner/product/overrides.h"

#include <memory>
#include <utility>

#include "planner/base/error.h"
#include "planner/product/permittivity_table.h"

namespace lossline {
namespace {

std::shared_ptr<const product::Sorption> sorption_of(const SorptionOverride& given) {
  if (given.free_water)
    return std::make_shared<const product::Sorption>(product::Sorption::free_water());
  product::Isotherm isotherm;
  isotherm.form = product::Oswin{given.oswin_scale, 0, given.oswin_exponent, 0};
  return std::make_shared<const product::Sorption>(
      isotherm, given.reference_temperature,
      product::SorptionHeat{given.heat_at_zero, given.heat_decay_moisture});
}

void put_permittivity(ProductCard& card, const ProductOverrides& overrides) {
  PermittivityTableOptions options;
  options.origin = overrides.permittivity_provenance.flags();
  options.name = "product.permittivity";
  card.permittivity = std::make_shared<PermittivityTable>(overrides.permittivity, options);
  card.permittivity_low = nullptr;
  card.permittivity_high = nullptr;
  card.permittivity_phase = overrides.permittivity_phase;
  card.permittivity_provenance = overrides.permittivity_provenance;
}

}  // namespace

ProductCard with_overrides(ProductCard card, const ProductOverrides& overrides) {
  const std::pair<const std::optional<double>&, std::optional<Property>&> scalars[] = {
      {overrides.dry_heat_capacity, card.dry_heat_capacity},
      {overrides.dry_heat_capacity_slope, card.dry_heat_capacity_slope},
      {overrides.dry_bulk_density, card.dry_bulk_density},
      {overrides.dry_piece_density, card.dry_piece_density},
      {overrides.solid_density, card.solid_density},
      {overrides.shrinkage, card.shrinkage},
      {overrides.conductivity, card.conductivity},
      {overrides.conductivity_slope, card.conductivity_slope},
      {overrides.diffusivity, card.diffusivity},
      {overrides.diffusivity_activation, card.diffusivity_activation},
      {overrides.diffusivity_half_moisture, card.diffusivity_half_moisture},
      {overrides.permeability, card.permeability},
      {overrides.vapour_factor, card.vapour_factor},
      {overrides.saturation_moisture, card.saturation_moisture},
      {overrides.heat_of_reaction, card.heat_of_reaction}};
  for (const auto& [given, property] : scalars)
    if (given) property = Property{*given, overrides.provenance};
  // One number holds everywhere: a heat capacity at all temperatures, a conductivity and a bulk
  // density at all moistures.
  if (overrides.dry_heat_capacity && !overrides.dry_heat_capacity_slope)
    card.dry_heat_capacity_slope.reset();
  if (overrides.conductivity && !overrides.conductivity_slope) card.conductivity_slope.reset();
  if (overrides.dry_bulk_density && !overrides.shrinkage) card.shrinkage.reset();
  try {
    if (overrides.sorption) {
      card.sorption = sorption_of(*overrides.sorption);
      card.sorption_provenance = overrides.provenance;
    }
    if (overrides.cure) {
      card.cure = product::first_order_from_t90(overrides.cure->time_to_90,
                                                overrides.cure->reference_temperature,
                                                overrides.cure->activation_energy);
      card.cure_provenance = overrides.provenance;
    }
    if (!overrides.permittivity.empty()) put_permittivity(card, overrides);
  } catch (const Error& error) {
    throw Error(ErrorKind::bad_line_file, error.what());
  }
  return card;
}

}  // namespace lossline
