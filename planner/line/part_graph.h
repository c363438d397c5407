#pragma once
// The graph behind topology.h: parts of the line as vertices, what flows between them as edges.
// Only topology*.cpp and its tests include this file; it carries the Boost.Graph headers.

#include <boost/graph/adjacency_list.hpp>
#include <boost/graph/filtered_graph.hpp>
#include <string>
#include <vector>

#include "planner/line/line.h"
#include "planner/line/topology.h"

namespace lossline::part_graph {

enum class PartKind { room, trap, stretch, generator, mixer, heater, exhaust };

/// A vertex.
struct Part {
  PartKind kind = PartKind::room;
  std::string name;
  std::size_t index = 0;  ///< into Line::stretches, generators or air
};

/// What an edge carries.
enum class Carries {
  product,  ///< the belt's way, inlet to outlet
  power,    ///< generator to stretch
  field,    ///< a passage the field can use, one edge per direction
  air,
};

struct Link {
  Carries carries = Carries::product;
  bool recycle = false;     ///< air: exhaust back to its own mixer
  bool taken_over = false;  ///< air: exhaust to another loop's mixer
};

using Graph = boost::adjacency_list<boost::vecS, boost::vecS, boost::bidirectionalS, Part, Link>;
using Vertex = boost::graph_traits<Graph>::vertex_descriptor;
using Edge = boost::graph_traits<Graph>::edge_descriptor;

/// Keeps the edges of one kind.
struct Only {
  const Graph* graph = nullptr;
  Carries carries = Carries::product;
  bool operator()(Edge edge) const { return (*graph)[edge].carries == carries; }
};

/// Hides traps that hold something back: what is left is open to the field.
struct NotGuarded {
  const Graph* graph = nullptr;
  bool operator()(Vertex vertex) const { return (*graph)[vertex].kind != PartKind::trap; }
};

/// The graph and where its parts are.
struct Parts {
  Graph graph;
  Vertex room_inlet = 0, room_outlet = 0;
  std::vector<Vertex> stretches, generators;      ///< in the order of the line
  std::vector<Vertex> mixers, heaters, exhausts;  ///< per air loop
};

/// Whether a trap holds anything back at all.
[[nodiscard]] bool guards(const EndTrap& trap);

/// Index of the stretch or air loop of that name, or npos.
inline constexpr std::size_t npos = static_cast<std::size_t>(-1);
[[nodiscard]] std::size_t find_stretch(const Line& line, const std::string& name);
[[nodiscard]] std::size_t find_loop(const Line& line, const std::string& name);

/// Builds the graph; names that do not resolve leave their edge out.
[[nodiscard]] Parts build(const Line& line);

/// "stretch[2].air": a key with the 1-based index of the line file.
[[nodiscard]] std::string key(const char* table, std::size_t index, const char* member);

// The three readings of the graph, each adding to `out`.
void read_air(const Line& line, const Parts& parts, Topology& out);    ///< topology_air.cpp
void read_paths(const Line& line, const Parts& parts, Topology& out);  ///< topology_paths.cpp

}  // namespace lossline::part_graph
