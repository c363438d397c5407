#include "planner/linefile/guard.h"

#include <algorithm>

namespace lossline::linefile {
namespace {

bool digit(char c) {
  return c >= '0' && c <= '9';
}

bool bare_key(char c) {
  return digit(c) || (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || c == '_' || c == '-';
}

/// Bytes of the UTF-8 sequence at the front of the text; 0 when it is none (RFC 3629, section 4).
std::size_t sequence_length(std::string_view text) {
  const auto byte = [&](std::size_t i) {
    return i < text.size() ? static_cast<unsigned char>(text[i]) : 0U;
  };
  const unsigned first = byte(0);
  if (first < 0x80) return 1;
  std::size_t length = 0;
  unsigned low = 0x80, high = 0xBF;
  if (first >= 0xC2 && first <= 0xDF) {
    length = 2;
  } else if (first >= 0xE0 && first <= 0xEF) {
    length = 3;
    if (first == 0xE0) low = 0xA0;
    if (first == 0xED) high = 0x9F;
  } else if (first >= 0xF0 && first <= 0xF4) {
    length = 4;
    if (first == 0xF0) low = 0x90;
    if (first == 0xF4) high = 0x8F;
  } else {
    return 0;
  }
  if (!(byte(1) >= low && byte(1) <= high)) return 0;
  for (std::size_t i = 2; i < length; ++i)
    if (!(byte(i) >= 0x80 && byte(i) <= 0xBF)) return 0;
  return length;
}

/// One line of the text at a time.
class Guard {
 public:
  explicit Guard(std::string_view text) : text_(text) {}

  std::optional<GuardFault> look() {
    if (text_.size() > largest_text) {
      fail(0, "the file is larger than any line file", "give the path of a line file");
      return fault_;
    }
    const std::string_view byte_order_mark = "\xEF\xBB\xBF";
    std::size_t begin = text_.starts_with(byte_order_mark) ? byte_order_mark.size() : 0;
    while (begin < text_.size() && !fault_) {
      const std::size_t end = std::min(text_.find('\n', begin), text_.size());
      row_ = text_.substr(begin, end - begin);
      if (row_.ends_with('\r')) row_.remove_suffix(1);
      ++line_;
      look_at_row();
      begin = end + 1;
    }
    return fault_;
  }

 private:
  std::string_view text_, row_;
  int line_ = 0;
  std::optional<GuardFault> fault_;

  bool fail(std::size_t at, std::string wrong, std::string right) {
    int column = 1;
    for (std::size_t i = 0; i < at; ++i)
      if ((static_cast<unsigned char>(row_[i]) & 0xC0) != 0x80) ++column;
    fault_ = GuardFault{line_, line_ == 0 ? 0 : column, std::move(wrong), std::move(right)};
    return false;
  }

  bool look_at_row() {
    for (std::size_t i = 0; i < row_.size();) {
      const std::size_t length = sequence_length(row_.substr(i));
      if (length == 0) return fail(i, "this is not UTF-8 text", "save the file as UTF-8");
      const auto c = static_cast<unsigned char>(row_[i]);
      if ((c < 0x20 && c != '\t') || c == 0x7F)
        return fail(i, "a control character stands here", "delete it");
      i += length;
    }
    const std::size_t first = row_.find_first_not_of(" \t");
    if (first == std::string_view::npos || row_[first] == '#') return true;
    if (row_[first] == '[' && !look_at_head(first)) return false;
    return look_at_marks(first);
  }

  /// "[name" or "[[name".
  bool look_at_head(std::size_t at) {
    ++at;
    if (at < row_.size() && row_[at] == '[') ++at;
    at = std::min(row_.find_first_not_of(" \t", at), row_.size());
    if (at == row_.size() ||
        !(bare_key(row_[at]) || row_[at] == '"' || row_[at] == '\'' || row_[at] == ']'))
      return fail(at, "the name of a table is missing", "write it as in [belt] or [[stretch]]");
    return true;
  }

  /// Quotes, letters beyond ASCII, and what follows the equals sign.
  bool look_at_marks(std::size_t at) {
    char before = '\n';
    bool value = false;
    for (; at < row_.size(); ++at) {
      const char c = row_[at];
      if (c == ' ' || c == '\t') continue;
      if (c == '#') return true;
      if (c == '"' || c == '\'') {
        if (!look_at_quote(at, before)) return false;
        before = c;
        continue;
      }
      if (static_cast<unsigned char>(c) >= 0x80)
        return fail(at, "this character may stand only in quotes or in a comment",
                    "write values with units in quotes, as in \"20 °C\"");
      if (c == '=' && !value) {
        value = true;
        if (!look_at_bare_value(at + 1)) return false;
      }
      before = c;
    }
    return true;
  }

  /// Moves to the closing quote.
  bool look_at_quote(std::size_t& at, char before) {
    const char mark = row_[at];
    const std::string three(3, mark);
    if (row_.substr(at).starts_with(three))
      return fail(at, "text over several lines is not used in line files",
                  "write it in one line, in single marks");
    if (std::string_view("\n=[,.{").find(before) == std::string_view::npos)
      return fail(at, "a quote is not expected here", "a text stands alone between its quotes");
    const std::size_t opened = at;
    for (++at; at < row_.size() && row_[at] != mark; ++at)
      if (mark == '"' && row_[at] == '\\') ++at;
    if (at >= row_.size())
      return fail(opened, "the text that begins here has no closing quote", "close it");
    return true;
  }

  /// A value that begins like a number: a number alone, or one that lacks its quotes.
  bool look_at_bare_value(std::size_t at) {
    at = row_.find_first_not_of(" \t", at);
    if (at == std::string_view::npos) return true;
    const std::size_t sign = row_[at] == '-' || row_[at] == '+' ? 1 : 0;
    if (at + sign >= row_.size() || !digit(row_[at + sign])) return true;
    std::size_t end = std::min(row_.find('#', at), row_.size());
    while (end > at && (row_[end - 1] == ' ' || row_[end - 1] == '\t')) --end;
    const std::string_view value = row_.substr(at, end - at);
    const std::string written(value);
    if (value.find(':') != std::string_view::npos ||
        (value.size() >= 10 && value[4] == '-' && value[7] == '-'))
      return fail(at, "dates and times have no place in a line file",
                  "put them in quotes, in a note");
    if (value.find_first_not_of("0123456789+-._eE") == std::string_view::npos) return true;
    const bool comma = value.find_first_not_of("0123456789+-._eE,") == std::string_view::npos;
    if (comma) return fail(at, written + " is not a number", "the decimal sign is a point");
    return fail(at, written + " has a unit but no quotes",
                "values with units go in quotes, as in \"" + written + '"');
  }
};

}  // namespace

std::optional<GuardFault> guard(std::string_view text) {
  return Guard(text).look();
}

}  // namespace lossline::linefile
