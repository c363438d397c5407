#include "planner/linefile/guard.h"

#include <gtest/gtest.h>

#include <random>

#include "small_line.h"

namespace lossline::linefile {
namespace {

std::string fault(const std::string& text) {
  const auto found = guard(text);
  if (!found) return "none";
  return std::to_string(found->line) + ':' + std::to_string(found->column) + ": " + found->wrong;
}

TEST(Guard, PassesASoundFile) {
  EXPECT_EQ(fault(small_line), "none");
  EXPECT_EQ(fault("\xEF\xBB\xBF" + small_line), "none");
  EXPECT_EQ(fault("# 20 °C in a comment\nnote = \"20 °C\" # ²\r\n"), "none");
  EXPECT_EQ(fault("a = 1.5e-3\nb = -2\nc = [1, 2]\nd = true\n'e f' = 'x # y'\n"), "none");
}

TEST(Guard, StopsTextTheParserMishandles) {
  EXPECT_EQ(fault("["), "1:2: the name of a table is missing");
  EXPECT_EQ(fault("a = 1\n[[["), "2:3: the name of a table is missing");
  EXPECT_EQ(fault("[=]"), "1:2: the name of a table is missing");
  EXPECT_EQ(fault("t = 20 °C"), "1:5: 20 °C has a unit but no quotes");
  EXPECT_EQ(fault("x² = 1"), "1:2: this character may stand only in quotes or in a comment");
  EXPECT_EQ(fault("d = 1979-05-27Tw"), "1:5: dates and times have no place in a line file");
  EXPECT_EQ(fault("d = 07:32:00"), "1:5: dates and times have no place in a line file");
  EXPECT_EQ(fault("a = \"\"\"x\ny\"\"\""),
            "1:5: text over several lines is not used in line files");
}

TEST(Guard, SaysWhatIsWrongWithValuesWithoutQuotes) {
  EXPECT_EQ(fault("speed = 2.4 m/min # fast"), "1:9: 2.4 m/min has a unit but no quotes");
  EXPECT_EQ(fault("rated = 75kW"), "1:9: 75kW has a unit but no quotes");
  EXPECT_EQ(fault("eps_real = 2,6"), "1:12: 2,6 is not a number");
}

TEST(Guard, ColumnsCountLettersNotBytes) {
  EXPECT_EQ(fault("a = \"°°\" °"), "1:10: this character may stand only in quotes or in a comment");
}

// Examples of RFC 3629, sections 3, 4 and 10: overlong forms, surrogates, beyond U+10FFFF.
TEST(Guard, RefusesWhatIsNotUtf8) {
  for (const char* bad :
       {"\xC0\x80", "\xE0\x80\x80", "\xED\xA0\x80", "\xF4\x90\x80\x80", "\xFF", "\xC3", "\xB0"})
    EXPECT_EQ(fault(std::string("a = \"") + bad + "\""), "1:6: this is not UTF-8 text");
  EXPECT_EQ(fault("a = \"\xF4\x8F\xBF\xBF\xED\x9F\xBF\""), "none");
  EXPECT_EQ(fault(std::string("a = 1\0", 6)), "1:6: a control character stands here");
}

// A reader that crashes or loops on damaged input would end or hang this test.
TEST(Guard, DamagedFilesAreRefusedOrReadButNeverFatal) {
  std::mt19937_64 random(99);
  const std::string letters = "[]{}=\"'#\\\n\t.,-+0179eEaz%_: \xC2\xB0\xE2\x82";
  int refused = 0;
  for (int i = 0; i < 1500; ++i) {
    std::string text = small_line;
    const auto edits = 1 + random() % 4;
    for (std::uint64_t k = 0; k < edits; ++k) {
      const std::size_t at = random() % text.size();
      switch (random() % 4) {
        case 0:
          text[at] = letters[random() % letters.size()];
          break;
        case 1:
          text.insert(at, 1, letters[random() % letters.size()]);
          break;
        case 2:
          text.erase(at, 1 + random() % 12);
          break;
        default:
          text.insert(at, text.substr(random() % text.size(), random() % 40));
      }
      if (text.empty()) text = "a";
    }
    if (faults(text) != "sound") ++refused;
  }
  EXPECT_GT(refused, 1000);
}

}  // namespace
}  // namespace lossline::linefile
