#pragma once
// How the parts of a line hang together, as a graph (Boost.Graph): the order of stretches, which
// generator feeds whom, the air loops found as strongly connected components with their tear, and
// the proof that every path from a powered cavity to the room crosses an end trap.

#include <cstddef>
#include <string>
#include <vector>

#include "planner/line/line.h"

namespace lossline {

/// A violation, in terms of the names the user gave.
struct TopologyProblem {
  std::string key;
  std::string wrong;
  std::string right;
};

/// A set of air loops that feed one another's intake and must be solved together.
struct AirCycle {
  std::vector<std::size_t> loops;    ///< indices into Line::air, in solving order
  std::vector<std::string> members;  ///< node names along the cycle, for messages
  std::string tear;  ///< the stream that is guessed and iterated, "main: exhaust -> mixer"
};

/// The structure of a line.
struct Topology {
  std::vector<std::size_t> cavities;                     ///< microwave stretches, in belt order
  std::vector<std::vector<std::size_t>> feeders;         ///< per cavity: indices of generators
  std::vector<std::vector<std::size_t>> loop_stretches;  ///< per air loop: stretches, belt order
  std::vector<std::size_t> loop_order;                   ///< air loops, suppliers first
  std::vector<AirCycle> cycles;                          ///< recycles and loops feeding each other
  std::vector<std::string> open_paths;                   ///< "cavity 2 -> rest 1 -> room (outlet)"
  std::vector<TopologyProblem> problems;                 ///< empty for a sound line
};

/// Builds the graph of a line and reads its structure off it.
///
///   line     any line, sound or not; names that do not resolve become problems
///   returns  the structure; see problems
/// Cost: linear in the number of parts.
[[nodiscard]] Topology topology(const Line& line);

}  // namespace lossline
