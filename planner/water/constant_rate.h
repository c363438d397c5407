#pragma once
// Drying in the constant-rate period from a free wet surface in parallel air flow: heat through the
// air film evaporates the water, the surface is at the wet bulb. SI units.
//
// Source [G]: C. J. Geankoplis, Transport Processes and Unit Operations, 3rd ed., Prentice Hall
//   1993, section 9.6: equation for air parallel to the surface, h = 0.0204 G^0.8 with G in
//   kg/(h m2), 2450 .. 29300 kg/(h m2), air 45 .. 150 degC (from memory); worked example 9.6-3.

namespace lossline::water {

/// Range of the film equation, mass flux of moist air [kg/(m2 s)], [G].
inline constexpr double parallel_flow_min = 2450.0 / 3600;
inline constexpr double parallel_flow_max = 29300.0 / 3600;

/// Film coefficient [W/(m2 K)] for air in parallel flow of the given mass flux [kg/(m2 s)].
/// Throws Error out_of_range outside the range above and for NaN.
[[nodiscard]] double parallel_flow_film(double mass_flux);

/// Water evaporated per area and time [kg/(m2 s)] from a free wet surface at T_surface [K], by air
/// of T_air >= T_surface [K] through a film [W/(m2 K)]; heat of evaporation by IF97 at the surface.
/// Throws Error out_of_range.
[[nodiscard]] double constant_rate_evaporation(double film, double T_air, double T_surface);

}  // namespace lossline::water
