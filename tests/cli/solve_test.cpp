#include <gmock/gmock.h>
#include <gtest/gtest.h>
#include <signal.h>
#include <sys/stat.h>
#include <unistd.h>

#include <nlohmann/json.hpp>
#include <sstream>

#include "tests/cli/program.h"

namespace lossline::tests {
namespace {

using ::testing::AnyOf;
using ::testing::HasSubstr;
using ::testing::IsEmpty;

TEST(SolveCommand, AnswersEveryScenarioWithinItsExitCodes) {
  for (const auto& file : line_files("scenarios")) {
    const Outcome outcome = lossline({"solve", file.string(), "--format", "json"});
    ASSERT_THAT(outcome.code, AnyOf(0, 1)) << file << '\n' << outcome.err;
    EXPECT_THAT(outcome.err, IsEmpty()) << file;
    const nlohmann::json j = nlohmann::json::parse(outcome.out);
    EXPECT_EQ(j["status"], "solved") << file << ' ' << j["reason"];
    bool beyond = false;
    for (const auto& margin : j["margins"]) beyond = beyond || margin["status"] == "beyond";
    EXPECT_EQ(outcome.code, beyond ? 1 : 0) << file;
    EXPECT_EQ(j["input_sha256"].get<std::string>().size(), 64u);
  }
}

TEST(SolveCommand, FitsItsPageInBothUnitSets) {
  for (const auto& file : line_files("scenarios")) {
    for (const char* units : {"si", "us"}) {
      for (const char* locale : {"C", "C.UTF-8"}) {
        const Outcome outcome =
            lossline({"solve", file.string(), "--units", units}, {{"LC_ALL", locale}});
        std::istringstream page(outcome.out);
        int count = 0;
        for (std::string line; std::getline(page, line); ++count) {
          const auto width = std::count_if(line.begin(), line.end(), [](char c) {
            return (static_cast<unsigned char>(c) & 0xC0u) != 0x80u;
          });
          EXPECT_LE(width, 100) << file << '\n' << line;
        }
        EXPECT_GT(count, 30) << file;
        EXPECT_LE(count, 75) << file;
      }
    }
  }
}

TEST(SolveCommand, WritesAProfile) {
  const Outcome outcome = lossline({"solve", scenario("quillfen.toml"), "--format", "csv"});
  EXPECT_THAT(outcome.out, HasSubstr("x_m,stretch,moisture_db_kg_per_kg"));
  EXPECT_GT(std::count(outcome.out.begin(), outcome.out.end(), '\n'), 10);
}

TEST(SolveCommand, GivesTheSameAnswerTwiceAndAnotherForAnotherInput) {
  auto answer = [](const std::vector<std::string>& more) {
    std::vector<std::string> arguments{"solve", scenario("quillfen.toml"), "--format", "json"};
    arguments.insert(arguments.end(), more.begin(), more.end());
    nlohmann::json j = nlohmann::json::parse(lossline(arguments).out);
    j.erase("time_ms");
    return j;
  };
  const nlohmann::json first = answer({});
  EXPECT_EQ(first, answer({}));
  const nlohmann::json hotter = answer({"--set", "generator[3].set_point=45 kW"});
  EXPECT_NE(first["input_sha256"], hotter["input_sha256"]);
  EXPECT_LT(hotter["answer"]["final_moisture_db"].get<double>(),
            first["answer"]["final_moisture_db"].get<double>());
}

TEST(SolveCommand, SaysOneForABrokenLimitAndStillAnswers) {
  const Outcome outcome =
      lossline({"solve", scenario("quillfen.toml"), "--set", "limits.product_temperature=60 degC"});
  EXPECT_EQ(outcome.code, 1);
  EXPECT_THAT(outcome.out, HasSubstr("! beyond  product temperature"));
}

TEST(SolveCommand, StampsAConstantShare) {
  const Outcome outcome =
      lossline({"solve", scenario("quillfen.toml"), "--set", "solve.balance=constant share"});
  EXPECT_THAT(outcome.out, HasSubstr("[ CONSTANT SHARE: 85 %"));
  EXPECT_THAT(outcome.out, HasSubstr("? unknown reflected over output"));
}

TEST(SolveCommand, NamesWhatAMaterialLacks) {
  std::string text = content(scenario("velnarrow.toml"));
  const std::size_t from = text.find("[product.permittivity]"), to = text.find("[belt]");
  ASSERT_LT(from, to);
  text.erase(from, to - from);
  const Folder folder;
  const Outcome outcome = lossline({"solve", folder.write("lacking.toml", text)});
  EXPECT_EQ(outcome.code, 2);
  EXPECT_THAT(outcome.err, HasSubstr("lacking.toml:"));
  EXPECT_THAT(outcome.err, HasSubstr("'rubber_compound' has no permittivity"));
  EXPECT_THAT(outcome.out, IsEmpty());
}

TEST(SolveCommand, WritesToAFileOrSaysThatItCannot) {
  const Folder folder;
  const std::string file = folder.path("answer.json");
  const Outcome written =
      lossline({"solve", scenario("quillfen.toml"), "--format", "json", "--output", file});
  EXPECT_THAT(written.code, AnyOf(0, 1));
  EXPECT_THAT(written.out, IsEmpty());
  EXPECT_EQ(nlohmann::json::parse(content(file))["format"], 1);
  const Outcome refused = lossline(
      {"solve", scenario("quillfen.toml"), "--output", folder.path("no/such/folder/answer.txt")});
  EXPECT_EQ(refused.code, 2);
  EXPECT_THAT(refused.err, HasSubstr("cannot be written"));
}

TEST(SolveCommand, NeverReportsSuccessWithoutHavingPrinted) {
  const Outcome full = run("/bin/sh", {"-c", "exec \"$1\" solve \"$2\" >/dev/full", "sh",
                                       LOSSLINE_PROGRAM, scenario("quillfen.toml")});
  EXPECT_EQ(full.code, 2);
  EXPECT_THAT(full.err, HasSubstr("cannot be written"));
}

// The line file is a pipe: the signal arrives while the program waits for it, so the solve finds
// the stop flag set at its first round.
TEST(SolveCommand, StopsWhenInterrupted) {
  const Folder folder;
  const std::string pipe = folder.path("line.toml");
  ASSERT_EQ(mkfifo(pipe.c_str(), 0600), 0);
  const Outcome outcome = lossline({"solve", pipe}, {}, [&](int process) {
    std::ofstream end(pipe, std::ios::binary);  // returns once the program has opened its end
    kill(process, SIGINT);
    usleep(50'000);
    end << content(scenario("quillfen.toml"));
  });
  EXPECT_EQ(outcome.code, 130) << outcome.err;
  EXPECT_THAT(outcome.out, IsEmpty());
  EXPECT_THAT(outcome.err, HasSubstr("interrupted"));
}

}  // namespace
}  // namespace lossline::tests
