#pragma once
// Writes a line as a new line file: keys in a fixed order, values with units, one short comment on
// each table. Never used to rewrite a file somebody wrote; see patch.h.

#include <string>

#include "planner/line/line.h"

namespace lossline::linefile {

/// The text of a line file that read_text reads back to the same line. Values that equal their
/// default are left out; so is evidence of a finer kind than the six words of a line file.
[[nodiscard]] std::string write(const Line& line);

}  // namespace lossline::linefile
