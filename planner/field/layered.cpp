#include "planner/field/layered.h"

#include "planner/base/constants.h"
#include "planner/field/range.h"
#include "planner/field/stack_kernel.h"
#include "planner/numerics/gauss_legendre.h"

namespace lossline::field {
namespace {

constexpr double largest_permittivity = 1e12;

void check(double frequency, std::span<const Layer> layers) {
  frequency_in_range(frequency);
  for (const Layer& layer : layers) {
    in_range("eps' of a layer", layer.eps.real(), "(1)", 1, largest_permittivity);
    in_range("eps'' of a layer", -layer.eps.imag(), "(1)", 0, largest_permittivity);
    in_range("thickness of a layer", layer.thickness, "m", 0, largest_length);
  }
}

double wave_number(double frequency) {
  return 2 * pi * frequency / speed_of_light;
}

/// A stack with its work space, so that many directions cost one allocation.
class Tracer {
 public:
  Tracer(double frequency, std::span<const Layer> layers)
      : k0_(wave_number(frequency)),
        layers_(layers),
        waves_(layers.size()),
        reflected_(layers.size() + 1),
        amplitude_(layers.size()) {}

  void turn_to(double mu) {
    mu_ = mu;
    for (std::size_t j = 0; j < layers_.size(); ++j)
      waves_[j] = kernel::layer_wave(k0_, layers_[j].eps, layers_[j].thickness, mu);
  }
  kernel::Ends solve(bool tm, bool metal) {
    return kernel::trace(waves_, mu_, tm, metal, reflected_, amplitude_);
  }
  [[nodiscard]] double absorbed(std::size_t layer, bool tm) const {
    return kernel::absorbed(k0_, waves_[layer], amplitude_[layer], mu_, tm);
  }
  [[nodiscard]] const kernel::Amplitude& amplitude(std::size_t layer) const {
    return amplitude_[layer];
  }

 private:
  double k0_, mu_ = 1;
  std::span<const Layer> layers_;
  std::vector<kernel::LayerWave> waves_;
  std::vector<kernel::Complex> reflected_;
  std::vector<kernel::Amplitude> amplitude_;
};

Tracer aimed_tracer(double frequency, std::span<const Layer> layers, double mu) {
  check(frequency, layers);
  in_range("cosine of incidence", mu, "(1)", 1e-9, 1);
  Tracer tracer(frequency, layers);
  tracer.turn_to(mu);
  return tracer;
}

}  // namespace

StackResponse stack_response(double frequency, std::span<const Layer> layers, double mu,
                             Polarisation polarisation, bool metal_back) {
  Tracer tracer = aimed_tracer(frequency, layers, mu);
  const bool tm = polarisation == Polarisation::tm;
  const kernel::Ends ends = tracer.solve(tm, metal_back);
  StackResponse out{ends.reflectance, ends.transmittance, {}};
  out.absorptance.reserve(layers.size());
  for (std::size_t j = 0; j < layers.size(); ++j) out.absorptance.push_back(tracer.absorbed(j, tm));
  return out;
}

std::vector<double> depth_bins(double frequency, std::span<const Layer> layers,
                               std::size_t layer_index, std::size_t bins, double mu,
                               Polarisation polarisation) {
  const double most_layers = static_cast<double>(layers.size()) - 1;
  in_range("layer index", static_cast<double>(layer_index), "(1)", 0, most_layers);
  in_range("number of bins", static_cast<double>(bins), "(1)", 1, 1e5);
  Tracer tracer = aimed_tracer(frequency, layers, mu);
  const bool tm = polarisation == Polarisation::tm;
  tracer.solve(tm, false);
  const double k0 = wave_number(frequency);
  const kernel::LayerWave slice = kernel::layer_wave(
      k0, layers[layer_index].eps, layers[layer_index].thickness / static_cast<double>(bins), mu);
  // A slice is a layer of its own: its forward wave has faded through the slices above it, the
  // wave it gets back has passed the slices below it twice.
  const kernel::Amplitude& whole = tracer.amplitude(layer_index);
  std::vector<kernel::Complex> returned(bins);
  returned[bins - 1] = whole.returned;
  for (std::size_t b = bins - 1; b-- > 0;)
    returned[b] = kernel::times(returned[b + 1], slice.twice);
  std::vector<double> share(bins);
  double forward = whole.forward_square;
  for (std::size_t b = 0; b < bins; ++b) {
    share[b] = kernel::absorbed(k0, slice, {forward, returned[b]}, mu, tm);
    forward *= kernel::squared(slice.once);
  }
  return share;
}

DiffuseResponse diffuse_response(double frequency, std::span<const Layer> layers,
                                 std::size_t nodes) {
  check(frequency, layers);
  in_range("number of directions", static_cast<double>(nodes), "(1)", 1, 1000);
  const auto rule = numerics::gauss_legendre(static_cast<int>(nodes), 0, 1);
  Tracer tracer(frequency, layers);
  DiffuseResponse out{0, 0, std::vector<double>(layers.size(), 0.0)};
  for (std::size_t i = 0; i < nodes; ++i) {
    const double mu = rule.nodes[i],
                 weight = rule.weights[i] * mu;  // half of 2 mu, per polarisation
    tracer.turn_to(mu);
    for (const bool tm : {false, true}) {
      const kernel::Ends ends = tracer.solve(tm, false);
      out.reflectance += weight * ends.reflectance;
      out.transmittance += weight * ends.transmittance;
      for (std::size_t j = 0; j < layers.size(); ++j)
        out.absorptance[j] += weight * tracer.absorbed(j, tm);
    }
  }
  return out;
}

}  // namespace lossline::field
