#pragma once
// The product riding the belt through one segment, as dy/dx for the stepper, with the air it meets:
// given (cross-flow, through-flow, room), marching with it (co-flow) or lagged from the last pass
// (counter-flow). SI units; flows per covered belt area.
//
//   M v dE/dx     = q(x) - e          M dry areal mass, v belt speed, q heat from the field
//   M v dX/dx     = -w                w water to the air, e enthalpy to the air less its heat
//     v dalpha/dx = rate(alpha, T)
//     G dH/dx     =  e b              co-flow only: air enthalpy and humidity, b covered width
//     G dY/dx     =  w b
// Three accumulators (water, enthalpy, heat from the air; per metre of covered width) go through
// the same stages, so that the ledgers close to rounding.

#include <array>

#include "planner/bed/exchange.h"
#include "planner/numerics/rosenbrock.h"
#include "planner/water/moist_air.h"

namespace lossline::march {

/// Places of the unknowns.
enum Unknown : std::size_t {
  E,
  X,
  alpha,
  air_H,
  air_Y,
  water_out,
  enthalpy_out,
  air_heat,
  unknowns
};
using State = std::array<double, unknowns>;

/// Air of temperature T [K] and humidity ratio Y.
struct Air {
  double T = 293.15;
  double Y = 0;
};

/// How the air of a segment is known.
enum class AirMode { given, with_belt, lagged };

/// The segment being integrated.
struct BeltSystem {
  const bed::BedMaterial* material = nullptr;
  mutable bed::Surroundings around;  ///< mutable for its surface_guess alone
  double speed = 1;                  ///< [m/s]
  double covered_width = 1;          ///< [m]
  double x0 = 0, x1 = 1;             ///< [m]
  double q0 = 0, q1 = 0;             ///< field heat at the two ends [W/m2 covered]
  AirMode mode = AirMode::given;
  Air air0, air1;       ///< at the two ends; air0 alone when given
  double air_flow = 0;  ///< dry air along the belt, for with_belt [kg/s]

  void rate(double x, const State& y, State& f) const {
    std::array<double, unknowns> out{};
    derivative<double>(x, {y[E], y[X], y[alpha], y[air_H], y[air_Y]}, out);
    f = out;
  }

  void linearise(double x, const State& y, numerics::Linearised<unknowns>& lin) const {
    using D = numerics::Dual<6>;
    std::array<D, unknowns> out{};
    derivative<D>(D::variable(x, 5),
                  {D::variable(y[E], 0), D::variable(y[X], 1), D::variable(y[alpha], 2),
                   D::variable(y[air_H], 3), D::variable(y[air_Y], 4)},
                  out);
    for (std::size_t i = 0; i < unknowns; ++i) {
      lin.f[i] = out[i].value;
      lin.df_dx[i] = out[i].slope[5];
      for (std::size_t j = 0; j < unknowns; ++j) lin.df_dy[i][j] = j < 5 ? out[i].slope[j] : 0.0;
    }
  }

  /// Exchange with the air at one place; also for reports. Remembers the surface moisture as the
  /// next evaluation's guess, so one system serves one thread.
  template <class S>
  [[nodiscard]] bed::Exchange<S> exchange(const S& x, const S& moisture, const S& T, const S& H,
                                          const S& Y) const {
    S air_T(air0.T), humidity(air0.Y);
    if (mode == AirMode::with_belt) {
      air_T = air_temperature(H, Y);
      humidity = Y;
    } else if (mode == AirMode::lagged) {
      const S s = (x - x0) / (x1 - x0);
      air_T = air0.T + (air1.T - air0.T) * s;
      humidity = air0.Y + (air1.Y - air0.Y) * s;
    }
    bed::Exchange<S> out =
        around.through ? bed::through_exchange(*material, around, moisture, T, air_T, humidity)
                       : bed::surface_exchange(*material, around, moisture, T, air_T, humidity);
    around.surface_guess = numerics::plain(out.surface_moisture);
    return out;
  }

  [[nodiscard]] double cure_rate(double a, double T) const {
    return material->cure ? product::rate(*material->cure, a, T) : 0.0;
  }
  template <int N>
  [[nodiscard]] numerics::Dual<N> cure_rate(const numerics::Dual<N>& a,
                                            const numerics::Dual<N>& T) const {
    if (!material->cure) return {};
    const double r = product::rate(*material->cure, a.value, T.value);
    const double da = 1e-6, dT = 1e-3;
    const double by_a = (product::rate(*material->cure, a.value + da, T.value) -
                         product::rate(*material->cure, a.value - da, T.value)) /
                        (2 * da);
    const double by_T = (product::rate(*material->cure, a.value, T.value + dT) -
                         product::rate(*material->cure, a.value, T.value - dT)) /
                        (2 * dT);
    return numerics::chain(a, by_a, T, by_T, r);
  }

 private:
  static double air_temperature(double H, double Y) { return water::air_temperature(H, Y); }
  template <int N>
  static numerics::Dual<N> air_temperature(const numerics::Dual<N>& H, const numerics::Dual<N>& Y) {
    const double T = water::air_temperature(H.value, Y.value);
    const auto hv = water::vapour_enthalpy(numerics::Dual<1>::variable(T, 0));
    const double by_H = 1 / (bed::dry_air_heat_capacity + Y.value * hv.slope[0]);
    return numerics::chain(H, by_H, Y, -hv.value * by_H, T);
  }

  template <class S>
  void derivative(const S& x, const std::array<S, 5>& y, std::array<S, unknowns>& f) const {
    const S T = bed::temperature(*material, y[E], y[X], y[alpha]);
    const bed::Exchange<S> ex = exchange(x, y[X], T, y[air_H], y[air_Y]);
    const S q = q0 + (q1 - q0) / (x1 - x0) * (x - x0);
    const double inertia = 1 / (around.dry_areal_mass * speed);
    f[E] = (q - ex.enthalpy) * inertia;
    f[X] = -1.0 * ex.water * inertia;
    f[alpha] = cure_rate(y[alpha], T) / speed;
    const double to_air = mode == AirMode::with_belt ? covered_width / air_flow : 0.0;
    f[air_H] = ex.enthalpy * to_air;
    f[air_Y] = ex.water * to_air;
    f[water_out] = ex.water;
    f[enthalpy_out] = ex.enthalpy;
    f[air_heat] = ex.heat;
  }
};

}  // namespace lossline::march
