#pragma once
// What a drying solver needs to know about bound water: activity, heat of binding, equilibrium
// moisture, tied together so that energy is a function of state. Dry-basis moisture X [kg/kg],
// T [K], heats in J per kg of water (q_net) or per kg of dry solid (Qb).
//
//   ln a(X,T) = ln a_ref(X) + q_net(X) (Mw/R) (1/T_ref - 1/T),     Qb(X) = integral_0^X q_net
//
// which is Clausius and Clapeyron's relation for a net heat that does not depend on temperature.
// a_ref is the isotherm at T_ref, the middle of its temperature range; q_net comes from the
// isotherm itself, between the ends of that range, or from a given heat of sorption.
//
// Where the table differs from the isotherm, and why
//   activity above 0.98      led along a parabola to 1, reached at a finite X (half-width 0.02), so
//                            that a very wet product has free water; also where heat and a high
//                            temperature would carry it beyond 1
//   X below 0                a straight line through zero, so that a solver cannot run away
//   drier than the fit       q_net is held below the moisture at the lowest stated activity: some
//                            forms let it grow without end
//   q_net < 0                taken as 0
//   q_net lowered            where needed so that a rises with X at every temperature from
//                            cold_end up to where the product boils at one atmosphere (hot_end at
//                            most): a falling activity would pull water together. heat_reduction()
//                            says how much
// Below activity 0.98 the pair above holds exactly.
//
// Source: Clausius-Clapeyron, as in any text on sorption (from memory). The limits on q_net are
// Lossline's own.

#include <cmath>
#include <cstddef>
#include <vector>

#include "planner/base/constants.h"
#include "planner/product/isotherm.h"

namespace lossline::product {

/// Activity with its derivatives.
struct ActivityValue {
  double a = 0;      ///< 1
  double da_dX = 0;  ///< per dry-basis moisture
  double da_dT = 0;  ///< [1/K]
};

/// A quantity of X with its derivative.
struct ValueSlope {
  double value = 0, slope = 0;
};

/// A given net heat of sorption, q0 exp(-X/Xq).
struct SorptionHeat {
  double at_zero = 0;         ///< q0 [J/kg water], >= 0
  double decay_moisture = 1;  ///< Xq, dry basis, > 0
};

/// Immutable; any thread. NaN in gives NaN out: the solver's own checks deal with it.
class Sorption {
 public:
  /// Temperatures between which q_net is made to suit; see above [K].
  static constexpr double cold_end = 273.15, hot_end = 473.15;
  /// Activities from 1 - half_width to 1 + half_width are led to 1 along a parabola.
  static constexpr double half_width = 0.02;
  /// Ramp of free_water(): a = X/X0.
  static constexpr double free_water_ramp = 1e-3;
  /// Largest X of a table [kg/kg].
  static constexpr double moisture_top = 1e3;

  /// q_net from the isotherm's own dependence on temperature; 0 when it has none.
  ///
  ///   throws  Error out_of_range for constants or ranges that cannot be used, or when activity
  ///           0.98 at T_ref needs X outside 1e-6 .. moisture_top
  explicit Sorption(const Isotherm& isotherm);
  /// q_net as given; the isotherm is used at T_ref only.
  ///
  ///   T_ref  [K], 200 .. 473.15
  Sorption(const Isotherm& isotherm, double T_ref, const SorptionHeat& heat);
  /// All water behaves as free water: a = 1 but for a short ramp to 0 at X = 0, no heat.
  [[nodiscard]] static Sorption free_water();

  /// Activity and its derivatives; 1 for X >= moisture_end(), a straight line for X < 0.
  [[nodiscard]] ActivityValue activity(double X, double T) const {
    const Node n = at(X);
    const double per_T = 1 / T, s = clapeyron * (per_reference_ - per_T);
    const double factor = n.q == 0 ? 1 : std::exp(n.q * s);  // wet products bind no heat
    const double a = n.a * factor;
    const ActivityValue straight{a, n.a_slope * factor + a * n.q_slope * s,
                                 a * n.q * clapeyron * per_T * per_T};
    const double over = a - (1 - half_width);
    if (!(over > 0)) return straight;
    if (over >= 2 * half_width) return {1, 0, 0};
    const double share = 1 - over / (2 * half_width);
    return {a - over * over / (4 * half_width), share * straight.da_dX, share * straight.da_dT};
  }
  /// ln a with its derivatives (in the members of the same names); X > 0.
  [[nodiscard]] ActivityValue log_activity(double X, double T) const;
  /// q_net [J/kg water] and its slope; 0 beyond moisture_end(), held below X = 0.
  [[nodiscard]] ValueSlope net_heat(double X) const {
    const Node n = at(X);
    return {n.q, n.q_slope};
  }
  /// Qb [J/kg dry solid]; its slope is net_heat exactly.
  [[nodiscard]] ValueSlope bound_heat(double X) const {
    const Node n = at(X);
    return {n.Qb, n.q};
  }
  /// X at which the activity is aw.
  ///
  ///   aw      0..1; 1 and above give moisture_end() (any wetter product is in equilibrium too)
  ///   T       [K], cold_end .. hot_end
  ///   throws  Error out_of_range for aw < 0, NaN or T outside
  [[nodiscard]] double equilibrium_moisture(double aw, double T) const;

  /// T_ref [K].
  [[nodiscard]] double reference_temperature() const { return reference_temperature_; }
  /// X from which water is free [kg/kg].
  [[nodiscard]] double moisture_end() const { return end_; }
  /// Largest share by which q_net had to be lowered inside the fit's range of activity, 0..1.
  [[nodiscard]] double heat_reduction() const { return heat_reduction_; }

 private:
  /// Values and slopes at a knot, and what a look-up returns; `a` is a_ref before the parabola.
  struct Node {
    double a = 0, a_slope = 0, q = 0, q_slope = 0, Qb = 0;
  };
  Sorption() = default;
  void lay_out(double end, std::size_t cells);
  void tabulate_activity(const Isotherm& isotherm);
  void tabulate_heat(const Isotherm& isotherm, const std::vector<double>& wanted);
  void limit_heat(const std::vector<double>& wanted, double least_hot);
  [[nodiscard]] double boiling(const Node& node, double q, double least) const;

  /// Everything at X: cubic Hermite inside the table, straight on outside.
  [[nodiscard]] Node at(double X) const {
    if (!(X > 0)) {
      const Node& n = nodes_.front();
      return {n.a_slope * X, n.a_slope, n.q, 0, n.q * X};
    }
    if (X >= end_) return nodes_.back();
    const double place = X * per_step_;
    const auto i = static_cast<std::size_t>(place);
    const Node &l = nodes_[i], &r = nodes_[i + 1];
    const double t = place - static_cast<double>(i), h = step_;
    const double u = 1 - t, t2 = t * t, bump = 6 * t * u * per_step_;
    const double w = t2 * (3 - 2 * t);                        // weight of the right value
    const double wl = t * u * u, wr = -t2 * u;                // weights of h times the slopes
    const double dl = u * (1 - 3 * t), dr = t * (3 * t - 2);  // and their derivatives
    const double area = t2 * t * (1 - 0.5 * t);               // integral of w
    return {l.a + w * (r.a - l.a) + h * (wl * l.a_slope + wr * r.a_slope),
            bump * (r.a - l.a) + dl * l.a_slope + dr * r.a_slope,
            l.q + w * (r.q - l.q) + h * (wl * l.q_slope + wr * r.q_slope),
            bump * (r.q - l.q) + dl * l.q_slope + dr * r.q_slope,
            l.Qb + h * (t * l.q + area * (r.q - l.q) +
                        h * t2 *
                            (l.q_slope * (0.5 - t * (2.0 / 3 - 0.25 * t)) -
                             r.q_slope * t * (1.0 / 3 - 0.25 * t)))};
  }

  /// Mw/R [kg K/J].
  static constexpr double clapeyron = water_molar_mass / gas_constant;

  std::vector<Node> nodes_;  ///< uniform in X from 0 to end_, one more than needed
  double step_ = 1, per_step_ = 1, end_ = 0;
  double reference_temperature_ = 298.15, per_reference_ = 1 / 298.15;
  double heat_reduction_ = 0;
};

}  // namespace lossline::product
