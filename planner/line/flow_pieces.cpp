// Separate pieces: the rate follows from pieces per second and mass per piece, the coverage from
// how they lie. One row of `lanes` pieces passes every lanes / piece_rate seconds, so the rows
// stand at the pitch  lanes x speed / piece_rate  along the belt.

#include <fmt/format.h>

#include "planner/line/flow_parts.h"

namespace lossline::flow_parts {
namespace {

struct Layout {
  double length = 0, width = 0, height = 0, lanes = 1;
};

bool read_layout(const Line& line, Layout& layout, std::vector<FlowProblem>& problems) {
  const Feed& feed = line.feed;
  auto take = [&](const char* key, const std::optional<double>& value, double& out) {
    if (value && *value > 0) {
      out = *value;
      return true;
    }
    problems.push_back({key, "is needed for a product of separate pieces",
                        "give the size of one piece: piece_length, piece_width, piece_height"});
    return false;
  };
  const std::optional<double> height = feed.piece_height ? feed.piece_height : feed.depth;
  bool good = take("feed.piece_length", feed.piece_length, layout.length);
  good &= take("feed.piece_width", feed.piece_width, layout.width);
  good &= take("feed.piece_height", height, layout.height);
  layout.lanes = feed.lanes.value_or(1);
  if (!(layout.lanes >= 1)) {
    problems.push_back({"feed.lanes", fmt::format("is {:g}", layout.lanes), "at least 1"});
    return false;
  }
  return good;
}

/// Reports pieces that would lie on top of each other.
void check_overlap(const Layout& layout, double width, double pitch, double speed,
                   std::vector<FlowProblem>& problems) {
  constexpr double rounding = 1 - 1e-9;
  if (!(pitch >= layout.length * rounding))
    problems.push_back(
        {"feed.piece_rate",
         fmt::format("one row every {:.4g} mm, but a piece is {:.4g} mm long: the pieces overlap",
                     1000 * pitch, 1000 * layout.length),
         fmt::format("run the belt at {:.4g} m/min or more, or use more lanes",
                     60 * speed * layout.length / pitch)});
  if (!(layout.lanes * layout.width * rounding <= width))
    problems.push_back(
        {"feed.lanes",
         fmt::format("{:g} lanes of {:.4g} mm need {:.4g} mm, but the loaded width is {:.4g} mm",
                     layout.lanes, 1000 * layout.width, 1000 * layout.lanes * layout.width,
                     1000 * width),
         "fewer lanes, or a wider feed.width"});
}

}  // namespace

ProductFlow resolve_pieces(const Line& line, const ProductCard& card,
                           std::vector<FlowProblem>& problems) {
  ProductFlow flow;
  Layout layout;
  if (!read_layout(line, layout, problems)) return flow;
  const double volume = layout.length * layout.width * layout.height;
  Factor mass{"feed.piece_mass", line.feed.piece_mass, 1, "kg"};
  Factor density = stated_density(line, card);
  // A mass stated for a piece counts before a density from the database.
  if (mass.value && !line.feed.bulk_density) density.value.reset();
  Factor rate = stated_rate(line, problems);
  if (!problems.empty()) return flow;
  Factor pieces{"feed.piece_rate", line.feed.piece_rate, 3600, "1/h"};
  if (!close(mass, {&density}, volume, problems)) return flow;
  if (!close(rate, {&pieces, &mass}, 1, problems)) return flow;
  if (!line.belt.speed || !(*line.belt.speed > 0)) {
    problems.push_back({"belt.speed",
                        "is needed: the gap between pieces does not follow from the "
                        "rate alone",
                        "give it, as in speed = \"0.6 m/min\""});
    return flow;
  }
  flow.speed = *line.belt.speed;
  flow.dry_solids = *rate.value;
  flow.width = line.feed.width.value_or(layout.lanes * layout.width);
  flow.depth = layout.height;
  const double pitch = layout.lanes * flow.speed / *pieces.value;
  check_overlap(layout, flow.width, pitch, flow.speed, problems);
  flow.coverage = layout.length * layout.width * layout.lanes / (flow.width * pitch);
  // Rounding in the inputs goes into the density, so that the stated rate is kept exactly.
  flow.dry_areal_mass = flow.dry_solids / (flow.width * flow.coverage * flow.speed);
  flow.dry_density = flow.dry_areal_mass / flow.depth;
  return flow;
}

}  // namespace lossline::flow_parts
