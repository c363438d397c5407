#include "planner/linefile/checks.h"

#include <utility>

namespace lossline::linefile {

bool Checker::given(const std::string& key) const {
  return positions_.contains(key);
}

bool Checker::sound(std::initializer_list<std::string> keys) const {
  for (const std::string& key : keys) {
    // A bad table takes its keys with it.
    for (std::string path = key; !path.empty();) {
      if (findings_.bad.contains(path)) return false;
      const std::size_t cut = path.find_last_of(".[");
      path = cut == std::string::npos ? "" : path.substr(0, cut);
    }
  }
  return true;
}

void Checker::report(const std::string& key, std::string wrong, std::string right) {
  findings_.problems.push_back(
      placed(findings_.file, positions_, key, std::move(wrong), std::move(right)));
}

std::string shown(double value, const QuantityKind& kind) {
  return format_quantity(value, kind);
}

}  // namespace lossline::linefile
