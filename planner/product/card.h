#pragma once
// ProductCard: everything the march needs to know about a product, with the evidence behind each
// value. Cards come from the materials database; a line file may override single values.
// Moisture X is dry basis [kg water / kg dry solid] throughout.

#include <memory>
#include <optional>
#include <string>
#include <vector>

#include "planner/product/cure.h"
#include "planner/product/permittivity.h"
#include "planner/product/provenance.h"
#include "planner/product/sorption.h"

namespace lossline {

/// One scalar with its evidence.
struct Property {
  double value = 0;
  Provenance provenance;
};

/// What a limit is about; the unit of its value follows from the kind.
enum class LimitKind {
  product_temperature,  ///< highest temperature anywhere [K]
  runaway_temperature,  ///< temperature from which self-heating was reported [K]
  internal_pressure,    ///< highest overpressure inside [Pa]
  heating_rate,         ///< highest dT/dt [K/s]
  drying_rate,          ///< highest -dX/dt [1/s]
  final_moisture_low,   ///< lowest final moisture, dry basis
  field_strength,       ///< highest rms field in the product [V/m]
};

/// What happens beyond a limit.
enum class Severity { quality, damage, fire };

/// A limit of the product, with the moisture range it holds in.
struct ProductLimit {
  LimitKind kind = LimitKind::product_temperature;
  double value = 0;
  std::optional<double> moisture_from, moisture_to;  ///< dry basis; absent = any
  std::string reason;
  Severity severity = Severity::quality;
  Provenance provenance;
};

/// A product as the march sees it. Absent optionals mean "not known": the march names what it
/// assumes instead, or refuses.
struct ProductCard {
  std::string id;
  std::string name;
  std::string family;  ///< food, plant, wood, board, paper, textile, mineral, ceramic, ...

  std::shared_ptr<const Permittivity> permittivity;  ///< null: none, not even an estimate
  /// Ends of the band when the nominal one is an estimate from composition; otherwise null.
  std::shared_ptr<const Permittivity> permittivity_low, permittivity_high;
  Phase permittivity_phase = Phase::bulk;
  Provenance permittivity_provenance;

  std::shared_ptr<const product::Sorption> sorption;  ///< null: all water behaves as free water
  Provenance sorption_provenance;

  std::optional<Property> dry_heat_capacity;        ///< of the dry solid at 0 degC [J/(kg K)]
  std::optional<Property> dry_heat_capacity_slope;  ///< its change with temperature [J/(kg K2)]
  std::optional<Property> dry_bulk_density;         ///< dry solid per bed volume [kg/m3]
  std::optional<Property> dry_piece_density;        ///< dry solid per piece volume [kg/m3]
  std::optional<Property> solid_density;            ///< of the pore-free solid [kg/m3]
  std::optional<Property> shrinkage;           ///< beta in rho_dry = rho_dry,0 / (1 + beta X), 1
  std::optional<Property> conductivity;        ///< dry [W/(m K)]
  std::optional<Property> conductivity_slope;  ///< per dry-basis moisture [W/(m K)]
  std::optional<Property> diffusivity;         ///< liquid, at 298.15 K, wet end [m2/s]
  std::optional<Property> diffusivity_activation;     ///< [J/mol]
  std::optional<Property> diffusivity_half_moisture;  ///< X where D has half its wet value, 1
  std::optional<Property> permeability;               ///< gas, intrinsic [m2]
  std::optional<Property> vapour_factor;              ///< pore diffusion over free-air diffusion, 1
  std::optional<Property> saturation_moisture;        ///< X with all pores full, dry basis
  std::optional<Property> heat_of_reaction;           ///< per dry solid, positive = released [J/kg]
  std::optional<product::CureModel> cure;
  Provenance cure_provenance;

  std::vector<ProductLimit> limits;
};

}  // namespace lossline
