#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <iostream>

#include "planner/base/error.h"
#include "planner/cli/commands.h"
#include "planner/cli/exit_codes.h"
#include "planner/cli/interrupt.h"
#include "planner/cli/load.h"
#include "planner/march/march.h"
#include "planner/report/csv.h"
#include "planner/report/json.h"
#include "planner/report/text.h"

namespace lossline::cli {
namespace {

/// Whether the terminal shows UTF-8, from the locale variables in the order POSIX gives them.
bool terminal_is_utf8() {
  for (const char* name : {"LC_ALL", "LC_CTYPE", "LANG"}) {
    const char* value = std::getenv(name);  // NOLINT(concurrency-mt-unsafe): one thread
    if (value == nullptr || *value == '\0') continue;
    std::string text(value);
    for (char& c : text) c = static_cast<char>(std::tolower(static_cast<unsigned char>(c)));
    return text.find("utf-8") != std::string::npos || text.find("utf8") != std::string::npos;
  }
  return false;
}

std::string written(const report::Page& page, const Options& options) {
  switch (options.format) {
    case Format::json:
      return report::json(page);
    case Format::csv:
      return report::csv(page);
    case Format::text:
      break;
  }
  return report::text(page, {options.units, terminal_is_utf8()});
}

void print(std::ostream& out, const std::string& answer) {
  out << answer << std::flush;
  if (!out) throw Error(ErrorKind::bad_input, "standard output cannot be written");
}

/// Writes beside the target and moves it into place, so that a half-written answer never stands
/// where a whole one is expected.
void write_file(const std::string& path, const std::string& content) {
  const std::string beside = path + ".part";
  std::ofstream file(beside, std::ios::binary | std::ios::trunc);
  file << content;
  file.close();
  std::error_code failed;
  if (file) std::filesystem::rename(beside, path, failed);
  if (!file || failed) {
    std::error_code ignored;
    std::filesystem::remove(beside, ignored);
    throw Error(ErrorKind::bad_input, "--output: '" + path + "' cannot be written");
  }
}

}  // namespace

int solve_command(const Options& options, const std::string& program, std::ostream& out) {
  if (options.level != "mean")
    throw Error(ErrorKind::bad_input,
                "--level: 'depth' is not available yet; 'mean', the product "
                "averaged over its depth, is");
  const std::atomic<bool>& stop = watch_interrupt();
  const Input input = load(options, program);
  SolveOptions choices;
  choices.stop = &stop;
  const Solution solution = solve(input.line, input.card, choices);
  if (solution.status == Status::refused)
    throw Error(ErrorKind::bad_line_file, options.file + ": " + solution.reason);
  if (solution.status == Status::interrupted) {
    std::cerr << "lossline: " << solution.reason << '\n';
    return exit_interrupted;
  }
  const verdict::Margins margins = verdict::margins(input.line, input.card, solution);
  const std::vector<verdict::Caution> cautions =
      verdict::cautions(input.line, input.card, solution, margins);
  const std::string answer =
      written({input.line, solution, margins, cautions, options.file, input.sha256}, options);
  if (options.output.empty())
    print(out, answer);
  else
    write_file(options.output, answer);
  const bool good =
      solution.status == Status::solved && margins.count(verdict::Standing::beyond) == 0;
  return good ? exit_ok : exit_beyond;
}

}  // namespace lossline::cli
