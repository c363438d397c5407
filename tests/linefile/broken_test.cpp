// Every NAME.toml in scenarios/broken must give exactly the message in NAME.expected: what
// `lossline check scenarios/broken/NAME.toml` prints from the root of the repository. Where the
// file reads well, the fault is one of its flow or structure. An expected message without its file
// is about a file that is not there.

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <sstream>

#include "planner/line/flow.h"
#include "planner/line/topology.h"
#include "small_line.h"

namespace lossline::linefile {
namespace {

namespace fs = std::filesystem;

std::vector<std::string> names() {
  std::vector<std::string> out;
  for (const auto& entry : fs::directory_iterator(LOSSLINE_SOURCE_DIR "/scenarios/broken"))
    if (entry.path().extension() == ".expected") out.push_back(entry.path().stem().string());
  std::sort(out.begin(), out.end());
  return out;
}

std::string text_of(const fs::path& path) {
  std::ifstream stream(path, std::ios::binary);
  std::ostringstream text;
  text << stream.rdbuf();
  return text.str();
}

/// What is wrong, as the program prints it. The files state the densities their flow needs, so
/// that an empty card serves.
std::string complaint(const std::string& path) {
  try {
    const LineFile file = read(path);
    std::vector<Problem> problems;
    std::vector<FlowProblem> contradictions;
    (void)resolve_flow(file.line, ProductCard{}, contradictions);
    for (const FlowProblem& p : contradictions)
      problems.push_back(locate(file, p.key, p.wrong, p.right));
    for (const TopologyProblem& p : topology(file.line).problems)
      problems.push_back(locate(file, p.key, p.wrong, p.right));
    sort_problems(problems);
    return problems.empty()
               ? "sound\n"
               : InputError(ErrorKind::bad_line_file, problems).what() + std::string("\n");
  } catch (const Error& error) {
    return error.what() + std::string("\n");
  }
}

class Broken : public ::testing::TestWithParam<std::string> {
 protected:
  void SetUp() override { fs::current_path(LOSSLINE_SOURCE_DIR); }
};

TEST_P(Broken, GivesExactlyTheExpectedMessage) {
  const std::string path = "scenarios/broken/" + GetParam();
  EXPECT_EQ(complaint(path + ".toml"), text_of(path + ".expected"));
}

INSTANTIATE_TEST_SUITE_P(Files, Broken, ::testing::ValuesIn(names()),
                         [](const auto& parameter) { return parameter.param; });

TEST(BrokenFiles, AreAtLeastTwentyFourAndEachHasItsMessage) {
  EXPECT_GE(names().size(), 24U);
  for (const auto& entry : fs::directory_iterator(LOSSLINE_SOURCE_DIR "/scenarios/broken")) {
    if (entry.path().extension() != ".toml") continue;
    EXPECT_TRUE(fs::exists(fs::path(entry.path()).replace_extension(".expected"))) << entry.path();
  }
}

}  // namespace
}  // namespace lossline::linefile
