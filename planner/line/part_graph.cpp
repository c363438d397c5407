#include "planner/line/part_graph.h"

#include <algorithm>

namespace lossline::part_graph {
namespace {

template <class List>
std::size_t find_named(const List& list, const std::string& name) {
  for (std::size_t i = 0; i < list.size(); ++i)
    if (list[i].name == name) return i;
  return npos;
}

Vertex add_part(Graph& graph, PartKind kind, const std::string& name, std::size_t index = 0) {
  const Vertex vertex = boost::add_vertex(graph);
  graph[vertex] = Part{kind, name, index};
  return vertex;
}

void connect(Graph& graph, Vertex from, Vertex to, Link link) {
  boost::add_edge(from, to, link, graph);
}

void connect_both(Graph& graph, Vertex a, Vertex b) {
  connect(graph, a, b, {Carries::field, false, false});
  connect(graph, b, a, {Carries::field, false, false});
}

/// The belt and the passages between its parts, from the inlet's room to the outlet's.
void add_belt(const Line& line, Parts& parts) {
  Graph& graph = parts.graph;
  std::vector<Vertex> way{parts.room_inlet};
  auto add_trap = [&](const std::optional<EndTrap>& trap, const char* fallback) {
    if (trap && guards(*trap))
      way.push_back(add_part(graph, PartKind::trap, trap->name.empty() ? fallback : trap->name));
  };
  add_trap(line.inlet_trap, "inlet trap");
  way.insert(way.end(), parts.stretches.begin(), parts.stretches.end());
  add_trap(line.outlet_trap, "outlet trap");
  way.push_back(parts.room_outlet);
  for (std::size_t i = 0; i + 1 < way.size(); ++i) {
    connect(graph, way[i], way[i + 1], {Carries::product, false, false});
    connect_both(graph, way[i], way[i + 1]);
  }
}

void add_power(const Line& line, Parts& parts) {
  for (std::size_t g = 0; g < line.generators.size(); ++g) {
    for (const FeedBranch& feed : line.generators[g].feeds) {
      const std::size_t stretch = find_stretch(line, feed.stretch);
      if (stretch != npos)
        connect(parts.graph, parts.generators[g], parts.stretches[stretch],
                {Carries::power, false, false});
    }
  }
}

/// mixer -> heater -> stretches in the air's order -> exhaust -> mixer, next loop or room.
void add_air(const Line& line, Parts& parts) {
  Graph& graph = parts.graph;
  const Link air{Carries::air, false, false};
  for (std::size_t l = 0; l < line.air.size(); ++l) {
    const AirLoop& loop = line.air[l];
    const Vertex exhaust = parts.exhausts[l];
    connect(graph, parts.mixers[l], parts.heaters[l], air);
    std::vector<Vertex> served;
    for (std::size_t s = 0; s < line.stretches.size(); ++s)
      if (!loop.name.empty() && line.stretches[s].air == loop.name)
        served.push_back(parts.stretches[s]);
    if (loop.pattern == AirPattern::counter) std::reverse(served.begin(), served.end());
    const bool chain = loop.pattern == AirPattern::co || loop.pattern == AirPattern::counter;
    Vertex last = parts.heaters[l];
    for (const Vertex stretch : served) {
      connect(graph, last, stretch, air);
      if (chain)
        last = stretch;
      else
        connect(graph, stretch, exhaust, air);
    }
    if (chain || served.empty()) connect(graph, last, exhaust, air);
    if (loop.recycle > 0) connect(graph, exhaust, parts.mixers[l], {Carries::air, true, false});
    const std::size_t supplier = find_loop(line, loop.takes_from);
    if (supplier != npos && supplier != l)
      connect(graph, parts.exhausts[supplier], parts.mixers[l], {Carries::air, false, true});
    else
      connect(graph, parts.room_inlet, parts.mixers[l], air);
    connect(graph, exhaust, parts.room_outlet, air);
  }
}

}  // namespace

bool guards(const EndTrap& trap) {
  return trap.reflective_attenuation + trap.absorbing_attenuation > 0;
}

std::size_t find_stretch(const Line& line, const std::string& name) {
  return name.empty() ? npos : find_named(line.stretches, name);
}

std::size_t find_loop(const Line& line, const std::string& name) {
  return name.empty() ? npos : find_named(line.air, name);
}

std::string key(const char* table, std::size_t index, const char* member) {
  return std::string(table) + '[' + std::to_string(index + 1) + "]." + member;
}

Parts build(const Line& line) {
  Parts parts;
  Graph& graph = parts.graph;
  parts.room_inlet = add_part(graph, PartKind::room, "room (inlet)");
  parts.room_outlet = add_part(graph, PartKind::room, "room (outlet)");
  for (std::size_t s = 0; s < line.stretches.size(); ++s)
    parts.stretches.push_back(add_part(graph, PartKind::stretch, line.stretches[s].name, s));
  for (std::size_t g = 0; g < line.generators.size(); ++g)
    parts.generators.push_back(add_part(graph, PartKind::generator, line.generators[g].name, g));
  for (std::size_t l = 0; l < line.air.size(); ++l) {
    const std::string& name = line.air[l].name;
    parts.mixers.push_back(add_part(graph, PartKind::mixer, name + ": mixer", l));
    parts.heaters.push_back(add_part(graph, PartKind::heater, name + ": heater", l));
    parts.exhausts.push_back(add_part(graph, PartKind::exhaust, name + ": exhaust", l));
  }
  add_belt(line, parts);
  add_power(line, parts);
  add_air(line, parts);
  return parts;
}

}  // namespace lossline::part_graph
