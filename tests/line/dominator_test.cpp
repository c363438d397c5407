// Cross-check of the path search by another theorem: a room is guarded exactly when every way to
// it from a source that reaches all powered cavities passes one trap, that is when a trap
// dominates the room in the field's graph (Lengauer and Tarjan 1979, ACM TOPLAS 1, 121-141).

#include <gtest/gtest.h>

#include <boost/graph/dominator_tree.hpp>
#include <random>

#include "planner/line/part_graph.h"
#include "sample_line.h"

namespace lossline {
namespace {

using namespace part_graph;

bool trap_dominates(const Line& line, const Parts& parts, Vertex room) {
  Graph graph = parts.graph;
  const Vertex source = boost::add_vertex(graph);
  graph[source] = {PartKind::generator, "all generators", 0};
  for (std::size_t s = 0; s < line.stretches.size(); ++s)
    for (const Generator& g : line.generators)
      if (g.feeds[0].stretch == line.stretches[s].name)
        boost::add_edge(source, parts.stretches[s], Link{Carries::field, false, false}, graph);
  const boost::filtered_graph<Graph, Only> view(graph, Only{&graph, Carries::field});
  const Vertex none = boost::graph_traits<Graph>::null_vertex();
  std::vector<Vertex> dominator(boost::num_vertices(graph), none);
  boost::lengauer_tarjan_dominator_tree(
      view, source,
      boost::make_iterator_property_map(dominator.begin(), boost::get(boost::vertex_index, graph)));
  for (Vertex v = dominator[room]; v != none && v != source; v = dominator[v])
    if (graph[v].kind == PartKind::trap) return true;
  return false;
}

TEST(Topology, AgreesWithTheDominatorTree) {
  std::mt19937 random(5);
  auto chance = [&](double p) { return std::bernoulli_distribution(p)(random); };
  int guarded = 0, open = 0;
  for (int trial = 0; trial < 200; ++trial) {
    Line line = sample::line();
    line.stretches.clear();
    line.generators.clear();
    const int n = 1 + static_cast<int>(random() % 7);
    for (int i = 0; i < n; ++i) {
      const bool cavity = i == 0 || chance(0.5);
      const std::string name = "s" + std::to_string(i);
      line.stretches.push_back(
          sample::stretch(name, cavity ? StretchKind::microwave : StretchKind::rest, "main"));
      if (i == 0 || (cavity && chance(0.6)))
        line.generators.push_back(sample::generator("g" + name, name));
    }
    std::shuffle(line.stretches.begin(), line.stretches.end(), random);
    if (chance(0.5)) line.inlet_trap.reset();
    if (chance(0.5)) line.outlet_trap.reset();
    const Topology found = topology(line);
    const Parts parts = build(line);
    std::size_t missing = 0;
    for (const Vertex room : {parts.room_inlet, parts.room_outlet})
      missing += trap_dominates(line, parts, room) ? 0 : 1;
    EXPECT_EQ(found.open_paths.size(), missing);
    ++(missing == 0 ? guarded : open);
  }
  EXPECT_GT(guarded, 20);
  EXPECT_GT(open, 20);
}

}  // namespace
}  // namespace lossline
