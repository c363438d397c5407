#include "materials/card_builder.h"

#include <array>
#include <map>
#include <utility>

#include "materials/models.h"
#include "planner/base/error.h"

namespace lossline::materials {
namespace {

using Member = std::optional<Property> ProductCard::*;

constexpr std::array<std::pair<const char*, Member>, 15> scalars = {{
    {"dry_heat_capacity", &ProductCard::dry_heat_capacity},
    {"dry_heat_capacity_slope", &ProductCard::dry_heat_capacity_slope},
    {"dry_bulk_density", &ProductCard::dry_bulk_density},
    {"dry_piece_density", &ProductCard::dry_piece_density},
    {"solid_density", &ProductCard::solid_density},
    {"shrinkage", &ProductCard::shrinkage},
    {"conductivity", &ProductCard::conductivity},
    {"conductivity_slope", &ProductCard::conductivity_slope},
    {"diffusivity", &ProductCard::diffusivity},
    {"diffusivity_activation", &ProductCard::diffusivity_activation},
    {"diffusivity_half_moisture", &ProductCard::diffusivity_half_moisture},
    {"permeability", &ProductCard::permeability},
    {"vapour_factor", &ProductCard::vapour_factor},
    {"saturation_moisture", &ProductCard::saturation_moisture},
    {"heat_of_reaction", &ProductCard::heat_of_reaction},
}};

const std::map<std::string, LimitKind>& limit_kinds() {
  static const std::map<std::string, LimitKind> kinds = {
      {"T_product_max", LimitKind::product_temperature},
      {"T_cure_max", LimitKind::product_temperature},
      {"T_runaway", LimitKind::runaway_temperature},
      {"p_internal_max", LimitKind::internal_pressure},
      {"dTdt_max", LimitKind::heating_rate},
      {"dXdt_max", LimitKind::drying_rate},
      {"X_final_min", LimitKind::final_moisture_low},
      {"E_field_max", LimitKind::field_strength}};
  return kinds;
}

Phase phase_of(const std::string& word) {
  return word == "particle" || word == "tissue" ? Phase::particle : Phase::bulk;
}

void put_permittivity(ProductCard& card, const DatasetRecord& record) {
  PermittivitySet set = permittivity_of(record);
  card.permittivity = std::move(set.nominal);
  card.permittivity_low = std::move(set.low);
  card.permittivity_high = std::move(set.high);
  card.permittivity_phase = phase_of(record.of_phase);
  card.permittivity_provenance = record.provenance;
}

}  // namespace

ProductCard build_card(CardRows rows) {
  ProductCard card;
  card.id = std::move(rows.id);
  card.name = std::move(rows.name);
  card.family = std::move(rows.family);
  card.limits = std::move(rows.limits);
  std::map<std::string, const DatasetRecord*> best;
  for (const DatasetRecord& record : rows.datasets)
    if (record.priority < reference_priority) best.try_emplace(record.quantity, &record);
  if (const auto eps = best.find("eps"); eps != best.end()) put_permittivity(card, *eps->second);
  if (const auto isotherm = best.find("isotherm"); isotherm != best.end()) {
    card.sorption = std::make_shared<const product::Sorption>(isotherm_of(*isotherm->second));
    card.sorption_provenance = isotherm->second->provenance;
  }
  if (const auto cure = best.find("cure"); cure != best.end()) {
    card.cure = cure_of(*cure->second);
    card.cure_provenance = cure->second->provenance;
  }
  for (const auto& [quantity, member] : scalars)
    if (const auto found = best.find(quantity); found != best.end())
      card.*member =
          Property{scalar_of(*found->second, rows.composition), found->second->provenance};
  return card;
}

std::vector<ProductLimit> read_limits(const Database& database, const std::string& material) {
  Statement rows = database.prepare(
      "SELECT kind, value, cond_X_lo, cond_X_hi, reason, severity, prov_id FROM limit_value"
      " WHERE material_id = ?1 ORDER BY limit_id");
  rows.bind(1, material);
  std::vector<ProductLimit> out;
  while (rows.step()) {
    const auto kind = limit_kinds().find(rows.text(0));
    if (kind == limit_kinds().end()) continue;
    const std::string severity = rows.text(5);
    out.push_back({kind->second, rows.real(1), rows.real_or_none(2), rows.real_or_none(3),
                   rows.text(4),
                   severity == "fire"     ? Severity::fire
                   : severity == "damage" ? Severity::damage
                                          : Severity::quality,
                   read_provenance(database, rows.integer(6))});
  }
  return out;
}

const std::optional<Property>* scalar(const ProductCard& card, const std::string& quantity) {
  for (const auto& [name, member] : scalars)
    if (quantity == name) return &(card.*member);
  return nullptr;
}

const std::vector<std::string>& scalar_quantities() {
  static const std::vector<std::string> names = [] {
    std::vector<std::string> out;
    out.reserve(scalars.size());
    for (const auto& entry : scalars) out.emplace_back(entry.first);
    return out;
  }();
  return names;
}

}  // namespace lossline::materials
