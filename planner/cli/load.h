#pragma once
// From a line file on disk to everything a solve needs, with every complaint located in the file.

#include <string>

#include "planner/cli/options.h"
#include "planner/line/flow.h"
#include "planner/line/line.h"
#include "planner/product/card.h"

namespace lossline::cli {

/// A line ready to be solved.
struct Input {
  Line line;
  ProductCard card;  ///< with the line file's overrides in place
  ProductFlow flow;
  std::string sha256;  ///< of the file's text and the assignments after it
};

/// Reads, applies --set, looks the material up and checks flow and structure.
///
///   throws  InputError with all problems of the file, Error for a material or database that cannot
///           be used
[[nodiscard]] Input load(const Options& options, const std::string& program);

}  // namespace lossline::cli
