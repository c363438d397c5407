#pragma once
// Refusals of numbers the field functions cannot use.

namespace lossline::field {

inline constexpr double highest_frequency = 1e12;  ///< [Hz]; above it metals are no longer metals
inline constexpr double largest_length = 1e3;      ///< [m], of anything in a line

/// Hands a value back when it lies in its range.
///
///   quantity   name for the message
///   value      must lie in low .. high, both included; NaN never does
///   unit       for the message
///   returns    value
///   throws     Error out_of_range that names quantity, value, unit and range
double in_range(const char* quantity, double value, const char* unit, double low, double high);

/// A frequency [Hz], above 0 and not above highest_frequency; otherwise as in_range.
double frequency_in_range(double frequency);

}  // namespace lossline::field
