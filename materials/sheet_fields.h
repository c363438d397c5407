#pragma once
// Access to one TOML table of an authored sheet that notes every fault with its line instead of
// stopping at the first, and knows which keys nobody asked for.

#include <toml++/toml.h>

#include <optional>
#include <set>
#include <string>
#include <vector>

#include "materials/sheets.h"

namespace lossline::materials {

/// One table. Missing required keys and values of the wrong kind become problems; the returned
/// value is then empty or zero and must not be used once problems exist.
class SheetFields {
 public:
  SheetFields(const toml::table& table, std::string file, std::string where,
              std::vector<Problem>& problems);

  [[nodiscard]] Place place() const;
  [[nodiscard]] std::string text(const char* key, bool required = true);
  [[nodiscard]] std::string text_or(const char* key, const char* fallback);
  [[nodiscard]] std::optional<double> number(const char* key, bool required = false);
  [[nodiscard]] bool truth(const char* key);
  [[nodiscard]] std::vector<std::string> texts(const char* key);
  /// A value with a unit, "20 degC", that must come out in the SI unit `si` (any when empty).
  [[nodiscard]] std::optional<double> quantity(const char* key, const std::string& si,
                                               bool required = false,
                                               std::string* printed = nullptr,
                                               std::string* si_out = nullptr);
  [[nodiscard]] const toml::table* table(const char* key);
  [[nodiscard]] std::vector<const toml::table*> tables(const char* key);
  [[nodiscard]] SheetProvenance provenance(const SheetProvenance& defaults);
  void fault(const std::string& key, const std::string& wrong, const std::string& right) const;
  /// Reports every key that nobody read.
  void refuse_unknown() const;

  [[nodiscard]] const std::string& file() const { return file_; }
  [[nodiscard]] const toml::table& raw() const { return table_; }

 private:
  [[nodiscard]] const toml::node* node(const char* key, bool required);
  [[nodiscard]] int line_of(const std::string& key) const;

  const toml::table& table_;
  std::string file_, where_;
  std::vector<Problem>& problems_;
  std::set<std::string> read_;
};

}  // namespace lossline::materials
