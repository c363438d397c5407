#include <fmt/format.h>

#include <cmath>

#include "planner/base/constants.h"
#include "planner/linefile/checks.h"

namespace lossline::linefile {
namespace {

namespace q = quantity;

void check_output(Checker& c, const Generator& generator, const std::string& path) {
  const auto above_rating = [&](const std::string& key, double value, const char* why) {
    if (c.sound({path + '.' + key, path + ".rated"}) && !(value <= generator.rated))
      c.report(path + '.' + key,
               fmt::format("{} is above the rating of {}", shown(value, q::power),
                           shown(generator.rated, q::power)),
               why);
  };
  above_rating("set_point", generator.set_point, "a generator gives its rated output at most");
  above_rating("minimum_stable", generator.minimum_stable,
               "the least stable output lies below the rating");
}

void check_shares(Checker& c, const Generator& generator, const std::string& path,
                  std::size_t shares) {
  const std::string feeds = path + ".feeds", key = path + ".shares";
  if (!c.sound({feeds, key})) return;
  const std::size_t count = generator.feeds.size();
  if (count == 0) {
    c.report(feeds, "is empty", "name the stretch that the power enters");
    return;
  }
  if (shares == 0 && count == 1) return;
  if (shares != count) {
    c.report(c.given(key) ? key : feeds,
             fmt::format("{} stretch{} named and {} share{} given", count,
                         count == 1 ? " is" : "es are", shares, shares == 1 ? " is" : "s are"),
             "give one share for each stretch, as in shares = [\"50 %\", \"50 %\"]");
    return;
  }
  double sum = 0;
  for (const FeedBranch& branch : generator.feeds) sum += branch.share;
  if (!(std::abs(sum - 1) <= 1e-6))
    c.report(key, fmt::format("the shares add up to {:.6g} %", 100 * sum),
             "the whole output goes somewhere: they add up to 100 %");
}

/// A run that is given carries the wave: its broad side is at least half a wavelength.
void check_run(Checker& c, const Generator& generator, const std::string& path) {
  const Run& run = generator.run;
  const std::string width = path + ".run_width", height = path + ".run_height";
  if (c.given(width) != c.given(height)) {
    c.report(c.given(width) ? height : width, "is missing",
             "a run has two inside dimensions; give both or none");
    return;
  }
  if (!c.given(width)) {
    if (c.given(path + ".run_length"))
      c.report(width, "is missing", "a run of stated length has two inside dimensions");
    return;
  }
  if (!c.sound({width, height})) return;
  if (!(run.height <= run.width))
    c.report(width,
             fmt::format("the broad side is {} and the narrow side {}",
                         shown(run.width, q::small_length), shown(run.height, q::small_length)),
             "the width of a run is its broad side");
  const double cutoff = 0.5 * speed_of_light / run.width;
  if (c.sound({path + ".frequency"}) && !(generator.frequency > cutoff))
    c.report(width,
             fmt::format("a guide {} wide carries nothing below {}, and '{}' works at {}",
                         shown(run.width, q::small_length), shown(cutoff, q::frequency),
                         generator.name, shown(generator.frequency, q::frequency)),
             fmt::format("the broad side is more than half a wavelength, {}",
                         shown(0.5 * speed_of_light / generator.frequency, q::small_length)));
}

}  // namespace

void check_power(Checker& c) {
  for (std::size_t g = 0; g < c.line.generators.size(); ++g) {
    const std::string path = member_path("generator", g);
    const Generator& generator = c.line.generators[g];
    check_output(c, generator, path);
    std::size_t shares = 0;
    while (c.given(member_path(path + ".shares", shares))) ++shares;
    // A list that came with --set has no members of its own.
    if (c.given(path + ".shares") && shares == 0) shares = generator.feeds.size();
    check_shares(c, generator, path, shares);
    check_run(c, generator, path);
  }
}

}  // namespace lossline::linefile
