#pragma once
// The commands, one file each. All print their answer to `out`, throw Error for input that cannot
// be used, and return the exit code otherwise.

#include <iosfwd>
#include <string>

#include "planner/cli/options.h"

namespace lossline::cli {

int check_command(const Options& options, const std::string& program, std::ostream& out);
int solve_command(const Options& options, const std::string& program, std::ostream& out);
int materials_command(const Options& options, const std::string& program, std::ostream& out);

}  // namespace lossline::cli
