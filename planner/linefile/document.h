#pragma once
// The text of a line file as a tree of tables and values, each with its place. Knows TOML, knows
// nothing about lines; only its .cpp sees the TOML library.

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

#include "planner/base/error.h"

namespace lossline::linefile {

/// Where something stands.
struct Place {
  int line = 0, column = 0;        ///< 1-based, columns in code points; 0 when not in the file
  std::size_t begin = 0, end = 0;  ///< bytes in the text, of values only
  bool from_setting = false;       ///< came with --set, not from the file
};

enum class NodeKind { text, number, flag, list, table, other };

struct Entry;

/// A value or table. Members not used by its kind stay empty.
struct Node {
  NodeKind kind = NodeKind::other;
  std::string text;  ///< of a text; of a setting: as the user wrote it
  double number = 0;
  bool flag = false;
  std::vector<Node> items;     ///< of a list, in order
  std::vector<Entry> entries;  ///< of a table, in file order
  Place place;
};

/// A key of a table with what it holds.
struct Entry {
  std::string key;
  Place place;  ///< of the key
  Node node;
};

/// The entry of a table; null when absent.
[[nodiscard]] const Entry* find(const Node& table, std::string_view key);
[[nodiscard]] Entry* find(Node& table, std::string_view key);

/// Reads the text after guard has passed it.
///
///   text      UTF-8 TOML
///   file      its name, for messages
///   problems  receives the syntax error, if any
///   returns   the root table; empty after an error
[[nodiscard]] Node parse_document(std::string_view text, const std::string& file,
                                  std::vector<Problem>& problems);

}  // namespace lossline::linefile
