#include "materials/models.h"

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/product/permittivity_models.h"
#include "planner/product/permittivity_table.h"

namespace lossline::materials {
namespace {

[[noreturn]] void refuse(const DatasetRecord& record, const std::string& what) {
  throw Error(ErrorKind::database, "data set '" + record.id + "': " + what);
}

double need(const DatasetRecord& record, const std::optional<double>& value, const char* name) {
  if (!value) refuse(record, std::string("its form needs ") + name);
  return *value;
}

PermittivitySet table_of(const DatasetRecord& record) {
  std::vector<PermittivityPoint> points;
  for (const PointRecord& p : record.points)
    points.push_back({need(record, p.f, "f"),
                      need(record, p.X, "X"),
                      need(record, p.T, "T"),
                      {p.value, -p.value_im.value_or(0)}});
  PermittivityTableOptions options;
  options.origin = record.provenance.flags();
  options.name = record.id;
  return {std::make_shared<PermittivityTable>(points, options), nullptr, nullptr};
}

product::MineralBody mineral_of(const DatasetRecord& record) {
  product::MineralBody body;
  body.sand = record.param("sand");
  body.clay = record.param("clay");
  body.dry_density = record.param("dry_density");
  body.solid_density = record.param("solid_density");
  body.solid = {record.param("solid_re"), -record.param("solid_im")};
  return body;
}

product::BoardMaterial board_of(const DatasetRecord& record) {
  const auto range = record.ranges.find("f");
  if (range == record.ranges.end()) refuse(record, "its form needs a range of f");
  return {record.param("a"), record.param("c"), record.param("d"), range->second.lo,
          range->second.hi};
}

EstimateInputs estimate_of(const DatasetRecord& record) {
  EstimateInputs in;
  in.composition.dry_bulk_density = record.param("dry_bulk_density");
  in.composition.solid_density = record.param("solid_density");
  in.composition.solid = {record.param("solid_re"), -record.param("solid_im")};
  in.composition.bound_moisture = record.param("bound_moisture");
  in.composition.conductivity = record.param("conductivity");
  in.composition.fibrous_sheet = record.param_or("fibrous_sheet", 0) > 0.5;
  in.shrinkage = record.param_or("shrinkage", 0);
  return in;
}

product::ArrheniusConstant arrhenius(const DatasetRecord& record, const std::string& name) {
  return {record.param(name), record.param_or(name + "_q", 0)};
}

product::IsothermForm isotherm_form(const DatasetRecord& r) {
  if (r.form == "gab")
    return product::Gab{arrhenius(r, "Xm"), arrhenius(r, "C"), arrhenius(r, "K")};
  if (r.form == "oswin")
    return product::Oswin{r.param("k0"), r.param("k1"), r.param("n0"), r.param("n1")};
  if (r.form == "modified_henderson")
    return product::ModifiedHenderson{r.param("A"), r.param("B"), r.param("C")};
  if (r.form == "modified_chung_pfost")
    return product::ModifiedChungPfost{r.param("A"), r.param("B"), r.param("C")};
  if (r.form == "hailwood_horrobin") return product::HailwoodHorrobin{};
  if (r.form == "toth")
    return product::Toth{r.param("ws"), r.param("b0"), r.param("Q"), r.param("n0"), r.param("c")};
  if (r.form == "freundlich") return product::Freundlich{r.param("a"), r.param("n")};
  refuse(r, "'" + r.form + "' is not an isotherm");
}

product::ThermalProperties food_at(const DatasetRecord& record,
                                   const std::optional<product::FoodComposition>& composition,
                                   double X, double T) {
  if (!composition) refuse(record, "its form needs the composition of the material");
  return product::food_properties(product::at_moisture(*composition, X), T);
}

double fresh_moisture(const product::FoodComposition& c) {
  return c.water / (c.protein + c.fat + c.carbohydrate + c.fibre + c.ash);
}

double thermal(const DatasetRecord& record, const product::ThermalProperties& at) {
  if (record.quantity == "cp") return at.heat_capacity;
  if (record.quantity == "k") return at.conductivity;
  return at.density;
}

std::complex<double> evaluate_eps(const DatasetRecord& record, const Query& query) {
  const double f = need(record, query.f, "f");
  // Some printed check values of a form hold at the temperature of its fit and state none.
  if (record.form == "leaf_dual_dispersion" && !query.T) {
    const double X = need(record, query.X, "X");
    return product::leaf_permittivity(X / (1 + X), f);
  }
  const PermittivitySet set = permittivity_of(record);
  const auto& curve = query.band == "low" ? set.low : query.band == "high" ? set.high : set.nominal;
  if (!curve) refuse(record, "has no band");
  return curve->at(query.X.value_or(0), query.T.value_or(293.15), f).value;
}

}  // namespace

PermittivitySet permittivity_of(const DatasetRecord& record) {
  if (record.kind == "points") return table_of(record);
  const Flags origin = record.provenance.flags();
  if (record.form == "leaf_dual_dispersion")
    return {leaf_tissue(record.param("conductivity"), origin), nullptr, nullptr};
  if (record.form == "grain_bulk_nelson")
    return {bulk_wheat(record.param("bulk_density"), origin), nullptr, nullptr};
  if (record.form == "soil_wang_schmugge")
    return {moist_mineral(mineral_of(record), record.param("conductivity"), origin), nullptr,
            nullptr};
  if (record.form == "board_p2040") return {dry_board(board_of(record), origin), nullptr, nullptr};
  if (record.form == "produce_sipahioglu_barringer")
    return {fresh_produce(record.param("ash"), origin), nullptr, nullptr};
  if (record.form == "composition_estimate") {
    EstimateBand band = estimate_band(estimate_of(record), origin);
    return {std::move(band.nominal), std::move(band.low), std::move(band.high)};
  }
  refuse(record, "'" + record.form + "' is not a permittivity");
}

product::Isotherm isotherm_of(const DatasetRecord& record) {
  product::Isotherm isotherm;
  isotherm.form = isotherm_form(record);
  if (const auto T = record.ranges.find("T"); T != record.ranges.end()) {
    isotherm.T_min = T->second.lo;
    isotherm.T_max = T->second.hi;
  }
  if (const auto aw = record.ranges.find("aw"); aw != record.ranges.end()) {
    isotherm.activity_min = aw->second.lo;
    isotherm.activity_max = aw->second.hi;
  }
  return isotherm;
}

product::CureModel cure_of(const DatasetRecord& r) {
  if (r.form == "lee_loos_springer") {
    product::LeeLoosSpringer model;
    model.k1 = {r.param("A1"), r.param("E1")};
    model.k2 = {r.param("A2"), r.param("E2")};
    model.k3 = {r.param("A3"), r.param("E3")};
    model.B = r.param("B");
    model.switch_alpha = r.param("switch");
    return model;
  }
  refuse(r, "'" + r.form + "' is not a kinetic form");
}

double scalar_of(const DatasetRecord& record,
                 const std::optional<product::FoodComposition>& composition) {
  if (record.kind == "constant") {
    if (record.points.size() != 1) refuse(record, "a constant needs exactly one value");
    return record.points.front().value;
  }
  if (record.form != "choi_okos") refuse(record, "'" + record.form + "' gives no single value");
  const auto dry = food_at(record, composition, 0, celsius_zero);
  if (record.quantity == "dry_heat_capacity") return dry.heat_capacity;
  if (record.quantity == "dry_heat_capacity_slope")
    return (food_at(record, composition, 0, celsius_zero + 50).heat_capacity - dry.heat_capacity) /
           50;
  if (record.quantity == "solid_density") return dry.density;
  if (record.quantity == "conductivity") return dry.conductivity;
  if (record.quantity == "conductivity_slope") {
    const double X = fresh_moisture(*composition);
    const auto fresh = food_at(record, composition, X, celsius_zero);
    return (fresh.conductivity - dry.conductivity) / X;
  }
  refuse(record, "the form choi_okos does not give " + record.quantity);
}

std::complex<double> evaluate(const DatasetRecord& record, const Query& query,
                              const std::optional<product::FoodComposition>& composition) {
  if (record.quantity == "eps") return evaluate_eps(record, query);
  if (record.quantity == "isotherm") {
    const auto form = isotherm_form(record);
    if (const auto* toth = std::get_if<product::Toth>(&form); toth != nullptr && query.p)
      return toth->loading(*query.p, need(record, query.T, "T"));
    return product::moisture(isotherm_of(record), need(record, query.aw, "aw"),
                             need(record, query.T, "T"));
  }
  if (record.quantity == "cure")
    return product::rate(cure_of(record), need(record, query.alpha, "alpha"),
                         need(record, query.T, "T"));
  if (record.form == "wood_cp")
    return product::wood_heat_capacity(need(record, query.X, "X"), need(record, query.T, "T"));
  if (record.form == "wood_k")
    return product::wood_conductivity(record.param("Gb"), record.param("So"),
                                      need(record, query.X, "X"));
  if (record.form == "choi_okos" &&
      (record.quantity == "cp" || record.quantity == "k" || record.quantity == "rho"))
    return thermal(record, food_at(record, composition, need(record, query.X, "X"),
                                   need(record, query.T, "T")));
  return scalar_of(record, composition);
}

}  // namespace lossline::materials
