// Order of the belt, and the ways the field could take into the room.

#include <algorithm>
#include <boost/graph/breadth_first_search.hpp>
#include <boost/graph/topological_sort.hpp>

#include "planner/line/part_graph.h"

namespace lossline::part_graph {
namespace {

using FieldView = boost::filtered_graph<Graph, Only, NotGuarded>;

/// Shortest way from any powered cavity to every open part, as predecessors.
std::vector<Vertex> open_predecessors(const Parts& parts, const std::vector<Vertex>& sources) {
  const FieldView view(parts.graph, Only{&parts.graph, Carries::field}, NotGuarded{&parts.graph});
  const std::size_t n = boost::num_vertices(parts.graph);
  std::vector<Vertex> previous(n);
  for (Vertex v = 0; v < n; ++v) previous[v] = v;
  std::vector<boost::default_color_type> color(n, boost::white_color);
  boost::queue<Vertex> waiting;
  const auto index = boost::get(boost::vertex_index, parts.graph);
  boost::breadth_first_search(
      view, sources.begin(), sources.end(), waiting,
      boost::make_bfs_visitor(boost::record_predecessors(previous.data(), boost::on_tree_edge())),
      boost::make_iterator_property_map(color.begin(), index));
  return previous;
}

std::string path_text(const Parts& parts, const std::vector<Vertex>& previous, Vertex end) {
  std::vector<Vertex> way{end};
  while (previous[way.back()] != way.back()) way.push_back(previous[way.back()]);
  std::string text;
  for (auto it = way.rbegin(); it != way.rend(); ++it) {
    if (!text.empty()) text += " -> ";
    text += parts.graph[*it].name;
  }
  return text;
}

void check_end(const Parts& parts, const std::vector<Vertex>& previous, Vertex room,
               const std::optional<EndTrap>& trap, const char* key, Topology& out) {
  if (previous[room] == room) return;
  const std::string path = path_text(parts, previous, room);
  out.open_paths.push_back(path);
  const std::string crosses = trap ? "crosses a trap of 0 dB only" : "crosses no end trap";
  out.problems.push_back({key, "the field can leave: " + path + ' ' + crosses,
                          "put an end trap with its reflective and absorbing attenuation there"});
}

}  // namespace

void read_paths(const Line& line, const Parts& parts, Topology& out) {
  const boost::filtered_graph<Graph, Only> belt(parts.graph, Only{&parts.graph, Carries::product});
  std::vector<Vertex> order;
  boost::topological_sort(belt, std::back_inserter(order));  // last part first
  std::reverse(order.begin(), order.end());
  std::vector<Vertex> powered;
  for (const Vertex v : order) {
    const Part& part = parts.graph[v];
    if (part.kind != PartKind::stretch || line.stretches[part.index].kind != StretchKind::microwave)
      continue;
    out.cavities.push_back(part.index);
    std::vector<std::size_t> feeders;
    bool on = false;
    for (auto [edge, end] = boost::in_edges(v, parts.graph); edge != end; ++edge) {
      if (parts.graph[*edge].carries != Carries::power) continue;
      const std::size_t g = parts.graph[boost::source(*edge, parts.graph)].index;
      if (std::find(feeders.begin(), feeders.end(), g) == feeders.end()) feeders.push_back(g);
      // A generator at rest may be switched on tomorrow: its rating counts, not its set point.
      on = on || line.generators[g].rated > 0 || line.generators[g].set_point > 0;
    }
    std::sort(feeders.begin(), feeders.end());
    out.feeders.push_back(feeders);
    if (on) powered.push_back(v);
  }
  if (powered.empty()) return;
  const std::vector<Vertex> previous = open_predecessors(parts, powered);
  check_end(parts, previous, parts.room_inlet, line.inlet_trap, "endtrap.inlet", out);
  check_end(parts, previous, parts.room_outlet, line.outlet_trap, "endtrap.outlet", out);
}

}  // namespace lossline::part_graph
