#include "materials/goldens.h"

#include <fmt/format.h>

#include <cmath>

#include "materials/models.h"
#include "planner/base/error.h"

namespace lossline::materials {
namespace {

std::string state_text(const Query& q) {
  std::string out;
  const auto add = [&](const std::optional<double>& value, const char* format) {
    if (!value) return;
    if (!out.empty()) out += ", ";
    out += fmt::format(fmt::runtime(format), *value);
  };
  add(q.X, "X = {:.4g}");
  add(q.aw, "aw = {:g}");
  add(q.alpha, "alpha = {:g}");
  add(q.p, "p = {:g} Pa");
  add(q.T, "T = {:.2f} K");
  if (q.f) add(*q.f / 1e6, "f = {:g} MHz");
  if (q.band != "nominal") out += ", " + q.band;
  return out;
}

bool near(double got, double expected, double tolerance) {
  return std::abs(got - expected) <= tolerance * std::abs(expected) * (1 + 1e-9);
}

}  // namespace

std::optional<product::FoodComposition> read_composition(const Database& database,
                                                         const std::string& material) {
  Statement rows = database.prepare(
      "SELECT component, mass_frac FROM composition WHERE material_id = ?1 AND basis = 'wet'");
  rows.bind(1, material);
  product::FoodComposition out;
  bool any = false;
  while (rows.step()) {
    any = true;
    const std::string part = rows.text(0);
    const double share = rows.real(1);
    if (part == "water") out.water = share;
    if (part == "protein") out.protein = share;
    if (part == "fat") out.fat = share;
    if (part == "carbohydrate") out.carbohydrate = share;
    if (part == "fibre") out.fibre = share;
    if (part == "ash") out.ash = share;
  }
  if (!any) return std::nullopt;
  // Printed compositions rarely sum to exactly 1; the shares are of the sum.
  const double sum = out.water + out.protein + out.fat + out.carbohydrate + out.fibre + out.ash;
  for (double* share :
       {&out.water, &out.protein, &out.fat, &out.carbohydrate, &out.fibre, &out.ash})
    *share /= sum;
  return out;
}

std::vector<GoldenResult> run_goldens(const Database& database, const std::string& material) {
  Statement rows = database.prepare(
      "SELECT g.golden_id, g.dataset_id, g.X, g.T, g.f, g.aw, g.alpha, g.p, g.band, g.expect,"
      " g.expect_im, g.tol_rel, g.origin, d.material_id"
      " FROM golden g JOIN dataset d USING(dataset_id)"
      " WHERE ?1 = '' OR d.material_id = ?1 ORDER BY g.golden_id");
  rows.bind(1, material);
  std::vector<GoldenResult> out;
  while (rows.step()) {
    Query query{rows.real_or_none(2), rows.real_or_none(3), rows.real_or_none(4),
                rows.real_or_none(5), rows.real_or_none(6), rows.real_or_none(7),
                rows.text(8)};
    GoldenResult result;
    result.id = rows.text(0);
    result.dataset = rows.text(1);
    result.state = state_text(query);
    result.expected = rows.real(9);
    result.expected_im = rows.real_or_none(10);
    result.tolerance = rows.real(11);
    result.origin = rows.text(12);
    try {
      const DatasetRecord record = read_dataset(database, result.dataset);
      const auto value = evaluate(record, query, read_composition(database, rows.text(13)));
      result.got = value.real();
      if (result.expected_im) result.got_im = -value.imag();
      result.passed =
          near(result.got, result.expected, result.tolerance) &&
          (!result.expected_im || near(*result.got_im, *result.expected_im, result.tolerance));
      if (!result.passed) {
        result.failure = fmt::format("expected {:.6g}", result.expected);
        if (result.expected_im) result.failure += fmt::format(" - j{:.6g}", *result.expected_im);
        result.failure += fmt::format(", got {:.6g}", result.got);
        if (result.got_im) result.failure += fmt::format(" - j{:.6g}", *result.got_im);
        result.failure += fmt::format(" (tolerance {:g})", result.tolerance);
      }
    } catch (const Error& error) {
      result.failure = error.what();
    }
    out.push_back(std::move(result));
  }
  return out;
}

}  // namespace lossline::materials
