#include "planner/linefile/document.h"

#include <toml++/toml.h>

#include <algorithm>
#include <cmath>

namespace lossline::linefile {
namespace {

/// Byte offsets of line and column.
class Offsets {
 public:
  explicit Offsets(std::string_view text) : text_(text) {
    lines_.push_back(0);
    for (std::size_t i = 0; i < text.size(); ++i)
      if (text[i] == '\n') lines_.push_back(i + 1);
  }

  [[nodiscard]] std::size_t at(toml::source_position position) const {
    if (position.line < 1 || position.line > lines_.size()) return text_.size();
    std::size_t i = lines_[position.line - 1];
    if (i == 0 && text_.starts_with("\xEF\xBB\xBF")) i = 3;
    for (toml::source_index c = 1; c < position.column && i < text_.size(); ++c) {
      ++i;
      while (i < text_.size() && (static_cast<unsigned char>(text_[i]) & 0xC0) == 0x80) ++i;
    }
    return i;
  }

 private:
  std::string_view text_;
  std::vector<std::size_t> lines_;
};

Place place_of(const toml::source_region& region, const Offsets& offsets) {
  Place place;
  place.line = static_cast<int>(region.begin.line);
  place.column = static_cast<int>(region.begin.column);
  place.begin = offsets.at(region.begin);
  place.end = offsets.at(region.end);
  return place;
}

Node converted(const toml::node& from, const Offsets& offsets);

void convert_table(const toml::table& from, const Offsets& offsets, Node& to) {
  for (const auto& [key, value] : from) {
    Entry entry;
    entry.key = std::string(key.str());
    entry.place = place_of(key.source(), offsets);
    entry.node = converted(value, offsets);
    to.entries.push_back(std::move(entry));
  }
  std::stable_sort(to.entries.begin(), to.entries.end(),
                   [](const Entry& a, const Entry& b) { return a.place.begin < b.place.begin; });
}

Node converted(const toml::node& from, const Offsets& offsets) {
  Node to;
  to.place = place_of(from.source(), offsets);
  if (const auto* text = from.as_string()) {
    to.kind = NodeKind::text;
    to.text = text->get();
  } else if (const auto* real = from.as_floating_point()) {
    to.kind = NodeKind::number;
    to.number = real->get();
  } else if (const auto* whole = from.as_integer()) {
    to.kind = NodeKind::number;
    to.number = static_cast<double>(whole->get());
  } else if (const auto* flag = from.as_boolean()) {
    to.kind = NodeKind::flag;
    to.flag = flag->get();
  } else if (const auto* list = from.as_array()) {
    to.kind = NodeKind::list;
    for (const auto& item : *list) to.items.push_back(converted(item, offsets));
  } else if (const auto* table = from.as_table()) {
    to.kind = NodeKind::table;
    convert_table(*table, offsets, to);
  }
  return to;
}

}  // namespace

const Entry* find(const Node& table, std::string_view key) {
  for (const Entry& entry : table.entries)
    if (entry.key == key) return &entry;
  return nullptr;
}

Entry* find(Node& table, std::string_view key) {
  for (Entry& entry : table.entries)
    if (entry.key == key) return &entry;
  return nullptr;
}

Node parse_document(std::string_view text, const std::string& file,
                    std::vector<Problem>& problems) {
  try {
    const toml::table root = toml::parse(text, std::string_view(file));
    Node node = converted(root, Offsets(text));
    node.place = {};
    return node;
  } catch (const toml::parse_error& error) {
    const toml::source_position at = error.source().begin;
    problems.push_back({file, static_cast<int>(at.line), static_cast<int>(at.column), "",
                        "this is not TOML: " + std::string(error.description()),
                        "write key = value, one to a line, below the [table] it belongs to"});
    Node empty;
    empty.kind = NodeKind::table;
    return empty;
  }
}

}  // namespace lossline::linefile
