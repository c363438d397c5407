#pragma once
// Looks through the text of a line file before the TOML parser does. It keeps text from the parser
// that version 3.3.0 of the library mishandles (letters beyond ASCII outside quotes, malformed
// table heads, malformed dates), and says more plainly what is wrong with values that most people
// would write without quotes.

#include <optional>
#include <string>
#include <string_view>

namespace lossline::linefile {

/// The first place where a text is no line file.
struct GuardFault {
  int line = 0, column = 0;  ///< 1-based; columns in code points
  std::string wrong, right;
};

/// Largest text that is looked at [bytes]; a line file has some ten thousand.
inline constexpr std::size_t largest_text = 4'000'000;

/// Checks a whole text.
///
///   returns  the first fault; nothing when the parser may have the text
/// Cost: linear.
[[nodiscard]] std::optional<GuardFault> guard(std::string_view text);

}  // namespace lossline::linefile
