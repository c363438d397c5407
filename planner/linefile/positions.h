#pragma once
// Where every key of a line file stands, by its dotted path.

#include <cstddef>
#include <map>
#include <string>

#include "planner/base/error.h"
#include "planner/linefile/document.h"

namespace lossline::linefile {

/// Places of one key and its value.
struct Position {
  int line = 0, column = 0;              ///< of the key, or of the table's head; 1-based
  int value_line = 0, value_column = 0;  ///< of the value
  std::size_t begin = 0, end = 0;        ///< bytes of the value, quotes included
  bool is_table = false;
  bool from_setting = false;  ///< given with --set; the numbers above are 0
};

/// By path: "belt.speed", "stretch[2].length", "generator[1].feeds[2]"; tables are in it too.
using Positions = std::map<std::string, Position>;

[[nodiscard]] Positions positions_of(const Node& root);

/// A problem at the value of a key. Where the key is absent it stands at the nearest table around
/// it; where that is absent too, at the whole file.
[[nodiscard]] Problem placed(const std::string& file, const Positions& positions,
                             const std::string& key, std::string wrong, std::string right);

/// "stretch[2]" of "stretch", 1: paths count from one.
[[nodiscard]] std::string member_path(const std::string& list, std::size_t index);

}  // namespace lossline::linefile
