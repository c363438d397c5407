#pragma once
// Values from the command line laid over those of a line file, "belt.speed=2.4 m/min".

#include <span>
#include <string>
#include <vector>

#include "planner/base/error.h"
#include "planner/linefile/document.h"

namespace lossline::linefile {

/// One `--set key=value`.
struct Setting {
  /// Dotted path; a member of a list of tables by its name or its 1-based number:
  /// "belt.speed", "stretch.cavity 1.length", "stretch[2].length".
  std::string key;
  std::string value;  ///< as in the file, without the quotes; lists separated by commas
};

/// Where the message of a bad setting says it is.
inline constexpr const char* setting_place = "--set";

/// Splits "key=value"; blanks around either are dropped.
///
///   throws  Error bad_input when there is no key or no "="
[[nodiscard]] Setting setting_from(const std::string& text);

/// Puts the settings into the tree, later ones over earlier ones.
///
///   root      tree of the file; absent keys and tables are added, to be judged by the reader
///   problems  receives paths that lead nowhere
void apply_settings(Node& root, std::span<const Setting> settings, std::vector<Problem>& problems);

}  // namespace lossline::linefile
