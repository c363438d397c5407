// Capital recovery and availability against published factor tables and closed forms.

#include <gtest/gtest.h>

#include <string>

#include "planner/cost/annuity.h"
#include "planner/decide/availability.h"
#include "tests/published/product_csv.h"

namespace lossline {

// Engineering-economy factor tables (e.g. Newnan; from memory), five decimals.
TEST(CapitalRecovery, MatchesTheFactorTables) {
  EXPECT_NEAR(cost::capital_recovery_factor(0.10, 10), 0.16275, 0.51e-5);
  EXPECT_NEAR(cost::capital_recovery_factor(0.08, 20), 0.10185, 0.51e-5);
  EXPECT_NEAR(cost::capital_recovery_factor(0.06, 5), 0.23740, 0.51e-5);
  EXPECT_NEAR(cost::annuity(100'000, 0.10, 10), 16'274.54, 0.0051);
}

// Binomial sums, IEC 61078 (from memory).
TEST(Availability, MatchesTheBinomialSums) {
  EXPECT_NEAR(decide::k_out_of_n(2, 3, 0.9), 0.972, 1e-12);
  EXPECT_NEAR(decide::k_out_of_n(3, 4, 0.9), 0.9477, 1e-12);
  EXPECT_NEAR(decide::k_out_of_n(8, 10, 0.95), 0.988496, 0.51e-6);
  EXPECT_NEAR(decide::k_out_of_n(4, 6, 0.98), 0.999847, 0.51e-6);
}

TEST(CapitalRecovery, AndAvailabilityMatchTheTabulatedGrid) {
  int rows = 0;
  for (const auto& row : test::table("economics_reliability.csv")) {
    const double expected = std::stod(row[3]);
    if (row[0] == "AP") {
      EXPECT_NEAR(cost::capital_recovery_factor(std::stod(row[1]), std::stod(row[2])), expected,
                  0.51e-8);
    } else {
      ASSERT_EQ(row[0], "KN");
      const auto bar = row[1].find('/');
      EXPECT_NEAR(decide::k_out_of_n(std::stoi(row[1].substr(0, bar)),
                                     std::stoi(row[1].substr(bar + 1)), std::stod(row[2])),
                  expected, 0.51e-10);
    }
    ++rows;
  }
  EXPECT_EQ(rows, 96);
}

}  // namespace lossline
