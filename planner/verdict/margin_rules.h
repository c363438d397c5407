#pragma once
// Internal to planner/verdict: how one margin is made, and the two groups of limits.

#include <string>
#include <vector>

#include "planner/verdict/margins.h"

namespace lossline::verdict {

/// What a group of limits is read from.
struct Case {
  const Line& line;
  const ProductCard& card;
  const Solution& solution;

  [[nodiscard]] bool solved() const { return solution.status == Status::solved; }
  [[nodiscard]] std::string stretch_name(std::size_t stretch) const;
};

/// The reserve of a limit: 5 K for temperatures, a tenth of the limit otherwise, and a tenth of
/// what is left to full cure for a degree of cure.
[[nodiscard]] double usual_reserve(Measure measure, double limit);

/// Fills margin, reserve and standing from value, limit and sense.
[[nodiscard]] Margin judged(Margin margin);

void add_product_margins(const Case& c, std::vector<Margin>& out);  ///< product_margins.cpp
void add_plant_margins(const Case& c, std::vector<Margin>& out);    ///< plant_margins.cpp

}  // namespace lossline::verdict
