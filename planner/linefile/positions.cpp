#include "planner/linefile/positions.h"

#include <utility>

#include "planner/linefile/settings.h"

namespace lossline::linefile {
namespace {

Position position_of(const Place& key, const Node& node) {
  Position out;
  out.line = key.line;
  out.column = key.column;
  out.value_line = node.place.line;
  out.value_column = node.place.column;
  out.begin = node.place.begin;
  out.end = node.place.end;
  out.is_table = node.kind == NodeKind::table;
  out.from_setting = node.place.from_setting;
  return out;
}

void walk(const Node& table, const std::string& path, Positions& out) {
  for (const Entry& entry : table.entries) {
    const std::string key = path.empty() ? entry.key : path + '.' + entry.key;
    out[key] = position_of(entry.place, entry.node);
    if (entry.node.kind == NodeKind::table) walk(entry.node, key, out);
    for (std::size_t i = 0; i < entry.node.items.size(); ++i) {
      const Node& item = entry.node.items[i];
      const std::string member = member_path(key, i);
      out[member] = position_of(item.place, item);
      if (item.kind == NodeKind::table) walk(item, member, out);
    }
  }
}

}  // namespace

std::string member_path(const std::string& list, std::size_t index) {
  return list + '[' + std::to_string(index + 1) + ']';
}

Positions positions_of(const Node& root) {
  Positions out;
  walk(root, "", out);
  return out;
}

Problem placed(const std::string& file, const Positions& positions, const std::string& key,
               std::string wrong, std::string right) {
  Problem problem{file, 0, 0, key, std::move(wrong), std::move(right)};
  std::string path = key;
  while (!path.empty()) {
    if (const auto found = positions.find(path); found != positions.end()) {
      const Position& at = found->second;
      if (at.from_setting) {
        problem.file = setting_place;
      } else {
        const bool value = path == key && !at.is_table && at.value_line > 0;
        problem.line = value ? at.value_line : at.line;
        problem.column = value ? at.value_column : at.column;
      }
      return problem;
    }
    const std::size_t cut = path.find_last_of(".[");
    path = cut == std::string::npos ? "" : path.substr(0, cut);
  }
  return problem;
}

}  // namespace lossline::linefile
