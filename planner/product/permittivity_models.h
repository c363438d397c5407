#pragma once
// Permittivities that rest on a published equation or on an estimate, made ready for the march:
// each keeps its own range, holds or follows the equation outside and says so by a mark, and never
// throws for a state the march can reach. Frequencies outside the stated band are refused.
// The equations themselves: dielectric_forms.h.

#include <complex>
#include <memory>

#include "planner/product/dielectric_forms.h"
#include "planner/product/permittivity.h"

namespace lossline {

using PermittivityPointer = std::shared_ptr<const Permittivity>;

/// Band of frequencies for which estimates and published equations are offered [Hz]: the heating
/// bands at 433, 915 (896), 2450 and 5800 MHz.
inline constexpr double model_frequency_min = 0.4e9, model_frequency_max = 6e9;

/// Relative change of an ionic conductivity with temperature, from its value at 298.15 K [1/K].
/// From memory: usual for dilute salt solutions (2 % a kelvin).
inline constexpr double ionic_slope = 0.02;

/// Leaf tissue by Ulaby and El-Rayes; `conductivity` of its free water [S/m]. Drier than 5 % wet
/// basis: held; wetter than 70 %: held. Phase: particle.
[[nodiscard]] PermittivityPointer leaf_tissue(double conductivity, Flags origin);

/// Hard red winter wheat in bulk at a wet bulk density [kg/m3]; 24 degC only, other temperatures
/// are held and beyond +-10 K marked extrapolated. Followed from 5 to 30 % wet basis (fit 10 to
/// 25 %), held outside. Phase: bulk.
[[nodiscard]] PermittivityPointer bulk_wheat(double bulk_density, Flags origin);

/// Moist sand or clay by Wang and Schmugge; `conductivity` of the pore water at 298.15 K [S/m].
/// Fitted at 1.4 and 5 GHz: lower and higher frequencies are marked extrapolated. Phase: bulk.
[[nodiscard]] PermittivityPointer moist_mineral(const product::MineralBody& body,
                                                double conductivity, Flags origin);

/// An air-dry board by ITU-R P.2040: no moisture and no temperature; any moisture above
/// dry_board_moisture is marked extrapolated. Phase: bulk.
[[nodiscard]] PermittivityPointer dry_board(const product::BoardMaterial& board, Flags origin);
/// Moisture an air-dry board may have [kg/kg dry basis]; order of size, own choice.
inline constexpr double dry_board_moisture = 0.10;

/// Fresh fruit and vegetables at 2450 MHz by Sipahioglu and Barringer; `ash` wet-basis share.
/// Drier than 70 % wet basis is refused. Phase: particle.
[[nodiscard]] PermittivityPointer fresh_produce(double ash, Flags origin);

/// What an estimate is made from: the four phases, and how the volume follows the moisture.
struct EstimateInputs {
  product::Composition composition;  ///< dry_bulk_density at X = 0; conductivity at 298.15 K
  double shrinkage = 0;  ///< beta in dry density = dry density at X = 0 / (1 + beta X), 1
};

/// The three curves of an estimate from composition.
struct EstimateBand {
  PermittivityPointer low, nominal, high;
};

/// The estimate, ready for the march: conductivity rises by ionic_slope with temperature, water
/// beyond 0 to 100 degC is held at the end and marked. Every value carries the mark estimated.
///
///   throws  Error out_of_range when the inputs cannot be used
[[nodiscard]] EstimateBand estimate_band(const EstimateInputs& inputs, Flags origin);

}  // namespace lossline
