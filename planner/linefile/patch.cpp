#include "planner/linefile/patch.h"

#include <filesystem>
#include <fstream>

#include "planner/base/quantity_kinds.h"

namespace lossline::linefile {
namespace {

/// The value as TOML: numbers and truth values bare, everything else in quotes.
std::string as_toml(const std::string& value) {
  const bool bare = value == "true" || value == "false" || value.starts_with('[') ||
                    read_quantity(value, quantity::number).value.has_value();
  if (bare) return value;
  std::string quoted = "\"";
  for (const char c : value) {
    if (c == '"' || c == '\\') quoted += '\\';
    quoted += c;
  }
  return quoted + '"';
}

/// Byte behind the last line of the keys of a table itself; npos when it has no head.
std::size_t end_of_table(const LineFile& file, const std::string& table) {
  std::size_t last = std::string::npos;
  for (const auto& [path, at] : file.positions) {
    const bool own = path.size() > table.size() + 1 && path.starts_with(table + '.') &&
                     path.find_first_of(".[", table.size() + 1) == std::string::npos;
    if (!own || at.is_table || at.from_setting) continue;
    // A list of tables has no text of its own.
    if (const auto member = file.positions.find(path + "[1]");
        member != file.positions.end() && member->second.is_table)
      continue;
    if (last == std::string::npos || at.end > last) last = at.end;
  }
  if (last == std::string::npos) return last;
  const std::size_t newline = file.text.find('\n', last);
  return newline == std::string::npos ? file.text.size() : newline + 1;
}

}  // namespace

std::string patched(const LineFile& file, const std::string& key, const std::string& value) {
  std::string text = file.text;
  const auto found = file.positions.find(key);
  if (found != file.positions.end() && !found->second.is_table && !found->second.from_setting) {
    const Position& at = found->second;
    text.replace(at.begin, at.end - at.begin, as_toml(value));
  } else {
    const std::size_t dot = key.rfind('.');
    const std::size_t at =
        dot == std::string::npos ? std::string::npos : end_of_table(file, key.substr(0, dot));
    if (at == std::string::npos)
      throw Error(ErrorKind::not_found,
                  file.path + ": " + key + " is not in the file, and neither is its table");
    std::string added = key.substr(dot + 1) + " = " + as_toml(value) + '\n';
    if (at > 0 && text[at - 1] != '\n') added = '\n' + added;
    text.insert(at, added);
  }
  (void)read_text(text, file.path);
  return text;
}

void save(const std::string& path, const std::string& text) {
  namespace fs = std::filesystem;
  std::error_code error;
  // A link stays a link: the file behind it is replaced.
  const fs::path target = fs::exists(path, error) ? fs::canonical(path, error) : fs::path(path);
  const fs::path fresh = target.string() + ".new";
  {
    std::ofstream stream(fresh, std::ios::binary | std::ios::trunc);
    stream << text;
    stream.flush();
    if (!stream) {
      stream.close();
      fs::remove(fresh, error);
      throw Error(ErrorKind::bad_input, path + ": the file cannot be written");
    }
  }
  std::error_code ignored;
  if (const fs::file_status old = fs::status(target, ignored); fs::is_regular_file(old))
    fs::permissions(fresh, old.permissions(), ignored);
  fs::rename(fresh, target, error);
  if (error) {
    fs::remove(fresh, ignored);
    throw Error(ErrorKind::bad_input, path + ": " + error.message());
  }
}

}  // namespace lossline::linefile
