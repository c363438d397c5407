#include "planner/march/assemble.h"

#include <algorithm>
#include <cmath>

#include "planner/base/error.h"

namespace lossline::march {
namespace {

void fill_lengths(const Setup& setup, Answer& answer) {
  for (const Stretch& stretch : setup.line.stretches) {
    answer.length += stretch.length;
    if (stretch.kind == StretchKind::microwave) answer.heated_length += stretch.length;
  }
  answer.residence = answer.length / setup.flow.speed;
  answer.heated_residence = answer.heated_length / setup.flow.speed;
}

void fill_extremes(const Solution& out, Answer& answer) {
  answer.hottest_temperature = -1;
  for (const Station& s : out.profile) {
    if (s.temperature > answer.hottest_temperature) {
      answer.hottest_temperature = s.temperature;
      answer.hottest_x = s.x;
    }
    if (s.heating_rate > answer.fastest_heating) {
      answer.fastest_heating = s.heating_rate;
      answer.fastest_heating_x = s.x;
    }
    if (s.drying_rate > answer.fastest_drying) {
      answer.fastest_drying = s.drying_rate;
      answer.fastest_drying_x = s.x;
    }
    if (s.overpressure > answer.highest_overpressure) {
      answer.highest_overpressure = s.overpressure;
      answer.highest_overpressure_x = s.x;
    }
  }
}

/// Least heat that turns a kilogram of water at the feed temperature into vapour at the boiling
/// point of the tunnel pressure [J/kg].
double energy_floor(double pressure, double feed_temperature) {
  const double boiling = water::fast_boiling_temperature(pressure);
  return water::vapour_enthalpy(boiling) - water::liquid_enthalpy(feed_temperature);
}

}  // namespace

void fill_answer(const Setup& setup, const LastRound& last, Solution& out) {
  Answer& answer = out.answer;
  answer.flow = setup.flow;
  fill_lengths(setup, answer);
  const State& end = last.pass.nodes.back();
  double water = 0;
  for (const SegmentFlows& flows : last.pass.flows) water += flows.water;
  answer.dry_solids = setup.flow.dry_solids;
  answer.feed_rate = setup.flow.feed;
  answer.product_rate = setup.flow.dry_solids * (1 + end[X]);
  answer.evaporated = water;
  answer.final_moisture = answer.final_moisture_low = answer.final_moisture_high = end[X];
  answer.final_temperature = bed::temperature(setup.material, end[E], end[X], end[alpha]);
  answer.degree_of_cure = end[alpha];
  fill_extremes(out, answer);
  answer.energy_floor = energy_floor(setup.line.pressure, setup.line.duty.feed_temperature);
  const PowerLedger& power = out.power;
  answer.share_of_forward = power.forward > 0 ? power.bed / power.forward : 0.0;
  if (water > 0) {
    answer.mains_per_water = power.mains / water;
    answer.energy_per_water = (power.mains + power.fuel) / water;
  }
  answer.mains_per_product = power.mains / answer.product_rate;
}

void fill_balances(const Setup& setup, const LastRound& last, Solution& out) {
  const State& in = last.pass.nodes.front();
  const State& end = last.pass.nodes.back();
  const double solids = setup.flow.dry_solids;
  double water = 0, to_air = 0, air_heat = 0, field = 0;
  for (const SegmentFlows& flows : last.pass.flows) {
    water += flows.water;
    to_air += flows.enthalpy;
    air_heat += flows.air_heat;
  }
  for (const CavityReport& cavity : out.cavities) field += cavity.bed;
  out.balances.water =
      std::abs(solids * (in[X] - end[X]) - water) / std::max(solids * in[X], 1e-12);
  const double exchanged = std::max(std::abs(field) + std::abs(air_heat), 1e-6);
  out.balances.energy = std::abs(solids * (end[E] - in[E]) - field + to_air) / exchanged;

  // The product's own ledger: what the heat did.
  ProductLedger& ledger = out.product;
  const double T0 = setup.line.duty.feed_temperature, T1 = out.answer.final_temperature;
  const double t0 = T0 - celsius_zero, t1 = T1 - celsius_zero;
  ledger.sensible_solids =
      solids * (setup.material.heat_capacity * (t1 - t0) +
                0.5 * setup.material.heat_capacity_slope * (t1 * t1 - t0 * t0));
  ledger.sensible_water = solids * end[X] * water::liquid_heat_capacity * (t1 - t0);
  ledger.bound_water = solids * (bed::bound_heat(*setup.material.sorption, in[X]) -
                                 bed::bound_heat(*setup.material.sorption, end[X]));
  ledger.reaction = solids * setup.material.heat_of_reaction * (end[alpha] - in[alpha]);
  ledger.evaporation = to_air + air_heat - water * water::liquid_enthalpy(T0);
  ledger.field = field;
  ledger.air = air_heat;

  double power_error = 0;
  for (const CavityReport& c : out.cavities)
    power_error +=
        std::abs(c.launched - c.bed - c.belt - c.walls - c.returned - c.ends - c.links - c.other);
  const PowerLedger& p = out.power;
  const double sum = p.supply_loss + p.tube_loss + p.run_loss + p.reflected + p.bed + p.belt +
                     p.walls + p.ends + p.other;
  if (p.generator_mains > 0)
    out.balances.power =
        std::max(std::abs(p.generator_mains - sum), power_error) / p.generator_mains;
}

void fill_evidence(const Setup& setup, const LastRound& last, Solution& out) {
  const ProductCard& card = setup.card;
  auto add = [&](const std::string& quantity, const Provenance& provenance, Flags flags) {
    out.evidence.push_back({quantity, provenance, flags | provenance.flags(), ""});
  };
  if (card.permittivity && !setup.cavities.empty())
    add("permittivity", card.permittivity_provenance, last.field.flags);
  if (card.sorption) add("sorption", card.sorption_provenance, {});
  if (card.cure) add("cure", card.cure_provenance, {});
  const std::pair<const char*, const std::optional<Property>*> scalars[] = {
      {"dry_heat_capacity", &card.dry_heat_capacity},
      {"dry_bulk_density", &card.dry_bulk_density},
      {"dry_piece_density", &card.dry_piece_density},
      {"solid_density", &card.solid_density},
      {"shrinkage", &card.shrinkage},
      {"conductivity", &card.conductivity},
      {"diffusivity", &card.diffusivity},
      {"permeability", &card.permeability},
      {"vapour_factor", &card.vapour_factor},
      {"saturation_moisture", &card.saturation_moisture},
      {"heat_of_reaction", &card.heat_of_reaction}};
  for (const auto& [name, property] : scalars)
    if (*property) add(name, (*property)->provenance, {});
  for (const bed::Assumption& assumption : setup.assumptions) {
    EvidenceItem item;
    item.quantity = assumption.quantity;
    item.provenance.evidence = Evidence::user_estimate;
    item.provenance.source = "default of the planner";
    item.flags = flag::assumed;
    item.note = assumption.note;
    out.evidence.push_back(item);
  }
  for (const EvidenceItem& item : out.evidence) out.flags |= item.flags;
}

void assemble(const Setup& setup, const LastRound& last, Solution& out) {
  if (last.air.reports.size() == setup.line.air.size()) out.air = last.air.reports;
  fill_profile(setup, last, out);
  fill_power(setup, last, out);
  fill_answer(setup, last, out);
  fill_balances(setup, last, out);
  fill_evidence(setup, last, out);
}

}  // namespace lossline::march
