#pragma once
// Internal to planner/verdict: the groups of cautions.

#include <string>
#include <vector>

#include "planner/verdict/cautions.h"

namespace lossline::verdict {

/// What the rules read.
struct CautionCase {
  const Line& line;
  const ProductCard& card;
  const Solution& solution;
  const Margins& margins;
};

/// "IEC 60519-6; verify the edition and national law".
[[nodiscard]] std::string deciding(const std::string& document);

void add_field_cautions(const CautionCase& c, std::vector<Caution>& out);
void add_product_cautions(const CautionCase& c, std::vector<Caution>& out);

}  // namespace lossline::verdict
