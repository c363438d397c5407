#pragma once
// Check values stored beside the data: every build of the database, and `materials check`, asks
// the models again and compares.

#include <optional>
#include <string>
#include <vector>

#include "materials/database.h"
#include "planner/product/composition.h"

namespace lossline::materials {

/// One check value and what the model says.
struct GoldenResult {
  std::string id, dataset, origin;
  std::string state;  ///< "X = 0.1, T = 298.15 K, f = 2450 MHz"
  double expected = 0, got = 0;
  std::optional<double> expected_im, got_im;
  double tolerance = 0;  ///< relative
  bool passed = false;
  std::string failure;  ///< why not; empty when passed
};

/// The composition of a material as shares of the wet mass, if stored.
[[nodiscard]] std::optional<product::FoodComposition> read_composition(const Database& database,
                                                                       const std::string& material);

/// Runs every check value of the database (of one material when named), in order of id.
[[nodiscard]] std::vector<GoldenResult> run_goldens(const Database& database,
                                                    const std::string& material = {});

}  // namespace lossline::materials
