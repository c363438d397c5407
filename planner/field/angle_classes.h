#pragma once
// The directions of a field in a box, sorted by mu = |cosine of the angle to the belt's normal|.
// Flat walls keep mu, so every class has its own power balance; an isotropic field has the same
// power density in every class.
//
// The nodes are mu = t^2 with Gauss-Legendre in t, which puts many of them near grazing where the
// classes differ most. Own choice; 12 classes reproduce the share of 96 classes to 2e-4 (tests).

#include <cstddef>
#include <span>
#include <vector>

namespace lossline::field {

/// Nodes and weights of the classes. Immutable; one object serves any number of threads.
class AngleClasses {
 public:
  static constexpr std::size_t azimuths = 6;  ///< directions per class against a vertical face

  ///   n        classes, 1 .. 1000
  ///   throws   Error out_of_range
  explicit AngleClasses(std::size_t n = 12);

  [[nodiscard]] std::size_t size() const { return mu_.size(); }
  /// Cosine of class i, 0 < mu < 1, ascending.
  [[nodiscard]] double mu(std::size_t i) const { return mu_[i]; }
  /// Weight of class i in the integral of mu from 0 to 1; the weights sum to 1.
  [[nodiscard]] double weight(std::size_t i) const { return weight_[i]; }

  /// |cosine| to the normal of a vertical face, sqrt(1 - mu^2) |cos phi|, at `azimuths` nodes of
  /// class i.
  [[nodiscard]] std::span<const double> lateral_cosines(std::size_t i) const {
    return {lateral_.data() + i * azimuths, azimuths};
  }
  /// Weights of those nodes in the mean over the azimuth phi; they sum to 1. Nodes crowd where the
  /// wave grazes the face; six give a smooth absorptance to 1e-4.
  [[nodiscard]] std::span<const double> lateral_weights() const { return lateral_weight_; }

 private:
  std::vector<double> mu_, weight_, lateral_, lateral_weight_;
};

}  // namespace lossline::field
