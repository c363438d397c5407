// Reading a measured series: every accepted spelling, every question, every kind of bad row.

#include "materials/series.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "planner/product/propagation.h"
#include "tests/materials/fixtures.h"

namespace lossline::materials {
namespace {

using test::message_of;
using ::testing::HasSubstr;

const char* const head = "# material=carrot; of_phase=particle; moisture_basis=wet\n";

std::string refusal(const std::string& text) {
  return message_of([&] { (void)read_series(text, "s.csv"); });
}

TEST(Series, ConvertsWetBasisCelsiusAndMegahertz) {
  const Series s = read_series(std::string(head) +
                                   "M,T,f,eps_re,eps_im\n%,degC,MHz,1,1\n"
                                   "50,25,2450,30,8\n",
                               "s.csv");
  ASSERT_EQ(s.points.size(), 1u);
  EXPECT_DOUBLE_EQ(s.points[0].moisture, 1.0);  // M = 0.5 -> X = 1, exact
  EXPECT_DOUBLE_EQ(s.points[0].temperature, 298.15);
  EXPECT_DOUBLE_EQ(s.points[0].frequency, 2.45e9);
  EXPECT_EQ(s.points[0].printed, "50,25,2450,30,8");
  EXPECT_TRUE(s.basis_converted);
}

TEST(Series, TakesLossTangentAndBothPenetrationDepths) {
  const Series tangent =
      read_series("X,T,f,eps_re,tan_delta\n1,K,GHz,1,1\n0.1,300,2.45,4,0.25\n", "s");
  ASSERT_EQ(tangent.points.size(), 1u);
  EXPECT_DOUBLE_EQ(tangent.points[0].eps_im, 1.0);
  // The depth of 10 - j2 at 2.45 GHz, 30.945 mm, from the exact plane-wave formula (half a unit of
  // the last digit, over the depth: 1.6e-5 relative, hence 1e-4 in eps'').
  const std::string rows = "X,T,f,eps_re,depth\n1,K,GHz,1,mm\n0.1,300,2.45,10,";
  const Series power = read_series("# penetration_depth=power\n" + rows + "30.945\n", "s");
  ASSERT_EQ(power.points.size(), 1u);
  EXPECT_NEAR(power.points[0].eps_im, 2.0, 1e-4);
  const Series field = read_series("# penetration_depth=field\n" + rows + "61.890\n", "s");
  ASSERT_EQ(field.points.size(), 1u);
  EXPECT_NEAR(field.points[0].eps_im, 2.0, 1e-4);
}

TEST(Series, LossFromDepthUndoesPenetrationDepth) {
  for (const double loss : {0.01, 0.5, 3.0, 40.0}) {
    const double depth = product::penetration_depth({12.0, -loss}, 915e6);
    EXPECT_NEAR(loss_from_depth(12.0, depth, 915e6) / loss, 1.0, 1e-9) << loss;
  }
}

TEST(Series, ReadsSemicolonsByteOrderMarkAndAnnouncedDecimalComma) {
  const Series s = read_series(
      "\xEF\xBB\xBF# decimal=comma\r\nX;T;f;eps_re;eps_im\r\n1;degC;MHz;1;1\r\n"
      "0,25;20;915;10,5;2,25\r\n",
      "s.csv");
  ASSERT_EQ(s.points.size(), 1u);
  EXPECT_DOUBLE_EQ(s.points[0].moisture, 0.25);
  EXPECT_DOUBLE_EQ(s.points[0].eps_im, 2.25);
  EXPECT_THAT(s.reading, HasSubstr("decimal comma"));
}

TEST(Series, SortsByFrequencyTemperatureMoisture) {
  const Series s = read_series(
      "X,T,f,eps_re,eps_im\n1,degC,MHz,1,1\n0.2,20,2450,3,1\n0.1,20,2450,2,1\n"
      "0.3,20,915,4,1\n",
      "s");
  ASSERT_EQ(s.points.size(), 3u);
  EXPECT_EQ(s.points[0].frequency, 915e6);
  EXPECT_LT(s.points[1].moisture, s.points[2].moisture);
}

TEST(Series, RejectsBadRowsWithTheirLineAndReason) {
  const Series s = read_series(std::string(head) +
                                   "M,T,f,eps_re,eps_im\n%,degC,MHz,1,1\n"
                                   "50,25,2450,30,8\n"
                                   "100,25,2450,30,8\n"
                                   "40,25,2450,0.5,8\n"
                                   "40,25,2450,30,-1\n"
                                   "40,25,2.45,30,8\n"
                                   "40,nan,2450,30,8\n"
                                   "40,25,2450,30\n"
                                   "40;25;2450;30;8\n"
                                   "50,25,2450,31,8\n"
                                   "40,-300,2450,30,8\n",
                               "s.csv");
  EXPECT_EQ(s.points.size(), 1u);
  ASSERT_EQ(s.rejected.size(), 9u);
  EXPECT_EQ(s.rejected[0].line, 5);
  EXPECT_THAT(s.rejected[0].reason, HasSubstr("M = '100'"));
  EXPECT_THAT(s.rejected[1].reason, HasSubstr("eps' = 0.5 is outside [1, 300]"));
  EXPECT_THAT(s.rejected[2].reason, HasSubstr("eps'' = -1"));
  EXPECT_THAT(s.rejected[3].reason, HasSubstr("f = 2.45e+06 Hz"));
  EXPECT_THAT(s.rejected[4].reason, HasSubstr("T = 'nan'"));
  EXPECT_THAT(s.rejected[5].reason, HasSubstr("4 cells, 5 columns"));
  EXPECT_THAT(s.rejected[6].reason, HasSubstr("1 cells, 5 columns"));
  EXPECT_THAT(s.rejected[7].reason, HasSubstr("same f, T and moisture as line 4"));
  EXPECT_THAT(s.rejected[8].reason, HasSubstr("T = -26.85 K"));
}

TEST(Series, AsksInsteadOfGuessing) {
  EXPECT_THAT(refusal("M,T,f,eps_re,eps_im\n%,degC,MHz,1,1\n"), HasSubstr("wet or dry basis?"));
  EXPECT_THAT(refusal("X,T,f,eps_re,depth\n1,degC,MHz,1,mm\n"), HasSubstr("power or the field"));
  EXPECT_THAT(refusal(std::string(head) + "X,T,f,eps_re,eps_im\n%,degC,MHz,1,1\n"),
              HasSubstr("X is dry basis but moisture_basis=wet"));
  EXPECT_THAT(refusal("X,T,f,eps_re,eps_im,tan_delta\n1,K,Hz,1,1,1\n"),
              HasSubstr("2 loss columns"));
  EXPECT_THAT(refusal("X,T,f,eps_re,eps_im\n1,degF,MHz,1,1\n"), HasSubstr("unit 'degF'"));
  EXPECT_THAT(refusal("X,T,f,eps_re,eps_im\n1,MHz,degC,1,1\n"), HasSubstr("unit 'MHz'"));
  EXPECT_THAT(refusal("X,T,f,epsilon,eps_im\n1,K,Hz,1,1\n"), HasSubstr("unknown column 'epsilon'"));
  EXPECT_THAT(refusal("# decimal=comma\nX,T,f,eps_re,eps_im\n1,K,Hz,1,1\n"),
              HasSubstr("separate the cells by semicolons"));
  EXPECT_THAT(refusal("# moisture_basis=dry\nM,T,f,eps_re,eps_im\n% wb,K,Hz,1,1\n"),
              HasSubstr("unit '% wb' contradicts the basis of column M"));
  EXPECT_THAT(refusal(""), HasSubstr("no column names and units found"));
  EXPECT_THAT(refusal("X,T,f,eps_re,eps_im\n"), HasSubstr("no column names and units found"));
}

}  // namespace
}  // namespace lossline::materials
