#pragma once
// The product's numbers as the bed equations use them: plain doubles, gathered once from a card,
// with a note for every value that had to be assumed because nobody knows it.
//
// Assumed values are of usual size and from memory; they carry the mark "assumed", appear in the
// evidence of every result, and give way to any value in the card or the line file.

#include <memory>
#include <optional>
#include <string>
#include <vector>

#include "planner/line/flow.h"
#include "planner/line/line.h"
#include "planner/product/card.h"

namespace lossline::bed {

/// Values used where neither the card nor the line file has one. From memory, order of size only.
namespace assumed {
inline constexpr double conductivity = 0.2;                ///< dry solid with pores [W/(m K)]
inline constexpr double conductivity_slope = 0.4;          ///< per dry-basis moisture [W/(m K)]
inline constexpr double diffusivity = 1e-9;                ///< liquid, at 298.15 K [m2/s]
inline constexpr double diffusivity_activation = 2.5e4;    ///< [J/mol]
inline constexpr double diffusivity_half_moisture = 0.05;  ///< dry basis
inline constexpr double permeability = 1e-12;              ///< gas, intrinsic [m2]
inline constexpr double vapour_factor = 0.2;               ///< pore over free-air diffusion, 1
inline constexpr double void_share = 0.4;                  ///< of a bed of loose pieces, 1
}  // namespace assumed

/// Share of the wet-end diffusivity that is left in a bone-dry solid, 1. Keeps the diffusion
/// equation regular at X = 0; own choice.
inline constexpr double dry_diffusivity_share = 0.02;

/// An assumption made for lack of data.
struct Assumption {
  std::string quantity;  ///< the card's name of it
  std::string note;      ///< value with unit, and the word "assumed"
};

/// Numbers of the bed equations; SI, moisture dry basis.
struct BedMaterial {
  std::shared_ptr<const product::Sorption> sorption;  ///< never null
  std::optional<product::CureModel> cure;
  double heat_of_reaction = 0;     ///< [J/kg dry]
  double heat_capacity = 0;        ///< dry solid at 0 degC [J/(kg K)]
  double heat_capacity_slope = 0;  ///< [J/(kg K2)]
  double dry_density = 0;          ///< of the bed or piece without shrinkage, at X = 0 [kg/m3]
  double shrinkage = 0;            ///< beta, 1
  double conductivity = 0, conductivity_slope = 0;
  double diffusivity = 0, diffusivity_activation = 0, diffusivity_half_moisture = 1;
  double permeability = 0;
  double vapour_factor = 0;
  double saturation_moisture = 1;
  double piece_dry_density = 0;  ///< granular bed: of one piece [kg/m3]
  double piece_radius = 0;       ///< granular bed [m]
  double void_share = 0;         ///< granular bed: air between pieces, 1
};

/// Gathers the numbers.
///
///   line, card, flow  flow must be a successful resolve_flow of the same line and card
///   assumptions       receives one entry per value that had to be assumed
///   throws            Error bad_line_file when a value without which nothing can be said is
///                     missing (the dry heat capacity)
[[nodiscard]] BedMaterial bed_material(const Line& line, const ProductCard& card,
                                       const ProductFlow& flow,
                                       std::vector<Assumption>& assumptions);

}  // namespace lossline::bed
