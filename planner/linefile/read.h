#pragma once
// Reads a line file: TOML with quantities as texts with units. Strict: everything wrong is
// reported at once, each problem with its place, and nothing unknown is passed over.

#include <span>
#include <string>

#include "planner/line/line.h"
#include "planner/linefile/positions.h"
#include "planner/linefile/settings.h"

namespace lossline::linefile {

/// Version of the format, the file's `format`.
inline constexpr int format_version = 1;

/// A line with the text it came from.
struct LineFile {
  Line line;
  std::string text;
  std::string path;     ///< as the user named it
  Positions positions;  ///< where each key stands, those of settings included
};

/// Reads a file.
///
///   path      of the file
///   settings  laid over the file, in order
///   returns   a line whose values are possible and fit into each other; whether its flow closes
///             and its parts hang together is for resolve_flow and topology to say
///   throws    InputError not_found when there is no such file, bad_line_file with all problems,
///             in the order of the file, otherwise
[[nodiscard]] LineFile read(const std::string& path, std::span<const Setting> settings = {});

/// Reads a text as read() does; path only names it in messages.
[[nodiscard]] LineFile read_text(std::string text, const std::string& path,
                                 std::span<const Setting> settings = {});

/// A problem of a key with its place in the file, for what is found out after reading.
///
///   key  "belt.speed", "stretch[2].length", as FlowProblem and TopologyProblem name it
[[nodiscard]] Problem locate(const LineFile& file, const std::string& key, std::string wrong,
                             std::string right);

/// Sorts problems in the order of the file: those of the whole file and of settings first.
void sort_problems(std::vector<Problem>& problems);

}  // namespace lossline::linefile
