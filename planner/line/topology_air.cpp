// Which air loops depend on each other, in what order they are solved, and which stream is
// guessed where they run in a circle.

#include <fmt/format.h>

#include <algorithm>
#include <boost/graph/strong_components.hpp>
#include <boost/graph/topological_sort.hpp>
#include <functional>

#include "planner/line/part_graph.h"

namespace lossline::part_graph {
namespace {

/// Keeps the air edges inside one strongly connected component that are not torn.
struct Inside {
  const Graph* graph = nullptr;
  const std::vector<int>* component = nullptr;
  int wanted = 0;
  const std::vector<Edge>* torn = nullptr;
  bool operator()(Edge edge) const {
    const Graph& g = *graph;
    return g[edge].carries == Carries::air && (*component)[boost::source(edge, g)] == wanted &&
           (*component)[boost::target(edge, g)] == wanted &&
           std::find(torn->begin(), torn->end(), edge) == torn->end();
  }
};

bool acyclic(const Graph& graph, const Inside& inside) {
  const boost::filtered_graph<Graph, Inside> view(graph, inside);
  try {
    std::vector<Vertex> order;
    boost::topological_sort(view, std::back_inserter(order));
    return true;
  } catch (const boost::not_a_dag&) {
    return false;
  }
}

double carried(const Line& line, const Graph& graph, Edge edge) {
  const AirLoop& loop = line.air[graph[boost::target(edge, graph)].index];
  return loop.dry_air_flow * (graph[edge].recycle ? loop.recycle : 1 - loop.recycle);
}

/// Streams to guess: every recycle is a circle of its own; circles that are left lose their
/// smallest stream that breaks one.
std::vector<Edge> find_tears(const Line& line, const Graph& graph, const Inside& inside) {
  std::vector<Edge> tears, others;
  for (auto [edge, end] = boost::edges(graph); edge != end; ++edge) {
    if (!inside(*edge)) continue;
    if (graph[*edge].recycle) tears.push_back(*edge);
    if (graph[*edge].taken_over) others.push_back(*edge);
  }
  std::stable_sort(others.begin(), others.end(), [&](Edge a, Edge b) {
    return carried(line, graph, a) < carried(line, graph, b);
  });
  for (const Edge edge : others) {
    if (acyclic(graph, {inside.graph, inside.component, inside.wanted, &tears})) break;
    tears.push_back(edge);
  }
  return tears;
}

std::string tear_name(const Graph& graph, Edge edge) {
  const Part& from = graph[boost::source(edge, graph)];
  const Part& to = graph[boost::target(edge, graph)];
  return graph[edge].recycle ? from.name + " -> mixer" : from.name + " -> " + to.name;
}

/// The members of a circle in the air's order: a topological order with the tears taken out.
std::vector<Vertex> members(const Graph& graph, const Inside& torn_inside) {
  const boost::filtered_graph<Graph, Inside> view(graph, torn_inside);
  std::vector<Vertex> order;
  boost::topological_sort(view, std::back_inserter(order));
  std::reverse(order.begin(), order.end());
  std::erase_if(order, [&](Vertex v) { return (*torn_inside.component)[v] != torn_inside.wanted; });
  return order;
}

void add_cycle(const Line& line, const Parts& parts, const std::vector<int>& component, int wanted,
               Topology& out) {
  const std::vector<Edge> none;
  const Inside inside{&parts.graph, &component, wanted, &none};
  const std::vector<Edge> tears = find_tears(line, parts.graph, inside);
  AirCycle cycle;
  for (const Edge edge : tears) {
    if (!cycle.tear.empty()) cycle.tear += ", ";
    cycle.tear += tear_name(parts.graph, edge);
  }
  for (const Vertex v : members(parts.graph, {&parts.graph, &component, wanted, &tears})) {
    cycle.members.push_back(parts.graph[v].name);
    if (parts.graph[v].kind == PartKind::mixer) cycle.loops.push_back(parts.graph[v].index);
  }
  if (cycle.loops.size() > 1) {
    std::string names;
    for (const std::size_t l : cycle.loops)
      names += (names.empty() ? "'" : ", '") + line.air[l].name + "'";
    out.problems.push_back({key("air", cycle.loops.front(), "takes_from"),
                            "the loops " + names +
                                " take their fresh air from each other: no air enters from "
                                "outside and the water they take up could never leave",
                            "let one of them take fresh air from the room"});
  }
  out.cycles.push_back(std::move(cycle));
}

/// A loop cannot hand on more air than leaves it.
void check_supply(const Line& line, Topology& out) {
  std::vector<double> taken(line.air.size(), 0.0);
  for (std::size_t l = 0; l < line.air.size(); ++l) {
    const AirLoop& loop = line.air[l];
    if (loop.takes_from.empty()) continue;
    const std::size_t supplier = find_loop(line, loop.takes_from);
    if (supplier == npos) {
      out.problems.push_back({key("air", l, "takes_from"),
                              "'" + loop.takes_from + "' is not the name of an air loop",
                              "name one of the [[air]] tables"});
    } else if (supplier == l) {
      out.problems.push_back({key("air", l, "takes_from"),
                              "the loop would take its fresh air from itself",
                              "state that share as recycle instead"});
    } else {
      taken[supplier] += loop.dry_air_flow * (1 - loop.recycle);
      const double given = line.air[supplier].dry_air_flow * (1 - line.air[supplier].recycle);
      if (!(taken[supplier] <= given * (1 + 1e-9)))
        out.problems.push_back(
            {key("air", l, "takes_from"),
             fmt::format("takes the exhaust of '{}' to {:.4g} kg/h in all, but only {:.4g} kg/h "
                         "leave it",
                         loop.takes_from, 3600 * taken[supplier], 3600 * given),
             "lower dry_air_flow here, or let part of the fresh air come from the room"});
    }
  }
}

}  // namespace

void read_air(const Line& line, const Parts& parts, Topology& out) {
  out.loop_stretches.resize(line.air.size());
  for (std::size_t s = 0; s < line.stretches.size(); ++s) {
    const std::size_t loop = find_loop(line, line.stretches[s].air);
    if (loop != npos) out.loop_stretches[loop].push_back(s);
  }
  check_supply(line, out);
  if (line.air.empty()) return;

  const boost::filtered_graph<Graph, Only> air(parts.graph, Only{&parts.graph, Carries::air});
  std::vector<int> component(boost::num_vertices(parts.graph));
  const auto index = boost::get(boost::vertex_index, parts.graph);
  const int count =
      boost::strong_components(air, boost::make_iterator_property_map(component.begin(), index));
  // Components are numbered against the flow, so the highest number is the first supplier.
  for (std::size_t l = 0; l < line.air.size(); ++l) out.loop_order.push_back(l);
  std::stable_sort(out.loop_order.begin(), out.loop_order.end(), [&](std::size_t a, std::size_t b) {
    return component[parts.mixers[a]] > component[parts.mixers[b]];
  });
  std::vector<int> size(static_cast<std::size_t>(count), 0);
  for (const int c : component) ++size[static_cast<std::size_t>(c)];
  for (const std::size_t l : out.loop_order) {
    int& members_left = size[static_cast<std::size_t>(component[parts.mixers[l]])];
    if (members_left > 1) add_cycle(line, parts, component, component[parts.mixers[l]], out);
    members_left = 0;
  }
}

}  // namespace lossline::part_graph
