#pragma once
// The six words by which a line file says how a value came to be known.

#include <span>
#include <string>

#include "planner/product/provenance.h"

namespace lossline::linefile {

/// Source of values whose table names none.
inline constexpr const char* own_source = "the user's line file";

[[nodiscard]] std::span<const std::string> evidence_words();

/// Index of the word for an evidence; that of "assumed" where no word stands for it.
[[nodiscard]] std::size_t word_of(Evidence evidence);

/// Fills evidence, grade and the default uncertainty of the grade.
void set_evidence(Provenance& provenance, const std::string& word);

}  // namespace lossline::linefile
