#pragma once
// Waves in a low tunnel between two metal plates that is filled with layers: belt, bed, air and
// perhaps an absorbing liner. Answers how fast the least attenuated wave dies out in it.
//
//   LSE (electric field along the layers)  E'' + k0^2 eps E = kt^2 E,            E  = 0 at the
//   plates LSM (magnetic field along the layers)  eps (H'/eps)' + k0^2 eps H = kt^2 H,  H' = 0 at
//   the plates along the tunnel                       ky^2 = kt^2 - (m pi/w)^2
//
// Source: R. E. Collin, Field Theory of Guided Waves, 2nd ed., IEEE Press 1991, chapter 6 (from
//   memory). Solved by finite volumes with the eigenvalues of a complex symmetric tridiagonal
//   matrix: no mode can be missed. Second order in the cell, 2e-5 at 400 cells (tests).

#include <complex>
#include <span>
#include <vector>

#include "planner/field/layered.h"

namespace lossline::field {

/// kt^2 of all waves that the cells resolve [1/m2], largest real part first.
struct TunnelModes {
  std::vector<std::complex<double>> lse, lsm;
};

/// The transverse eigenvalues.
///
///   frequency  [Hz], > 0
///   layers     from one plate to the other, total thickness > 0
///   cells      20 .. 2000
///   throws     Error out_of_range
///
/// Cost: proportional to cells squared, 50 ms at 400.
TunnelModes tunnel_modes(double frequency, std::span<const Layer> layers, int cells = 400);

/// Attenuation along a tunnel of infinite width of the wave with this kt^2 [dB/m].
double tunnel_attenuation(std::complex<double> kt_squared);

/// Attenuation along a tunnel with side walls `width` apart, m half waves across [dB/m].
double tunnel_attenuation(std::complex<double> kt_squared, double width, int half_waves);

/// Attenuation of the least attenuated wave, LSE from m = 0 and LSM from m = 1 on, the lowest that
/// side walls allow. A bound for the tunnel: with many waves at work the worst one decides.
///
///   width    [m], > 0
///   returns  [dB/m]
///   throws   Error out_of_range
double least_tunnel_attenuation(double frequency, std::span<const Layer> layers, double width,
                                int cells = 400);

}  // namespace lossline::field
