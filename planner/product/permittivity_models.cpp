#include "planner/product/permittivity_models.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <utility>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/water/permittivity.h"

namespace lossline {
namespace {

using Complex = std::complex<double>;
using Value = Valued<Complex>;

constexpr double water_T_min = 273.15, water_T_max = 373.15;  // stated range of the water formula
constexpr double edge_share = 0.02;

double wet_basis(double X) {
  return X / (1 + X);
}

void check_state(const char* name, double moisture, double temperature) {
  const bool usable =
      moisture >= -1e-9 && std::isfinite(moisture) && temperature > 0 && std::isfinite(temperature);
  if (!usable)
    throw Error(ErrorKind::out_of_range,
                fmt::format("{}: moisture {:g} or temperature {:g} K is not possible", name,
                            moisture, temperature));
}

void check_frequency(const char* name, double frequency, double lo, double hi) {
  if (!(frequency >= lo && frequency <= hi))
    throw Error(ErrorKind::out_of_range,
                fmt::format("{}: no value at {:g} MHz; available: {:g} to {:g} MHz", name,
                            frequency / 1e6, lo / 1e6, hi / 1e6));
}

/// A value inside [lo, hi] as it is; outside followed as far as [lo - below, hi + above] and held
/// beyond, each with its mark.
double held(double value, double lo, double hi, double below, double above, Flags& flags) {
  if (value >= lo && value <= hi) {
    if (std::min(value - lo, hi - value) < edge_share * (hi - lo)) flags |= flag::edge;
    return value;
  }
  const double kept = std::clamp(value, lo - below, hi + above);
  flags |= kept == value ? flag::extrapolated : flag::clamped;
  return kept;
}

/// Free water at T, held within the range of the water formula, with conduction that rises with T.
Complex pore_water(double T, double frequency, double conductivity, Flags& flags) {
  const double kept = std::clamp(T, water_T_min, water_T_max);
  if (kept != T) flags |= flag::extrapolated;
  const double sigma = conductivity * std::max(1 + ionic_slope * (kept - 298.15), 0.1);
  return water::pure_water_ellison(frequency, kept) -
         Complex(0, sigma / (2 * pi * frequency * electric_constant));
}

class LeafTissue final : public Permittivity {
 public:
  LeafTissue(double conductivity, Flags origin) : conductivity_(conductivity), origin_(origin) {}
  [[nodiscard]] Value at(double X, double T, double f) const override {
    check_state("leaf tissue", X, T);
    check_frequency("leaf tissue", f, model_frequency_min, model_frequency_max);
    Value out{{}, origin_};
    const double wet = wet_basis(std::max(X, 0.0));
    double m = product::leaf_moisture_min;  // the anchored dry end
    if (wet < product::leaf_moisture_min) {
      out.flags |= flag::extrapolated;
    } else {
      m = held(wet, product::leaf_moisture_min, product::leaf_moisture_max, 0, 0, out.flags);
    }
    // The model's own conductivity already belongs to 22 degC; it is not carried further.
    const double kept = std::clamp(T, water_T_min, water_T_max);
    if (std::abs(T - 295.15) > 10 || kept != T) out.flags |= flag::extrapolated;
    out.value = product::leaf_permittivity_at(m, f, kept, conductivity_);
    return out;
  }

 private:
  double conductivity_;
  Flags origin_;
};

class BulkWheat final : public Permittivity {
 public:
  BulkWheat(double bulk_density, Flags origin) : bulk_density_(bulk_density), origin_(origin) {}
  [[nodiscard]] Value at(double X, double T, double f) const override {
    check_state("bulk wheat", X, T);
    check_frequency("bulk wheat", f, 20e6, 2.5e9);
    Value out{{}, origin_};
    const double m = held(wet_basis(std::max(X, 0.0)), 0.10, 0.25, 0.05, 0.05, out.flags);
    if (std::abs(T - 297.15) > 10) out.flags |= flag::extrapolated;
    out.value = product::wheat_permittivity(m, bulk_density_, f);
    return out;
  }

 private:
  double bulk_density_;
  Flags origin_;
};

class MoistMineral final : public Permittivity {
 public:
  MoistMineral(const product::MineralBody& body, double conductivity, Flags origin)
      : body_(body),
        conductivity_(conductivity),
        full_(1e3 * (1 / body.dry_density - 1 / body.solid_density)),
        origin_(origin) {}
  [[nodiscard]] Value at(double X, double T, double f) const override {
    check_state("moist mineral", X, T);
    check_frequency("moist mineral", f, model_frequency_min, model_frequency_max);
    Value out{{}, origin_};
    if (f < 1.4e9 || f > 5e9) out.flags |= flag::extrapolated;
    if (X > full_) out.flags |= flag::clamped;
    const Complex water = pore_water(T, f, conductivity_, out.flags);
    out.value = product::moist_mineral_permittivity(body_, std::clamp(X, 0.0, full_), water);
    return out;
  }

 private:
  product::MineralBody body_;
  double conductivity_, full_;  ///< full_: moisture with every pore full
  Flags origin_;
};

class DryBoard final : public Permittivity {
 public:
  DryBoard(const product::BoardMaterial& board, Flags origin) : board_(board), origin_(origin) {}
  [[nodiscard]] Value at(double X, double T, double f) const override {
    check_state("dry board", X, T);
    check_frequency("dry board", f, 0.9 * board_.frequency_min, board_.frequency_max);
    Value out{product::board_permittivity(board_, f), origin_};
    const bool outside =
        f < board_.frequency_min || X > dry_board_moisture || std::abs(T - 293.15) > 10;
    if (outside) out.flags |= flag::extrapolated;
    return out;
  }

 private:
  product::BoardMaterial board_;
  Flags origin_;
};

class FreshProduce final : public Permittivity {
 public:
  FreshProduce(double ash, Flags origin) : ash_(ash), origin_(origin) {}
  [[nodiscard]] Value at(double X, double T, double f) const override {
    check_state("fresh produce", X, T);
    check_frequency("fresh produce", f, 0.95 * product::produce_frequency,
                    1.05 * product::produce_frequency);
    const double m = wet_basis(X);
    if (!(m >= 0.70))
      throw Error(ErrorKind::out_of_range,
                  fmt::format("fresh produce: wet-basis moisture {:.3g} is outside [0.7, 1]; the "
                              "equation must not be used for dried produce",
                              m));
    Value out{{}, origin_};
    const double kept = held(T, 278.15, 403.15, 0, 0, out.flags);
    out.value = product::produce_permittivity(std::min(m, 1.0), ash_, kept);
    return out;
  }

 private:
  double ash_;
  Flags origin_;
};

enum class Curve { low, nominal, high };

class EstimatedPermittivity final : public Permittivity {
 public:
  EstimatedPermittivity(const EstimateInputs& inputs, Curve curve, Flags origin)
      : inputs_(inputs), curve_(curve), origin_(origin | flag::estimated) {}
  [[nodiscard]] Value at(double X, double T, double f) const override {
    check_state("estimate from composition", X, T);
    check_frequency("estimate from composition", f, model_frequency_min, model_frequency_max);
    Value out{{}, origin_};
    const double moisture = std::max(X, 0.0);
    product::Composition now = inputs_.composition;
    now.dry_bulk_density /= 1 + inputs_.shrinkage * moisture;
    const Complex water = pore_water(T, f, inputs_.composition.conductivity, out.flags);
    const product::PermittivityBand band = product::estimated_permittivity(now, moisture, water);
    if (band.pores_full && inputs_.shrinkage == 0) out.flags |= flag::clamped;
    out.value = curve_ == Curve::low ? band.low : curve_ == Curve::high ? band.high : band.nominal;
    return out;
  }

 private:
  EstimateInputs inputs_;
  Curve curve_;
  Flags origin_;
};

}  // namespace

PermittivityPointer leaf_tissue(double conductivity, Flags origin) {
  return std::make_shared<LeafTissue>(conductivity, origin);
}

PermittivityPointer bulk_wheat(double bulk_density, Flags origin) {
  return std::make_shared<BulkWheat>(bulk_density, origin);
}

PermittivityPointer moist_mineral(const product::MineralBody& body, double conductivity,
                                  Flags origin) {
  return std::make_shared<MoistMineral>(body, conductivity, origin);
}

PermittivityPointer dry_board(const product::BoardMaterial& board, Flags origin) {
  return std::make_shared<DryBoard>(board, origin);
}

PermittivityPointer fresh_produce(double ash, Flags origin) {
  return std::make_shared<FreshProduce>(ash, origin);
}

EstimateBand estimate_band(const EstimateInputs& inputs, Flags origin) {
  // One evaluation shows whether the inputs can be used at all.
  (void)product::estimated_permittivity(inputs.composition, 0.0, Complex(78, -10));
  return {std::make_shared<EstimatedPermittivity>(inputs, Curve::low, origin),
          std::make_shared<EstimatedPermittivity>(inputs, Curve::nominal, origin),
          std::make_shared<EstimatedPermittivity>(inputs, Curve::high, origin)};
}

}  // namespace lossline
