#pragma once
// From a stored data set to something that can be evaluated: the only place that knows which form
// id stands for which function of planner/product.

#include <complex>
#include <memory>
#include <optional>
#include <string>
#include <variant>

#include "materials/record.h"
#include "planner/product/composition.h"
#include "planner/product/cure.h"
#include "planner/product/permittivity.h"
#include "planner/product/sorption.h"

namespace lossline::materials {

/// A permittivity with its band; low and high are null unless the nominal one is an estimate.
struct PermittivitySet {
  std::shared_ptr<const Permittivity> nominal, low, high;
};

/// The permittivity of an `eps` data set.
///
///   throws  Error database when the form is unknown or a parameter is missing
[[nodiscard]] PermittivitySet permittivity_of(const DatasetRecord& record);

/// The isotherm of an `isotherm` data set with the ranges of its fit.
[[nodiscard]] product::Isotherm isotherm_of(const DatasetRecord& record);

/// The kinetics of a `cure` data set.
[[nodiscard]] product::CureModel cure_of(const DatasetRecord& record);

/// The value of a scalar data set: its constant, or the property its model gives at 0 degC (for
/// conductivity_slope: the straight line through the dry and the fresh product).
///
///   composition  of the material; needed by the choi_okos form only
[[nodiscard]] double scalar_of(const DatasetRecord& record,
                               const std::optional<product::FoodComposition>& composition);

/// A state at which a model is asked.
struct Query {
  std::optional<double> X, T, f, aw, alpha, p;
  std::string band = "nominal";
};

/// The model's answer in the SI unit of its quantity; eps as eps' - j eps'', all else real.
///
///   throws  Error database when the query lacks an input the form needs
[[nodiscard]] std::complex<double> evaluate(
    const DatasetRecord& record, const Query& query,
    const std::optional<product::FoodComposition>& composition);

}  // namespace lossline::materials
