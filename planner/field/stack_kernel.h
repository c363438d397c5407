#pragma once
// The inner loop of the layered bed: one direction, one polarisation, no memory of its own. Used
// by layered.cpp for any number of layers and by bed_optics.cpp for bed on belt.
//
// Plane wave exp(+j w t) from air; tangential electric field; media 0 (air), 1..n, n+1 (air or
// metal). Textbook recursion, as in H. A. Macleod, Thin-Film Optical Filters, or W. C. Chew, Waves
// and Fields in Inhomogeneous Media, section 2.1 (from memory). Only decaying exponentials occur,
// so no thickness overflows, and absorption is a volume integral, so no loss is too low.

#include <cmath>
#include <complex>
#include <cstddef>
#include <span>

namespace lossline::field::kernel {

using Complex = std::complex<double>;

// Plain products and quotients: the library's operators also recover from infinities, which
// cannot occur here and cost half the time.
inline Complex times(Complex a, Complex b) {
  return {a.real() * b.real() - a.imag() * b.imag(), a.real() * b.imag() + a.imag() * b.real()};
}
inline Complex over(Complex a, Complex b) {
  const double s = 1 / (b.real() * b.real() + b.imag() * b.imag());
  return {s * (a.real() * b.real() + a.imag() * b.imag()),
          s * (a.imag() * b.real() - a.real() * b.imag())};
}
inline double square(double x) {
  return x * x;
}
inline double squared(Complex a) {
  return a.real() * a.real() + a.imag() * a.imag();
}

/// Root with real part >= 0 and imaginary part <= 0 of z with Im z <= 0.
inline Complex decaying_root(Complex z) {
  const double loss = -z.imag();
  const double size = std::sqrt(z.real() * z.real() + loss * loss);
  const double t = std::sqrt(0.5 * (size + std::abs(z.real())));
  if (!(t > 0)) return {0, 0};
  return z.real() >= 0 ? Complex{t, -0.5 * loss / t} : Complex{0.5 * loss / t, -t};
}

/// What a layer does to a wave of one direction, whatever the polarisation and the neighbours.
struct LayerWave {
  Complex eps;
  Complex kz;               ///< normal wave number over k0
  Complex once, twice;      ///< exp(-j kz d), exp(-2 j kz d)
  double straight = 0;      ///< integral of exp(-2 Im kz z) over the layer [m]
  Complex crossed;          ///< integral of the interference of forward and returned wave [m]
  double along_square = 0;  ///< 1 - mu^2
};

/// The wave in a layer of thickness d [m] for the cosine mu in air; k0 in [rad/m].
inline LayerWave layer_wave(double k0, Complex eps, double d, double mu) {
  LayerWave w;
  w.eps = eps;
  // eps - sin^2 written as (eps - 1) + mu^2: exact in air down to grazing.
  w.kz = decaying_root({(eps.real() - 1) + mu * mu, eps.imag()});
  const double phase = k0 * w.kz.real() * d, fade = -2 * k0 * w.kz.imag() * d;
  const double amplitude = std::exp(-0.5 * fade), power = amplitude * amplitude;
  const double lost = fade > 0.5 ? 1 - power : -std::expm1(-fade);
  const double c = std::cos(phase), s = std::sin(phase);
  w.once = {amplitude * c, -amplitude * s};
  w.twice = times(w.once, w.once);
  w.straight = fade > 1e-9 ? d * lost / fade : d;
  const double sinc = phase > 0 ? s / phase : 1;
  w.crossed = {d * sinc * power * c, d * sinc * power * s};
  w.along_square = 1 - mu * mu;
  return w;
}

/// Admittance of the tangential field over that of vacuum.
inline Complex admittance(const LayerWave& w, bool tm) {
  return tm ? over(w.eps, w.kz) : w.kz;
}

/// The field at the top of a layer: power of the forward wave (incident wave = 1) and the ratio of
/// returned to forward wave at the bottom.
struct Amplitude {
  double forward_square = 0;
  Complex returned;
};

struct Ends {
  double reflectance = 0, transmittance = 0;
};

/// Solves one direction of incidence.
///
///   waves      n layers, first met first
///   mu         cosine in air, > 0
///   tm         magnetic field parallel to the layers
///   metal      perfect metal behind the last layer instead of air
///   reflected  room for n + 1 numbers
///   amplitude  room for n, filled
inline Ends trace(std::span<const LayerWave> waves, double mu, bool tm, bool metal,
                  std::span<Complex> reflected, std::span<Amplitude> amplitude) {
  const std::size_t n = waves.size();
  const double air = tm ? 1 / mu : mu;
  Complex below = air;
  reflected[n] = 0;
  for (std::size_t j = n; j-- > 0;) {
    const Complex y = admittance(waves[j], tm);
    // Interface j+1, between layer j and what lies under it.
    const Complex rho = over(y - below, y + below);
    if (j + 1 == n) {
      reflected[n] = metal ? Complex(-1) : rho;
    } else {
      const Complex rq = times(reflected[j + 2], waves[j + 1].twice);
      reflected[j + 1] = over(rho + rq, 1.0 + times(rho, rq));
    }
    below = y;
  }
  const Complex rho = over(air - below, air + below);
  if (n > 0) {
    const Complex rq = times(reflected[1], waves[0].twice);
    reflected[0] = over(rho + rq, 1.0 + times(rho, rq));
  } else {
    reflected[0] = metal ? Complex(-1) : rho;
  }
  Complex a = 1;
  for (std::size_t j = 0; j < n; ++j) {
    a = times(a, over(1.0 + reflected[j], 1.0 + times(reflected[j + 1], waves[j].twice)));
    amplitude[j] = {squared(a), reflected[j + 1]};
    a = times(a, waves[j].once);
  }
  return {squared(reflected[0]), metal ? 0.0 : squared(times(a, 1.0 + reflected[n]))};
}

/// Share of the incident power that a layer, or a slice of one, turns into heat.
///
///   k0         [rad/m]
///   wave       of the layer or slice
///   amplitude  at its top and bottom
///   mu, tm     as in trace
inline double absorbed(double k0, const LayerWave& wave, const Amplitude& amplitude, double mu,
                       bool tm) {
  const double both = wave.straight * (1 + squared(amplitude.returned) * squared(wave.once));
  const double cross = 2 * (amplitude.returned.real() * wave.crossed.real() +
                            amplitude.returned.imag() * wave.crossed.imag());
  const double loss = -wave.eps.imag() * k0 * amplitude.forward_square;
  if (!tm) return loss * (both + cross) / mu;
  // The field along the normal follows from the magnetic field: |E_z|^2 = sin^2 |Y/eps|^2 |H|^2,
  // and Y/eps = 1/kz.
  const double normal = wave.along_square / squared(wave.kz);
  return loss * mu * ((both + cross) + normal * (both - cross));
}

}  // namespace lossline::field::kernel
