#pragma once
// What the user typed, as a plain struct. The only file pair that knows CLI11.

#include <cstdint>
#include <string>
#include <vector>

#include "planner/report/shown.h"

namespace lossline::cli {

enum class Command {
  none,  ///< help or version was printed, or the usage was wrong: see Options::exit_code
  check,
  solve,
  materials_list,
  materials_show,
  materials_check,
  materials_import,
  materials_undo,
};

enum class Format { text, json, csv };

struct Options {
  Command command = Command::none;
  int exit_code = 0;                     ///< when there is no command to run
  std::string file;                      ///< line file, material id or CSV
  std::vector<std::string> assignments;  ///< "--set key=value", in order
  std::string level = "mean";
  Format format = Format::text;
  UnitSet units = UnitSet::si_engineering;
  std::string output;  ///< empty = standard output
  std::int64_t import_number = 0;
};

/// Reads the command line; prints help and version to standard output and complaints to standard
/// error.
[[nodiscard]] Options read_options(int argc, const char* const* argv);

}  // namespace lossline::cli
