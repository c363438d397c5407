#pragma once
// Internal to planner/report: sections of the text page, each ending in a line break.

#include <string>
#include <vector>

#include "planner/report/text.h"

namespace lossline::report {

/// Breaks words into lines of page_width, later lines indented.
[[nodiscard]] std::string wrapped(const std::string& first, const std::string& words,
                                  std::size_t indent);
/// Text cut to `columns` characters, filled up with blanks; counts UTF-8 characters.
[[nodiscard]] std::string cut(const std::string& text, std::size_t columns);

[[nodiscard]] std::string power_section(const Page& page, const Setting& setting);
[[nodiscard]] std::string stretch_section(const Page& page, const Setting& setting);
[[nodiscard]] std::string cavity_section(const Page& page, const Setting& setting);
[[nodiscard]] std::string air_section(const Page& page, const Setting& setting);
[[nodiscard]] std::string margin_section(const Page& page, const Setting& setting);
[[nodiscard]] std::string caution_section(const Page& page);
[[nodiscard]] std::string evidence_section(const Page& page);

}  // namespace lossline::report
