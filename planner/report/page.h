#pragma once
// What every form of the answer is written from. All members refer to things the caller owns.

#include <string>
#include <vector>

#include "planner/line/line.h"
#include "planner/march/solution.h"
#include "planner/verdict/cautions.h"
#include "planner/verdict/margins.h"

namespace lossline::report {

/// One solved line with its verdict.
struct Page {
  const Line& line;
  const Solution& solution;
  const verdict::Margins& margins;
  const std::vector<verdict::Caution>& cautions;
  std::string file;          ///< line file, as the user named it
  std::string input_sha256;  ///< of the line file with its overrides; empty when unknown
};

}  // namespace lossline::report
