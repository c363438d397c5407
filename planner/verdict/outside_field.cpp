#include "planner/verdict/outside_field.h"

#include <algorithm>

#include "planner/field/openings.h"

namespace lossline::verdict {

double strictest_level(double frequency) {
  const double MHz = 1e-6 * frequency;
  return MHz < 2000 ? std::min(equipment_level, MHz / 40) : equipment_level;
}

std::optional<OutsideField> outside_field(const EndTrap& trap, const EndReport& end) {
  if (!(end.arriving > 0) || !(end.leaving >= 0) || !(end.frequency > 0)) return std::nullopt;
  const field::LeakEstimate estimate = field::leak_estimate(
      end.frequency, trap.opening.width, trap.opening.height, end.leaving, survey_distance);
  OutsideField out;
  out.low = estimate.low;
  out.high = estimate.high;
  out.level = strictest_level(end.frequency);
  if (out.high < out.level)
    out.word = "below";
  else
    out.word = out.low > out.level ? "above" : "near";
  return out;
}

}  // namespace lossline::verdict
