#pragma once
// What several tests of the materials need: the built database, the schema, a folder of its own.

#include <unistd.h>

#include <filesystem>
#include <fstream>
#include <sstream>
#include <string>

#include "materials/store.h"
#include "planner/base/error.h"

namespace lossline::materials::test {

/// The shipped database of this build.
inline std::string shipped() {
  return LOSSLINE_MATERIALS_DB;
}
inline std::string data_folder() {
  return LOSSLINE_SOURCE_DIR "/materials/data";
}
inline std::string schema_file() {
  return LOSSLINE_SOURCE_DIR "/materials/schema.sql";
}

inline std::string read_text(const std::string& path) {
  std::ifstream in(path, std::ios::binary);
  std::ostringstream text;
  text << in.rdbuf();
  return text.str();
}

inline void write_text(const std::string& path, const std::string& text) {
  std::filesystem::create_directories(std::filesystem::path(path).parent_path());
  std::ofstream(path, std::ios::binary) << text;
}

/// A folder that goes away with the object.
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
  [[nodiscard]] std::string operator/(const std::string& name) const { return path_ + "/" + name; }

 private:
  std::string path_;
};

/// The message of the Error a call throws; empty when it throws none.
template <class Call>
std::string message_of(Call call) {
  try {
    call();
  } catch (const Error& error) {
    return error.what();
  }
  return {};
}

}  // namespace lossline::materials::test
