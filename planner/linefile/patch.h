#pragma once
// Changes one value in the text of a line file and leaves every other byte, comments included, as
// it is.

#include <string>

#include "planner/linefile/read.h"

namespace lossline::linefile {

/// The text with another value for one key.
///
///   file     as read, without settings on that key
///   key      "belt.speed", "stretch[2].length"; a key that is absent is added at the end of its
///            table, which must be there
///   value    as in a Setting: "2.4 m/min", 0.3, true
///   returns  the new text, read once to be sure that it is a line file
///   throws   Error not_found when neither the key nor its table is in the file, InputError
///            bad_line_file when the value does not suit
[[nodiscard]] std::string patched(const LineFile& file, const std::string& key,
                                  const std::string& value);

/// Saves a text whole or not at all: writes a new file beside it and renames it over the old one.
///
///   throws  Error bad_input when the file cannot be written; the old one is untouched then
void save(const std::string& path, const std::string& text);

}  // namespace lossline::linefile
