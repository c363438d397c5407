#pragma once
// Runs a program as its user would and collects what it says.

#include <functional>
#include <string>
#include <utility>
#include <vector>

namespace lossline::tests {

struct Outcome {
  int code = -1;  ///< exit code; 128 + n when signal n ended it
  std::string out, err;
};

/// Runs program with arguments.
///
///   environment  set on top of the caller's
///   meanwhile    called once with the process id while the program runs; may be empty
[[nodiscard]] Outcome run(const std::string& program, const std::vector<std::string>& arguments,
                          const std::vector<std::pair<std::string, std::string>>& environment = {},
                          const std::function<void(int)>& meanwhile = {});

}  // namespace lossline::tests
