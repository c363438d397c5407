#include "planner/linefile/table_reader.h"

#include <fmt/format.h>

#include <utility>

#include "planner/base/nearest.h"
#include "planner/linefile/positions.h"
#include "planner/linefile/settings.h"

namespace lossline::linefile {
namespace {

bool plain(const QuantityKind& kind) {
  return kind.form == QuantityForm::number || kind.form == QuantityForm::count;
}

/// What a node is, for messages about wrong types.
std::string description(const Node& node) {
  switch (node.kind) {
    case NodeKind::text:
      return '"' + node.text + "\" is a text";
    case NodeKind::number:
      return fmt::format("{:g} is a number without unit", node.number);
    case NodeKind::flag:
      return node.flag ? "true is neither number nor text" : "false is neither number nor text";
    case NodeKind::list:
      return "this is a list";
    case NodeKind::table:
      return "this is a table";
    case NodeKind::other:
      break;
  }
  return "this is no value of a line file";
}

/// The text as the user wrote it, the same in the file and on the command line.
std::string quoted(const std::string& text) {
  return '"' + text + '"';
}

}  // namespace

std::string as_in_file(const QuantityKind& kind) {
  return plain(kind) ? std::string(kind.example) : quoted(std::string(kind.example));
}

TableReader::TableReader(const Node& node, const Place& place, std::string path, Findings& findings)
    : node_(node), place_(place), path_(std::move(path)), findings_(findings) {}

std::string TableReader::path_of(const std::string& key) const {
  return path_.empty() ? key : path_ + '.' + key;
}

std::string TableReader::name() const {
  if (path_.empty()) return "a line file";
  const std::size_t number = path_.ends_with(']') ? path_.rfind('[') : std::string::npos;
  return number == std::string::npos ? '[' + path_ + ']' : "[[" + path_.substr(0, number) + "]]";
}

bool TableReader::report(const Place& place, const std::string& key, std::string wrong,
                         std::string right) {
  findings_.bad.insert(key);
  findings_.problems.push_back({place.from_setting ? setting_place : findings_.file, place.line,
                                place.column, key, std::move(wrong), std::move(right)});
  return false;
}

const Entry* TableReader::ask(const char* key) {
  asked_.emplace_back(key);
  return find(node_, key);
}

bool TableReader::missing(const char* key, const std::string& as_in) {
  return report(place_, path_of(key), "is missing", "write it as in " + as_in);
}

const Entry* TableReader::ask(const char* key, Need need, const std::string& as_in) {
  const Entry* entry = ask(key);
  if (entry == nullptr && need == Need::required) missing(key, as_in);
  return entry;
}

bool TableReader::read_text(const std::string& key, const Node& node, const std::string& text,
                            double& value, const Range& range) {
  std::string written = text;
  if (range.kind.dimension == quantity::energy_price.dimension && currency_ != "CU")
    if (const std::size_t at = written.find(currency_);
        !currency_.empty() && at != std::string::npos)
      written.replace(at, currency_.size(), "CU");
  const QuantityResult result = read_quantity(written, range.kind);
  if (!result.value) {
    Place place = node.place;
    if (!place.from_setting) place.column += static_cast<int>(result.fault.column);
    return report(place, key, result.fault.wrong, result.fault.right);
  }
  value = *result.value;
  return true;
}

bool TableReader::read(const std::string& key, const Node& node, double& value,
                       const Range& range) {
  double read = 0;
  std::string written;
  if (node.kind == NodeKind::text && (node.place.from_setting || !plain(range.kind))) {
    written = quoted(node.text);
    if (!read_text(key, node, node.text, read, range)) return false;
  } else if (node.kind == NodeKind::number && plain(range.kind)) {
    written = fmt::format("{:.10g}", node.number);
    read = node.number;
    if (range.kind.form == QuantityForm::count && !read_text(key, node, written, read, range))
      return false;
  } else {
    return report(node.place, key, description(node),
                  fmt::format("write {} {} quotes, as in {}", range.kind.noun,
                              plain(range.kind) ? "without" : "in", as_in_file(range.kind)));
  }
  if (!range.holds(read))
    return report(node.place, key,
                  fmt::format("{} {} is outside {} to {}", range.name, written,
                              format_quantity(range.low, range.kind),
                              format_quantity(range.high, range.kind)),
                  range.reason);
  value = read;
  return true;
}

bool TableReader::required(const char* key, double& value, const Range& range) {
  const Entry* entry =
      ask(key, Need::required, fmt::format("{} = {}", key, as_in_file(range.kind)));
  return entry != nullptr && read(path_of(key), entry->node, value, range);
}

bool TableReader::optional(const char* key, double& value, const Range& range, double) {
  const Entry* entry = ask(key);
  return entry != nullptr && read(path_of(key), entry->node, value, range);
}

bool TableReader::optional(const char* key, std::optional<double>& value, const Range& range) {
  const Entry* entry = ask(key);
  double read_value = 0;
  if (entry == nullptr || !read(path_of(key), entry->node, read_value, range)) return false;
  value = read_value;
  return true;
}

bool TableReader::power(const char* key, double& value, double whole, const Range& range,
                        Need need) {
  const Entry* entry = ask(key, need, fmt::format("{} = \"52 kW\" or \"70 %\"", key));
  if (entry == nullptr) return false;
  if (entry->node.kind == NodeKind::text && entry->node.text.ends_with('%')) {
    double part = 0;
    if (!read(path_of(key), entry->node, part, range::feed_share)) return false;
    value = part * whole;
    return true;
  }
  return read(path_of(key), entry->node, value, range);
}

bool TableReader::text(const char* key, std::string& value, Need need) {
  const Entry* entry = ask(key, need, fmt::format("{} = \"...\"", key));
  if (entry == nullptr) return false;
  if (entry->node.kind != NodeKind::text)
    return report(entry->node.place, path_of(key), description(entry->node),
                  "write a text in quotes");
  if (need == Need::required && entry->node.text.empty())
    return report(entry->node.place, path_of(key), "is empty", "give it some text");
  value = entry->node.text;
  return true;
}

bool TableReader::flag(const char* key, bool& value) {
  const Entry* entry = ask(key);
  if (entry == nullptr) return false;
  const Node& node = entry->node;
  const bool set = node.kind == NodeKind::text && node.place.from_setting;
  if (node.kind != NodeKind::flag && !(set && (node.text == "true" || node.text == "false")))
    return report(node.place, path_of(key), description(node),
                  set ? "give true or false" : "write true or false, without quotes");
  value = set ? node.text == "true" : node.flag;
  return true;
}

bool TableReader::word(const char* key, std::span<const std::string> words, std::size_t& index,
                       Need need) {
  const Entry* entry = ask(key, need, fmt::format("{} = \"{}\"", key, words.front()));
  if (entry == nullptr) return false;
  const Node& node = entry->node;
  if (node.kind != NodeKind::text)
    return report(node.place, path_of(key), description(node),
                  "write one of " + listed(words) + ", in quotes");
  for (std::size_t i = 0; i < words.size(); ++i) {
    if (words[i] != node.text) continue;
    index = i;
    return true;
  }
  const std::string meant = nearest(node.text, words);
  return report(node.place, path_of(key), quoted(node.text) + " is not a word known here",
                meant.empty() ? "write one of " + listed(words) : "did you mean '" + meant + "'?");
}

bool TableReader::texts(const char* key, std::vector<std::string>& values, Need need) {
  const Entry* entry = ask(key, need, fmt::format("{} = [\"...\"]", key));
  if (entry == nullptr) return false;
  const Node& node = entry->node;
  if (node.kind == NodeKind::text && node.place.from_setting) {
    std::size_t begin = 0;
    while (begin <= node.text.size()) {
      const std::size_t end = std::min(node.text.find(',', begin), node.text.size());
      const std::size_t first = std::min(node.text.find_first_not_of(' ', begin), end);
      std::string item = node.text.substr(first, end - first);
      while (item.ends_with(' ')) item.pop_back();
      values.push_back(std::move(item));
      begin = end + 1;
    }
    return true;
  }
  if (node.kind != NodeKind::list)
    return report(node.place, path_of(key), description(node),
                  "write a list in brackets, as in [\"...\", \"...\"]");
  bool good = true;
  for (std::size_t i = 0; i < node.items.size(); ++i) {
    if (node.items[i].kind == NodeKind::text)
      values.push_back(node.items[i].text);
    else
      good = report(node.items[i].place, member_path(path_of(key), i), description(node.items[i]),
                    "write a text in quotes");
  }
  if (!good) findings_.bad.insert(path_of(key));
  return good;
}

bool TableReader::shares(const char* key, std::vector<double>& values) {
  std::vector<std::string> written;
  const Entry* entry = find(node_, key);
  if (!texts(key, written, Need::optional)) return false;
  bool good = true;
  for (std::size_t i = 0; i < written.size(); ++i) {
    Node item = entry->node.kind == NodeKind::list ? entry->node.items[i] : entry->node;
    item.text = written[i];
    double value = 0;
    good &= read(member_path(path_of(key), i), item, value, range::feed_share);
    values.push_back(value);
  }
  if (!good) findings_.bad.insert(path_of(key));
  return good;
}

}  // namespace lossline::linefile
