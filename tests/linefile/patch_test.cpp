#include "planner/linefile/patch.h"

#include <filesystem>
#include <fstream>
#include <sstream>

#include "small_line.h"

namespace lossline::linefile {
namespace {

LineFile small() {
  return read_text(small_line, "test.toml");
}

TEST(Patch, ChangesTheValueAndNothingElse) {
  EXPECT_EQ(patched(small(), "line.name", "Other # line"),
            with(small_line, "\"Test line\"", "\"Other # line\""));
  EXPECT_EQ(patched(small(), "stretch[1].launchers", "3"),
            with(small_line, "launchers = 2", "launchers = 3"));
  EXPECT_EQ(patched(small(), "generator[1].shares", "[\"30 %\", \"70 %\"]"),
            with(small_line, "[\"60 %\", \"40 %\"]", "[\"30 %\", \"70 %\"]"));
  EXPECT_EQ(patched(small(), "generator[1].set_point", "80 %"),
            with(small_line, "\"70 %\"", "\"80 %\""));
}

TEST(Patch, WorksBehindLettersOfSeveralBytes) {
  const std::string text = with(small_line, "# the first", "# Größe in °C");
  const std::string inside = with(text, "name = \"Test line\"", "name = \"Größe\"");
  EXPECT_EQ(patched(read_text(inside, "test.toml"), "line.name", "x"),
            with(inside, "\"Größe\"", "\"x\""));
}

TEST(Patch, AddsAnAbsentKeyAtTheEndOfItsTable) {
  EXPECT_EQ(
      patched(small(), "belt.speed", "2.4 m/min"),
      with(small_line, "width = \"1200 mm\"\n", "width = \"1200 mm\"\nspeed = \"2.4 m/min\"\n"));
  EXPECT_EQ(
      patched(small(), "stretch[2].mixing", "0.1"),
      with(small_line, "height = \"1.0 m\"\n\n[[gen", "height = \"1.0 m\"\nmixing = 0.1\n\n[[gen"));
}

TEST(Patch, RefusesWhatWouldSpoilTheFile) {
  EXPECT_THROW((void)patched(small(), "belt.width", "0.2 kg"), InputError);
  EXPECT_THROW((void)patched(small(), "belt.colour", "green"), InputError);
  EXPECT_THROW((void)patched(small(), "belt.width", "0.9 m"), InputError);  // narrower than the bed
  EXPECT_THROW((void)patched(small(), "limits.moisture_low", "1 % db"), Error);
}

class SavedFile : public ::testing::Test {
 protected:
  std::filesystem::path folder_ = std::filesystem::path(::testing::TempDir()) / "lossline_patch";
  void SetUp() override { std::filesystem::create_directories(folder_); }
  void TearDown() override { std::filesystem::remove_all(folder_); }
  static std::string text_of(const std::filesystem::path& path) {
    std::ifstream stream(path, std::ios::binary);
    std::ostringstream text;
    text << stream.rdbuf();
    return text.str();
  }
};

TEST_F(SavedFile, IsReplacedWholeAndLeavesNothingBeside) {
  const auto path = folder_ / "a.toml";
  save(path.string(), "old");
  save(path.string(), "new");
  EXPECT_EQ(text_of(path), "new");
  EXPECT_EQ(std::distance(std::filesystem::directory_iterator(folder_), {}), 1);
}

TEST_F(SavedFile, KeepsALinkALink) {
  const auto path = folder_ / "a.toml", link = folder_ / "b.toml";
  save(path.string(), "old");
  std::filesystem::create_symlink(path, link);
  save(link.string(), "new");
  EXPECT_TRUE(std::filesystem::is_symlink(link));
  EXPECT_EQ(text_of(path), "new");
}

TEST_F(SavedFile, FailsWithoutTouchingTheOldOne) {
  EXPECT_THROW(save((folder_ / "no folder" / "a.toml").string(), "x"), Error);
}

}  // namespace
}  // namespace lossline::linefile
