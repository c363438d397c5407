#pragma once
// Where the cavity balance can be trusted and how far, each caution with a sentence for the reader.
//
// Source: comparison of the balance of planner/field/cavity_network.h with three-dimensional
//   time-domain solutions of eight loaded boxes (own study; 4 to 5 wavelengths a side, bed share
//   0.23 to 0.81): the ratio of bed to other sinks came out 1.02 to 1.27 times too high without
//   mixing, mean 1.10, and up to 2.2 times with complete mixing. Limits on modal overlap follow
//   common practice for reverberation chambers.

#include <optional>
#include <string>
#include <vector>

namespace lossline::field {

inline constexpr double good_size = 4;           ///< every side above so many wavelengths
inline constexpr double least_size = 2;          ///< below it the balance is no model at all
inline constexpr double good_overlap = 5;        ///< modal overlap of a well mixed field
inline constexpr double least_overlap = 1;       ///< below it single modes decide
inline constexpr double thin_depth = 0.1;        ///< bed depth over free-space wavelength
inline constexpr double weak_absorptance = 0.1;  ///< diffuse absorptance of a weak bed
inline constexpr double weak_share = 0.5;        ///< below it the other sinks together take more
inline constexpr double cautious_ratio = 0.75;   ///< true over unmixed ratio, low end of the study

enum class ValidityKind { small_cavity, few_modes, thin_bed, weak_bed };

enum class ValidityGrade {
  caution,  ///< the result stands with a wider band
  unusable  ///< the model does not hold
};

/// One caution.
struct ValidityFlag {
  ValidityKind kind = ValidityKind::small_cavity;
  ValidityGrade grade = ValidityGrade::caution;
  std::string sentence;  ///< complete sentence with the numbers
};

/// One cavity as solved.
struct ValidityInput {
  double frequency = 0;                      ///< [Hz], > 0
  double length = 0, width = 0, height = 0;  ///< inside [m], > 0
  double bed_depth = 0;                      ///< thinnest bed in the cavity [m]; 0 = no bed
  double modal_overlap = 0;                  ///< planner/field/cavity_modes.h
  double bed_share = 0;                      ///< of the launched power, 0..1
  /// Cosine-weighted absorptance of the bed (mean_bed_absorptance), 0..1, when known.
  std::optional<double> bed_absorptance;
};

/// The cautions that apply, none for a large cavity with a strong bed.
///
///   throws  Error out_of_range
std::vector<ValidityFlag> validity_flags(const ValidityInput& input);

/// Low bound of the bed's share: the ratio of bed to everything else at no mixing, times 0.75.
///
///   unmixed_share  share of launched power in the bed at mixing 0, >= 0; above 1 (a cavity that
///                  lives on its neighbours) it says nothing about the other sinks and counts as 1
///   returns        0..1
///   throws         Error out_of_range
double cautious_bed_share(double unmixed_share);

}  // namespace lossline::field
