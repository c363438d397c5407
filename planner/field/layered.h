#pragma once
// A plane wave, or a field from all sides, on a stack of flat layers in air: what is reflected,
// what passes, and what every layer turns into heat. Exact for layers wide against the wave.
//
// Convention exp(+j w t), eps = eps' - j eps''. mu = |cosine| of the angle of incidence in air.
// Sources: W. C. Chew, Waves and Fields in Inhomogeneous Media, section 2.1; textbook recursion
//   (from memory). The absorption is the closed volume integral of eps'' |E|^2, which closes with
//   R + T + A = 1 to rounding and keeps all its digits at low loss; own derivation, tests.

#include <complex>
#include <cstddef>
#include <span>
#include <vector>

namespace lossline::field {

/// One flat layer.
struct Layer {
  std::complex<double> eps{1, 0};  ///< eps' - j eps'', eps' >= 1, eps'' >= 0
  double thickness = 0;            ///< [m], >= 0
};

enum class Polarisation {
  te,  ///< electric field parallel to the layers
  tm,  ///< magnetic field parallel to the layers
};

/// Shares of the incident power; reflectance + transmittance + sum of absorptance = 1.
struct StackResponse {
  double reflectance = 0, transmittance = 0;
  std::vector<double> absorptance;  ///< per layer
};

/// The response to one plane wave.
///
///   frequency   [Hz], > 0
///   layers      the one the wave meets first comes first; may be empty
///   mu          cosine of the angle of incidence, 1e-9 .. 1
///   metal_back  perfect metal behind the last layer instead of air
///   throws      Error out_of_range
StackResponse stack_response(double frequency, std::span<const Layer> layers, double mu,
                             Polarisation polarisation, bool metal_back = false);

/// Heat in equal slices of one layer, as shares of the incident power; they sum to the layer's
/// absorptance.
///
///   layer_index  < layers.size()
///   bins         slices, 1 .. 100000, first met first
///   others       as stack_response
///   throws       Error out_of_range
std::vector<double> depth_bins(double frequency, std::span<const Layer> layers,
                               std::size_t layer_index, std::size_t bins, double mu,
                               Polarisation polarisation);

/// Shares of the power that falls on the stack from an unpolarised isotropic field.
struct DiffuseResponse {
  double reflectance = 0, transmittance = 0;
  std::vector<double> absorptance;  ///< per layer
};

/// The cosine-weighted average over all directions and both polarisations.
///
///   nodes    Gauss-Legendre nodes in mu; 12 gives 1e-4 relative, 32 about 1e-6
///   returns  int_0^1 (TE + TM)/2 2 mu dmu of each share
///   throws   Error out_of_range
DiffuseResponse diffuse_response(double frequency, std::span<const Layer> layers,
                                 std::size_t nodes = 12);

}  // namespace lossline::field
