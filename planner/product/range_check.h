#pragma once
// The one way the product models refuse an argument: a value that passes comes back unchanged, a
// value outside its range or not a number throws.

namespace lossline::product {

/// Passes `value` on when low <= value <= high.
///
///   quantity  what it is, as the message names it
///   unit      of all three numbers; "1" for a plain number
///   throws    Error out_of_range "quantity = value unit is outside [low, high] unit"; NaN never
///             passes
double checked(const char* quantity, double value, const char* unit, double low, double high);

}  // namespace lossline::product
