#include "planner/verdict/evidence.h"

#include <fmt/format.h>

#include <algorithm>
#include <set>
#include <utility>

namespace lossline::verdict {

bool is_verified(const EvidenceItem& item) {
  if (item.flags.has(flag::from_memory | flag::estimated | flag::invented | flag::assumed))
    return false;
  switch (item.provenance.evidence) {
    case Evidence::primary_read:
    case Evidence::secondary_two:
    case Evidence::secondary_one:
    case Evidence::user_measured:
      return true;
    default:
      return false;
  }
}

EvidenceSummary evidence_summary(const Solution& solution) {
  EvidenceSummary out;
  std::set<std::pair<std::string, std::string>> seen;  // one default may serve several stretches
  for (const EvidenceItem& item : solution.evidence) {
    if (!seen.insert({item.quantity, item.provenance.source}).second) continue;
    const int grade = std::clamp(item.provenance.grade - 'A', 0, 4);
    ++out.by_grade[static_cast<std::size_t>(grade)];
    if (!is_verified(item))
      out.unverified[evidence_name(item.provenance.evidence)].push_back(item.quantity);
  }
  std::size_t unverified = 0;
  for (const auto& [origin, quantities] : out.unverified) unverified += quantities.size();
  out.contains_unverified = unverified > 0;
  if (seen.empty()) {
    out.sentence = "no material data used";
    return out;
  }
  std::string grades;
  for (std::size_t g = 0; g < out.by_grade.size(); ++g)
    if (out.by_grade[g] > 0)
      grades += fmt::format("{}{} {}", grades.empty() ? "" : ", ", out.by_grade[g],
                            static_cast<char>('A' + static_cast<int>(g)));
  out.sentence = fmt::format("{} quantities by grade: {}", seen.size(), grades);
  if (out.contains_unverified)
    out.sentence += fmt::format("; contains unverified data ({} of {})", unverified, seen.size());
  return out;
}

std::vector<std::string> stamps(const Line& line, const Solution& solution) {
  std::vector<std::string> out;
  switch (solution.status) {
    case Status::solved:
      break;
    case Status::not_converged:
      out.emplace_back("NOT CONVERGED: the numbers are no answer");
      break;
    case Status::interrupted:
      out.emplace_back("INTERRUPTED: the numbers are no answer");
      break;
    case Status::refused:
      out.emplace_back("REFUSED");
      break;
  }
  if (solution.balance == Balance::constant_share)
    out.push_back(
        fmt::format("CONSTANT SHARE: {:.0f} % of launched power put into the product by "
                    "decree, no cavity balance",
                    100 * line.solve.load_share));
  std::string unusable;
  for (const CavityReport& cavity : solution.cavities)
    for (const field::ValidityFlag& flag : cavity.validity)
      if (flag.grade == field::ValidityGrade::unusable &&
          unusable.find(cavity.name) == std::string::npos)
        unusable += (unusable.empty() ? "" : ", ") + cavity.name;
  if (!unusable.empty()) out.push_back("FIELD MODEL DOES NOT HOLD in " + unusable);
  if (line.product.contains_metal)
    out.emplace_back("NOT FOR ORDER: metal in the product without a handling plan");
  if (solution.flags.has(flag::invented))
    out.emplace_back("DEMONSTRATION DATA: the product describes nothing real");
  if (evidence_summary(solution).contains_unverified) out.emplace_back("contains unverified data");
  return out;
}

std::vector<std::string> flag_words(Flags flags) {
  static constexpr std::array<std::pair<Flags, const char*>, 10> words{
      {{flag::edge, "edge"},
       {flag::extrapolated, "extrapolated"},
       {flag::clamped, "clamped"},
       {flag::estimated, "estimated"},
       {flag::from_memory, "from_memory"},
       {flag::mixed_sources, "mixed_sources"},
       {flag::default_uncertainty, "default_uncertainty"},
       {flag::invented, "invented"},
       {flag::assumed, "assumed"},
       {flag::guarded, "guarded"}}};
  std::vector<std::string> out;
  for (const auto& [bit, word] : words)
    if (flags.has(bit)) out.emplace_back(word);
  return out;
}

}  // namespace lossline::verdict
