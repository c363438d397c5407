#include "planner/field/validity.h"

#include <fmt/format.h>

#include <algorithm>
#include <limits>

#include "planner/base/constants.h"
#include "planner/field/range.h"

namespace lossline::field {
namespace {

void add_size(const ValidityInput& in, double lambda, std::vector<ValidityFlag>& out) {
  const double sides[] = {in.length, in.width, in.height};
  const double least = *std::min_element(std::begin(sides), std::end(sides)) / lambda;
  if (least >= good_size) return;
  if (least < least_size)
    out.push_back(
        {ValidityKind::small_cavity, ValidityGrade::unusable,
         fmt::format("The smallest side of the cavity is {:.1f} wavelengths; below {:.0f} "
                     "single modes decide and the power balance does not hold.",
                     least, least_size)});
  else
    out.push_back({ValidityKind::small_cavity, ValidityGrade::caution,
                   fmt::format("The smallest side of the cavity is {:.1f} wavelengths; the power "
                               "balance was compared with field solutions above {:.0f} only.",
                               least, good_size)});
}

void add_overlap(const ValidityInput& in, std::vector<ValidityFlag>& out) {
  if (in.modal_overlap > good_overlap) return;
  if (in.modal_overlap < least_overlap)
    out.push_back({ValidityKind::few_modes, ValidityGrade::unusable,
                   fmt::format("Only {:.2g} modes lie within one resonance width; below {:.0f} the "
                               "power in the bed depends on single modes and cannot be planned "
                               "from a balance.",
                               in.modal_overlap, least_overlap)});
  else
    out.push_back({ValidityKind::few_modes, ValidityGrade::caution,
                   fmt::format("Only {:.1f} modes lie within one resonance width; at a fixed "
                               "frequency the ratio of bed to other sinks may be off by 50 %, "
                               "right on average only.",
                               in.modal_overlap)});
}

void add_bed(const ValidityInput& in, double lambda, std::vector<ValidityFlag>& out) {
  if (!(in.bed_depth > 0)) return;
  if (in.bed_depth < thin_depth * lambda)
    out.push_back({ValidityKind::thin_bed, ValidityGrade::caution,
                   fmt::format("The bed is {:.1f} mm deep, less than a tenth of the wavelength "
                               "({:.0f} mm); diffraction at its edges is not in the balance.",
                               in.bed_depth * 1e3, lambda * 1e3)});
  if (in.bed_absorptance && *in.bed_absorptance < weak_absorptance)
    out.push_back({ValidityKind::weak_bed, ValidityGrade::caution,
                   fmt::format("The bed takes {:.1f} % of the power that falls on it; the ratio of "
                               "bed to other sinks is uncertain by 15 %, and its side faces "
                               "matter.",
                               *in.bed_absorptance * 100)});
  else if (in.bed_share < weak_share)
    out.push_back({ValidityKind::weak_bed, ValidityGrade::caution,
                   fmt::format("The bed takes {:.0f} % of the launched power; launchers, walls, "
                               "belt and openings together take more than the product.",
                               in.bed_share * 100)});
}

}  // namespace

std::vector<ValidityFlag> validity_flags(const ValidityInput& input) {
  const double lambda = speed_of_light / frequency_in_range(input.frequency);
  constexpr double tiny = std::numeric_limits<double>::min();
  constexpr double infinite = std::numeric_limits<double>::infinity();
  in_range("cavity length", input.length, "m", tiny, largest_length);
  in_range("cavity width", input.width, "m", tiny, largest_length);
  in_range("cavity height", input.height, "m", tiny, largest_length);
  in_range("bed depth", input.bed_depth, "m", 0, largest_length);
  in_range("modal overlap", input.modal_overlap, "(1)", 0, infinite);
  // Rounding may carry a share a little past its ends.
  in_range("bed share", input.bed_share, "(1)", -1e-6, infinite);
  if (input.bed_absorptance)
    in_range("absorptance of the bed", *input.bed_absorptance, "(1)", 0, 1 + 1e-9);
  std::vector<ValidityFlag> out;
  add_size(input, lambda, out);
  add_overlap(input, out);
  add_bed(input, lambda, out);
  return out;
}

double cautious_bed_share(double unmixed_share) {
  constexpr double infinite = std::numeric_limits<double>::infinity();
  const double share = std::min(in_range("bed share", unmixed_share, "(1)", 0, infinite), 1.0);
  return cautious_ratio * share / (1 - share + cautious_ratio * share);
}

}  // namespace lossline::field
