#pragma once
// The profile along the belt as CSV (RFC 4180), one row per station, the unit in every heading.
// Moisture is dry basis. Empty fields are unknown.

#include <string>

#include "planner/report/page.h"

namespace lossline::report {

/// The table with its heading line; lines end in LF, the decimal sign is a point, numbers carry
/// nine digits.
[[nodiscard]] std::string csv(const Page& page);

}  // namespace lossline::report
