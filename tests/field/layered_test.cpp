// Sources of the reference values: an independent implementation of the same textbook recursion in
// double precision in another language (digits as printed there); identities need no source.

#include "planner/field/layered.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <limits>
#include <numeric>
#include <random>

#include "planner/base/constants.h"
#include "planner/base/error.h"

namespace lossline::field {
namespace {

constexpr double f = 2450e6;

double sum(const std::vector<double>& v) {
  return std::accumulate(v.begin(), v.end(), 0.0);
}

struct PlaneWave {
  double angle;
  Polarisation pol;
  double R, T, bed, belt;
};

// Analytic values with nine digits; 1e-6 absolute leaves room for the last digits of c only.
TEST(LayeredBed, MatchesNineDigitPlaneWavesOnBedAndBelt) {
  const Layer layers[] = {{{10, -2}, 0.040}, {{2.6, -0.01}, 0.003}};
  using P = Polarisation;
  const PlaneWave table[] = {{0, P::te, 0.196814548, 0.165473123, 0.637460611, 0.000251718},
                             {0, P::tm, 0.196814548, 0.165473123, 0.637460611, 0.000251718},
                             {30, P::te, 0.225866487, 0.147233148, 0.626641750, 0.000258615},
                             {30, P::tm, 0.148684369, 0.183352203, 0.667708885, 0.000254543},
                             {60, P::te, 0.381195984, 0.083323347, 0.535227179, 0.000253491},
                             {60, P::tm, 0.035673073, 0.237763030, 0.726299222, 0.000264676},
                             {85, P::te, 0.828015737, 0.005362789, 0.166527879, 0.000093595},
                             {85, P::tm, 0.217491214, 0.136119951, 0.646014601, 0.000374234}};
  for (const PlaneWave& row : table) {
    const StackResponse r = stack_response(f, layers, std::cos(row.angle * pi / 180), row.pol);
    EXPECT_NEAR(r.reflectance, row.R, 1e-6) << row.angle;
    EXPECT_NEAR(r.transmittance, row.T, 1e-6) << row.angle;
    EXPECT_NEAR(r.absorptance[0], row.bed, 1e-6) << row.angle;
    EXPECT_NEAR(r.absorptance[1], row.belt, 1e-6) << row.angle;
  }
}

struct Diffuse {
  double f;
  std::complex<double> eps;
  double depth, bed_top, bed_bottom, belt_top, belt_bottom, T, R;
};

// Averages with 200 nodes, seven digits printed (four for the belt).
TEST(LayeredBed, MatchesDiffuseAveragesOfEightBeds) {
  const Diffuse table[] = {
      {2450e6, {30, -8}, .02, 0.4574015, 0.4640421, 1.146e-04, 4.752e-04, 0.0763198, 0.4661642},
      {2450e6, {10, -2}, .05, 0.5438952, 0.5534794, 1.481e-04, 4.824e-04, 0.0964021, 0.3595546},
      {2450e6, {4, -.3}, .02, 0.1093515, 0.1160178, 9.093e-04, 6.344e-04, 0.5705763, 0.3191628},
      {2450e6, {2.2, -.03}, .01, 0.0122296, 0.0135648, 1.395e-03, 1.071e-03, 0.8019194, 0.1844563},
      {915e6, {30, -8}, .05, 0.3846591, 0.3855700, 4.107e-05, 1.471e-04, 0.0742215, 0.5410783},
      {915e6, {10, -2}, .05, 0.4917751, 0.4932489, 2.353e-04, 3.372e-04, 0.3752398, 0.1327498},
      {915e6, {4, -.3}, .05, 0.1018427, 0.1043715, 3.227e-04, 1.914e-04, 0.5450302, 0.3528044},
      {915e6, {2.2, -.03}, .02, 0.0115351, 0.0118644, 5.989e-04, 5.195e-04, 0.8727092, 0.1151568}};
  for (const Diffuse& row : table) {
    const Layer down[] = {{row.eps, row.depth}, {{2.6, -0.01}, 0.003}};
    const Layer up[] = {down[1], down[0]};
    const DiffuseResponse above = diffuse_response(row.f, down, 200);
    const DiffuseResponse below = diffuse_response(row.f, up, 200);
    EXPECT_NEAR(above.absorptance[0], row.bed_top, 1e-6);
    EXPECT_NEAR(below.absorptance[1], row.bed_bottom, 1e-6);
    EXPECT_NEAR(above.absorptance[1], row.belt_top, 1e-6);
    EXPECT_NEAR(below.absorptance[0], row.belt_bottom, 1e-6);
    EXPECT_NEAR(above.transmittance, row.T, 1e-6);
    EXPECT_NEAR(above.reflectance, row.R, 1e-6);
    // Twelve directions, the planner's default, against two hundred: 1e-4 relative.
    EXPECT_NEAR(diffuse_response(row.f, down).absorptance[0], row.bed_top, 1e-4 * row.bed_top);
  }
}

// Fifths of the bed's heat from the top down, in a diffuse field; the reference integrated 5001
// points by trapezoids, good to 2e-4.
TEST(LayeredBed, MatchesHeatInFifthsOfTheDepth) {
  const Layer down[] = {{{10, -2}, 0.050}, {{2.6, -0.01}, 0.003}};
  const Layer up[] = {down[1], down[0]};
  const double from_top[] = {0.17679919, 0.14287711, 0.09199015, 0.07981713, 0.05241163};
  const double from_below[] = {0.05560044, 0.07855153, 0.0955274, 0.1425768, 0.18122328};
  std::vector<double> top(5, 0.0), below(5, 0.0);
  constexpr int nodes = 4000;  // midpoint in mu, weight 2 mu
  for (int i = 0; i < nodes; ++i) {
    const double mu = (i + 0.5) / nodes;
    for (const auto pol : {Polarisation::te, Polarisation::tm}) {
      const auto a = depth_bins(f, down, 0, 5, mu, pol), b = depth_bins(f, up, 1, 5, mu, pol);
      for (std::size_t k = 0; k < 5; ++k) {
        top[k] += mu / nodes * a[k];
        below[4 - k] += mu / nodes * b[k];
      }
    }
  }
  for (std::size_t k = 0; k < 5; ++k) {
    EXPECT_NEAR(top[k], from_top[k], 2e-4);
    EXPECT_NEAR(below[k], from_below[k], 2e-4);
  }
}

// Interference makes absorption rise and fall with depth; a spread of 10 % rms in the depth smooths
// it. Four printed digits. Nine-point Gauss-Hermite: Abramowitz and Stegun, table 25.10.
TEST(LayeredBed, MatchesInterferenceInDepthAndItsSmoothing) {
  const double table[][3] = {{5, .1423, .1421},  {8, .1467, .1474},  {10, .1591, .1613},
                             {12, .1894, .1948}, {15, .2945, .3036}, {18, .4662, .4425},
                             {20, .5175, .4815}, {25, .4161, .4284}, {30, .4026, .4274},
                             {40, .6273, .5808}};
  const double node[] = {0, 0.723551018752838, 1.468553289216668, 2.266580584531843,
                         3.190993201781528};
  const double weight[] = {0.7202352156061, 0.4326515590026, 0.08847452739438, 0.004943624275537,
                           0.00003960697726326};
  auto absorbed = [](double depth) {
    const Layer layers[] = {{{10, -2}, depth}, {{2.6, -0.01}, 0.003}};
    return diffuse_response(f, layers, 24).absorptance[0];
  };
  for (const auto& row : table) {
    const double depth = row[0] * 1e-3;
    EXPECT_NEAR(absorbed(depth), row[1], 6e-5);
    double smooth = 0;
    for (int k = 0; k < 5; ++k)
      for (const int sign : {-1, 1})
        smooth += (k == 0 ? 0.5 : 1.0) * weight[k] / std::sqrt(pi) *
                  absorbed(depth * (1 + sign * 0.1 * std::sqrt(2.0) * node[k]));
    EXPECT_NEAR(smooth, row[2], 6e-5);
  }
}

class RandomStack {
 public:
  explicit RandomStack(unsigned seed) : engine_(seed) {}
  std::vector<Layer> next() {
    std::vector<Layer> layers(1 + engine_() % 5);
    for (Layer& layer : layers)
      layer = {{between(1, 80), -std::exp(between(std::log(1e-6), std::log(50.0)))},
               std::exp(between(std::log(1e-4), std::log(0.5)))};
    return layers;
  }
  double between(double a, double b) { return std::uniform_real_distribution(a, b)(engine_); }

 private:
  std::mt19937 engine_;
};

TEST(LayeredBed, ReflectsPassesAndAbsorbsEverythingForRandomStacks) {
  RandomStack random(7);
  for (int trial = 0; trial < 2000; ++trial) {
    const std::vector<Layer> layers = random.next();
    for (const double mu : {1.0, 0.8, 0.4, 0.1, 1e-3})
      for (const auto pol : {Polarisation::te, Polarisation::tm})
        for (const bool metal : {false, true}) {
          const StackResponse r = stack_response(f, layers, mu, pol, metal);
          EXPECT_NEAR(r.reflectance + r.transmittance + sum(r.absorptance), 1, 1e-12);
          for (const double a : r.absorptance) EXPECT_GE(a, 0);
          EXPECT_TRUE(!metal || r.transmittance == 0);
        }
  }
}

TEST(LayeredBed, PassesTheSameFromBothSides) {
  RandomStack random(11);
  for (int trial = 0; trial < 2000; ++trial) {
    const std::vector<Layer> layers = random.next();
    const std::vector<Layer> back(layers.rbegin(), layers.rend());
    const double mu = random.between(0.01, 1);
    for (const auto pol : {Polarisation::te, Polarisation::tm})
      EXPECT_NEAR(stack_response(f, layers, mu, pol).transmittance,
                  stack_response(f, back, mu, pol).transmittance, 1e-12);
  }
}

TEST(LayeredBed, DepthBinsSumToTheAbsorptanceOfTheirLayer) {
  RandomStack random(13);
  for (int trial = 0; trial < 500; ++trial) {
    const std::vector<Layer> layers = random.next();
    const double mu = random.between(0.01, 1);
    for (const auto pol : {Polarisation::te, Polarisation::tm}) {
      const StackResponse r = stack_response(f, layers, mu, pol);
      for (std::size_t j = 0; j < layers.size(); ++j)
        EXPECT_NEAR(sum(depth_bins(f, layers, j, 7, mu, pol)), r.absorptance[j], 1e-12);
    }
  }
}

TEST(LayeredBed, CuttingALayerInTwoChangesNothing) {
  const Layer whole[] = {{{10, -2}, 0.05}};
  const Layer cut[] = {{{10, -2}, 0.02}, {{10, -2}, 0.03}};
  for (const auto pol : {Polarisation::te, Polarisation::tm}) {
    const StackResponse a = stack_response(f, whole, 0.6, pol),
                        b = stack_response(f, cut, 0.6, pol);
    EXPECT_NEAR(a.reflectance, b.reflectance, 1e-13);
    EXPECT_NEAR(a.absorptance[0], sum(b.absorptance), 1e-13);
  }
}

TEST(LayeredBed, AbsorbsInProportionToAVanishingLoss) {
  auto absorbed_per_loss = [](double loss) {
    const Layer layers[] = {{{4, -loss}, 0.02}};
    return stack_response(f, layers, 0.7, Polarisation::tm).absorptance[0] / loss;
  };
  double before = absorbed_per_loss(1e-6);
  for (const double loss : {1e-9, 1e-12}) {
    const double per_loss = absorbed_per_loss(loss);
    EXPECT_NEAR(per_loss / before, 1, 1e-5);
    before = per_loss;
  }
}

TEST(LayeredBed, AirIsInvisibleDownToGrazing) {
  const Layer air[] = {{{1, 0}, 0.1}};
  for (const double mu : {1.0, 1e-3, 1e-8}) {
    const StackResponse r = stack_response(f, air, mu, Polarisation::tm);
    EXPECT_NEAR(r.transmittance, 1, 1e-12);
    EXPECT_NEAR(r.reflectance, 0, 1e-12);
  }
}

TEST(LayeredBed, RefusesWhatItCannotUse) {
  const Layer good[] = {{{4, -0.3}, 0.02}};
  const Layer gain[] = {{{4, 0.3}, 0.02}};
  const Layer thin[] = {{{4, -0.3}, -0.02}};
  const Layer unknown[] = {{{std::numeric_limits<double>::quiet_NaN(), -0.3}, 0.02}};
  for (const auto& bad : {gain, thin, unknown})
    EXPECT_THROW(stack_response(f, {bad, 1}, 1, Polarisation::te), Error);
  EXPECT_THROW(stack_response(f, good, 0, Polarisation::te), Error);
  EXPECT_THROW(stack_response(f, good, 1.1, Polarisation::te), Error);
  EXPECT_THROW(stack_response(0, good, 1, Polarisation::te), Error);
  EXPECT_THROW(depth_bins(f, good, 1, 5, 1, Polarisation::te), Error);
  EXPECT_THROW(depth_bins(f, good, 0, 0, 1, Polarisation::te), Error);
  EXPECT_THROW(diffuse_response(f, good, 0), Error);
}

}  // namespace
}  // namespace lossline::field
