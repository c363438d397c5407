#include <chrono>
#include <ctime>
#include <ostream>

#include "materials/commands.h"
#include "materials/import.h"
#include "materials/store.h"
#include "planner/base/error.h"
#include "planner/cli/commands.h"
#include "planner/cli/exit_codes.h"

namespace lossline::cli {
namespace {

/// Today's date in UTC, YYYY-MM-DD.
std::string today() {
  const std::time_t now = std::chrono::system_clock::to_time_t(std::chrono::system_clock::now());
  std::tm parts{};
  gmtime_r(&now, &parts);
  char text[16];
  return {text, std::strftime(text, sizeof text, "%Y-%m-%d", &parts)};
}

std::string user_database() {
  std::string path = materials::default_user_database();
  if (path.empty())
    throw Error(ErrorKind::not_found,
                "there is no place for your own materials: set LOSSLINE_USER_MATERIALS to a file");
  return path;
}

}  // namespace

int materials_command(const Options& options, const std::string& program, std::ostream& out) {
  if (options.command == Command::materials_undo) {
    materials::undo_import(user_database(), options.import_number);
    out << "import " << options.import_number << " is taken back\n";
    return exit_ok;
  }
  const materials::Store store = materials::Store::open(materials::find_base_database(program),
                                                        materials::default_user_database());
  switch (options.command) {
    case Command::materials_show:
      materials::show(out, store, options.file);
      break;
    case Command::materials_check:
      return materials::check(out, store) ? exit_ok : exit_beyond;
    case Command::materials_import:
      materials::import_file(out, store, user_database(), options.file, today());
      break;
    default:
      materials::list(out, store);
      break;
  }
  return exit_ok;
}

}  // namespace lossline::cli
