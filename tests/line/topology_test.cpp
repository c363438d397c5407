#include "planner/line/topology.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include "sample_line.h"

namespace lossline {
namespace {

using ::testing::ElementsAre;
using ::testing::HasSubstr;
using ::testing::IsEmpty;

const TopologyProblem& only(const Topology& t) {
  static const TopologyProblem none;
  EXPECT_EQ(t.problems.size(), 1u);
  for (const TopologyProblem& p : t.problems) SCOPED_TRACE(p.key + ": " + p.wrong);
  return t.problems.empty() ? none : t.problems.front();
}

TEST(Topology, OfASoundLineHasNoProblems) {
  const Topology t = topology(sample::line());
  EXPECT_THAT(t.problems, IsEmpty());
  EXPECT_THAT(t.cavities, ElementsAre(1, 2));
  EXPECT_THAT(t.feeders, ElementsAre(ElementsAre(0), ElementsAre(1)));
  EXPECT_THAT(t.loop_stretches, ElementsAre(ElementsAre(0, 1, 2)));
  EXPECT_THAT(t.cycles, IsEmpty());
  EXPECT_THAT(t.open_paths, IsEmpty());
}

TEST(Topology, NamesThePathThroughAMissingTrap) {
  Line line = sample::line();
  line.outlet_trap.reset();
  const Topology t = topology(line);
  EXPECT_EQ(only(t).key, "endtrap.outlet");
  EXPECT_THAT(t.open_paths, ElementsAre("cavity 2 -> cooling -> room (outlet)"));
  line.inlet_trap.reset();
  EXPECT_THAT(topology(line).open_paths, ElementsAre("cavity 1 -> preheat -> room (inlet)",
                                                     "cavity 2 -> cooling -> room (outlet)"));
}

TEST(Topology, ATrapThatHoldsNothingBackIsNoTrap) {
  Line line = sample::line();
  line.inlet_trap->reflective_attenuation = line.inlet_trap->absorbing_attenuation = 0;
  EXPECT_EQ(only(topology(line)).key, "endtrap.inlet");
}

TEST(Topology, AnUnpoweredLineMayBeOpen) {
  Line line = sample::line();
  line.generators.clear();
  line.inlet_trap.reset();
  line.outlet_trap.reset();
  const Topology t = topology(line);
  EXPECT_THAT(t.problems, IsEmpty());
  EXPECT_THAT(t.feeders, ElementsAre(IsEmpty(), IsEmpty()));
}

TEST(Topology, FieldFromAPoweredCavityLeavesThroughAnUnpoweredOne) {
  Line line = sample::line();
  line.generators = {sample::generator("g2", "cavity 2")};
  line.inlet_trap.reset();
  EXPECT_THAT(topology(line).open_paths,
              ElementsAre("cavity 2 -> cavity 1 -> preheat -> room (inlet)"));
}

TEST(Topology, FindsARecycleAndItsTear) {
  Line line = sample::line();
  line.air[0].recycle = 0.7;
  const Topology t = topology(line);
  EXPECT_THAT(t.problems, IsEmpty());
  ASSERT_EQ(t.cycles.size(), 1u);
  EXPECT_EQ(t.cycles[0].tear, "main: exhaust -> mixer");
  EXPECT_THAT(t.cycles[0].loops, ElementsAre(0));
  EXPECT_EQ(t.cycles[0].members.front(), "main: mixer");
  EXPECT_EQ(t.cycles[0].members.back(), "main: exhaust");
}

TEST(Topology, SolvesSuppliersOfAirFirst) {
  Line line = sample::line();
  line.stretches[0].air = "pre";
  line.air = {sample::loop("pre", AirPattern::counter), sample::loop("main", AirPattern::co)};
  line.air[0].takes_from = "main";
  const Topology t = topology(line);
  EXPECT_THAT(t.problems, IsEmpty());
  EXPECT_THAT(t.loop_order, ElementsAre(1, 0));
  EXPECT_THAT(t.cycles, IsEmpty());
}

TEST(Topology, ReportsLoopsThatFeedEachOther) {
  Line line = sample::line();
  line.stretches[0].air = "pre";
  line.air = {sample::loop("pre", AirPattern::co), sample::loop("main", AirPattern::co, 0.2)};
  line.air[0].recycle = 0.2;
  line.air[0].takes_from = "main";
  line.air[1].takes_from = "pre";
  const Topology t = topology(line);
  EXPECT_THAT(only(t).wrong, HasSubstr("never leave"));
  ASSERT_EQ(t.cycles.size(), 1u);
  EXPECT_EQ(t.cycles[0].loops.size(), 2u);
  EXPECT_THAT(t.cycles[0].tear, HasSubstr("pre: exhaust -> mixer, main: exhaust -> mixer"));
}

TEST(Topology, RefusesMoreAirThanTheSupplierLetsGo) {
  Line line = sample::line();
  line.stretches[0].air = "pre";
  line.air = {sample::loop("pre", AirPattern::co), sample::loop("main", AirPattern::co, 0.5)};
  line.air[0].takes_from = "main";  // wants 1.5 kg/s, gets 0.75
  EXPECT_THAT(only(topology(line)).wrong, HasSubstr("2700 kg/h"));
  line.air[0].dry_air_flow = 0.75;
  EXPECT_THAT(topology(line).problems, IsEmpty());
}

TEST(Topology, RefusesPowerIntoAPlaceThatIsNoCavity) {
  Line line = sample::line();
  line.generators[0].feeds[0].stretch = "cooling";
  EXPECT_EQ(only(topology(line)).key, "generator[1].feeds[1]");
  line.generators[0].feeds[0].stretch = "attic";
  EXPECT_THAT(only(topology(line)).wrong, HasSubstr("'attic' is not the name of a stretch"));
}

TEST(Topology, RefusesSharesThatDoNotAddUp) {
  Line line = sample::line();
  line.generators[0].feeds = {{"cavity 1", 0.5}, {"cavity 2", 0.4}};
  line.stretches[2].launchers = 2;
  EXPECT_EQ(only(topology(line)).key, "generator[1].shares");
  EXPECT_THAT(only(topology(line)).wrong, HasSubstr("0.9"));
}

TEST(Topology, RefusesTwoFrequenciesInOneCavity) {
  Line line = sample::line();
  line.stretches[1].launchers = 2;
  line.generators[1].feeds[0].stretch = "cavity 1";
  line.generators[1].frequency = 2450e6;
  EXPECT_EQ(only(topology(line)).key, "generator[2].frequency");
}

TEST(Topology, RefusesMoreFeedsThanLaunchers) {
  Line line = sample::line();
  line.generators[1].feeds[0].stretch = "cavity 1";
  EXPECT_EQ(only(topology(line)).key, "stretch[2].launchers");
}

TEST(Topology, RefusesNamesOfAirThatDoNotResolve) {
  Line line = sample::line();
  line.stretches[3].air = "cold";
  EXPECT_EQ(only(topology(line)).key, "stretch[4].air");
  line = sample::line();
  line.air.push_back(sample::loop("spare", AirPattern::cross));
  EXPECT_EQ(only(topology(line)).key, "air[2].name");
  line = sample::line();
  line.air[0].takes_from = "roof";
  EXPECT_EQ(only(topology(line)).key, "air[1].takes_from");
  line.air[0].takes_from = "main";
  EXPECT_THAT(only(topology(line)).right, HasSubstr("recycle"));
  line = sample::line();
  line.surfaces = {{"duct", "roof", 300}};
  EXPECT_EQ(only(topology(line)).key, "surface[1].air");
}

TEST(Topology, RefusesAirThroughAProductThatIsNotLoose) {
  Line line = sample::line();
  line.product.kind = ProductKind::slab;
  EXPECT_EQ(only(topology(line)).key, "air[1].pattern");
}

TEST(Topology, RefusesNamesUsedTwice) {
  Line line = sample::line();
  line.stretches[3].name = "preheat";
  EXPECT_EQ(only(topology(line)).key, "stretch[4].name");
}

}  // namespace
}  // namespace lossline
