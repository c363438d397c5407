#pragma once
// Heat capacity, conductivity and density from composition (foods) and of wood.
//
// Sources
//   [CO86]  Y. Choi, M. R. Okos, in Food Engineering and Process Applications vol. 1, Elsevier
//   1986,
//           93-101; as in ASHRAE Handbook Refrigeration 2006, chapter 9, Table 1 (two copies seen;
//           fibre one). -40 .. 150 degC. Fat cp: the copies differ, 1.4733e-3 against 1.4733e-4 in
//           the linear term, the first is taken. Water cp: the copies print the constant 4.1289;
//           the 4.1762 used here is from memory and gives 4.177 kJ/(kg K) at 20 degC, where steam
//           tables have 4.184.
//   [GZ10]  S. V. Glass, S. L. Zelinka, Wood Handbook FPL-GTR-190, 2010, chapter 4, eqs. 4-7, 4-9,
//           4-15 to 4-18 (one lineage seen).

namespace lossline::product {

/// Mass shares of a food; they sum to 1.
struct FoodComposition {
  double water = 0, protein = 0, fat = 0, carbohydrate = 0, fibre = 0, ash = 0;
};

/// The three thermal properties.
struct ThermalProperties {
  double heat_capacity = 0;  ///< [J/(kg K)]
  double conductivity = 0;   ///< [W/(m K)]
  double density = 0;        ///< [kg/m3], pore-free
};

/// A food at a temperature [CO86]: cp by mass, 1/rho by mass, k by volume.
///
///   composition  shares 0..1, sum 1 within 1e-3 (scaled to 1)
///   T            [K], 273.15 .. 423.15
///   throws       Error out_of_range
[[nodiscard]] ThermalProperties food_properties(const FoodComposition& composition, double T);

/// The same food at another moisture: the dry shares keep their proportions.
///
///   moisture  dry basis [kg/kg], >= 0
///   throws    Error out_of_range, also when the composition has no dry solid
[[nodiscard]] FoodComposition at_moisture(const FoodComposition& composition, double moisture);

/// Heat capacity of wood with its water [GZ10], per kg of wet wood [J/(kg K)].
///
///   moisture  dry basis [kg/kg], 0 .. 0.3 (fibre saturation)
///   T         [K], 250 .. 420
[[nodiscard]] double wood_heat_capacity(double moisture, double T);

/// Heat capacity of dry wood [GZ10] [J/(kg K)]; T [K], 250 .. 420.
[[nodiscard]] double dry_wood_heat_capacity(double T);

/// Conductivity of wood across the grain [GZ10] [W/(m K)].
///
///   basic_gravity  Gb, oven-dry mass over green volume over the density of water, 0.2 .. 1
///   shrinkage      So, total volumetric, 0 .. 0.3
///   moisture       dry basis [kg/kg], 0 .. 0.25
[[nodiscard]] double wood_conductivity(double basic_gravity, double shrinkage, double moisture);

}  // namespace lossline::product
