#pragma once
// The known word a user most likely meant by an unknown one.

#include <span>
#include <string>
#include <string_view>

namespace lossline {

/// Number of single-letter insertions, deletions, replacements and swaps of neighbours that turn a
/// into b.
/// Cost: proportional to the product of the lengths.
[[nodiscard]] int edit_distance(std::string_view a, std::string_view b);

/// Whether two words differ in the case of their ASCII letters at most.
[[nodiscard]] bool same_but_for_case(std::string_view a, std::string_view b);

/// The known word nearest to one that is not known.
///
///   word     what the user wrote
///   known    what could have been meant, best first where several are equally near
///   returns  the same word in another case if there is one; otherwise the word with the fewest
///            edits if they are at most a third of its letters (and at least one edit is allowed);
///            otherwise an empty text
[[nodiscard]] std::string nearest(std::string_view word, std::span<const std::string> known);

/// "'a', 'b' or 'c'", for messages that list what is allowed.
[[nodiscard]] std::string listed(std::span<const std::string> words);

}  // namespace lossline
