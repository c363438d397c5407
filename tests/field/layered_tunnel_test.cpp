#include "planner/field/layered_tunnel.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

#include "planner/base/constants.h"
#include "planner/base/error.h"

namespace lossline::field {
namespace {

using Complex = std::complex<double>;

double k0(double frequency) {
  return 2 * pi * frequency / speed_of_light;
}

/// Sum of the wave impedances seen downwards and upwards from the middle of the air layer, zero
/// for a mode (transverse resonance; Collin, chapter 6). LSM.
Complex resonance(Complex kt, double frequency, std::span<const Layer> layers, std::size_t split) {
  const double k = k0(frequency);
  auto chain = [&](std::span<const Layer> seen, bool reverse) {
    Complex Z = 0;
    for (std::size_t n = 0; n < seen.size(); ++n) {
      const Layer& layer = seen[reverse ? seen.size() - 1 - n : n];
      const Complex kz = std::sqrt(k * k * layer.eps - kt), z = kz / (layer.eps * k);
      const Complex tangent = std::tan(kz * layer.thickness), j(0, 1);
      Z = z * (Z + j * z * tangent) / (z + j * Z * tangent);
    }
    return Z;
  };
  return chain(layers.first(split), false) + chain(layers.subspan(split), true);
}

Complex nearest(const std::vector<Complex>& all, Complex wanted) {
  return *std::min_element(all.begin(), all.end(), [&](Complex a, Complex b) {
    return std::abs(a - wanted) < std::abs(b - wanted);
  });
}

// An empty tunnel has kt^2 = k0^2 - (n pi/h)^2; second order in the cell.
TEST(LayeredTunnel, EmptyTunnelHasTheTextbookWaves) {
  const Layer air[] = {{{1, 0}, 0.1}};
  const double k2 = k0(2450e6) * k0(2450e6);
  const TunnelModes modes = tunnel_modes(2450e6, air);
  const double first = k2 - (pi / 0.1) * (pi / 0.1);
  EXPECT_NEAR(modes.lse[0].real() / first, 1, 1e-5);
  EXPECT_NEAR(modes.lsm[0].real() / k2, 1, 1e-9);  // the wave that stands across, no cut-off
  EXPECT_NEAR(modes.lsm[1].real() / first, 1, 1e-5);
  EXPECT_EQ(modes.lse.size(), 399U);
  EXPECT_EQ(modes.lsm.size(), 400U);
}

TEST(LayeredTunnel, ErrorFallsWithTheSquareOfTheCell) {
  const Layer air[] = {{{1, 0}, 0.1}};
  const double first = k0(2450e6) * k0(2450e6) - (pi / 0.1) * (pi / 0.1);
  const double coarse = tunnel_modes(2450e6, air, 50).lse[0].real() - first;
  const double fine = tunnel_modes(2450e6, air, 100).lse[0].real() - first;
  EXPECT_NEAR(std::log2(coarse / fine), 2, 0.01);
}

// Belt 3 mm eps 2.6-0.01j, bed 20 mm eps 4-0.3j, air, 100 mm between the plates: kt^2/k0^2 of the
// wave across, five printed decimals of an independent solution of the transverse resonance. The
// same root is found here by secant and must agree with them; the finite volumes must agree with
// the root to second order, 2e-5 relative at 400 cells and a quarter of it at 800.
TEST(LayeredTunnel, FilledTunnelMatchesTransverseResonance) {
  const Layer layers[] = {
      {{2.6, -0.01}, 0.003}, {{4, -0.3}, 0.020}, {{1, 0}, 0.040}, {{1, 0}, 0.037}};
  const struct {
    double f;
    Complex kt;
  } table[] = {{915e6, {1.28336, -0.015616}}, {2450e6, {2.43576, -0.171842}}};
  for (const auto& row : table) {
    const double k2 = k0(row.f) * k0(row.f);
    const Complex found = nearest(tunnel_modes(row.f, layers).lsm, row.kt * k2);
    const Complex finer = nearest(tunnel_modes(row.f, layers, 800).lsm, row.kt * k2);
    Complex a = found, b = a * 1.0001;
    Complex fa = resonance(a, row.f, layers, 3), fb = resonance(b, row.f, layers, 3);
    for (int round = 0; round < 30 && std::abs(b - a) > 1e-12 * std::abs(b); ++round) {
      const Complex c = b - fb * (b - a) / (fb - fa);
      a = b;
      fa = fb;
      b = c;
      fb = resonance(b, row.f, layers, 3);
    }
    EXPECT_NEAR(b.real() / k2, row.kt.real(), 1e-5);
    EXPECT_NEAR(b.imag() / k2, row.kt.imag(), 1e-5);
    EXPECT_LT(std::abs(found - b), 2e-5 * std::abs(b));
    EXPECT_LT(std::abs(finer - b), 0.3 * std::abs(found - b));
  }
}

struct Filled {
  double f, height;
  std::complex<double> bed;
  double liner, dB_per_m;
};

// dB/m of the least attenuated wave between wide plates, belt 3 mm, bed 20 mm, liner 6-3j (an
// illustration, no material). Printed with one or two decimals. The printed values take the LSM
// wave without half waves across and the LSE wave with one in 0.85 m; so does this test.
TEST(LayeredTunnel, MatchesAttenuationOfFilledTunnels) {
  const Filled table[] = {{2450e6, .05, {2.2, -.03}, 0, 2.5},    {2450e6, .05, {4, -.3}, 0, 15.4},
                          {2450e6, .05, {10, -2}, 0, 16.2},      {2450e6, .05, {30, -8}, 0, 19.2},
                          {2450e6, .05, {2.2, -.03}, .01, 37.2}, {2450e6, .05, {10, -2}, .01, 79.7},
                          {2450e6, .10, {4, -.3}, 0, 2.3},       {2450e6, .10, {10, -2}, 0, 6.9},
                          {2450e6, .10, {10, -2}, .01, 37.8},    {915e6, .10, {2.2, -.03}, 0, .19},
                          {915e6, .10, {4, -.3}, 0, 1.15},       {915e6, .10, {10, -2}, 0, 13.2},
                          {915e6, .10, {30, -8}, 0, 6.4},        {915e6, .10, {10, -2}, .01, 12.5}};
  for (const Filled& row : table) {
    std::vector<Layer> layers{{{2.6, -0.01}, 0.003}, {row.bed, 0.020}};
    layers.push_back({{1, 0}, row.height - 0.023 - row.liner});
    if (row.liner > 0) layers.push_back({{6, -3}, row.liner});
    const TunnelModes modes = tunnel_modes(row.f, layers);
    double least = 1e9;
    for (const Complex& kt : modes.lsm) least = std::min(least, tunnel_attenuation(kt));
    for (const Complex& kt : modes.lse) least = std::min(least, tunnel_attenuation(kt, 0.85, 1));
    EXPECT_NEAR(least, row.dB_per_m, row.dB_per_m < 2 ? 0.0055 : 0.055)
        << row.f << ' ' << row.height << ' ' << row.bed;
    // With side walls a wave stands across the LSM field; the bound may only use allowed waves.
    const double bound = least_tunnel_attenuation(row.f, layers, 0.85);
    EXPECT_GT(bound, 0);
    EXPECT_LT(bound, 1.1 * least + 1);
  }
}

TEST(LayeredTunnel, AWiderTunnelAttenuatesLessPerMetreBelowCutoff) {
  const Layer air[] = {{{1, 0}, 0.02}};
  EXPECT_GT(least_tunnel_attenuation(2450e6, air, 0.03, 50),
            least_tunnel_attenuation(2450e6, air, 0.05, 50));
  // Empty and 50 mm wide: TE10 below cut-off, 314.5 dB/m.
  EXPECT_NEAR(least_tunnel_attenuation(2450e6, air, 0.05, 50), 314.5, 0.1);
}

TEST(LayeredTunnel, RefusesWhatItCannotUse) {
  const Layer air[] = {{{1, 0}, 0.02}};
  const Layer gain[] = {{{4, 1}, 0.02}};
  EXPECT_THROW(tunnel_modes(2450e6, {}), Error);
  EXPECT_THROW(tunnel_modes(2450e6, air, 5), Error);
  EXPECT_THROW(tunnel_modes(2450e6, gain), Error);
  EXPECT_THROW(least_tunnel_attenuation(2450e6, air, 0), Error);
}

}  // namespace
}  // namespace lossline::field
