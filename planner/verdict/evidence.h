#pragma once
// What a result rests on, in a few words: how many quantities of which grade, which inputs nobody
// has verified, and the stamps every page of the result must carry.

#include <array>
#include <map>
#include <string>
#include <vector>

#include "planner/line/line.h"
#include "planner/march/solution.h"

namespace lossline::verdict {

/// Summary of the evidence of one solution.
struct EvidenceSummary {
  std::array<int, 5> by_grade{};  ///< how many quantities of grade A, B, C, D, E
  /// Quantities nobody has verified, by how they came: "invented" -> "permittivity", ...
  std::map<std::string, std::vector<std::string>> unverified;
  bool contains_unverified = false;
  std::string sentence;  ///< "8 quantities: 2 B, 3 C, 3 E; contains unverified data (5 of 8)"
};

/// A value somebody could check counts as verified: read in its source, in a reprint or measured.
[[nodiscard]] bool is_verified(const EvidenceItem& item);

[[nodiscard]] EvidenceSummary evidence_summary(const Solution& solution);

/// Words that must stand on every output, most important first: not solved, constant share, field
/// model not valid, metal, invented data, unverified data.
[[nodiscard]] std::vector<std::string> stamps(const Line& line, const Solution& solution);

/// The marks as words, "extrapolated", "estimated", ...
[[nodiscard]] std::vector<std::string> flag_words(Flags flags);

}  // namespace lossline::verdict
