#include "planner/base/error.h"

#include <utility>

namespace lossline {
namespace {

std::string joined(const std::vector<Problem>& problems) {
  std::string text;
  for (const Problem& problem : problems) {
    if (!text.empty()) text += '\n';
    text += problem.text();
  }
  return text;
}

}  // namespace

std::string Problem::text() const {
  std::string out = file;
  if (line > 0) out += ':' + std::to_string(line);
  if (line > 0 && column > 0) out += ':' + std::to_string(column);
  if (!out.empty()) out += ": ";
  if (!key.empty()) out += key + ": ";
  out += wrong;
  if (!right.empty()) out += "; " + right;
  return out;
}

InputError::InputError(ErrorKind kind, std::vector<Problem> problems)
    : Error(kind, joined(problems)), problems_(std::move(problems)) {}

}  // namespace lossline
