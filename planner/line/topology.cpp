#include "planner/line/topology.h"

#include <fmt/format.h>

#include <cmath>
#include <set>

#include "planner/line/part_graph.h"

namespace lossline {
namespace {

using namespace part_graph;

template <class List>
void check_names(const List& list, const char* table, Topology& out) {
  std::set<std::string> seen;
  for (std::size_t i = 0; i < list.size(); ++i) {
    if (list[i].name.empty())
      out.problems.push_back({key(table, i, "name"), "is missing", "give every part a name"});
    else if (!seen.insert(list[i].name).second)
      out.problems.push_back({key(table, i, "name"),
                              "'" + list[i].name + "' names two parts of the same kind",
                              "names must differ"});
  }
}

std::string feed_key(std::size_t generator, std::size_t feed) {
  return key("generator", generator, "feeds") + '[' + std::to_string(feed + 1) + ']';
}

void check_generator(const Line& line, std::size_t g, Topology& out) {
  const Generator& generator = line.generators[g];
  double shares = 0;
  for (std::size_t f = 0; f < generator.feeds.size(); ++f) {
    const std::string& name = generator.feeds[f].stretch;
    shares += generator.feeds[f].share;
    const std::size_t stretch = find_stretch(line, name);
    if (stretch == npos)
      out.problems.push_back({feed_key(g, f), "'" + name + "' is not the name of a stretch",
                              "name one of the [[stretch]] tables"});
    else if (line.stretches[stretch].kind != StretchKind::microwave)
      out.problems.push_back(
          {feed_key(g, f), "'" + name + "' is not a microwave stretch, and power cannot enter it",
           "feed a stretch of kind \"microwave\""});
  }
  if (generator.feeds.empty())
    out.problems.push_back({key("generator", g, "feeds"),
                            "'" + generator.name + "' feeds no stretch",
                            "name the stretch its power enters"});
  else if (!(std::abs(shares - 1) <= 1e-6))
    out.problems.push_back(
        {key("generator", g, "shares"),
         fmt::format("the shares of '{}' add up to {:.6g}", generator.name, shares),
         "they must add up to 1"});
}

/// A cavity is one resonant box: one frequency, and no more feeds than openings to enter by.
void check_cavities(const Line& line, Topology& out) {
  for (std::size_t c = 0; c < out.cavities.size(); ++c) {
    const std::size_t s = out.cavities[c];
    double frequency = 0;
    std::string first;
    for (const std::size_t g : out.feeders[c]) {
      const Generator& generator = line.generators[g];
      if (frequency == 0) {
        frequency = generator.frequency;
        first = generator.name;
      } else if (!(std::abs(generator.frequency / frequency - 1) <= 1e-3)) {
        out.problems.push_back({key("generator", g, "frequency"),
                                fmt::format("'{}' feeds '{}' at {:.5g} MHz, and '{}' at {:.5g} MHz",
                                            generator.name, line.stretches[s].name,
                                            1e-6 * generator.frequency, first, 1e-6 * frequency),
                                "feed one cavity at one frequency"});
      }
    }
    const std::size_t launchers =
        static_cast<std::size_t>(std::max(line.stretches[s].launchers, 0));
    if (out.feeders[c].size() > launchers)
      out.problems.push_back(
          {key("stretch", s, "launchers"),
           fmt::format("{} generators enter '{}' through {} launcher{}", out.feeders[c].size(),
                       line.stretches[s].name, launchers, launchers == 1 ? "" : "s"),
           "count every opening through which power enters"});
  }
}

void check_air(const Line& line, Topology& out) {
  for (std::size_t s = 0; s < line.stretches.size(); ++s) {
    const std::string& name = line.stretches[s].air;
    if (!name.empty() && find_loop(line, name) == npos)
      out.problems.push_back(
          {key("stretch", s, "air"), "'" + name + "' is not the name of an air loop",
           "name one of the [[air]] tables, or leave it out for still room air"});
  }
  for (std::size_t l = 0; l < line.air.size(); ++l) {
    const AirLoop& loop = line.air[l];
    if (out.loop_stretches[l].empty())
      out.problems.push_back({key("air", l, "name"), "'" + loop.name + "' serves no stretch",
                              "name it in the air of a stretch, or leave it out"});
    if (loop.pattern == AirPattern::through && line.product.kind != ProductKind::granular_bed)
      out.problems.push_back({key("air", l, "pattern"), "air cannot flow through this product",
                              "\"through\" needs a granular bed; use \"co\", \"counter\" or "
                              "\"cross\""});
  }
  for (std::size_t i = 0; i < line.surfaces.size(); ++i)
    if (find_loop(line, line.surfaces[i].air) == npos)
      out.problems.push_back({key("surface", i, "air"),
                              "'" + line.surfaces[i].air + "' is not the name of an air loop",
                              "name the loop whose exhaust touches it"});
}

}  // namespace

Topology topology(const Line& line) {
  Topology out;
  check_names(line.stretches, "stretch", out);
  check_names(line.generators, "generator", out);
  check_names(line.air, "air", out);
  if (line.stretches.empty())
    out.problems.push_back({"stretch", "the line has no stretches", "at least one [[stretch]]"});
  const Parts parts = build(line);
  for (std::size_t g = 0; g < line.generators.size(); ++g) check_generator(line, g, out);
  read_paths(line, parts, out);
  read_air(line, parts, out);
  check_cavities(line, out);
  check_air(line, out);
  return out;
}

}  // namespace lossline
