#include "planner/field/layered_tunnel.h"

#include <algorithm>
#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/field/range.h"
#include "planner/field/waveguide.h"

namespace lossline::field {
namespace {

using Complex = std::complex<double>;

/// Mean of eps or of 1/eps over a stretch of the height.
class Filling {
 public:
  explicit Filling(std::span<const Layer> layers) : layers_(layers) {}

  [[nodiscard]] Complex mean(double from, double to, bool inverse) const {
    Complex sum = 0;
    double bottom = 0;
    for (const Layer& layer : layers_) {
      const double top = bottom + layer.thickness;
      const double shared = std::min(to, top) - std::max(from, bottom);
      if (shared > 0) sum += shared * (inverse ? 1.0 / layer.eps : layer.eps);
      bottom = top;
    }
    return sum / (to - from);
  }

 private:
  std::span<const Layer> layers_;
};

/// Eigenvalues of a complex symmetric tridiagonal matrix by implicit QL with Wilkinson's shift
/// (J. H. Wilkinson, The Algebraic Eigenvalue Problem, Oxford 1965, chapter 8, with complex
/// rotations). `side[i]` couples i and i+1; the last one is not used.
std::vector<Complex> eigenvalues(std::vector<Complex> diagonal, std::vector<Complex> side) {
  const std::size_t n = diagonal.size();
  constexpr double tiny = std::numeric_limits<double>::epsilon();
  side[n - 1] = 0;
  for (std::size_t l = 0; l < n; ++l) {
    for (int round = 0;; ++round) {
      std::size_t m = l;
      while (m + 1 < n &&
             std::abs(side[m]) > tiny * (std::abs(diagonal[m]) + std::abs(diagonal[m + 1])))
        ++m;
      if (m == l) break;
      if (round > 60)
        throw Error(ErrorKind::internal, "the waves of a layered tunnel were not found");
      const Complex half = (diagonal[l + 1] - diagonal[l]) / (2.0 * side[l]);
      Complex root = std::sqrt(half * half + 1.0);
      if (std::norm(half - root) > std::norm(half + root)) root = -root;
      Complex g = diagonal[m] - diagonal[l] + side[l] / (half + root);
      Complex s = 1, c = 1, p = 0;
      bool broken = false;
      for (std::size_t i = m; i-- > l;) {
        const Complex f = s * side[i], b = c * side[i];
        const Complex r = std::sqrt(f * f + g * g);
        side[i + 1] = r;
        if (!(std::abs(r) > 0)) {  // the rotation is undefined: split here and start again
          diagonal[i + 1] -= p;
          side[m] = 0;
          broken = true;
          break;
        }
        s = f / r;
        c = g / r;
        g = diagonal[i + 1] - p;
        const Complex t = (diagonal[i] - g) * s + 2.0 * c * b;
        p = s * t;
        diagonal[i + 1] = g + p;
        g = c * t - b;
      }
      if (broken) continue;
      diagonal[l] -= p;
      side[l] = g;
      side[m] = 0;
    }
  }
  std::sort(diagonal.begin(), diagonal.end(),
            [](Complex a, Complex b) { return a.real() > b.real(); });
  return diagonal;
}

double thickness(std::span<const Layer> layers) {
  double sum = 0;
  for (const Layer& layer : layers) {
    in_range("eps' of a layer", layer.eps.real(), "(1)", 1, 1e6);
    in_range("eps'' of a layer", -layer.eps.imag(), "(1)", 0, 1e6);
    sum += in_range("thickness of a layer", layer.thickness, "m", 0, largest_length);
  }
  return in_range("height of the tunnel", sum, "m", 1e-6, largest_length);
}

}  // namespace

TunnelModes tunnel_modes(double frequency, std::span<const Layer> layers, int cells) {
  in_range("number of cells", cells, "(1)", 20, 2000);
  const double k0 = 2 * pi * frequency_in_range(frequency) / speed_of_light, k2 = k0 * k0;
  const auto n = static_cast<std::size_t>(cells);
  const double dz = thickness(layers) / cells, flux = 1 / (dz * dz);
  const Filling fill(layers);
  auto face = [&](std::size_t i) { return static_cast<double>(i) * dz; };
  auto around = [&](std::size_t i) {  // mean of eps half a cell each side of face i
    return fill.mean(face(i) - 0.5 * dz, face(i) + 0.5 * dz, false);
  };
  TunnelModes out;
  // LSE: the inner cell faces carry E.
  std::vector<Complex> diagonal, side;
  for (std::size_t i = 1; i < n; ++i) {
    diagonal.push_back(k2 * around(i) - 2 * flux);
    side.emplace_back(flux);
  }
  out.lse = eigenvalues(diagonal, side);
  // LSM: the cell centres carry H, (H'/eps)' + k0^2 H = kt^2 (1/eps) H made symmetric by the root
  // of the mean of 1/eps.
  std::vector<Complex> weight(n), across(n, Complex(0));
  for (std::size_t i = 0; i < n; ++i) weight[i] = fill.mean(face(i), face(i + 1), true);
  for (std::size_t i = 1; i < n; ++i) across[i - 1] = flux / around(i);  // face between i-1 and i
  diagonal.assign(n, Complex(0));
  side.assign(n, Complex(0));
  for (std::size_t i = 0; i < n; ++i) {
    const Complex loss = (i > 0 ? across[i - 1] : Complex(0)) + across[i];
    diagonal[i] = (k2 - loss) / weight[i];
    if (i + 1 < n) side[i] = across[i] / std::sqrt(weight[i] * weight[i + 1]);
  }
  out.lsm = eigenvalues(std::move(diagonal), std::move(side));
  return out;
}

double tunnel_attenuation(std::complex<double> kt_squared) {
  return decibels_per_neper * std::abs(std::sqrt(kt_squared).imag());
}

double tunnel_attenuation(std::complex<double> kt_squared, double width, int half_waves) {
  in_range("tunnel width", width, "m", std::numeric_limits<double>::min(), largest_length);
  in_range("half waves across", half_waves, "(1)", 0, 1e6);
  const double kx = half_waves * pi / width;
  return tunnel_attenuation(kt_squared - kx * kx);
}

double least_tunnel_attenuation(double frequency, std::span<const Layer> layers, double width,
                                int cells) {
  const TunnelModes modes = tunnel_modes(frequency, layers, cells);
  double least = std::numeric_limits<double>::infinity();
  for (const Complex& kt : modes.lse) least = std::min(least, tunnel_attenuation(kt, width, 0));
  for (const Complex& kt : modes.lsm) least = std::min(least, tunnel_attenuation(kt, width, 1));
  return least;
}

}  // namespace lossline::field
