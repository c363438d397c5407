#include "planner/linefile/read.h"

#include "small_line.h"

namespace lossline::linefile {
namespace {

TEST(Read, FillsTheLineInSi) {
  const LineFile file = read_text(small_line, "test.toml");
  const Line& line = file.line;
  EXPECT_EQ(line.name, "Test line");
  EXPECT_EQ(line.duty.feed_rate, 0.5);
  EXPECT_NEAR(line.duty.feed_moisture, 1.0 / 3, 1e-15);
  EXPECT_EQ(line.duty.feed_temperature, 323.15);
  EXPECT_EQ(line.duty.target_moisture, 0.1);
  EXPECT_EQ(line.product.kind, ProductKind::slab);
  EXPECT_EQ(line.belt.width, 1.2);
  EXPECT_EQ(line.feed.depth, 0.02);
  ASSERT_EQ(line.stretches.size(), 2U);
  EXPECT_EQ(line.stretches[0].kind, StretchKind::microwave);
  EXPECT_EQ(line.stretches[0].launchers, 2);
  EXPECT_EQ(line.stretches[1].launchers, 1);
  ASSERT_EQ(line.generators.size(), 1U);
  EXPECT_DOUBLE_EQ(line.generators[0].set_point, 0.7 * 15e3);
  EXPECT_EQ(line.generators[0].minimum_stable, 1500);
  ASSERT_EQ(line.generators[0].feeds.size(), 2U);
  EXPECT_EQ(line.generators[0].feeds[1].stretch, "cavity 1b");
  EXPECT_EQ(line.generators[0].feeds[1].share, 0.4);
  EXPECT_EQ(line.air[0].pattern, AirPattern::cross);
}

TEST(Read, LeavesOutMeansDefault) {
  const Line line = read_text(small_line, "test.toml").line;
  const Line fresh;
  EXPECT_EQ(line.pressure, fresh.pressure);
  EXPECT_EQ(line.belt.eps, fresh.belt.eps);
  EXPECT_EQ(line.stretches[0].wall_resistivity, Stretch{}.wall_resistivity);
  EXPECT_FALSE(line.belt.speed.has_value());
  EXPECT_FALSE(line.product.overrides.dry_heat_capacity.has_value());
  EXPECT_FALSE(line.inlet_trap.has_value());
}

TEST(Read, EvidenceWordsGiveGradeAndUncertainty) {
  const std::string given = with(small_line, "[belt]",
                                 "[product.override]\nevidence = \"measured\"\nsource = \"lab\"\n"
                                 "dry_heat_capacity = \"1.6 kJ/(kg K)\"\n\n[belt]");
  const Provenance p = read_text(given, "test.toml").line.product.overrides.provenance;
  EXPECT_EQ(p.evidence, Evidence::user_measured);
  EXPECT_EQ(p.grade, 'B');
  EXPECT_EQ(p.source, "lab");
  EXPECT_EQ(p.relative_uncertainty, 0.08);
}

TEST(Read, PricesMayCarryTheCurrencyOfTheFile) {
  const Line line = read_text(small_line +
                                  "[prices]\ncurrency = \"EUR\"\n"
                                  "electricity = \"36 EUR/MWh\"\n",
                              "test.toml")
                        .line;
  EXPECT_EQ(line.prices.currency, "EUR");
  EXPECT_EQ(line.prices.electricity, 1e-8);
}

TEST(Read, ReportsEverythingAtOnceInTheOrderOfTheFile) {
  std::string text = with(small_line, "feed_rate = \"1.8 t/h\"", "feed_rate = \"1.8\"");
  text = with(text, "launchers = 2", "launchers = 2.5");
  text = with(text, "[[air]]", "[[aire]]");
  EXPECT_EQ(faults(text),
            "test.toml:7:17: duty.feed_rate: \"1.8\" has no unit; write a mass flow as in "
            "\"1.8 t/h\"\n"
            "test.toml:29:14: stretch[1].launchers: \"2.5\" is not a whole number; write it as in "
            "2\n"
            "test.toml:30:7: stretch[1].air: there is no air loop called 'main'; the file has "
            "none\n"
            "test.toml:50:3: aire: is not a key of a line file; did you mean 'air'?");
}

TEST(Read, AMissingKeyPointsAtItsTable) {
  EXPECT_EQ(faults(with(small_line, "kind = \"microwave\"\nlength = \"1.2 m\"\n", "")),
            "test.toml:32:1: stretch[2].kind: is missing; write it as in kind = \"microwave\"\n"
            "test.toml:32:1: stretch[2].length: is missing; write it as in length = \"2.4 m\"");
}

TEST(Read, LocatesProblemsFoundLater) {
  const LineFile file = read_text(small_line, "test.toml");
  EXPECT_EQ(locate(file, "belt.width", "w", "r").text(), "test.toml:17:9: belt.width: w; r");
  EXPECT_EQ(locate(file, "belt.speed", "w", "r").text(), "test.toml:16:2: belt.speed: w; r");
  EXPECT_EQ(locate(file, "generator[1].feeds[2]", "w", "r").text(),
            "test.toml:47:22: generator[1].feeds[2]: w; r");
  EXPECT_EQ(locate(file, "stretch[2].passage_width", "w", "r").text(),
            "test.toml:32:1: stretch[2].passage_width: w; r");
  EXPECT_EQ(locate(file, "endtrap.inlet", "w", "r").text(), "test.toml: endtrap.inlet: w; r");
}

TEST(Read, PositionsSpanTheValueExactly) {
  const LineFile file = read_text(small_line, "test.toml");
  const auto value = [&](const char* key) {
    const Position& at = file.positions.at(key);
    return file.text.substr(at.begin, at.end - at.begin);
  };
  EXPECT_EQ(value("line.name"), "\"Test line\"");
  EXPECT_EQ(value("stretch[1].launchers"), "2");
  EXPECT_EQ(value("generator[1].shares"), "[\"60 %\", \"40 %\"]");
  EXPECT_EQ(value("generator[1].shares[2]"), "\"40 %\"");
}

TEST(Read, ChecksAreSilentAboutValuesAlreadyReported) {
  // The bed is wider than the belt could be, but the belt's width is not known.
  EXPECT_EQ(faults(with(with(small_line, "width = \"1200 mm\"", "width = \"1200\""),
                        "width = \"1.0 m\"", "width = \"2.0 m\"")),
            "test.toml:17:14: belt.width: \"1200\" has no unit; write a length as in \"2.4 m\"");
}

TEST(Read, PiecesMustFitToo) {
  const std::string pieces =
      with(with(small_line, "kind = \"slab\"", "kind = \"pieces\""), "depth = \"20 mm\"",
           "piece_width = \"0.5 m\"\nlanes = 3\npiece_height = \"600 mm\"");
  EXPECT_EQ(faults(pieces),
            "test.toml:22:9: feed.lanes: 3 lanes of 500 mm make 1.5 m and the belt is 1.2 m wide; "
            "the product lies on the belt\n"
            "test.toml:30:10: stretch[1].height: 'cavity 1' leaves 500 mm above the belt and the "
            "product is 600 mm high (feed.piece_height); the product stands under the roof\n"
            "test.toml:39:10: stretch[2].height: 'cavity 1b' leaves 500 mm above the belt and the "
            "product is 600 mm high (feed.piece_height); the product stands under the roof");
}

TEST(Read, RefusesFoldersAndMissingFiles) {
  for (const char* path : {"no such file.toml", "."}) {
    try {
      (void)read(path);
      ADD_FAILURE() << path;
    } catch (const InputError& error) {
      EXPECT_EQ(error.kind(), ErrorKind::not_found);
    }
  }
}

}  // namespace
}  // namespace lossline::linefile
