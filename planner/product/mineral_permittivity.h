#pragma once
// Permittivity of minerals by published models: moist sand and clay bodies, dry building boards.
//
// Sources
//   [WS80]   J. R. Wang, T. J. Schmugge, IEEE Trans. Geosci. Remote Sens. GE-18, 288-295, 1980;
//            from memory. Fitted at 1.4 and 5 GHz; 0.915 GHz is an extrapolation.
//   [P2040]  Recommendation ITU-R P.2040-3, 2023, Table 3; seen in six copies of one lineage.
//            Ordinary indoor condition, no moisture, no temperature.

#include <complex>

namespace lossline::product {

/// A sand or clay body for [WS80].
struct MineralBody {
  double sand = 0;                        ///< mass share of the solid, 0..1
  double clay = 0;                        ///< mass share of the solid, 0..1; sand + clay <= 1
  double dry_density = 0;                 ///< dry solid per volume [kg/m3]
  double solid_density = 0;               ///< of the pore-free solid [kg/m3], above dry_density
  std::complex<double> solid{5.5, -0.2};  ///< eps of the solid; 5.5 - j0.2 is the model's own
};

/// Washed silica sand is far less lossy than the soils of [WS80]; own choice, an estimate.
inline constexpr std::complex<double> silica_sand_solid{5.0, -0.02};
/// Water in the film next to the grains [WS80].
inline constexpr std::complex<double> mineral_film_water{3.2, -0.1};

/// Moist sand or clay [WS80].
///
///   moisture  dry basis [kg/kg], >= 0; beyond full pores the value at full pores is returned
///   water     eps of the pore water at the temperature, conduction included; eps' >= 1
///   throws    Error out_of_range
[[nodiscard]] std::complex<double> moist_mineral_permittivity(const MineralBody& body,
                                                              double moisture,
                                                              std::complex<double> water);
/// The same with pure water at temperature T [K] and `frequency` [Hz] plus conduction.
///
///   conductivity  of the pore water [S/m], >= 0
[[nodiscard]] std::complex<double> moist_mineral_permittivity(const MineralBody& body,
                                                              double moisture, double T,
                                                              double frequency,
                                                              double conductivity);

/// Line of [P2040] Table 3: eps' = a, sigma = c f^d with f in GHz.
struct BoardMaterial {
  double a = 1;                                 ///< eps', 1
  double c = 0;                                 ///< conductivity at 1 GHz [S/m]
  double d = 0;                                 ///< exponent, 1
  double frequency_min = 0, frequency_max = 0;  ///< stated range [Hz]
};
namespace board {
inline constexpr BoardMaterial wood{1.99, 0.0047, 1.0718, 1e6, 100e9};
inline constexpr BoardMaterial chipboard{2.58, 0.0217, 0.7800, 1e9, 100e9};
inline constexpr BoardMaterial plasterboard{2.73, 0.0085, 0.9395, 1e9, 100e9};
inline constexpr BoardMaterial ceiling_board{1.48, 0.0011, 1.0750, 1e9, 100e9};
inline constexpr BoardMaterial brick{3.91, 0.0238, 0.16, 1e9, 40e9};
inline constexpr BoardMaterial concrete{5.24, 0.0462, 0.7822, 1e9, 100e9};
inline constexpr BoardMaterial glass{6.31, 0.0036, 1.3394, 0.1e9, 100e9};
}  // namespace board

/// An air-dry board [P2040].
///
///   frequency  [Hz], stated range widened by 10 % below (0.9 GHz for most, an extrapolation)
[[nodiscard]] std::complex<double> board_permittivity(const BoardMaterial& material,
                                                      double frequency);

}  // namespace lossline::product
