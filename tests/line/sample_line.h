#pragma once
// A small sound line for the tests of this folder: preheat, two cavities, cooling, one air loop.

#include "planner/line/line.h"

namespace lossline::sample {

inline Stretch stretch(const std::string& name, StretchKind kind, const std::string& air = "") {
  Stretch s;
  s.name = name;
  s.kind = kind;
  s.length = 2;
  s.air = air;
  if (kind == StretchKind::microwave) {
    s.width = 1.9;
    s.height = 1.4;
  }
  return s;
}

inline EndTrap trap(const std::string& name) {
  return {name, {1.6, 0.1}, 1.2, 20, 20, "supplier"};
}

inline Generator generator(const std::string& name, const std::string& feeds) {
  Generator g;
  g.name = name;
  g.frequency = 915e6;
  g.rated = 75e3;
  g.set_point = 60e3;
  g.tube_efficiency = 0.88;
  g.supply_efficiency = 0.95;
  g.feeds = {{feeds, 1.0}};
  return g;
}

inline AirLoop loop(const std::string& name, AirPattern pattern, double recycle = 0) {
  AirLoop a;
  a.name = name;
  a.pattern = pattern;
  a.dry_air_flow = 1.5;
  a.recycle = recycle;
  return a;
}

inline Line line() {
  Line l;
  l.name = "sample";
  l.stretches = {stretch("preheat", StretchKind::air, "main"),
                 stretch("cavity 1", StretchKind::microwave, "main"),
                 stretch("cavity 2", StretchKind::microwave, "main"),
                 stretch("cooling", StretchKind::cooling)};
  l.inlet_trap = trap("inlet");
  l.outlet_trap = trap("outlet");
  l.generators = {generator("g1", "cavity 1"), generator("g2", "cavity 2")};
  l.air = {loop("main", AirPattern::through)};
  l.belt.width = 1.6;
  return l;
}

}  // namespace lossline::sample
