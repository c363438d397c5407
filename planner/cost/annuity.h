#pragma once
// Capital cost as an equal yearly payment.
//
// Source: engineering-economy factor tables, e.g. D. G. Newnan, Engineering Economic Analysis
// (from memory).

namespace lossline::cost {

/// Capital recovery factor (A/P, i, n) = i (1+i)^n/((1+i)^n - 1); 1/n when i = 0.
///
///   interest  i, per year, 0 .. 1 (0.08 for 8 %)
///   years     n, > 0 .. 100; need not be whole
///   returns   yearly payment per unit of capital [1/year]
///   throws    Error out_of_range
[[nodiscard]] double capital_recovery_factor(double interest, double years);

/// Yearly payment for a sum borrowed today; capital >= 0 in any currency. Refusals as above.
[[nodiscard]] double annuity(double capital, double interest, double years);

}  // namespace lossline::cost
