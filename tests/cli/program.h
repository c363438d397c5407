#pragma once
// The program under test, and where it may write.

#include <stdlib.h>

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <sstream>
#include <string>
#include <vector>

#include "tests/cli/process.h"

namespace lossline::tests {

using Environment = std::vector<std::pair<std::string, std::string>>;

/// A folder of this test's own, removed with it.
class Folder {
 public:
  Folder() {
    std::string pattern = (std::filesystem::temp_directory_path() / "lossline-XXXXXX").string();
    path_ = mkdtemp(pattern.data());
  }
  ~Folder() {
    std::error_code ignored;
    std::filesystem::remove_all(path_, ignored);
  }
  Folder(const Folder&) = delete;
  Folder& operator=(const Folder&) = delete;

  [[nodiscard]] std::string path(const std::string& name) const { return (path_ / name).string(); }
  [[nodiscard]] std::string write(const std::string& name, const std::string& text) const {
    std::ofstream(path_ / name, std::ios::binary) << text;
    return path(name);
  }

 private:
  std::filesystem::path path_;
};

inline std::string content(const std::filesystem::path& path) {
  std::ifstream file(path, std::ios::binary);
  std::ostringstream text;
  text << file.rdbuf();
  return text.str();
}

inline std::string scenario(const std::string& name) {
  return std::string(LOSSLINE_SOURCE_DIR) + "/scenarios/" + name;
}

/// All line files of a folder of the repository, sorted.
inline std::vector<std::filesystem::path> line_files(const std::string& folder) {
  std::vector<std::filesystem::path> out;
  for (const auto& entry :
       std::filesystem::directory_iterator(std::string(LOSSLINE_SOURCE_DIR) + '/' + folder))
    if (entry.path().extension() == ".toml") out.push_back(entry.path());
  std::sort(out.begin(), out.end());
  return out;
}

/// Runs lossline with no user database of the machine it runs on.
inline Outcome lossline(const std::vector<std::string>& arguments, Environment environment = {},
                        const std::function<void(int)>& meanwhile = {}) {
  environment.insert(environment.begin(), {"LOSSLINE_USER_MATERIALS", "/nonexistent/user.db"});
  return run(LOSSLINE_PROGRAM, arguments, environment, meanwhile);
}

}  // namespace lossline::tests
