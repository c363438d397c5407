#include "planner/linefile/write.h"

#include <fmt/format.h>

#include <array>
#include <utility>

#include "planner/linefile/keys.h"
#include "planner/linefile/positions.h"
#include "planner/linefile/read.h"

namespace lossline::linefile {
namespace {

struct Comment {
  std::string_view table, text;
};

constexpr std::array comments{
    Comment{"duty", "what the line must achieve"},
    Comment{"product.override", "in place of the materials database"},
    Comment{"product.sorption", "how the product holds its water"},
    Comment{"product.cure", "first order, from the time to 90 %"},
    Comment{"product.permittivity", "eps_real - j loss_factor"},
    Comment{"feed", "how the product lies on the belt"},
    Comment{"limits", "beyond those of the material"},
};

std::string quoted(const std::string& text) {
  std::string out = "\"";
  for (const char c : text) {
    if (c == '"' || c == '\\')
      out += {'\\', c};
    else if (c == '\n')
      out += "\\n";
    else if (static_cast<unsigned char>(c) < 0x20 || c == 0x7F)
      out += fmt::format("\\u{:04X}", static_cast<unsigned>(c));
    else
      out += c;
  }
  return out + '"';
}

/// Writes one table; the head comes with the first key.
class TableWriter final : public Fields {
 public:
  TableWriter(std::string path, bool member, std::string& out)
      : path_(std::move(path)), member_(member), out_(out) {}

  [[nodiscard]] bool reading() const override { return false; }
  bool required(const char* key, double& value, const Range& range) override {
    std::string text = exact_quantity(value, range.kind);
    if (const std::size_t at = text.find("CU"); at != std::string::npos)
      text.replace(at, 2, currency_);
    put(key, range.kind.si_unit.empty() ? text : quoted(text));
    return true;
  }
  bool optional(const char* key, double& value, const Range& range, double fallback) override {
    return value == fallback || required(key, value, range);
  }
  bool optional(const char* key, std::optional<double>& value, const Range& range) override {
    return !value || required(key, *value, range);
  }
  bool power(const char* key, double& value, double, const Range& range, Need need) override {
    return (need == Need::optional && value == 0) || required(key, value, range);
  }
  bool text(const char* key, std::string& value, Need need) override {
    if (need == Need::required || !value.empty()) put(key, quoted(value));
    return true;
  }
  bool flag(const char* key, bool& value) override {
    if (value) put(key, "true");
    return true;
  }
  bool word(const char* key, std::span<const std::string> words, std::size_t& index,
            Need) override {
    put(key, quoted(words[index]));
    return true;
  }
  bool texts(const char* key, std::vector<std::string>& values, Need) override {
    std::string list;
    for (const std::string& value : values) list += (list.empty() ? "" : ", ") + quoted(value);
    put(key, '[' + list + ']');
    return true;
  }
  bool shares(const char* key, std::vector<double>& values) override {
    std::vector<std::string> written;
    written.reserve(values.size());
    for (const double value : values) written.push_back(exact_quantity(value, quantity::share));
    return texts(key, written, Need::optional);
  }
  void idle(std::span<const char* const>, const std::string&) override {}
  void forgive(std::span<const char* const>) override {}
  void money(const std::string& currency) override { currency_ = currency; }
  bool table(const char* key, bool present, Need, const Visit& visit) override {
    if (!present) return false;
    TableWriter writer(path_of(key), false, out_);
    visit(writer);
    return true;
  }
  void tables(const char* key, std::size_t count, Need,
              const std::function<void(Fields&, std::size_t)>& visit) override {
    for (std::size_t i = 0; i < count; ++i) {
      TableWriter writer(path_of(key), true, out_);
      visit(writer, i);
    }
  }

 private:
  std::string path_;
  bool member_;
  std::string& out_;
  bool begun_ = false;
  std::string currency_ = "CU";

  [[nodiscard]] std::string path_of(const char* key) const {
    return path_.empty() ? key : path_ + '.' + key;
  }
  void begin() {
    if (begun_) return;
    begun_ = true;
    out_ += member_ ? fmt::format("\n[[{}]]", path_) : fmt::format("\n[{}]", path_);
    for (const Comment& comment : comments)
      if (comment.table == path_) out_ += fmt::format("  # {}", comment.text);
    out_ += '\n';
  }
  void put(const char* key, const std::string& value) {
    begin();
    out_ += fmt::format("{} = {}\n", key, value);
  }
};

}  // namespace

std::string write(const Line& line) {
  std::string out = fmt::format("format = {}\n", format_version);
  Line copy = line;
  TableWriter writer("", false, out);
  line_file_fields(writer, copy);
  return out;
}

}  // namespace lossline::linefile
