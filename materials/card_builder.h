#pragma once
// Builds a product card from the rows of a material.

#include <optional>
#include <string>
#include <vector>

#include "materials/record.h"
#include "planner/product/card.h"
#include "planner/product/composition.h"

namespace lossline::materials {

/// Data sets of this priority and above are kept for comparison and never used by a card: single
/// end points, other phases, equations that do not reach the drying range.
inline constexpr int reference_priority = 300;

/// What a card is made from.
struct CardRows {
  std::string id, name, family;
  std::vector<DatasetRecord> datasets;  ///< best first; the first of each quantity is used
  std::vector<ProductLimit> limits;
  std::optional<product::FoodComposition> composition;
};

/// The card; quantities without a data set stay absent.
[[nodiscard]] ProductCard build_card(CardRows rows);

/// The limits stored for a material, in order of entry. Critical moistures, which mark the change
/// of a drying period and are no limit, are left out.
[[nodiscard]] std::vector<ProductLimit> read_limits(const Database& database,
                                                    const std::string& material);

/// The scalars of a card by quantity id, for tables: the member, or nullptr for an unknown id.
[[nodiscard]] const std::optional<Property>* scalar(const ProductCard& card,
                                                    const std::string& quantity);

/// Quantity ids of all scalars of a card, in the order of the card.
[[nodiscard]] const std::vector<std::string>& scalar_quantities();

}  // namespace lossline::materials
