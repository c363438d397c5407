#pragma once
// The one exception of Lossline, and the list of problems a reader of user input collects.
//
// A use that cannot be carried out throws Error. A search that does not succeed returns a
// status instead (see planner/march/solution.h). Bad user input is collected in Problems so
// that everything wrong in a file is reported at once.

#include <stdexcept>
#include <string>
#include <vector>

namespace lossline {

/// What went wrong, in the classes the command line maps to exit codes.
enum class ErrorKind {
  out_of_range,   ///< a value outside the range its function states
  bad_line_file,  ///< a line file that cannot be used
  bad_input,      ///< any other user input that cannot be used (a CSV, an option)
  not_found,      ///< a file, material or name that does not exist
  database,       ///< the materials database cannot be read or written
  internal,       ///< a defect of Lossline itself
};

/// Thrown when a use cannot be carried out. what() is one sentence that names the quantity, its
/// value and unit, the allowed range, and the place.
class Error : public std::runtime_error {
 public:
  Error(ErrorKind kind, const std::string& message) : std::runtime_error(message), kind_(kind) {}
  [[nodiscard]] ErrorKind kind() const { return kind_; }

 private:
  ErrorKind kind_;
};

/// One thing wrong in a file the user wrote.
struct Problem {
  std::string file;   ///< as the user named it
  int line = 0;       ///< 1-based; 0 when the whole file is meant
  int column = 0;     ///< 1-based, in code points; 0 when the whole line is meant
  std::string key;    ///< dotted path with 1-based indices, "stretch[2].length"; empty when none
  std::string wrong;  ///< what is wrong
  std::string right;  ///< what would be right

  /// "file:line:column: key: wrong; right" with the absent parts left out.
  [[nodiscard]] std::string text() const;
};

/// Thrown by readers of user files after everything wrong was collected; what() has one problem
/// a line, in file order.
class InputError : public Error {
 public:
  InputError(ErrorKind kind, std::vector<Problem> problems);
  [[nodiscard]] const std::vector<Problem>& problems() const { return problems_; }

 private:
  std::vector<Problem> problems_;
};

}  // namespace lossline
