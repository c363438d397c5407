#include "planner/product/permittivity_table.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <tuple>
#include <utility>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/numerics/monotone_cubic.h"

namespace lossline {
namespace {

std::string place_of(const PermittivityPoint& p) {
  return fmt::format("f = {:g} MHz, T = {:g} degC, X = {:g}", p.frequency / 1e6,
                     p.temperature - celsius_zero, p.moisture);
}

[[noreturn]] void refuse(const std::string& name, const std::string& what) {
  throw Error(ErrorKind::bad_input, name + ": " + what);
}

void check_point(const PermittivityPoint& p, const std::string& name) {
  const bool placed = std::isfinite(p.moisture) && p.moisture >= 0 &&
                      std::isfinite(p.temperature) && p.temperature > 0 &&
                      std::isfinite(p.frequency) && p.frequency > 0;
  if (!placed)
    refuse(name,
           "a point needs moisture >= 0, temperature > 0 K and frequency > 0, got " + place_of(p));
  const bool possible = std::isfinite(p.eps.real()) && p.eps.real() >= 1 &&
                        std::isfinite(p.eps.imag()) && p.eps.imag() <= 0;
  if (!possible)
    refuse(name, fmt::format("eps' = {:g}, eps'' = {:g} at {} is impossible; eps' >= 1, eps'' >= 0",
                             p.eps.real(), -p.eps.imag(), place_of(p)));
}

/// How far beyond a span [lo, hi] a value is: 0 inside.
double beyond(double value, double lo, double hi) {
  return std::max({lo - value, value - hi, 0.0});
}

}  // namespace

PermittivityTable::PermittivityTable(const std::vector<PermittivityPoint>& points,
                                     PermittivityTableOptions options)
    : options_(std::move(options)) {
  if (points.empty()) refuse(options_.name, "no points");
  std::vector<PermittivityPoint> sorted = points;
  log_loss_ = !options_.dry || options_.dry->imag() < 0;
  for (const PermittivityPoint& p : sorted) {
    check_point(p, options_.name);
    log_loss_ = log_loss_ && p.eps.imag() < 0;
  }
  if (options_.dry) {
    check_point({1e9, 0, 293.15, *options_.dry}, options_.name + ", dry solid");
    dry_ = transformed(*options_.dry);
  }
  std::sort(sorted.begin(), sorted.end(), [](const auto& a, const auto& b) {
    return std::tie(a.frequency, a.temperature, a.moisture) <
           std::tie(b.frequency, b.temperature, b.moisture);
  });
  moisture_min_ = moisture_max_ = sorted.front().moisture;
  temperature_min_ = temperature_max_ = sorted.front().temperature;
  for (const PermittivityPoint& p : sorted) {
    moisture_min_ = std::min(moisture_min_, p.moisture);
    moisture_max_ = std::max(moisture_max_, p.moisture);
    temperature_min_ = std::min(temperature_min_, p.temperature);
    temperature_max_ = std::max(temperature_max_, p.temperature);
    if (sheets_.empty() || p.frequency > sheets_.back().frequency)
      sheets_.push_back({p.frequency, std::log(p.frequency), {}});
    auto& rows = sheets_.back().rows;
    if (rows.empty() || p.temperature > rows.back().temperature + temperature_step_min)
      rows.push_back({p.temperature, {}, {}, {}});
    Row& row = rows.back();
    const auto at = std::lower_bound(row.X.begin(), row.X.end(), p.moisture);
    if (at != row.X.end() && *at == p.moisture)
      refuse(options_.name, "two points at " + place_of(p));
    row.value.insert(row.value.begin() + (at - row.X.begin()), transformed(p.eps));
    row.X.insert(at, p.moisture);
  }
  for (Sheet& sheet : sheets_) {
    const bool one_moisture = std::all_of(sheet.rows.begin(), sheet.rows.end(),
                                          [](const Row& row) { return row.X.size() == 1; });
    for (Row& row : sheet.rows) {
      if (row.X.size() == 1 && !one_moisture)
        refuse(options_.name,
               fmt::format("{:g} degC at {:g} MHz has a single moisture; give each temperature two "
                           "or more",
                           row.temperature - celsius_zero, sheet.frequency / 1e6));
      if (row.X.size() < 4) continue;
      std::vector<double> re, im;
      for (const Pair& v : row.value) {
        re.push_back(v.re);
        im.push_back(v.im);
      }
      const numerics::MonotoneCubic curve_re(row.X, std::move(re), numerics::Outside::hold);
      const numerics::MonotoneCubic curve_im(row.X, std::move(im), numerics::Outside::hold);
      for (std::size_t i = 0; i < row.X.size(); ++i)
        row.slope.push_back({curve_re.slopes()[i], curve_im.slopes()[i]});
    }
  }
}

PermittivityTable::Pair PermittivityTable::transformed(std::complex<double> eps) const {
  return {std::cbrt(eps.real()), log_loss_ ? std::log(-eps.imag()) : -eps.imag()};
}

PermittivityTable::Pair PermittivityTable::along_moisture(const Row& row, double X,
                                                          Flags& flags) const {
  const double lo = row.X.front(), hi = row.X.back(), span = hi - lo;
  if (X < lo) {
    flags |= flag::extrapolated;
    if (!dry_) return row.value.front();
    const double share = X / lo;
    return {dry_->re + share * (row.value.front().re - dry_->re),
            dry_->im + share * (row.value.front().im - dry_->im)};
  }
  if (X > hi) {
    // With a single moisture the span is zero: any other moisture is beyond the allowance.
    flags |= X - hi <= allowance_share * span ? flag::extrapolated : flag::clamped;
    return row.value.back();
  }
  if (span == 0) return row.value.front();
  if (std::min(X - lo, hi - X) < edge_share * span) flags |= flag::edge;
  if (X == hi) return row.value.back();
  const auto upper = std::upper_bound(row.X.begin(), row.X.end(), X);
  const auto i = static_cast<std::size_t>(upper - row.X.begin()) - 1;
  const double h = row.X[i + 1] - row.X[i], t = (X - row.X[i]) / h;
  const Pair &v0 = row.value[i], &v1 = row.value[i + 1];
  if (row.slope.empty()) return {v0.re + t * (v1.re - v0.re), v0.im + t * (v1.im - v0.im)};
  const double t2 = t * t, t3 = t2 * t;
  const double h01 = 3 * t2 - 2 * t3, h10 = (t3 - 2 * t2 + t) * h, h11 = (t3 - t2) * h;
  const Pair &s0 = row.slope[i], &s1 = row.slope[i + 1];
  return {v0.re + h01 * (v1.re - v0.re) + h10 * s0.re + h11 * s1.re,
          v0.im + h01 * (v1.im - v0.im) + h10 * s0.im + h11 * s1.im};
}

PermittivityTable::Pair PermittivityTable::along_temperature(const Sheet& sheet, double X, double T,
                                                             Flags& flags) const {
  const auto& rows = sheet.rows;
  const double lo = rows.front().temperature, hi = rows.back().temperature, span = hi - lo;
  if (rows.size() == 1) {
    if (beyond(T, lo, hi) > allowance_temperature) flags |= flag::extrapolated;
    return along_moisture(rows.front(), X, flags);
  }
  const double allowance = std::max(allowance_temperature, allowance_share * span);
  const double distance = beyond(T, lo, hi);
  if (distance > 0) flags |= distance <= allowance ? flag::extrapolated : flag::clamped;
  if (distance == 0 && std::min(T - lo, hi - T) < edge_share * span) flags |= flag::edge;
  const double held = std::clamp(T, lo - allowance, hi + allowance);
  std::size_t i = 0;
  while (i + 2 < rows.size() && held > rows[i + 1].temperature) ++i;
  const Pair v0 = along_moisture(rows[i], X, flags), v1 = along_moisture(rows[i + 1], X, flags);
  const double t = (held - rows[i].temperature) / (rows[i + 1].temperature - rows[i].temperature);
  return {v0.re + t * (v1.re - v0.re), v0.im + t * (v1.im - v0.im)};
}

Valued<std::complex<double>> PermittivityTable::at(double moisture, double temperature,
                                                   double frequency) const {
  const bool usable =
      moisture >= -1e-9 && std::isfinite(moisture) && temperature > 0 && std::isfinite(temperature);
  if (!usable)
    throw Error(ErrorKind::out_of_range,
                fmt::format("{}: moisture {:g} or temperature {:g} K is not possible",
                            options_.name, moisture, temperature));
  const double X = std::max(moisture, 0.0);
  Valued<std::complex<double>> out;
  out.flags = options_.origin;
  Pair pair;
  const Sheet* below = nullptr;
  const Sheet* above = nullptr;
  const Sheet* nearest = nullptr;
  for (const Sheet& sheet : sheets_) {
    const double distance = std::abs(frequency / sheet.frequency - 1);
    if (distance <= frequency_tolerance &&
        (nearest == nullptr || distance < std::abs(frequency / nearest->frequency - 1)))
      nearest = &sheet;
    if (sheet.frequency < frequency) below = &sheet;
    if (sheet.frequency > frequency && above == nullptr) above = &sheet;
  }
  if (nearest != nullptr) {
    pair = along_temperature(*nearest, X, temperature, out.flags);
  } else if (below != nullptr && above != nullptr) {
    const Pair v0 = along_temperature(*below, X, temperature, out.flags);
    const Pair v1 = along_temperature(*above, X, temperature, out.flags);
    const double t = (std::log(frequency) - below->log_frequency) /
                     (above->log_frequency - below->log_frequency);
    pair = {v0.re + t * (v1.re - v0.re), v0.im + t * (v1.im - v0.im)};
  } else {
    throw Error(ErrorKind::out_of_range, fmt::format("{}: no value at {:g} MHz; available: {}",
                                                     options_.name, frequency / 1e6, ranges()));
  }
  double re = pair.re * pair.re * pair.re;
  double im = log_loss_ ? std::exp(pair.im) : pair.im;
  if (!(re >= 1)) {
    re = 1;
    out.flags |= flag::guarded;
  }
  if (!(im >= 0)) {
    im = 0;
    out.flags |= flag::guarded;
  }
  out.value = {re, -im};
  return out;
}

std::string PermittivityTable::ranges() const {
  std::string frequencies;
  for (const Sheet& sheet : sheets_)
    frequencies += fmt::format("{}{:g}", frequencies.empty() ? "" : ", ", sheet.frequency / 1e6);
  return fmt::format("{} MHz, moisture {:g} to {:g} dry basis, {:g} to {:g} degC", frequencies,
                     moisture_min_, moisture_max_, temperature_min_ - celsius_zero,
                     temperature_max_ - celsius_zero);
}

}  // namespace lossline
