#pragma once
// The answer as one terminal page: what was asked, what comes out, where the power goes, how the
// product fares in each stretch, how far every limit is, what to mind and what it all rests on.

#include <string>

#include "planner/report/page.h"
#include "planner/report/shown.h"

namespace lossline::report {

/// Widest line of the page, in characters.
inline constexpr int page_width = 100;

/// The page. A refused line gives its reason alone.
[[nodiscard]] std::string text(const Page& page, const Setting& setting);

}  // namespace lossline::report
