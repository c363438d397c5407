#include "planner/linefile/read.h"

#include <fmt/format.h>

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <sstream>
#include <tuple>
#include <utility>

#include "planner/linefile/checks.h"
#include "planner/linefile/document.h"
#include "planner/linefile/guard.h"
#include "planner/linefile/keys.h"
#include "planner/linefile/table_reader.h"

namespace lossline::linefile {
namespace {

const std::string format_line = fmt::format("write format = {} in the first line", format_version);

[[noreturn]] void refuse(ErrorKind kind, const std::string& path, std::string wrong,
                         std::string right) {
  throw InputError(kind, {{path, 0, 0, "", std::move(wrong), std::move(right)}});
}

std::string whole_text(const std::string& path) {
  std::error_code error;
  if (!std::filesystem::exists(path, error))
    refuse(ErrorKind::not_found, path, "there is no such file", "check the path");
  if (std::filesystem::is_directory(path, error))
    refuse(ErrorKind::not_found, path, "this is a folder", "name a line file in it");
  std::ifstream stream(path, std::ios::binary);
  std::ostringstream text;
  if (stream && stream.peek() != std::ifstream::traits_type::eof()) text << stream.rdbuf();
  if (!stream.eof() && !stream)
    refuse(ErrorKind::not_found, path, "the file cannot be read", "check its permissions");
  return std::move(text).str();
}

/// Whether the file is of the version that this program reads.
bool check_format(Node& root, Findings& findings) {
  const Entry* entry = find(root, "format");
  if (entry == nullptr) {
    findings.problems.push_back(
        {findings.file, 0, 0, "format", "is missing, so this may be no line file", format_line});
    return false;
  }
  const Node& node = entry->node;
  const bool number = node.kind == NodeKind::number;
  if (number && node.number == format_version) {
    std::erase_if(root.entries, [](const Entry& e) { return e.key == "format"; });
    return true;
  }
  findings.problems.push_back(
      {node.place.from_setting ? setting_place : findings.file, node.place.line, node.place.column,
       "format",
       number ? fmt::format("this program reads format {} and this is {:g}", format_version,
                            node.number)
              : "this is not a version number",
       number && node.number > format_version ? "use a newer Lossline" : format_line});
  return false;
}

void throw_if_any(Findings& findings) {
  if (findings.problems.empty()) return;
  sort_problems(findings.problems);
  throw InputError(ErrorKind::bad_line_file, std::move(findings.problems));
}

}  // namespace

void sort_problems(std::vector<Problem>& problems) {
  std::stable_sort(problems.begin(), problems.end(), [](const Problem& a, const Problem& b) {
    return std::tie(a.line, a.column) < std::tie(b.line, b.column);
  });
}

LineFile read_text(std::string text, const std::string& path, std::span<const Setting> settings) {
  Findings findings;
  findings.file = path;
  if (const auto fault = guard(text)) {
    findings.problems.push_back({path, fault->line, fault->column, "", fault->wrong, fault->right});
    throw_if_any(findings);
  }
  Node root = parse_document(text, path, findings.problems);
  throw_if_any(findings);
  apply_settings(root, settings, findings.problems);
  if (!check_format(root, findings)) throw_if_any(findings);

  LineFile file;
  file.positions = positions_of(root);
  TableReader reader(root, {}, "", findings);
  line_file_fields(reader, file.line);
  reader.finish();

  Checker checker(file.line, file.positions, findings);
  check_duty(checker);
  check_geometry(checker);
  check_power(checker);
  check_air(checker);
  check_names(checker);
  throw_if_any(findings);
  file.text = std::move(text);
  file.path = path;
  return file;
}

LineFile read(const std::string& path, std::span<const Setting> settings) {
  return read_text(whole_text(path), path, settings);
}

Problem locate(const LineFile& file, const std::string& key, std::string wrong, std::string right) {
  return placed(file.path, file.positions, key, std::move(wrong), std::move(right));
}

}  // namespace lossline::linefile
