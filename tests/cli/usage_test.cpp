#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "tests/cli/program.h"

namespace lossline::tests {
namespace {

using ::testing::HasSubstr;
using ::testing::IsEmpty;

TEST(Usage, HelpTeachesWithAnExampleAndTheExitCodes) {
  const Outcome help = lossline({"--help"});
  EXPECT_EQ(help.code, 0);
  EXPECT_THAT(help.out, HasSubstr("lossline solve quillfen.toml"));
  EXPECT_THAT(help.out, HasSubstr("Exit codes: 0"));
  EXPECT_THAT(help.err, IsEmpty());
  for (const char* command : {"check", "solve", "materials"}) {
    EXPECT_THAT(help.out, HasSubstr(command));
    EXPECT_EQ(lossline({command, "--help"}).code, 0) << command;
  }
}

TEST(Usage, VersionIsOneLine) {
  const Outcome version = lossline({"--version"});
  EXPECT_EQ(version.code, 0);
  EXPECT_EQ(version.out, "lossline 0.1.0\n");
}

TEST(Usage, WithoutACommandItExplainsItself) {
  const Outcome nothing = lossline({});
  EXPECT_EQ(nothing.code, 2);
  EXPECT_THAT(nothing.err, HasSubstr("solve"));
  EXPECT_EQ(lossline({"materials"}).code, 2);
}

TEST(Usage, NamesTheCommandAMistypedWordMeant) {
  const Outcome wrong = lossline({"slove", "x.toml"});
  EXPECT_EQ(wrong.code, 2);
  EXPECT_EQ(wrong.err, "lossline: 'slove' is not a command of lossline; did you mean 'solve'?\n");
  EXPECT_THAT(lossline({"polish"}).err, HasSubstr("there are"));
  EXPECT_THAT(lossline({"materials", "lst"}).err, HasSubstr("did you mean 'list'?"));
}

TEST(Usage, RefusesWrongOptionsWithExitCodeTwo) {
  const std::vector<std::vector<std::string>> wrong{
      {"solve"},
      {"solve", scenario("quillfen.toml"), "--levle", "mean"},
      {"solve", scenario("quillfen.toml"), "--format", "xml"},
      {"solve", scenario("quillfen.toml"), "--units", "furlongs"},
      {"solve", scenario("quillfen.toml"), "another.toml"},
      {"solve", scenario("quillfen.toml"), "--set"},
      {"check"},
      {"materials", "undo", "first"},
      {"materials", "show"}};
  for (const auto& arguments : wrong) {
    const Outcome outcome = lossline(arguments);
    EXPECT_EQ(outcome.code, 2) << arguments.back();
    EXPECT_THAT(outcome.out, IsEmpty()) << arguments.back();
    EXPECT_THAT(outcome.err, HasSubstr("lossline: ")) << arguments.back();
  }
}

TEST(Usage, SaysWhichLevelIsAvailable) {
  const Outcome depth = lossline({"solve", scenario("quillfen.toml"), "--level", "depth"});
  EXPECT_EQ(depth.code, 2);
  EXPECT_THAT(depth.err, HasSubstr("'depth' is not available yet; 'mean'"));
}

}  // namespace
}  // namespace lossline::tests
