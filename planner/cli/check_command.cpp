#include <fmt/format.h>

#include <algorithm>
#include <ostream>

#include "planner/cli/commands.h"
#include "planner/cli/exit_codes.h"
#include "planner/cli/load.h"
#include "planner/report/shown.h"

namespace lossline::cli {

int check_command(const Options& options, const std::string& program, std::ostream& out) {
  using namespace report;
  const Input input = load(options, program);
  const ProductFlow& f = input.flow;
  const Setting set{options.units, false};
  double length = 0, heated = 0;
  for (const Stretch& s : input.line.stretches) {
    length += s.length;
    if (s.kind == StretchKind::microwave) heated += s.length;
  }
  out << fmt::format("{}: sound\n", options.file);
  out << fmt::format("  {} of {} at {}\n", with_unit(Shown::mass_rate, f.feed, set),
                     input.card.name.empty() ? input.card.id : input.card.name,
                     both_bases(input.line.duty.feed_moisture));
  out << fmt::format(
      "  {} deep, {} wide, {} dry, belt {}", with_unit(Shown::small_length, f.depth, set),
      with_unit(Shown::length, f.width, set), with_unit(Shown::areal_mass, f.dry_areal_mass, set),
      with_unit(Shown::speed, f.speed, set));
  out << (f.coverage < 1 ? fmt::format(", {} % covered\n", figures(100 * f.coverage)) : "\n");
  out << fmt::format("  {} stretches, {} in all and {} in cavities, {} min; {} generator{}\n",
                     input.line.stretches.size(), with_unit(Shown::length, length, set),
                     with_unit(Shown::length, heated, set), figures(length / f.speed / 60),
                     input.line.generators.size(), input.line.generators.size() == 1 ? "" : "s");
  return exit_ok;
}

}  // namespace lossline::cli
