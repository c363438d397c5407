#include "planner/verdict/evidence.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/verdict/sample_solution.h"

namespace lossline::verdict {
namespace {

using ::testing::Contains;
using ::testing::ElementsAre;
using ::testing::HasSubstr;

TEST(Evidence, CountsGradesAndListsWhatNobodyVerified) {
  const EvidenceSummary e = evidence_summary(sample::solved());
  EXPECT_THAT(e.by_grade, ElementsAre(0, 1, 0, 0, 1));
  ASSERT_EQ(e.unverified.size(), 1u);
  EXPECT_THAT(e.unverified.at("user_estimate"), ElementsAre("conductivity"));
  EXPECT_EQ(e.sentence, "2 quantities by grade: 1 B, 1 E; contains unverified data (1 of 2)");
}

TEST(Evidence, CountsADefaultOnceHoweverManyStretchesUseIt) {
  Solution s = sample::solved();
  s.evidence.push_back(s.evidence.back());
  EXPECT_EQ(evidence_summary(s).sentence, evidence_summary(sample::solved()).sentence);
}

TEST(Evidence, AMarkMakesAValueUnverifiedWhateverItsSource) {
  EvidenceItem item{"permittivity", {Evidence::primary_read, 'A', "table", "", "", 0.1}, {}, ""};
  EXPECT_TRUE(is_verified(item));
  for (const Flags f : {flag::from_memory, flag::estimated, flag::invented, flag::assumed}) {
    item.flags = f;
    EXPECT_FALSE(is_verified(item));
  }
  item.flags = flag::edge;
  EXPECT_TRUE(is_verified(item));
  item.provenance.evidence = Evidence::common_practice;
  EXPECT_FALSE(is_verified(item));
}

TEST(Evidence, StampsEveryReasonNotToTrustAPage) {
  Line line = sample::solved_line();
  Solution s = sample::solved();
  EXPECT_THAT(stamps(line, s), ElementsAre("contains unverified data"));
  s.status = Status::not_converged;
  s.balance = Balance::constant_share;
  s.flags |= flag::invented;
  line.product.contains_metal = true;
  const auto all = stamps(line, s);
  ASSERT_EQ(all.size(), 5u);
  EXPECT_THAT(all[0], HasSubstr("NOT CONVERGED"));
  EXPECT_THAT(all[1], HasSubstr("85 %"));
  EXPECT_THAT(all, Contains(HasSubstr("NOT FOR ORDER")));
}

TEST(Evidence, NamesItsMarks) {
  EXPECT_THAT(flag_words(flag::clamped | flag::edge), ElementsAre("edge", "clamped"));
}

}  // namespace
}  // namespace lossline::verdict
