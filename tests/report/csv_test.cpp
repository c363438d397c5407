#include "planner/report/csv.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <sstream>

#include "tests/report/sample_page.h"

namespace lossline::report {
namespace {

std::vector<std::string> lines(const std::string& text) {
  std::vector<std::string> out;
  std::istringstream in(text);
  for (std::string line; std::getline(in, line);) out.push_back(line);
  return out;
}

TEST(Csv, HasOneRowAStationAndUnitsInItsHeadings) {
  sample::WholePage whole;
  const auto rows = lines(csv(whole.page()));
  ASSERT_EQ(rows.size(), 1 + whole.solution.profile.size());
  EXPECT_EQ(rows[0].substr(0, 31), "x_m,stretch,moisture_db_kg_per_");
  const auto commas = std::count(rows[0].begin(), rows[0].end(), ',');
  for (const std::string& row : rows)
    EXPECT_EQ(std::count(row.begin(), row.end(), ','), commas) << row;
  EXPECT_EQ(rows[5].substr(0, 20), "4,cavity 1,0.12,0.12");
}

TEST(Csv, LeavesUnknownFieldsEmptyAndQuotesNames) {
  sample::WholePage whole;
  whole.solution.profile[0].temperature = std::nan("");
  whole.line.stretches[0].name = "warm, \"up\"";
  const auto rows = lines(csv(whole.page()));
  EXPECT_EQ(rows[1].substr(0, 27), "0,\"warm, \"\"up\"\"\",0.3,0.3,,3");
  EXPECT_EQ(rows[1].substr(rows[1].size() - 3), ",,,");  // no field outside cavities
}

}  // namespace
}  // namespace lossline::report
