#include "planner/field/cavity_network.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <utility>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/field/band_matrix.h"
#include "planner/field/conductor.h"
#include "planner/field/range.h"
#include "planner/numerics/dense.h"

namespace lossline::field {
namespace {

double part(const std::vector<double>& list, std::size_t i) {
  return list.empty() ? 0.0 : list[i];
}

/// What of a cavity is the same in all classes [m2].
struct Fixed {
  double port = 0;     ///< launchers
  double ceiling = 0;  ///< one horizontal wall times Rs/eta_0
  double sides = 0;    ///< all vertical walls times Rs/eta_0
  double mixing_upper = 0, mixing_lower = 0;
};

Fixed fixed_sinks(const CavityInput& c) {
  Fixed out;
  const double lambda = speed_of_light / c.frequency;
  // A radiating port gets back `backscatter` times the share of an idle one.
  const double ports = c.launchers > 0 && c.launched_W > 0 ? c.launchers - 1 + c.backscatter
                                                           : static_cast<double>(c.launchers);
  out.port = ports * lambda * lambda / (8 * pi);
  const Conductor wall{c.wall_resistivity, c.wall_relative_permeability, c.wall_roughness_factor};
  const double loss = surface_resistance(c.frequency, wall) / vacuum_impedance;
  const double plan = c.length * c.width, vertical = 2 * c.height * (c.length + c.width);
  out.ceiling = plan * loss;
  out.sides = vertical * loss;
  out.mixing_upper = c.mixing * (plan + vertical * (1 - c.belt_height_share)) / 4;
  out.mixing_lower = c.mixing * (plan + vertical * c.belt_height_share) / 4;
  return out;
}

/// Walls of one volume in the class mu, `share` of the vertical walls. A wave on a horizontal wall
/// loses mu^2 + 1 in the mean of both polarisations, on a vertical one 1 + (1 - mu^2)/2 in the
/// mean over azimuth; over all classes both are 4/3, the wall Q of [Hill].
double walls(const Fixed& fixed, double mu, double share) {
  return fixed.ceiling * (1 + mu * mu) + fixed.sides * share * (1 + 0.5 * (1 - mu * mu));
}

double upper_sinks(const CavityInput& c, const Fixed& fixed, double mu, std::size_t i) {
  return part(c.bed_top, i) + part(c.belt_top, i) + 0.5 * part(c.bed_side, i) +
         walls(fixed, mu, 1 - c.belt_height_share) + fixed.port + c.open_upper_m2;
}

double lower_sinks(const CavityInput& c, const Fixed& fixed, double mu, std::size_t i) {
  return part(c.bed_bottom, i) + part(c.belt_bottom, i) + 0.5 * part(c.bed_side, i) +
         walls(fixed, mu, c.belt_height_share) + c.open_lower_m2;
}

void check_list(const char* name, const std::vector<double>& list, std::size_t classes) {
  const double n = static_cast<double>(classes);
  if (!list.empty()) in_range(name, static_cast<double>(list.size()), "numbers", n, n);
  for (const double v : list) in_range(name, v, "m2", 0, std::numeric_limits<double>::max());
}

void check(const CavityInput& c, const AngleClasses& classes) {
  constexpr double tiny = std::numeric_limits<double>::min();
  constexpr double huge = 1e12;
  frequency_in_range(c.frequency);
  in_range("cavity length", c.length, "m", tiny, largest_length);
  in_range("cavity width", c.width, "m", tiny, largest_length);
  in_range("cavity height", c.height, "m", tiny, largest_length);
  in_range("belt height share", c.belt_height_share, "(1)", 0, 1);
  in_range("bed width", c.bed_width, "m", 0, c.width);
  in_range("launchers", c.launchers, "(1)", 0, 1e6);
  in_range("backscatter", c.backscatter, "(1)", 1, 2);
  in_range("mixing", c.mixing, "(1)", 0, huge);
  in_range("launched power", c.launched_W, "W", 0, huge);
  in_range("open ends above the belt", c.open_upper_m2, "m2", 0, huge);
  in_range("open ends below the belt", c.open_lower_m2, "m2", 0, huge);
  check_list("bed from above", c.bed_top, classes.size());
  check_list("bed from below", c.bed_bottom, classes.size());
  check_list("belt from above", c.belt_top, classes.size());
  check_list("belt from below", c.belt_bottom, classes.size());
  check_list("side faces of the bed", c.bed_side, classes.size());
  check_list("passage through belt and gap", c.transmitted, classes.size());
  check_list("launch distribution", c.launch, classes.size());
  if (c.launch.empty()) return;
  double sum = 0;
  for (std::size_t i = 0; i < classes.size(); ++i) sum += classes.weight(i) * c.launch[i];
  in_range("integral of the launch distribution", sum, "(1)", 1 - 1e-12, 1 + 1e-12);
}

void check_links(std::span<const CavityInput> cavities, std::span<const CavityLink> links) {
  for (const CavityLink& link : links) {
    const double most = static_cast<double>(cavities.size()) - 1;
    in_range("cavity of a link", static_cast<double>(link.a), "(1)", 0, most);
    in_range("cavity of a link", static_cast<double>(link.b), "(1)", 0, most);
    in_range("cross section of a link", link.sigma_m2, "m2", 0, 1e6);
    const double f = cavities[link.a].frequency;
    in_range("frequency beyond a link", cavities[link.b].frequency, "Hz", f, f);
    if (link.a == link.b) throw Error(ErrorKind::out_of_range, "a link joins a cavity to itself");
  }
}

/// The system of all cavities. Unknown 2c is the volume above the belt of cavity c, 2c+1 below.
class Network {
 public:
  Network(const AngleClasses& classes, std::span<const CavityInput> cavities,
          std::span<const CavityLink> links)
      : classes_(classes), cavities_(cavities), links_(links), n_(2 * cavities.size()) {
    for (const CavityInput& c : cavities_) {
      fixed_.push_back(fixed_sinks(c));
      mixing_.push_back(fixed_.back().mixing_upper);
      mixing_.push_back(fixed_.back().mixing_lower);
    }
    band_ = 1;
    for (const CavityLink& link : links_)
      band_ = std::max(band_, 2 * (std::max(link.a, link.b) - std::min(link.a, link.b)));
    S_.assign(classes_.size() * n_, 0.0);
  }

  void solve() {
    const bool mixed = std::any_of(mixing_.begin(), mixing_.end(), [](double m) { return m > 0; });
    if (n_ == 0) return;
    if (mixed) return solve_mixed();
    BandMatrix matrix(n_, band_);
    for (std::size_t i = 0; i < classes_.size(); ++i) {
      fill_losses(i, matrix);
      factor(matrix);
      source(i, field(i));
      matrix.solve(field(i));
    }
  }

  [[nodiscard]] CavityResult result(std::size_t c) const;

 private:
  std::span<double> field(std::size_t i) { return {S_.data() + i * n_, n_}; }
  [[nodiscard]] double field(std::size_t i, std::size_t unknown) const {
    return S_[i * n_ + unknown];
  }

  /// Sinks and links of class i, without the mixing.
  void fill_losses(std::size_t i, BandMatrix& matrix) const {
    matrix.clear();
    const double mu = classes_.mu(i);
    for (std::size_t c = 0; c < cavities_.size(); ++c) {
      const double link = part(cavities_[c].transmitted, i);
      matrix.add(2 * c, 2 * c, upper_sinks(cavities_[c], fixed_[c], mu, i) + link);
      matrix.add(2 * c + 1, 2 * c + 1, lower_sinks(cavities_[c], fixed_[c], mu, i) + link);
      matrix.add(2 * c + 1, 2 * c, -link);
    }
    for (const CavityLink& link : links_) {
      const std::size_t low = 2 * std::min(link.a, link.b), high = 2 * std::max(link.a, link.b);
      matrix.add(low, low, link.sigma_m2);
      matrix.add(high, high, link.sigma_m2);
      matrix.add(high, low, -link.sigma_m2);
    }
  }
  void source(std::size_t i, std::span<double> out) const {
    for (std::size_t c = 0; c < cavities_.size(); ++c) {
      const CavityInput& cavity = cavities_[c];
      out[2 * c] = cavity.launched_W * (cavity.launch.empty() ? 1.0 : cavity.launch[i]);
      out[2 * c + 1] = 0;
    }
  }
  static void factor(BandMatrix& matrix) {
    if (!matrix.factor())
      throw Error(ErrorKind::internal, "the power balance of the cavities is singular");
  }
  void solve_mixed();

  const AngleClasses& classes_;
  std::span<const CavityInput> cavities_;
  std::span<const CavityLink> links_;
  std::size_t n_, band_ = 1;
  std::vector<Fixed> fixed_;
  std::vector<double> mixing_;  ///< per unknown
  std::vector<double> S_;       ///< [class * n + unknown]
};

/// With A the losses of a class, D the mixing and m the mean over the classes, (A + D) S = P + D m
/// is the same as (A + D)(S - m) = P - A m. The mean of S - m vanishes, which gives m; and in this
/// form the balance closes to rounding however strong the mixing is.
void Network::solve_mixed() {
  const BandMatrix empty(n_, band_);
  std::vector<BandMatrix> plain(classes_.size(), empty), factors(classes_.size(), empty);
  std::vector<double> mean(n_, 0.0), work(n_), coupling(n_ * n_, 0.0), block(n_ * n_);
  for (std::size_t i = 0; i < classes_.size(); ++i) {
    const double weight = classes_.weight(i);
    fill_losses(i, plain[i]);
    factors[i] = plain[i];
    for (std::size_t k = 0; k < n_; ++k) factors[i].add(k, k, mixing_[k]);
    factor(factors[i]);
    source(i, work);
    factors[i].solve(work);
    for (std::size_t k = 0; k < n_; ++k) mean[k] += weight * work[k];
    plain[i].spread(block);
    factors[i].solve(block, n_);
    for (std::size_t k = 0; k < n_ * n_; ++k) coupling[k] += weight * block[k];
  }
  numerics::DenseFactor joint;
  if (!joint.factor(std::move(coupling), n_))
    throw Error(ErrorKind::internal, "the mixing of the cavities is singular");
  joint.solve(mean);
  for (std::size_t i = 0; i < classes_.size(); ++i) {
    const std::span<double> S = field(i);
    source(i, S);
    plain[i].multiply(mean, work);
    for (std::size_t k = 0; k < n_; ++k) S[k] -= work[k];
    factors[i].solve(S);
    for (std::size_t k = 0; k < n_; ++k) S[k] += mean[k];
  }
}

CavityResult Network::result(std::size_t c) const {
  const CavityInput& cavity = cavities_[c];
  CavityResult out;
  out.S_upper.reserve(classes_.size());
  out.S_lower.reserve(classes_.size());
  for (std::size_t i = 0; i < classes_.size(); ++i) {
    const double weight = classes_.weight(i), mu = classes_.mu(i);
    const double upper = field(i, 2 * c), lower = field(i, 2 * c + 1);
    out.S_upper.push_back(upper);
    out.S_lower.push_back(lower);
    out.S_upper_mean += weight * upper;
    out.S_lower_mean += weight * lower;
    out.bed_top_W += weight * upper * part(cavity.bed_top, i);
    out.bed_bottom_W += weight * lower * part(cavity.bed_bottom, i);
    out.bed_side_W += weight * (upper + lower) * 0.5 * part(cavity.bed_side, i);
    out.belt_W += weight * (upper * part(cavity.belt_top, i) + lower * part(cavity.belt_bottom, i));
    out.walls_W += weight * (upper * walls(fixed_[c], mu, 1 - cavity.belt_height_share) +
                             lower * walls(fixed_[c], mu, cavity.belt_height_share));
    for (const CavityLink& link : links_) {
      if (link.a != c && link.b != c) continue;
      const double other = field(i, 2 * (link.a == c ? link.b : link.a));
      out.links_W += weight * link.sigma_m2 * (upper - other);
    }
  }
  out.returned_W = fixed_[c].port * out.S_upper_mean;
  out.ends_W = cavity.open_upper_m2 * out.S_upper_mean + cavity.open_lower_m2 * out.S_lower_mean;
  out.bed_W = out.bed_top_W + out.bed_bottom_W + out.bed_side_W;
  return out;
}

}  // namespace

NetworkResult solve_network(const AngleClasses& classes, std::span<const CavityInput> cavities,
                            std::span<const CavityLink> links) {
  double launched = 0;
  for (const CavityInput& c : cavities) {
    check(c, classes);
    launched += c.launched_W;
  }
  check_links(cavities, links);
  Network network(classes, cavities, links);
  network.solve();
  NetworkResult out;
  out.cavities.reserve(cavities.size());
  for (std::size_t c = 0; c < cavities.size(); ++c) {
    out.cavities.push_back(network.result(c));
    const CavityResult& r = out.cavities.back();
    const double gone = r.bed_W + r.belt_W + r.walls_W + r.returned_W + r.ends_W + r.links_W;
    if (launched > 0)
      out.residual = std::max(out.residual, std::abs(cavities[c].launched_W - gone) / launched);
  }
  return out;
}

}  // namespace lossline::field
