#include "planner/linefile/evidence_words.h"

#include <array>

namespace lossline::linefile {
namespace {

const std::array<std::string, 6> words{"measured", "published", "quoted",
                                       "handbook", "assumed",   "invented"};
constexpr std::size_t assumed = 4;

/// Relative standard uncertainty of a value whose source states none. Chosen for this program, as
/// for the materials database; not published.
double default_uncertainty(char grade) {
  switch (grade) {
    case 'A':
      return 0.03;
    case 'B':
      return 0.08;
    case 'C':
      return 0.15;
    case 'D':
      return 0.30;
    default:
      return 0.55;
  }
}

}  // namespace

std::span<const std::string> evidence_words() {
  return words;
}

std::size_t word_of(Evidence evidence) {
  for (std::size_t i = 0; i < words.size(); ++i) {
    Evidence meant = Evidence::user_estimate;
    char grade = 'E';
    if (evidence_from_word(words[i], meant, grade) && meant == evidence) return i;
  }
  return assumed;
}

void set_evidence(Provenance& provenance, const std::string& word) {
  if (evidence_from_word(word, provenance.evidence, provenance.grade))
    provenance.relative_uncertainty = default_uncertainty(provenance.grade);
}

}  // namespace lossline::linefile
