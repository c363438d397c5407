#pragma once
// Film coefficient of a granule in a bed that air flows through.
//
// Source: N. Wakao, S. Kaguei, Heat and Mass Transfer in Packed Beds, Gordon and Breach 1982:
//   Nu = 2 + 1.1 Re^0.6 Pr^(1/3), 15 < Re < 8500 (from memory). Air properties from memory:
//   viscosity 1.72e-5 (T/273.15)^0.7 Pa s, conductivity 0.0241 (T/273.15)^0.82 W/(m K), Pr 0.71.

namespace lossline::bed {

/// Film coefficient on the granule's surface [W/(m2 K)].
///
///   flow      dry air per empty cross section [kg/(m2 s)], > 0
///   diameter  of the granule [m], > 0
///   T         of the air [K]
double granule_heat_transfer(double flow, double diameter, double T);

}  // namespace lossline::bed
