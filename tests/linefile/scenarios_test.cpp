#include <gtest/gtest.h>

#include <string>

#include "planner/linefile/read.h"

namespace lossline::linefile {
namespace {

TEST(Scenarios, AllDemonstrationLinesAreRead) {
  for (const char* name : {"quillfen", "tarnwick", "ostrevik", "velnarrow", "brackenmoor"}) {
    const std::string path = std::string(LOSSLINE_SOURCE_DIR "/scenarios/") + name + ".toml";
    try {
      const LineFile file = read(path);
      EXPECT_FALSE(file.line.name.empty());
      EXPECT_FALSE(file.line.generators.empty()) << name;
    } catch (const Error& error) {
      ADD_FAILURE() << error.what();
    }
  }
}

}  // namespace
}  // namespace lossline::linefile
