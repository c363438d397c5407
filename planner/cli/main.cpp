// The program `lossline`: reads the command line, runs one command, maps failures to exit codes.

#include <exception>
#include <filesystem>
#include <iostream>

#include "planner/base/error.h"
#include "planner/cli/commands.h"
#include "planner/cli/exit_codes.h"
#include "planner/cli/options.h"

namespace {

/// Where this program stands, to find its materials database.
std::string program_path(const char* argv0) {
  std::error_code failed;
  const std::filesystem::path self = std::filesystem::read_symlink("/proc/self/exe", failed);
  return failed ? std::string(argv0) : self.string();
}

int run(const lossline::cli::Options& options, const std::string& program) {
  using lossline::cli::Command;
  switch (options.command) {
    case Command::none:
      return options.exit_code;
    case Command::check:
      return check_command(options, program, std::cout);
    case Command::solve:
      return solve_command(options, program, std::cout);
    default:
      return materials_command(options, program, std::cout);
  }
}

}  // namespace

int main(int argc, char** argv) {
  try {
    return run(lossline::cli::read_options(argc, argv), program_path(argv[0]));
  } catch (const lossline::InputError& e) {
    std::cerr << e.what() << '\n';
  } catch (const lossline::Error& e) {
    std::cerr << "lossline: " << e.what() << '\n';
  } catch (const std::exception& e) {
    std::cerr << "lossline: this should not happen, please report it: " << e.what() << '\n';
  }
  return lossline::cli::exit_bad_input;
}
