#pragma once
// The answer as one JSON object: a public interface. SI units with the unit in the key, moisture
// dry basis ("_db"); a key that is absent means unknown, and no number is ever NaN or infinite.

#include <string>

#include "planner/report/page.h"

namespace lossline::report {

/// Version of the interface; grows when a key changes its meaning or goes away, not when one is
/// added.
inline constexpr int json_format = 1;

/// The object, pretty-printed, with a final newline. The same page gives the same bytes but for
/// time_ms.
[[nodiscard]] std::string json(const Page& page);

}  // namespace lossline::report
