#include <algorithm>
#include <map>

#include "planner/base/nearest.h"
#include "planner/linefile/checks.h"

namespace lossline::linefile {
namespace {

template <class T>
std::vector<std::string> names_of(const std::vector<T>& parts) {
  std::vector<std::string> names;
  names.reserve(parts.size());
  for (const T& part : parts) names.push_back(part.name);
  return names;
}

void check_unique(Checker& c, const char* table, const std::vector<std::string>& names) {
  std::map<std::string, std::size_t> first;
  for (std::size_t i = 0; i < names.size(); ++i) {
    if (names[i].empty()) continue;
    const auto [before, is_new] = first.emplace(names[i], i);
    if (!is_new)
      c.report(member_path(table, i) + ".name",
               member_path(table, before->second) + " is called '" + names[i] + "' too",
               "a name belongs to one " + std::string(table));
  }
}

/// A name that must be one of a list of parts.
void check_reference(Checker& c, const std::string& key, const std::string& name,
                     const std::vector<std::string>& names, const std::string& what) {
  if (std::find(names.begin(), names.end(), name) != names.end()) return;
  const std::string meant = nearest(name, names);
  c.report(key, "there is no " + what + " called '" + name + '\'',
           names.empty()    ? "the file has none"
           : !meant.empty() ? "did you mean '" + meant + "'?"
                            : "the names are " + listed(names));
}

}  // namespace

void check_names(Checker& c) {
  const Line& line = c.line;
  const std::vector<std::string> stretches = names_of(line.stretches);
  const std::vector<std::string> loops = names_of(line.air);
  check_unique(c, "stretch", stretches);
  check_unique(c, "generator", names_of(line.generators));
  check_unique(c, "air", loops);
  check_unique(c, "surface", names_of(line.surfaces));
  for (std::size_t g = 0; g < line.generators.size(); ++g) {
    const std::string feeds = member_path("generator", g) + ".feeds";
    for (std::size_t f = 0; f < line.generators[g].feeds.size(); ++f)
      check_reference(c, member_path(feeds, f), line.generators[g].feeds[f].stretch, stretches,
                      "stretch");
  }
  for (std::size_t s = 0; s < line.stretches.size(); ++s)
    if (!line.stretches[s].air.empty())
      check_reference(c, member_path("stretch", s) + ".air", line.stretches[s].air, loops,
                      "air loop");
  for (std::size_t l = 0; l < line.air.size(); ++l)
    if (!line.air[l].takes_from.empty())
      check_reference(c, member_path("air", l) + ".takes_from", line.air[l].takes_from, loops,
                      "air loop");
  for (std::size_t i = 0; i < line.surfaces.size(); ++i)
    if (!line.surfaces[i].air.empty())
      check_reference(c, member_path("surface", i) + ".air", line.surfaces[i].air, loops,
                      "air loop");
}

}  // namespace lossline::linefile
