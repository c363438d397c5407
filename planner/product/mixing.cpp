#include "planner/product/mixing.h"

#include <cmath>
#include <limits>

#include "planner/base/error.h"
#include "planner/product/range_check.h"

namespace lossline::product {
namespace {

using Complex = std::complex<double>;
constexpr double huge = std::numeric_limits<double>::max();

void check_eps(Complex eps) {
  checked("eps' of a constituent", eps.real(), "1", std::numeric_limits<double>::min(), huge);
  checked("eps'' of a constituent", -eps.imag(), "1", 0, huge);
}

void check_parts(std::span<const Constituent> parts) {
  double sum = 0;
  for (const Constituent& part : parts) {
    sum += checked("share of volume", part.share, "1", 0, 1);
    check_eps(part.eps);
  }
  checked("sum of the shares of volume", sum, "1", 1 - 1e-9, 1 + 1e-9);
}

}  // namespace

Complex lichtenecker(std::span<const Constituent> parts) {
  check_parts(parts);
  Complex sum = 0;
  for (const Constituent& part : parts) sum += part.share * std::log(part.eps);
  return std::exp(sum);
}

Complex power_law(std::span<const Constituent> parts, double a) {
  checked("exponent of the mixing rule", a, "1", -1, 1);
  if (a == 0) return lichtenecker(parts);
  check_parts(parts);
  Complex sum = 0;
  for (const Constituent& part : parts) sum += part.share * std::pow(part.eps, a);
  return std::pow(sum, 1 / a);
}

Complex crim(std::span<const Constituent> parts) {
  check_parts(parts);
  Complex sum = 0;
  for (const Constituent& part : parts) sum += part.share * std::sqrt(part.eps);
  return sum * sum;
}

Complex looyenga(std::span<const Constituent> parts) {
  return power_law(parts, 1.0 / 3);
}

Complex wiener_upper(std::span<const Constituent> parts) {
  check_parts(parts);
  Complex sum = 0;
  for (const Constituent& part : parts) sum += part.share * part.eps;
  return sum;
}

Complex wiener_lower(std::span<const Constituent> parts) {
  check_parts(parts);
  Complex sum = 0;
  for (const Constituent& part : parts) sum += part.share / part.eps;
  return 1.0 / sum;
}

Complex maxwell_garnett(Complex host, Complex inclusion, double share) {
  check_eps(host);
  check_eps(inclusion);
  checked("share of volume", share, "1", 0, 1);
  const Complex difference = inclusion - host;
  return host + 3 * share * host * difference / (inclusion + 2.0 * host - share * difference);
}

Complex bruggeman(std::span<const Constituent> parts) {
  Complex eps = lichtenecker(parts);
  for (int round = 0; round < 2000; ++round) {
    Complex above = 0, below = 0;
    for (const Constituent& part : parts) {
      const Complex weight = part.share / (part.eps + 2.0 * eps);
      above += weight * part.eps;
      below += weight;
    }
    const Complex next = above / below;
    if (std::abs(next - eps) <= 1e-13 * std::abs(next)) return next;
    eps = next;
  }
  throw Error(ErrorKind::internal, "the symmetric mixing rule did not converge in 2000 rounds");
}

Complex at_density(Complex eps, double from, double to) {
  check_eps(eps);
  checked("bulk density", from, "kg/m3", std::numeric_limits<double>::min(), huge);
  checked("bulk density", to, "kg/m3", std::numeric_limits<double>::min(), huge);
  const Complex root = (std::pow(eps, 1.0 / 3) - 1.0) * (to / from) + 1.0;
  return root * root * root;
}

}  // namespace lossline::product
