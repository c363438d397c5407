#include "planner/product/provenance.h"

#include <array>

namespace lossline {

Flags Provenance::flags() const {
  switch (evidence) {
    case Evidence::from_memory:
      return flag::from_memory;
    case Evidence::model_derived:
      return flag::estimated;
    case Evidence::user_estimate:
      return flag::assumed;
    case Evidence::invented:
      return flag::invented;
    default:
      return {};
  }
}

const char* evidence_name(Evidence evidence) {
  switch (evidence) {
    case Evidence::primary_read:
      return "primary_read";
    case Evidence::secondary_two:
      return "secondary_two";
    case Evidence::secondary_one:
      return "secondary_one";
    case Evidence::abstract_only:
      return "abstract_only";
    case Evidence::from_memory:
      return "from_memory";
    case Evidence::model_derived:
      return "model_derived";
    case Evidence::user_measured:
      return "user_measured";
    case Evidence::user_estimate:
      return "user_estimate";
    case Evidence::common_practice:
      return "common_practice";
    case Evidence::invented:
      return "invented";
  }
  return "unknown";
}

bool evidence_from_word(const std::string& word, Evidence& evidence, char& grade) {
  struct Row {
    const char* word;
    Evidence evidence;
    char grade;
  };
  static constexpr std::array rows{
      Row{"measured", Evidence::user_measured, 'B'}, Row{"published", Evidence::secondary_one, 'C'},
      Row{"quoted", Evidence::secondary_one, 'C'},   Row{"handbook", Evidence::from_memory, 'D'},
      Row{"assumed", Evidence::user_estimate, 'E'},  Row{"invented", Evidence::invented, 'E'}};
  for (const Row& row : rows) {
    if (word == row.word) {
      evidence = row.evidence;
      grade = row.grade;
      return true;
    }
  }
  return false;
}

}  // namespace lossline
