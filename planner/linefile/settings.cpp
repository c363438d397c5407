#include "planner/linefile/settings.h"

#include <charconv>
#include <optional>

#include "planner/base/nearest.h"

namespace lossline::linefile {
namespace {

std::string trimmed(const std::string& text) {
  const std::size_t begin = text.find_first_not_of(" \t");
  if (begin == std::string::npos) return {};
  return text.substr(begin, text.find_last_not_of(" \t") - begin + 1);
}

Place no_place() {
  Place place;
  place.from_setting = true;
  return place;
}

std::vector<std::string> names_of(const Node& list) {
  std::vector<std::string> names;
  for (const Node& item : list.items)
    if (const Entry* name = find(item, "name"); name != nullptr) names.push_back(name->node.text);
  return names;
}

/// "[3]" at the front of the rest: the number, and the rest after it.
std::optional<std::size_t> take_number(std::string_view& rest) {
  if (!rest.starts_with('[')) return std::nullopt;
  std::size_t number = 0;
  const char* const end = rest.data() + rest.size();
  const auto [next, error] = std::from_chars(rest.data() + 1, end, number);
  if (error != std::errc{} || next == end || *next != ']') return std::nullopt;
  rest.remove_prefix(static_cast<std::size_t>(next - rest.data()) + 1);
  return number;
}

/// Follows one path down the tree.
class Walk {
 public:
  Walk(const Setting& setting, std::vector<Problem>& problems)
      : setting_(setting), problems_(problems), rest_(setting.key) {}

  void from(Node& root) {
    Node* table = &root;
    while (table != nullptr) {
      const std::size_t end = std::min(rest_.find_first_of(".["), rest_.size());
      const std::string key(rest_.substr(0, end));
      rest_.remove_prefix(end);
      if (key.empty()) return fail("is not the path of a key", "write it as in belt.speed");
      Entry* entry = find(*table, key);
      if (rest_.empty()) return put(*table, entry, key);
      if (entry == nullptr) {
        table->entries.push_back({key, no_place(), {}});
        entry = &table->entries.back();
        entry->node.kind = NodeKind::table;
        entry->node.place = no_place();
      }
      table = entry->node.kind == NodeKind::list ? member(entry->node, key) : &entry->node;
      if (table == nullptr) return;
      if (table->kind != NodeKind::table || !rest_.starts_with('.'))
        return fail("leads through a value that is no table", "write it as in belt.speed");
      rest_.remove_prefix(1);
    }
  }

 private:
  const Setting& setting_;
  std::vector<Problem>& problems_;
  std::string_view rest_;

  void fail(std::string wrong, std::string right) {
    problems_.push_back({setting_place, 0, 0, setting_.key, std::move(wrong), std::move(right)});
  }

  /// The member of a list of tables that the rest of the path names; null after a complaint.
  Node* member(Node& list, const std::string& key) {
    if (rest_.starts_with('[')) {
      const auto number = take_number(rest_);
      if (number && *number >= 1 && *number <= list.items.size()) return &list.items[*number - 1];
      fail("has no such member",
           key + " has members [1] to [" + std::to_string(list.items.size()) + ']');
      return nullptr;
    }
    // The longest name wins, so that a name may contain the beginning of another.
    Node* found = nullptr;
    std::size_t longest = 0;
    for (Node& item : list.items) {
      const Entry* name = find(item, "name");
      if (name == nullptr || name->node.text.size() < longest) continue;
      if (rest_.starts_with('.' + name->node.text + '.')) {
        found = &item;
        longest = name->node.text.size();
      }
    }
    if (found != nullptr) {
      rest_.remove_prefix(longest + 1);
      return found;
    }
    const std::vector<std::string> names = names_of(list);
    fail("names no member of " + key, names.empty() ? "give its number, as in " + key + "[1]"
                                                    : "the names are " + listed(names));
    return nullptr;
  }

  void put(Node& table, Entry* entry, const std::string& key) {
    if (entry != nullptr && (entry->node.kind == NodeKind::table ||
                             (entry->node.kind == NodeKind::list && !entry->node.items.empty() &&
                              entry->node.items[0].kind == NodeKind::table)))
      return fail("is a table, not a value", "name one of its keys");
    Node value;
    value.kind = NodeKind::text;
    value.text = setting_.value;
    value.place = no_place();
    if (entry == nullptr)
      table.entries.push_back({key, no_place(), std::move(value)});
    else
      entry->node = std::move(value);
  }
};

}  // namespace

Setting setting_from(const std::string& text) {
  const std::size_t equals = text.find('=');
  Setting setting;
  if (equals != std::string::npos)
    setting = {trimmed(text.substr(0, equals)), trimmed(text.substr(equals + 1))};
  if (setting.key.empty())
    throw Error(
        ErrorKind::bad_input,
        "--set '" + text + "' is not key=value; write it as in --set 'belt.speed=2.4 m/min'");
  return setting;
}

void apply_settings(Node& root, std::span<const Setting> settings, std::vector<Problem>& problems) {
  for (const Setting& setting : settings) Walk(setting, problems).from(root);
}

}  // namespace lossline::linefile
