// The part of the reader that goes from table to table and reports what nobody asked for.

#include <fmt/format.h>

#include "planner/base/nearest.h"
#include "planner/linefile/positions.h"
#include "planner/linefile/table_reader.h"

namespace lossline::linefile {

void TableReader::idle(std::span<const char* const> keys, const std::string& why) {
  for (const char* key : keys)
    if (const Entry* entry = ask(key))
      report(entry->place, path_of(key), "means nothing here", why);
}

void TableReader::forgive(std::span<const char* const> keys) {
  for (const char* key : keys) (void)ask(key);
}

bool TableReader::table(const char* key, bool, Need need, const Visit& visit) {
  const Entry* entry = ask(key);
  if (entry == nullptr) {
    if (need == Need::required)
      report(place_, path_of(key), "the table is missing",
             fmt::format("begin it with [{}]", path_of(key)));
    return false;
  }
  if (entry->node.kind != NodeKind::table)
    return report(entry->place, path_of(key),
                  entry->node.kind == NodeKind::list ? "there is one of these in a line, not a list"
                                                     : "is a table, not a value",
                  fmt::format("begin it with [{}]", path_of(key)));
  TableReader reader(entry->node, entry->place, path_of(key), findings_);
  visit(reader);
  reader.finish();
  return true;
}

void TableReader::tables(const char* key, std::size_t, Need need,
                         const std::function<void(Fields&, std::size_t)>& visit) {
  const Entry* entry = ask(key);
  const std::string head = fmt::format("begin each with [[{}]]", path_of(key));
  if (entry == nullptr) {
    if (need == Need::required) report(place_, path_of(key), "there is none", head);
    return;
  }
  bool good = entry->node.kind == NodeKind::list;
  for (const Node& item : entry->node.items) good = good && item.kind == NodeKind::table;
  if (!good) {
    report(entry->place, path_of(key), "is a list of tables, and this is not", head);
    return;
  }
  for (std::size_t i = 0; i < entry->node.items.size(); ++i) {
    const Node& item = entry->node.items[i];
    TableReader reader(item, item.place, member_path(path_of(key), i), findings_);
    visit(reader, i);
    reader.finish();
  }
}

void TableReader::finish() {
  for (const Entry& entry : node_.entries) {
    bool known = false;
    for (const std::string& key : asked_) known = known || key == entry.key;
    if (known) continue;
    const std::string meant = nearest(entry.key, asked_);
    report(entry.node.place.from_setting ? entry.node.place : entry.place, path_of(entry.key),
           "is not a key of " + name(),
           meant.empty() ? "its keys are " + listed(asked_) : "did you mean '" + meant + "'?");
  }
}

}  // namespace lossline::linefile
