#include "planner/product/sorption.h"

#include <algorithm>
#include <cmath>
#include <limits>

#include "planner/product/range_check.h"
#include "planner/water/if97.h"

namespace lossline::product {
namespace {

/// Cells of the table of an isotherm: 40 bytes each, a few neighbours in use at a time.
constexpr std::size_t table_cells = 1024;
/// Share of the rise of ln a with X that the heat may not take away at either end of temperature.
constexpr double stability_margin = 0.1;
/// Passes of the three-point mean that round the corners of the heat.
constexpr int smoothing_passes = 6;

/// Boiling point of free water at one atmosphere [K]; IAPWS-IF97, 373.124.
constexpr double boiling_at_one_atmosphere = 373.124;

double middle(const Isotherm& isotherm) {
  return 0.5 * (isotherm.T_min + isotherm.T_max);
}

/// Slope of a monotone cubic at a knot between two secants of equal cells (Fritsch and Butland).
double monotone_slope(double left, double right) {
  return left * right > 0 ? 2 * left * right / (left + right) : 0;
}

/// q_net [J/kg] of the isotherm at X between the ends of its temperatures, not below 0.
double isotherm_heat(const Isotherm& isotherm, double X, double per_clapeyron) {
  const double cold = activity(isotherm, X, isotherm.T_min);
  const double hot = activity(isotherm, X, isotherm.T_max);
  if (!(cold > 0 && hot > cold)) return 0;
  return per_clapeyron * std::log(hot / cold) / (1 / isotherm.T_min - 1 / isotherm.T_max);
}

}  // namespace

Sorption::Sorption(const Isotherm& isotherm) {
  check(isotherm);
  reference_temperature_ =
      checked("middle temperature of the isotherm", middle(isotherm), "K", cold_end, hot_end);
  tabulate_activity(isotherm);
  std::vector<double> wanted(nodes_.size(), 0.0);
  if (isotherm.T_max - isotherm.T_min >= 1) {
    const double dry = moisture(isotherm, isotherm.activity_min, reference_temperature_);
    for (std::size_t i = 0; i < wanted.size(); ++i) {
      const double X = std::max(step_ * static_cast<double>(i), std::max(dry, 1e-3 * step_));
      wanted[i] = isotherm_heat(isotherm, X, 1 / clapeyron);
    }
  }
  tabulate_heat(isotherm, wanted);
}

Sorption::Sorption(const Isotherm& isotherm, double T_ref, const SorptionHeat& heat)
    : reference_temperature_(checked("reference temperature", T_ref, "K", cold_end, hot_end)) {
  check(isotherm);
  checked("net heat of sorption at zero moisture", heat.at_zero, "J/kg", 0, 1e7);
  checked("decay moisture of the heat of sorption", heat.decay_moisture, "kg/kg", 1e-6, 1e3);
  tabulate_activity(isotherm);
  std::vector<double> wanted(nodes_.size());
  for (std::size_t i = 0; i < wanted.size(); ++i)
    wanted[i] = heat.at_zero * std::exp(-step_ * static_cast<double>(i) / heat.decay_moisture);
  tabulate_heat(isotherm, wanted);
}

Sorption Sorption::free_water() {
  Sorption out;
  out.lay_out(free_water_ramp * (1 + half_width), 1);  // one cell: the ramp is straight
  for (std::size_t i = 0; i < 2; ++i) {
    out.nodes_[i].a = static_cast<double>(i) * (1 + half_width);
    out.nodes_[i].a_slope = 1 / free_water_ramp;
  }
  return out;
}

void Sorption::lay_out(double end, std::size_t cells) {
  per_reference_ = 1 / reference_temperature_;
  end_ = end;
  step_ = end / static_cast<double>(cells);
  per_step_ = 1 / step_;
  nodes_.assign(cells + 2, Node{});  // one spare: rounding may carry X just below end_ there
  nodes_.back().a = 1 + half_width;
}

void Sorption::tabulate_activity(const Isotherm& isotherm) {
  const double T = reference_temperature_;
  const double join = checked("moisture at activity 0.98", moisture(isotherm, 1 - half_width, T),
                              "kg/kg", 1e-6, moisture_top);
  auto slope_at = [&](double X) {
    const double d = 1e-5 * join;
    return (product::activity(isotherm, X + d, T) - product::activity(isotherm, X - d, T)) /
           (2 * d);
  };
  const double rise =
      checked("slope of the activity at 0.98", slope_at(join), "1", half_width / moisture_top, 1e9);
  lay_out(join + 2 * half_width / rise, table_cells);
  for (std::size_t i = 1; i < nodes_.size() - 1; ++i) {
    const double X = step_ * static_cast<double>(i), beyond = rise * (X - join);
    if (beyond < 0) {
      nodes_[i].a = product::activity(isotherm, X, T);
      nodes_[i].a_slope = X > 2e-5 * join ? slope_at(X) : 0;
    } else {
      nodes_[i].a = 1 - half_width + beyond;
      nodes_[i].a_slope = rise;
    }
  }
  nodes_[0].a_slope = nodes_[1].a * per_step_;
  // a cubic is monotone when its end slopes are at most three times the secant
  for (std::size_t i = 0; i + 2 < nodes_.size(); ++i) {
    const double most = 3 * (nodes_[i + 1].a - nodes_[i].a) * per_step_;
    for (Node* n : {&nodes_[i], &nodes_[i + 1]}) n->a_slope = std::clamp(n->a_slope, 0.0, most);
  }
}

/// Temperature at which the product at a knot, binding heat q, boils at one atmosphere [K].
double Sorption::boiling(const Node& node, double q, double least) const {
  double low = least, high = hot_end;
  for (int round = 0; round < 12; ++round) {
    const double T = 0.5 * (low + high);
    const double a = node.a * std::exp(q * clapeyron * (1 / reference_temperature_ - 1 / T));
    (std::min(a, 1.0) * water::saturation_pressure(T) < standard_pressure ? low : high) = T;
  }
  return low;
}

void Sorption::limit_heat(const std::vector<double>& wanted, double least_hot) {
  const std::size_t last = nodes_.size() - 2;
  for (std::size_t i = 0; i < last; ++i) nodes_[i].q = wanted[i];
  nodes_[last].q = 0;
  // ln a must not fall with X at either end of temperature: q may fall only so much, and rise only
  // so much, from knot to knot. The largest such q below the wanted one takes one sweep each way.
  auto steepness = [](const Node& n) { return n.a > 0 ? n.a_slope / n.a : 1e300; };
  auto room = [&](std::size_t i, double T) {
    const double factor = clapeyron * std::abs(1 / reference_temperature_ - 1 / T);
    return (1 - stability_margin) * step_ *
           std::min(steepness(nodes_[i]), steepness(nodes_[i + 1])) / std::max(factor, 1e-30);
  };
  for (std::size_t i = last; i-- > 0;) {
    const double most = nodes_[i + 1].q + room(i, boiling(nodes_[i], wanted[i], least_hot));
    nodes_[i].q = std::min(nodes_[i].q, most);
  }
  for (std::size_t i = 0; i < last; ++i)
    nodes_[i + 1].q = std::min(nodes_[i + 1].q, nodes_[i].q + room(i, cold_end));
  for (int pass = 0; pass < smoothing_passes; ++pass) {
    double left = nodes_[0].q;
    for (std::size_t i = 1; i < last; ++i) {
      const double here = nodes_[i].q;
      nodes_[i].q = 0.25 * left + 0.5 * here + 0.25 * nodes_[i + 1].q;
      left = here;
    }
  }
}

void Sorption::tabulate_heat(const Isotherm& isotherm, const std::vector<double>& wanted) {
  limit_heat(wanted, std::clamp(isotherm.T_max, boiling_at_one_atmosphere, hot_end));
  const std::size_t last = nodes_.size() - 2;
  const double largest = *std::max_element(wanted.begin(), wanted.end());
  for (std::size_t i = 1; i < last; ++i) {
    const bool counts = nodes_[i].a >= isotherm.activity_min &&
                        nodes_[i].a <= isotherm.activity_max && wanted[i] > 0.01 * largest;
    if (counts) heat_reduction_ = std::max(heat_reduction_, 1 - nodes_[i].q / wanted[i]);
  }
  for (std::size_t i = 1; i < last; ++i)
    nodes_[i].q_slope = monotone_slope((nodes_[i].q - nodes_[i - 1].q) * per_step_,
                                       (nodes_[i + 1].q - nodes_[i].q) * per_step_);
  for (std::size_t i = 0; i < last; ++i)
    nodes_[i + 1].Qb = nodes_[i].Qb + 0.5 * step_ * (nodes_[i].q + nodes_[i + 1].q) +
                       step_ * step_ / 12 * (nodes_[i].q_slope - nodes_[i + 1].q_slope);
  nodes_.back().Qb = nodes_[last].Qb;
}

ActivityValue Sorption::log_activity(double X, double T) const {
  const ActivityValue value = activity(X, T);
  return {std::log(value.a), value.da_dX / value.a, value.da_dT / value.a};
}

double Sorption::equilibrium_moisture(double aw, double T) const {
  checked("water activity", aw, "1", 0, std::numeric_limits<double>::max());
  checked("temperature", T, "K", cold_end, hot_end);
  if (aw >= 1) return end_;
  if (aw == 0) return 0;
  std::size_t low = 0, high = nodes_.size() - 2;
  while (high - low > 1) {
    const std::size_t half = (low + high) / 2;
    (activity(step_ * static_cast<double>(half), T).a < aw ? low : high) = half;
  }
  double left = step_ * static_cast<double>(low), right = step_ * static_cast<double>(high);
  double X = 0.5 * (left + right);
  for (int round = 0; round < 60; ++round) {
    const ActivityValue value = activity(X, T);
    (value.a < aw ? left : right) = X;
    double next = value.da_dX > 0 ? X - (value.a - aw) / value.da_dX : left;
    if (!(next > left && next < right)) next = 0.5 * (left + right);
    if (std::abs(next - X) <= 1e-15 * end_) return next;
    X = next;
  }
  return X;
}

}  // namespace lossline::product
