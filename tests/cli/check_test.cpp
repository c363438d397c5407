#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/cli/program.h"

namespace lossline::tests {
namespace {

using ::testing::HasSubstr;
using ::testing::IsEmpty;

TEST(CheckCommand, FindsEveryScenarioSound) {
  for (const auto& file : line_files("scenarios")) {
    const Outcome outcome = lossline({"check", file.string()});
    EXPECT_EQ(outcome.code, 0) << file << '\n' << outcome.err;
    EXPECT_THAT(outcome.out, HasSubstr(": sound"));
    EXPECT_THAT(outcome.out, HasSubstr("belt"));
    EXPECT_THAT(outcome.err, IsEmpty());
  }
}

TEST(CheckCommand, SaysTheExpectedOfEveryBrokenFile) {
  int seen = 0;
  for (const auto& file : line_files("scenarios/broken")) {
    auto expected = file;
    expected.replace_extension(".expected");
    if (!std::filesystem::exists(expected)) continue;
    ++seen;
    // The expected text names the file as seen from the root of the repository.
    const Outcome outcome =
        run("/bin/sh", {"-c", "cd \"$1\" && exec \"$2\" check \"scenarios/broken/$3\"", "sh",
                        LOSSLINE_SOURCE_DIR, LOSSLINE_PROGRAM, file.filename().string()});
    EXPECT_EQ(outcome.code, 2) << file;
    EXPECT_EQ(outcome.err, content(expected)) << file;
    EXPECT_THAT(outcome.out, IsEmpty()) << file;
  }
  EXPECT_GE(seen, 10);
}

TEST(CheckCommand, AppliesSettingsAndRefusesWrongOnes) {
  const std::string file = scenario("ostrevik.toml");
  EXPECT_EQ(lossline({"check", file, "--set", "belt.speed=0.2 m/min"}).code, 0);
  for (const char* wrong : {"belt.speed", "belt.sped=0.2 m/min", "belt.speed=0.2 kg", "=3"}) {
    const Outcome outcome = lossline({"check", file, "--set", wrong});
    EXPECT_EQ(outcome.code, 2) << wrong;
    EXPECT_FALSE(outcome.err.empty()) << wrong;
  }
  // 40 pieces an hour in two lanes of 150 mm pieces need 0.05 m/min.
  const Outcome slow = lossline({"check", file, "--set", "belt.speed=0.04 m/min"});
  EXPECT_EQ(slow.code, 2);
  EXPECT_THAT(slow.err, HasSubstr("overlap"));
}

TEST(CheckCommand, NamesTheNearestMaterial) {
  const Outcome outcome =
      lossline({"check", scenario("quillfen.toml"), "--set", "product.material=carott"});
  EXPECT_EQ(outcome.code, 2);
  EXPECT_THAT(outcome.err, HasSubstr("carrot"));
}

TEST(CheckCommand, RefusesFilesThatAreNone) {
  const Folder folder;
  const Outcome missing = lossline({"check", folder.path("none.toml")});
  EXPECT_EQ(missing.code, 2);
  EXPECT_THAT(missing.err, HasSubstr("none.toml"));
  EXPECT_EQ(lossline({"check", folder.path("")}).code, 2);  // the folder itself
  EXPECT_EQ(lossline({"check", folder.write("empty.toml", "")}).code, 2);
  EXPECT_EQ(lossline({"check", folder.write("bytes.toml", std::string("\x00\xff\x01", 3))}).code,
            2);
}

}  // namespace
}  // namespace lossline::tests
