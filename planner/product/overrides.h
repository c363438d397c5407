#pragma once
// Values a line file puts in place of the database's, each with its own evidence.

#include <complex>
#include <optional>
#include <string>
#include <vector>

#include "planner/product/card.h"

namespace lossline {

/// One line of a permittivity table given in a line file.
struct PermittivityPoint {
  double frequency = 0;      ///< [Hz]
  double moisture = 0;       ///< dry basis [kg/kg]
  double temperature = 0;    ///< [K]
  std::complex<double> eps;  ///< eps' - j eps''
};

/// An isotherm given in a line file: Oswin at a reference temperature with a heat of sorption
/// that decays with moisture, or none at all.
struct SorptionOverride {
  bool free_water = false;                ///< all water behaves as free water
  double oswin_scale = 0;                 ///< A: dry-basis moisture at activity 0.5, 1
  double oswin_exponent = 0;              ///< B, 1
  double reference_temperature = 298.15;  ///< [K]
  double heat_at_zero = 0;                ///< q0, net heat of sorption of the last water [J/kg]
  double heat_decay_moisture = 1;         ///< Xq, dry basis
};

/// First-order cure stated by the time to 90 % at a temperature, as rheometers report it.
struct CureOverride {
  double time_to_90 = 0;             ///< [s]
  double reference_temperature = 0;  ///< [K]
  double activation_energy = 0;      ///< [J/mol]
};

/// All overrides of one line file; absent members leave the card's value.
struct ProductOverrides {
  Provenance provenance;  ///< of all scalars below
  std::optional<double> dry_heat_capacity, dry_heat_capacity_slope, dry_bulk_density,
      dry_piece_density, solid_density, shrinkage, conductivity, conductivity_slope, diffusivity,
      diffusivity_activation, diffusivity_half_moisture, permeability, vapour_factor,
      saturation_moisture, heat_of_reaction;  ///< units as in ProductCard
  std::optional<SorptionOverride> sorption;
  std::optional<CureOverride> cure;
  std::vector<PermittivityPoint> permittivity;
  Phase permittivity_phase = Phase::bulk;
  Provenance permittivity_provenance;
};

/// The card with the overrides in place. A heat capacity, conductivity or dry bulk density given
/// without its slope or shrinkage holds at all temperatures and moistures: the card's own slope or
/// shrinkage goes with the value it belonged to. A given permittivity table replaces an estimate
/// together with its band.
///
///   throws  Error bad_line_file when a permittivity table cannot be used (see
///           permittivity_table.h)
[[nodiscard]] ProductCard with_overrides(ProductCard card, const ProductOverrides& overrides);

}  // namespace lossline
