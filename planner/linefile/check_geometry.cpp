#include <fmt/format.h>

#include <array>

#include "planner/linefile/checks.h"

namespace lossline::linefile {
namespace {

namespace q = quantity;

std::string size(double value) {
  return shown(value, value < 1 ? q::small_length : q::length);
}

bool pieces(const Checker& c) {
  return c.line.product.kind == ProductKind::pieces && c.sound({"product.kind"});
}

/// Key and value of how high the product stands on the belt; an empty key when not known.
struct Height {
  std::string key;
  double value = 0;
};

Height product_height(const Checker& c) {
  const Feed& feed = c.line.feed;
  const bool piece = pieces(c) && feed.piece_height;
  const std::string key = piece ? "feed.piece_height" : "feed.depth";
  const std::optional<double> value = piece ? feed.piece_height : feed.depth;
  if (!value || !c.sound({key})) return {};
  return {key, *value};
}

void check_feed(Checker& c) {
  const Feed& feed = c.line.feed;
  const double belt = c.line.belt.width;
  const bool belt_known = c.given("belt.width") && c.sound({"belt.width"});
  if (feed.width && belt_known && c.sound({"feed.width"}) && !(*feed.width <= belt))
    c.report("feed.width",
             fmt::format("the product is {} wide and the belt {}", size(*feed.width), size(belt)),
             "the product lies on the belt");
  if (pieces(c) && feed.piece_width && belt_known && c.sound({"feed.piece_width", "feed.lanes"})) {
    const double lanes = feed.lanes.value_or(1);
    if (!(lanes * *feed.piece_width <= belt))
      c.report(feed.lanes ? "feed.lanes" : "feed.piece_width",
               fmt::format("{:g} lane{} of {} make {} and the belt is {} wide", lanes,
                           lanes == 1 ? "" : "s", size(*feed.piece_width),
                           size(lanes * *feed.piece_width), size(belt)),
               "the product lies on the belt");
  }
  if (feed.piece_size && feed.depth && c.sound({"feed.piece_size", "feed.depth"}) &&
      !(*feed.piece_size <= *feed.depth))
    c.report("feed.depth",
             fmt::format("the bed is {} deep and one granule {}", size(*feed.depth),
                         size(*feed.piece_size)),
             "a bed is at least one granule deep");
}

/// An opening the loaded belt runs through.
struct Gate {
  std::string name;  ///< "the inlet trap"
  std::string width_key, height_key;
  double width = 0, height = 0;
};

void check_gate(Checker& c, const Gate& gate) {
  const double belt = c.line.belt.width;
  if (c.given("belt.width") && c.sound({"belt.width", gate.width_key}) && !(belt <= gate.width))
    c.report(gate.width_key,
             fmt::format("{} is {} wide and the belt {}", gate.name, size(gate.width), size(belt)),
             "the belt runs through it");
  const Height product = product_height(c);
  if (!product.key.empty() && c.sound({gate.height_key}) && !(product.value <= gate.height))
    c.report(gate.height_key,
             fmt::format("{} is {} high and the product {} ({})", gate.name, size(gate.height),
                         size(product.value), product.key),
             "the product runs through it");
}

/// An opening in the end wall of a cavity.
void check_wall(Checker& c, const Gate& gate, std::size_t s) {
  const Stretch& cavity = c.line.stretches[s];
  const std::string path = member_path("stretch", s);
  if (c.sound({gate.width_key, path + ".width"}) && !(gate.width <= cavity.width))
    c.report(gate.width_key,
             fmt::format("{} is {} wide and '{}' only {}", gate.name, size(gate.width), cavity.name,
                         size(cavity.width)),
             "an opening lies inside the wall it is cut into");
  if (c.sound({gate.height_key, path + ".height"}) && !(gate.height <= cavity.height))
    c.report(gate.height_key,
             fmt::format("{} is {} high and '{}' only {}", gate.name, size(gate.height),
                         cavity.name, size(cavity.height)),
             "an opening lies inside the wall it is cut into");
}

bool cavity(const Checker& c, std::size_t s) {
  return c.line.stretches[s].kind == StretchKind::microwave &&
         c.sound({member_path("stretch", s) + ".kind"});
}

void check_cavity(Checker& c, std::size_t s) {
  const Stretch& stretch = c.line.stretches[s];
  const std::string path = member_path("stretch", s);
  if (c.given("belt.width") && c.sound({"belt.width", path + ".width"}) &&
      !(c.line.belt.width <= stretch.width))
    c.report(path + ".width",
             fmt::format("'{}' is {} wide inside and the belt {}", stretch.name,
                         size(stretch.width), size(c.line.belt.width)),
             "the belt runs through it");
  const Height product = product_height(c);
  const double above = (1 - stretch.belt_height_share) * stretch.height;
  if (!product.key.empty() && c.sound({path + ".height", path + ".belt_height_share"}) &&
      !(product.value <= above))
    c.report(path + ".height",
             fmt::format("'{}' leaves {} above the belt and the product is {} high ({})",
                         stretch.name, size(above), size(product.value), product.key),
             "the product stands under the roof");
  const std::string width = path + ".passage_width", height = path + ".passage_height";
  if (c.given(width) != c.given(height))
    c.report(c.given(width) ? height : width, "is missing",
             "a passage has a width and a height; give both or none");
  if (!stretch.passage) return;
  const Gate gate{"the passage of '" + stretch.name + '\'', width, height, stretch.passage->width,
                  stretch.passage->height};
  check_gate(c, gate);
  check_wall(c, gate, s);
}

void check_traps(Checker& c) {
  const std::vector<Stretch>& stretches = c.line.stretches;
  const auto check = [&](const std::optional<EndTrap>& trap, const std::string& end,
                         std::size_t neighbour) {
    if (!trap) return;
    const std::string path = "endtrap." + end;
    const Gate gate{"the " + end + " trap", path + ".opening_width", path + ".opening_height",
                    trap->opening.width, trap->opening.height};
    if (!c.sound({path})) return;
    check_gate(c, gate);
    if (neighbour < stretches.size() && cavity(c, neighbour)) check_wall(c, gate, neighbour);
  };
  check(c.line.inlet_trap, "inlet", 0);
  check(c.line.outlet_trap, "outlet", stretches.size() - 1);
}

}  // namespace

void check_geometry(Checker& c) {
  check_feed(c);
  for (std::size_t s = 0; s < c.line.stretches.size(); ++s)
    if (cavity(c, s)) check_cavity(c, s);
  check_traps(c);
}

}  // namespace lossline::linefile
