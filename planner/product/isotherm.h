#pragma once
// A sorption isotherm: one of the published forms with the ranges its source states, and the two
// questions asked of it. Dry-basis moisture X [kg/kg], water activity a, temperature T [K].

#include <variant>

#include "planner/product/isotherm_forms.h"

namespace lossline::product {

/// Any of the published forms.
using IsothermForm =
    std::variant<Gab, Bet, Oswin, ModifiedHenderson, ModifiedChungPfost, ModifiedOswin,
                 ModifiedHalsey, Peleg, HailwoodHorrobin, Toth, Freundlich, DubininAstakhov>;

/// A form with the ranges of its fit.
struct Isotherm {
  IsothermForm form;
  double T_min = 293.15, T_max = 333.15;          ///< of the fit [K]
  double activity_min = 0.1, activity_max = 0.9;  ///< of the fit, 1
};

/// Equilibrium moisture.
///
///   a        water activity, >= 0; above 1 it is taken as 1
///   T        [K], 200 .. 700; a few forms end sooner (wood at 100 degC)
///   returns  X [kg/kg], not falling in a; where a form has a pole at a = 1, X at activity_top
///   throws   Error out_of_range, also when the form has no answer at T
[[nodiscard]] double moisture(const Isotherm& isotherm, double a, double T);

/// Water activity over a product of moisture X: the inverse, closed form or numeric to rounding.
///
///   X        [kg/kg], >= 0
///   returns  a, 0..1; 1 for X beyond what the form holds at saturation
///   throws   as moisture
[[nodiscard]] double activity(const Isotherm& isotherm, double X, double T);

/// Whether activity and temperature lie in the ranges of the fit; false for NaN.
[[nodiscard]] bool in_range(const Isotherm& isotherm, double a, double T);

/// Checks the constants that no temperature enters (signs, exponents) and the ranges.
///
///   throws  Error out_of_range naming the constant
void check(const Isotherm& isotherm);

}  // namespace lossline::product
