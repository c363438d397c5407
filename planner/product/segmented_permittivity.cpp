#include "planner/product/segmented_permittivity.h"

#include <algorithm>

#include "planner/product/range_check.h"

namespace lossline::product {
namespace {

double along(const TwoSegments& line, double beyond) {
  return line.at_critical + beyond * (beyond < 0 ? line.slope_below : line.slope_above);
}

}  // namespace

std::complex<double> segmented_permittivity(const SegmentedPermittivity& model, double moisture) {
  checked("critical moisture", model.critical_moisture, "kg/kg", 0, 100);
  const double beyond = checked("moisture", moisture, "kg/kg", 0, 100) - model.critical_moisture;
  const double root = std::max(along(model.root, beyond), 1.0);
  return {root * root, -std::max(along(model.loss, beyond), 0.0)};
}

}  // namespace lossline::product
