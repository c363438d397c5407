#pragma once
// What the through-mean product gives to the air: one cell through the depth, with the slab's (or
// the granule's) own resistance between mean and surface. Constant rate, falling rate, equilibrium
// and the boiling cap all come out of one balance at the surface; no critical moisture is put in.
//
//   inside:   g [ rho_s D (X - Xs) + c_v (psi(X) - psi(Xs)) ]     g = 3 n / Lc per area, n faces
//   outside:  beta (psi(Xs) - psi_air)
//   boiling:  g c_K Pi(X)                                         adds to the outflow
//   heat:     (Ta - T) / (1/h + Lc/3k) per face
// The factor 3 is the lumped resistance of a slab heated or dried evenly (parabolic profile); in a
// pure late falling rate it is 22 % faster than the exact 2.467 (first root of the slab series).
// Through-flow of air in a granular bed: exponential approach of the air to the granule's surface,
// linear driving force inside the granule (15 D / r^2, Glueckauf 1955, from memory).

#include <algorithm>
#include <cmath>

#include "planner/bed/bed_state.h"
#include "planner/bed/vapour.h"

namespace lossline::bed {

/// Heat capacity of dry air [J/(kg K)].
inline constexpr double dry_air_heat_capacity = 1006.0;
/// Heat capacity of vapour in the through-flow film [J/(kg K)].
inline constexpr double vapour_heat_capacity = 1880.0;
/// Highest vapour share of pressure for which a humidity ratio is formed at a surface, 1.
inline constexpr double humidity_cap = 0.95;

/// The product's body and what surrounds it at one place of the belt.
struct Surroundings {
  double pressure = standard_pressure;  ///< [Pa]
  double dry_areal_mass = 0;            ///< [kg/m2 covered]
  double heat_top = 0, heat_belt = 0;   ///< film coefficients [W/(m2 K)]
  double belt_open = 0;                 ///< open share of the belt, 1
  double side_area = 0;                 ///< free side faces over plan area (pieces), 1
  bool through = false;                 ///< air flows up through the bed
  double through_flow = 0;              ///< dry air per covered area [kg/(m2 s)]
  double piece_heat = 0;                ///< film coefficient of a granule [W/(m2 K)]
  double surface_guess = -1;            ///< surface moisture nearby, to save work; negative = none
};

/// Flows from product to air per covered area, and the surface state behind them.
template <class S>
struct Exchange {
  S water{};     ///< [kg/(m2 s)]
  S enthalpy{};  ///< with the vapour, less the heat taken from the air [W/m2]
  S heat{};      ///< from the air to the product [W/m2]
  S over{};      ///< vapour overpressure inside [Pa]
  S surface_moisture{};
};

/// Humidity ratio that air at the surface would take, times P over the molar-mass ratio [Pa]; C1.
/// Air that flows through a bed approaches the surface along this potential.
template <class S>
S humidity_potential(const S& p, double P) {
  const S share = p / P;
  if (numerics::plain(share) <= humidity_cap) return P * share / (1.0 - share);
  constexpr double left = 1 - humidity_cap;
  return P * (humidity_cap / left + (share - humidity_cap) / (left * left));
}

/// The balance at the surface: inside flow less outside flow, decreasing in Xs.
template <class S>
struct SurfaceBalance {
  S liquid, vapour, psi_mean, outside, potential_air, X, T, psat;
  double P;
  bool through;

  /// The potential outside the surface at vapour pressure p.
  template <class R>
  [[nodiscard]] R outside_potential(const R& p) const {
    return through ? humidity_potential<R>(p, P) : diffusion_potential<R>(p, P);
  }
  /// Inside flow less outside flow for a surface at vapour pressure p and moisture Xs.
  template <class R>
  [[nodiscard]] R residual(const R& Xs, const R& p) const {
    return liquid * (X - Xs) + vapour * (psi_mean - diffusion_potential<R>(p, P)) -
           outside * (outside_potential<R>(p) - potential_air);
  }
};

/// Solves the surface balance for the surface moisture, in plain numbers.
///
///   guess    a nearby solution, negative for none; only the cost depends on it
///   slope    receives the derivative of the residual at the solution
/// The residual falls all the way, so the root is the only one: Newton from the guess, and a
/// bracketed Newton where that strays.
inline double surface_moisture(const product::Sorption& sorption, const SurfaceBalance<double>& b,
                               double guess, double& slope) {
  constexpr double close = 1e-13;
  auto residual = [&](double Xs) {
    const auto x = numerics::Dual<1>::variable(Xs, 0);
    const auto p = activity(sorption, x, numerics::Dual<1>(b.T)) * b.psat;
    const numerics::Dual<1> r = b.residual<numerics::Dual<1>>(x, p);
    slope = r.slope[0];
    return r.value;
  };
  double Xs = guess;
  for (int i = 0; i < 12 && Xs >= 0; ++i) {
    const double r = residual(Xs);
    if (!(slope < 0)) break;
    const double next = Xs - r / slope;
    if (std::abs(next - Xs) <= close * (1 + std::abs(Xs))) return std::max(next, 0.0);
    Xs = next;
  }
  double low = 0, high = std::max(b.X, 1e-9);
  if (!(residual(low) > 0)) return low;
  for (int i = 0; i < 60 && residual(high) > 0; ++i) {
    low = high;
    high *= 2;
  }
  Xs = std::clamp(b.X, low, high);
  for (int i = 0; i < 80; ++i) {
    const double r = residual(Xs);
    (r > 0 ? low : high) = Xs;
    double next = slope < 0 ? Xs - r / slope : 0.5 * (low + high);
    if (!(next > low && next < high)) next = 0.5 * (low + high);
    if (std::abs(next - Xs) <= close * (1 + std::abs(Xs))) return next;
    Xs = next;
  }
  return Xs;
}

/// The surface moisture; for duals with its derivatives by the implicit function theorem: one
/// Newton step in duals from the solved point.
inline double solved_surface(const product::Sorption& sorption, const SurfaceBalance<double>& b,
                             double guess) {
  double slope = 0;
  return surface_moisture(sorption, b, guess, slope);
}
template <int N>
numerics::Dual<N> solved_surface(const product::Sorption& sorption,
                                 const SurfaceBalance<numerics::Dual<N>>& b, double guess) {
  using D = numerics::Dual<N>;
  double slope = 0;
  const double Xs =
      surface_moisture(sorption,
                       SurfaceBalance<double>{b.liquid.value, b.vapour.value, b.psi_mean.value,
                                              b.outside.value, b.potential_air.value, b.X.value,
                                              b.T.value, b.psat.value, b.P, b.through},
                       guess, slope);
  D residual = b.template residual<D>(D(Xs), activity(sorption, D(Xs), b.T) * b.psat);
  residual.value = 0;
  return D(Xs) - residual / slope;
}

/// Completes the balance, solves it, and returns the vapour flow into the air [kg/(m2 s)].
template <class S>
S solve_film(const BedMaterial& material, SurfaceBalance<S>& b, const S& X, const S& T,
             const S& psat, const S& air_Y, double P, bool through, double guess, S& surface) {
  b.X = X;
  b.T = T;
  b.psat = psat;
  b.P = P;
  b.through = through;
  b.potential_air = b.outside_potential(vapour_pressure(air_Y, P));
  surface = solved_surface(*material.sorption, b, guess);
  const S p = activity(*material.sorption, surface, T) * psat;
  return b.outside * (b.outside_potential(p) - b.potential_air);
}

/// Exchange of a slab, sheet, piece or unventilated bed with the air along its faces.
template <class S>
Exchange<S> surface_exchange(const BedMaterial& material, const Surroundings& around, const S& X,
                             const S& T, const S& air_T, const S& air_Y) {
  const double P = around.pressure;
  const S moist = numerics::plain(X) > 0 ? X : 0.0 * X;
  const S thickness =
      around.dry_areal_mass / material.dry_density * (1.0 + material.shrinkage * moist);
  const bool belt_breathes = around.heat_belt > 0 && around.belt_open > 0;
  const double faces = 1.0 + (belt_breathes ? 1.0 : 0.0) + around.side_area;
  const S per_face = thickness / faces;
  const S inside = 3.0 * faces / per_face;  // all faces together, per plan area

  const S psat = water::fast_saturation_pressure(T);
  const S p = activity(*material.sorption, X, T) * psat;
  Exchange<S> out;
  out.over = overpressure(p, P);
  const double top_side = 1.0 + around.side_area;
  const double beta =
      film_conductance(around.heat_top, P) * top_side +
      (belt_breathes ? film_conductance(around.heat_belt, P) * around.belt_open : 0.0);
  S film(0.0);
  if (beta > 0) {
    SurfaceBalance<S> b;
    b.liquid = inside * (material.dry_density / (1.0 + material.shrinkage * moist)) *
               liquid_diffusivity(material, X, T);
    b.vapour = inside * pore_diffusion(material, moist, T, P);
    b.psi_mean = diffusion_potential(p, P);
    b.outside = S(beta);
    film = solve_film(material, b, X, T, psat, air_Y, P, false, around.surface_guess,
                      out.surface_moisture);
  } else {
    out.surface_moisture = X;
  }
  out.water = film + inside * pressure_flow(material, moist, T, out.over, P) * out.over;
  const S k3 = 3.0 * (material.conductivity + material.conductivity_slope * moist);
  S conductance(0.0);
  if (around.heat_top > 0)
    conductance = conductance + top_side / (1.0 / around.heat_top + per_face / k3);
  if (around.heat_belt > 0)
    conductance = conductance + 1.0 / (1.0 / around.heat_belt + per_face / k3);
  out.heat = conductance * (air_T - T);
  out.enthalpy = out.water * water::vapour_enthalpy(T) - out.heat;
  return out;
}

/// Exchange of a granular bed with air that flows up through it; (air_T, air_Y) enter below.
template <class S>
Exchange<S> through_exchange(const BedMaterial& material, const Surroundings& around, const S& X,
                             const S& T, const S& air_T, const S& air_Y) {
  using std::exp;
  const double P = around.pressure, G = around.through_flow;
  const double depth = around.dry_areal_mass / material.dry_density;
  const double r = material.piece_radius;
  const double film_area = 3 * (1 - material.void_share) / r * depth;  // per plan area
  const S moist = numerics::plain(X) > 0 ? X : 0.0 * X;

  const S psat = water::fast_saturation_pressure(T);
  const S p = activity(*material.sorption, X, T) * psat;
  Exchange<S> out;
  out.over = overpressure(p, P);
  const S capacity = dry_air_heat_capacity + vapour_heat_capacity * air_Y;
  const S approach_heat = 1.0 - exp(-1.0 * around.piece_heat * film_area / (G * capacity));
  const double approach_mass =
      -std::expm1(-around.piece_heat * film_area /
                  (G * film_heat_capacity * std::pow(lewis_number, 2.0 / 3.0)));
  // Linear driving force inside the granules, per plan area; the outside flow is put on the
  // diffusion potential of the surface so that one balance serves both geometries.
  const double inside = 15 / (r * r) * around.dry_areal_mass / material.piece_dry_density;
  const double beta = G * approach_mass * (water_molar_mass / dry_air_molar_mass) / P;
  SurfaceBalance<S> b;
  b.liquid = inside * material.piece_dry_density * liquid_diffusivity(material, X, T);
  b.vapour = inside * pore_diffusion(material, moist, T, P);
  b.psi_mean = diffusion_potential(p, P);
  b.outside = S(beta);
  const S film = solve_film(material, b, X, T, psat, air_Y, P, true, around.surface_guess,
                            out.surface_moisture);
  out.water = film + inside * pressure_flow(material, moist, T, out.over, P) * out.over;
  out.heat = G * capacity * (air_T - T) * approach_heat;
  out.enthalpy = out.water * water::vapour_enthalpy(T) - out.heat;
  return out;
}

}  // namespace lossline::bed
