#pragma once
// Reads tables of a document strictly: every key is asked for by a description (keys.h), and what
// nobody asked for is reported with the key that was probably meant.

#include <set>
#include <string>
#include <vector>

#include "planner/linefile/document.h"
#include "planner/linefile/fields.h"

namespace lossline::linefile {

/// What reading collects across all tables of a file.
struct Findings {
  std::string file;
  std::vector<Problem> problems;
  std::set<std::string> bad;  ///< paths of keys with a problem, missing ones included
};

class TableReader final : public Fields {
 public:
  /// node      a table
  /// place     where a message about the whole table points
  /// path      dotted path of the table; empty for the root
  TableReader(const Node& node, const Place& place, std::string path, Findings& findings);

  /// Reports the keys that nobody asked for.
  void finish();

  [[nodiscard]] bool reading() const override { return true; }
  bool required(const char* key, double& value, const Range& range) override;
  bool optional(const char* key, double& value, const Range& range, double fallback) override;
  bool optional(const char* key, std::optional<double>& value, const Range& range) override;
  bool power(const char* key, double& value, double whole, const Range& range, Need need) override;
  bool text(const char* key, std::string& value, Need need) override;
  bool flag(const char* key, bool& value) override;
  bool word(const char* key, std::span<const std::string> words, std::size_t& index,
            Need need) override;
  bool texts(const char* key, std::vector<std::string>& values, Need need) override;
  bool shares(const char* key, std::vector<double>& values) override;
  void idle(std::span<const char* const> keys, const std::string& why) override;
  void forgive(std::span<const char* const> keys) override;
  void money(const std::string& currency) override { currency_ = currency; }
  bool table(const char* key, bool present, Need need, const Visit& visit) override;
  void tables(const char* key, std::size_t count, Need need,
              const std::function<void(Fields&, std::size_t)>& visit) override;

 private:
  const Node& node_;
  Place place_;
  std::string path_;
  Findings& findings_;
  std::vector<std::string> asked_;
  std::string currency_ = "CU";

  [[nodiscard]] std::string path_of(const std::string& key) const;
  [[nodiscard]] std::string name() const;
  const Entry* ask(const char* key);
  const Entry* ask(const char* key, Need need, const std::string& as_in);
  bool report(const Place& place, const std::string& key, std::string wrong, std::string right);
  bool missing(const char* key, const std::string& as_in);
  bool read(const std::string& key, const Node& node, double& value, const Range& range);
  bool read_text(const std::string& key, const Node& node, const std::string& text, double& value,
                 const Range& range);
};

/// A quantity as it stands in a file, "75 kW" in quotes or 2.6 without.
[[nodiscard]] std::string as_in_file(const QuantityKind& kind);

}  // namespace lossline::linefile
