#pragma once
// Where a value comes from and how far it may be trusted.

#include <string>

#include "planner/product/flags.h"

namespace lossline {

/// How the value reached us.
enum class Evidence {
  primary_read,     ///< table or equation seen in the source itself
  secondary_two,    ///< two independent reprints agree
  secondary_one,    ///< one reprint, or quoted by the user from a publication
  abstract_only,    ///< the number stands in the abstract or an excerpt
  from_memory,      ///< a named source that nobody could check
  model_derived,    ///< from a general model, not measured on this material
  user_measured,    ///< the user's own measurement
  user_estimate,    ///< the user's guess
  common_practice,  ///< a rule of the trade
  invented,         ///< demonstration data
};

/// Evidence, grade and place of one value or data set.
struct Provenance {
  Evidence evidence = Evidence::user_estimate;
  char grade = 'E';     ///< 'A' (best) to 'E'
  std::string source;   ///< citation in one line; "the user's line file" for overrides
  std::string locator;  ///< table, equation or page
  std::string dataset;  ///< data set id in the materials database; empty for overrides
  double relative_uncertainty = 0.55;  ///< standard uncertainty over value, 1

  /// The marks every value of this origin carries.
  [[nodiscard]] Flags flags() const;
};

/// One word for tables and JSON: "primary_read", "from_memory", ...
[[nodiscard]] const char* evidence_name(Evidence evidence);

/// The evidence and grade behind a word of a line file: measured (grade B), published (C),
/// quoted (C), handbook (D), assumed (E), invented (E).
///
///   word     one of the six words
///   returns  true and fills evidence and grade; false for any other word
bool evidence_from_word(const std::string& word, Evidence& evidence, char& grade);

}  // namespace lossline
