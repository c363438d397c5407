#pragma once
// The pieces flow.cpp is made of: what a line states about the stream, and the two rules every
// kind of product shares (one factor may be missing; nothing may contradict).

#include <optional>
#include <string>
#include <vector>

#include "planner/line/flow.h"

namespace lossline::flow_parts {

/// One factor of the flow identity as the line states it.
struct Factor {
  std::string key;              ///< of the line file
  std::optional<double> value;  ///< SI
  double scale = 1;             ///< SI times this is what messages print
  std::string unit;             ///< of the printed value
};

/// "1.2 m/min" for messages.
[[nodiscard]] std::string printed(const Factor& factor, double value);

/// The dry-solids flow that the duty states, as a factor whose value is dry solids and whose
/// printed form is the rate the user wrote. Reports rates that contradict each other.
[[nodiscard]] Factor stated_rate(const Line& line, std::vector<FlowProblem>& problems);

/// Dry solid per volume at feed moisture [kg/m3]: of the bed from feed.bulk_density or the card's
/// bulk density, of a slab, profile or piece from feed.bulk_density, the card's piece
/// density or, where it has none, its bulk density.
[[nodiscard]] Factor stated_density(const Line& line, const ProductCard& card);

/// Makes product = factor 1 x factor 2 x ... hold: fills the one value that is missing, or checks
/// the closing error when none is.
///
///   product, factors  what the identity says; `fixed` multiplies the factors
///   returns           true when every value is known and the identity closes
[[nodiscard]] bool close(Factor& product, std::vector<Factor*> factors, double fixed,
                         std::vector<FlowProblem>& problems);

/// The stream of separate pieces (flow_pieces.cpp).
[[nodiscard]] ProductFlow resolve_pieces(const Line& line, const ProductCard& card,
                                         std::vector<FlowProblem>& problems);

}  // namespace lossline::flow_parts
