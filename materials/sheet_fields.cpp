#include "materials/sheet_fields.h"

#include <utility>

#include "materials/units.h"

namespace lossline::materials {

SheetFields::SheetFields(const toml::table& table, std::string file, std::string where,
                         std::vector<Problem>& problems)
    : table_(table), file_(std::move(file)), where_(std::move(where)), problems_(problems) {}

Place SheetFields::place() const {
  return {file_, static_cast<int>(table_.source().begin.line)};
}

int SheetFields::line_of(const std::string& key) const {
  const toml::node* found = table_.get(key);
  const auto line = found != nullptr ? found->source().begin.line : table_.source().begin.line;
  return static_cast<int>(line);
}

void SheetFields::fault(const std::string& key, const std::string& wrong,
                        const std::string& right) const {
  problems_.push_back({file_, line_of(key), 0, where_ + "." + key, wrong, right});
}

const toml::node* SheetFields::node(const char* key, bool required) {
  read_.insert(key);
  const toml::node* found = table_.get(key);
  if (found == nullptr && required) fault(key, "missing", "state it");
  return found;
}

std::string SheetFields::text(const char* key, bool required) {
  const toml::node* found = node(key, required);
  if (found == nullptr) return {};
  if (const auto value = found->value<std::string>(); value && found->is_string()) {
    if (value->empty() && required) fault(key, "empty", "state it");
    return *value;
  }
  fault(key, "not a text", "write it in quotation marks");
  return {};
}

std::string SheetFields::text_or(const char* key, const char* fallback) {
  std::string value = text(key, false);
  return value.empty() ? fallback : value;
}

std::optional<double> SheetFields::number(const char* key, bool required) {
  const toml::node* found = node(key, required);
  if (found == nullptr) return std::nullopt;
  if (const auto value = found->value<double>(); value && found->is_number()) return *value;
  fault(key, "not a number", "a plain number");
  return std::nullopt;
}

bool SheetFields::truth(const char* key) {
  const toml::node* found = node(key, false);
  if (found == nullptr) return false;
  if (const auto value = found->value<bool>(); value && found->is_boolean()) return *value;
  fault(key, "neither true nor false", "true or false");
  return false;
}

std::vector<std::string> SheetFields::texts(const char* key) {
  std::vector<std::string> out;
  const toml::node* found = node(key, false);
  if (found == nullptr) return out;
  if (const toml::array* array = found->as_array()) {
    for (const toml::node& item : *array) {
      if (const auto value = item.value<std::string>())
        out.push_back(*value);
      else
        fault(key, "holds something that is not a text", "a list of texts");
    }
  } else {
    fault(key, "not a list", "a list of texts");
  }
  return out;
}

std::optional<double> SheetFields::quantity(const char* key, const std::string& si, bool required,
                                            std::string* printed, std::string* si_out) {
  const std::string written = text(key, required);
  if (written.empty()) return std::nullopt;
  const auto value = unit_value(written);
  if (!value) {
    fault(key, "'" + written + "' is not a number with a known unit",
          "number, space, unit; units: " + known_units());
    return std::nullopt;
  }
  if (!si.empty() && value->si != si) {
    fault(key, "'" + written + "' is in " + value->si, "a unit of " + si);
    return std::nullopt;
  }
  if (printed != nullptr) *printed = written;
  if (si_out != nullptr) *si_out = value->si;
  return value->value;
}

const toml::table* SheetFields::table(const char* key) {
  const toml::node* found = node(key, false);
  if (found == nullptr) return nullptr;
  if (found->as_table() == nullptr) fault(key, "not a table", "a table");
  return found->as_table();
}

std::vector<const toml::table*> SheetFields::tables(const char* key) {
  std::vector<const toml::table*> out;
  const toml::node* found = node(key, false);
  if (found == nullptr) return out;
  if (const toml::array* array = found->as_array())
    for (const toml::node& item : *array)
      if (item.as_table() != nullptr) out.push_back(item.as_table());
  if (out.empty()) fault(key, "not a list of tables", "[[" + std::string(key) + "]]");
  return out;
}

SheetProvenance SheetFields::provenance(const SheetProvenance& defaults) {
  SheetProvenance out;
  out.evidence = text("evidence");
  out.grade = text("grade");
  out.source = text("source", false);
  out.locator = text("locator", false);
  out.reprint = text("reprint", false);
  out.reprint_locator = text("reprint_locator", false);
  out.discrepancy = text("discrepancy", false);
  out.note = text("note", false);
  out.entered_by = text_or("entered_by", defaults.entered_by.c_str());
  out.entered_on = text_or("entered_on", defaults.entered_on.c_str());
  return out;
}

void SheetFields::refuse_unknown() const {
  for (const auto& [key, value] : table_) {
    const std::string name(key.str());
    if (!read_.contains(name)) fault(name, "unknown key", "remove it or mend its spelling");
  }
}

}  // namespace lossline::materials
