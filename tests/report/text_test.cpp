#include "planner/report/text.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <algorithm>
#include <sstream>

#include "tests/report/sample_page.h"

namespace lossline::report {
namespace {

using ::testing::HasSubstr;
using ::testing::Not;

std::size_t characters(const std::string& line) {
  return static_cast<std::size_t>(std::count_if(line.begin(), line.end(), [](char c) {
    return (static_cast<unsigned char>(c) & 0xC0u) != 0x80u;
  }));
}

TEST(TextPage, FitsATerminal) {
  sample::WholePage whole;
  whole.line.limits.product_temperature = 370;
  for (const bool unicode : {false, true}) {
    for (const UnitSet units : {UnitSet::si_engineering, UnitSet::us_customary}) {
      std::istringstream page(text(whole.page(), {units, unicode}));
      int count = 0;
      for (std::string line; std::getline(page, line); ++count)
        EXPECT_LE(characters(line), static_cast<std::size_t>(page_width)) << line;
      EXPECT_LE(count, 60);
    }
  }
}

TEST(TextPage, IsPlainAsciiWhenAsked) {
  sample::WholePage whole;
  const std::string page = text(whole.page(), {UnitSet::si_engineering, false});
  EXPECT_TRUE(std::all_of(page.begin(), page.end(),
                          [](char c) { return c == '\n' || (c >= ' ' && c <= '~'); }));
}

TEST(TextPage, NamesBasesAndBoundaries) {
  sample::WholePage whole;
  const std::string page = text(whole.page(), {});
  EXPECT_THAT(page, HasSubstr("% wb ("));
  EXPECT_THAT(page, HasSubstr("% of mains"));
  EXPECT_THAT(page, HasSubstr("% of output"));
  EXPECT_THAT(page, HasSubstr("164 mm"));  // hot spots of 915 MHz
  EXPECT_THAT(page, HasSubstr("contains unverified data"));
  EXPECT_THAT(page, HasSubstr("<- binds: "));
}

TEST(TextPage, ShowsEveryLimitThatIsNotWithin) {
  sample::WholePage whole;
  whole.line.limits.product_temperature = 350;  // beyond
  whole.line.generators[0].reflected_limit.reset();
  const std::string page = text(whole.page(), {});
  EXPECT_THAT(page, HasSubstr("! beyond  product temperature"));
  EXPECT_THAT(page, HasSubstr("? unknown reflected over output"));
}

TEST(TextPage, SpeaksUsCustomaryUnits) {
  sample::WholePage whole;
  const std::string page = text(whole.page(), {UnitSet::us_customary, false});
  EXPECT_THAT(page, HasSubstr("lb/h"));
  EXPECT_THAT(page, HasSubstr("degF"));
  EXPECT_THAT(page, HasSubstr("ft/min"));
  EXPECT_THAT(page, Not(HasSubstr("degC")));
}

TEST(TextPage, OfARefusedLineGivesTheReasonAlone) {
  sample::WholePage whole;
  whole.solution = Solution{};
  whole.solution.reason = "no permittivity";
  const std::string page = text(whole.page(), {});
  EXPECT_THAT(page, HasSubstr("REFUSED"));
  EXPECT_THAT(page, HasSubstr("no permittivity"));
  EXPECT_THAT(page, Not(HasSubstr("Answer")));
}

TEST(TextPage, StampsAResultThatDidNotConverge) {
  sample::WholePage whole;
  whole.solution.status = Status::not_converged;
  EXPECT_THAT(text(whole.page(), {}), HasSubstr("[ NOT CONVERGED"));
}

}  // namespace
}  // namespace lossline::report
