#pragma once
// The keys of a line file, told once: the same description reads a table into a struct and writes
// a struct as a table (keys.h holds the descriptions, table_reader.h and write.h the two uses).

#include <cstddef>
#include <functional>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "planner/line/ranges.h"

namespace lossline::linefile {

enum class Need { required, optional };

/// One table of a line file, being read or being written.
class Fields {
 public:
  Fields() = default;
  Fields(const Fields&) = delete;
  Fields& operator=(const Fields&) = delete;
  virtual ~Fields() = default;

  /// True while a file is read into structs.
  [[nodiscard]] virtual bool reading() const = 0;

  // Values. Reading fills the value when the key is present and good and returns whether it did;
  // writing writes the value and returns true.

  /// A quantity, or a plain number where the range's kind has no unit.
  virtual bool required(const char* key, double& value, const Range& range) = 0;
  /// Left out in writing when it equals the fallback.
  virtual bool optional(const char* key, double& value, const Range& range, double fallback) = 0;
  virtual bool optional(const char* key, std::optional<double>& value, const Range& range) = 0;
  /// A power in watts or a share of `whole`.
  virtual bool power(const char* key, double& value, double whole, const Range& range,
                     Need need) = 0;
  virtual bool text(const char* key, std::string& value, Need need) = 0;
  /// True or false; left out in writing when false.
  virtual bool flag(const char* key, bool& value) = 0;
  /// One of a list of words, by index.
  virtual bool word(const char* key, std::span<const std::string> words, std::size_t& index,
                    Need need) = 0;
  virtual bool texts(const char* key, std::vector<std::string>& values, Need need) = 0;
  virtual bool shares(const char* key, std::vector<double>& values) = 0;

  /// Keys that exist but mean nothing here; reading reports those present.
  virtual void idle(std::span<const char* const> keys, const std::string& why) = 0;
  /// Keys about which nothing can be said because the one they hang on is wrong itself.
  virtual void forgive(std::span<const char* const> keys) = 0;

  /// The word that stands for the currency in the prices of this table.
  virtual void money(const std::string& currency) = 0;

  using Visit = std::function<void(Fields&)>;
  /// A table within this one. Reading visits it when it is present; writing visits it when
  /// `present` is true. Returns whether it visited.
  virtual bool table(const char* key, bool present, Need need, const Visit& visit) = 0;
  /// The members of a list of tables; `count` is how many there are to write.
  virtual void tables(const char* key, std::size_t count, Need need,
                      const std::function<void(Fields&, std::size_t)>& visit) = 0;

  /// A list of tables as a vector of structs.
  template <class T>
  void list(const char* key, std::vector<T>& items, Need need, void (*fields)(Fields&, T&)) {
    tables(key, items.size(), need, [&](Fields& f, std::size_t i) {
      if (items.size() <= i) items.resize(i + 1);
      fields(f, items[i]);
    });
  }

  /// An enumeration by the words that stand for its members, in their order from zero.
  template <class E>
  bool choice(const char* key, std::span<const std::string> words, E& value, Need need) {
    auto index = static_cast<std::size_t>(value);
    const bool good = word(key, words, index, need);
    if (good) value = static_cast<E>(index);
    return good;
  }
};

}  // namespace lossline::linefile
