#include "planner/report/json.h"

#include <cmath>

#include "planner/report/json_parts.h"
#include "planner/verdict/evidence.h"

namespace lossline::report {

void put(Json& object, const char* key, double value) {
  if (std::isfinite(value)) object[key] = value;
}

void put(Json& object, const char* key, const std::optional<double>& value) {
  if (value) put(object, key, *value);
}

Json flags_json(Flags flags) {
  Json out = Json::array();
  for (const std::string& word : verdict::flag_words(flags)) out.push_back(word);
  return out;
}

namespace {

const char* status_word(Status status) {
  switch (status) {
    case Status::solved:
      return "solved";
    case Status::not_converged:
      return "not-converged";
    case Status::interrupted:
      return "interrupted";
    case Status::refused:
      break;
  }
  return "refused";
}

Json line_json(const Page& page) {
  const Answer& a = page.solution.answer;
  Json out;
  out["name"] = page.line.name;
  out["material"] = page.line.product.material;
  put(out, "length_m", a.length);
  put(out, "heated_length_m", a.heated_length);
  put(out, "belt_speed_m_per_s", a.flow.speed);
  put(out, "residence_s", a.residence);
  put(out, "heated_residence_s", a.heated_residence);
  put(out, "loaded_width_m", a.flow.width);
  put(out, "depth_m", a.flow.depth);
  put(out, "coverage", a.flow.coverage);
  put(out, "dry_areal_mass_kg_per_m2", a.flow.dry_areal_mass);
  return out;
}

Json answer_json(const Page& page) {
  const Answer& a = page.solution.answer;
  Json out;
  put(out, "dry_solids_kg_per_s", a.dry_solids);
  put(out, "feed_kg_per_s", a.feed_rate);
  put(out, "product_kg_per_s", a.product_rate);
  put(out, "evaporation_kg_per_s", a.evaporated);
  put(out, "feed_moisture_db", page.line.duty.feed_moisture);
  put(out, "final_moisture_db", a.final_moisture);
  if (a.spread_known) {
    put(out, "final_moisture_p05_db", a.final_moisture_low);
    put(out, "final_moisture_p95_db", a.final_moisture_high);
  }
  put(out, "final_temperature_K", a.final_temperature);
  put(out, "hottest_temperature_K", a.hottest_temperature);
  put(out, "hottest_x_m", a.hottest_x);
  put(out, "fastest_heating_K_per_s", a.fastest_heating);
  put(out, "fastest_heating_x_m", a.fastest_heating_x);
  put(out, "fastest_drying_db_per_s", a.fastest_drying);
  put(out, "fastest_drying_x_m", a.fastest_drying_x);
  put(out, "highest_overpressure_Pa", a.highest_overpressure);
  put(out, "highest_overpressure_x_m", a.highest_overpressure_x);
  put(out, "degree_of_cure", a.degree_of_cure);
  if (page.solution.power.forward > 0) put(out, "share_of_forward_in_product", a.share_of_forward);
  if (a.evaporated > 0) {
    put(out, "mains_J_per_kg_water", a.mains_per_water);
    put(out, "energy_J_per_kg_water", a.energy_per_water);
  }
  put(out, "mains_J_per_kg_product", a.mains_per_product);
  put(out, "least_possible_J_per_kg_water", a.energy_floor);
  return out;
}

Json product_json(const Solution& solution) {
  const ProductLedger& p = solution.product;
  Json out;
  put(out, "field_W", p.field);
  put(out, "air_W", p.air);
  put(out, "reaction_W", p.reaction);
  put(out, "sensible_solids_W", p.sensible_solids);
  put(out, "sensible_water_W", p.sensible_water);
  put(out, "evaporation_W", p.evaporation);
  put(out, "bound_water_W", p.bound_water);
  return out;
}

Json band_json(const EstimateBand& band) {
  Json out;
  out["converged"] = band.converged;
  put(out, "final_moisture_low_loss_db", band.final_moisture_low_loss);
  put(out, "final_moisture_high_loss_db", band.final_moisture_high_loss);
  put(out, "share_low_loss", band.share_low_loss);
  put(out, "share_high_loss", band.share_high_loss);
  put(out, "hottest_low_loss_K", band.hottest_low_loss);
  put(out, "hottest_high_loss_K", band.hottest_high_loss);
  return out;
}

Json margins_json(const Page& page) {
  Json out = Json::array();
  for (std::size_t i = 0; i < page.margins.all.size(); ++i) {
    const verdict::Margin& m = page.margins.all[i];
    Json row;
    row["name"] = m.name;
    put(row, "value", m.value);
    put(row, "limit", m.limit);
    row["unit"] = verdict::measure_unit(m.measure);
    row["sense"] = m.at_least ? "at_least" : "at_most";
    put(row, "margin", m.margin);
    if (m.margin) put(row, "reserve", m.reserve);
    row["where"] = m.where;
    put(row, "x_m", m.x);
    row["origin"] = m.origin;
    if (!m.reason.empty()) row["reason"] = m.reason;
    row["status"] = verdict::standing_word(m.standing);
    row["binding"] = page.margins.binding == i;
    out.push_back(std::move(row));
  }
  return out;
}

Json cautions_json(const Page& page) {
  Json out = Json::array();
  for (const verdict::Caution& c : page.cautions)
    out.push_back({{"id", c.id},
                   {"title", c.title},
                   {"text", c.text},
                   {"where", c.where},
                   {"document", c.document},
                   {"always", c.always}});
  return out;
}

Json evidence_json(const Solution& solution) {
  Json out = Json::array();
  for (const EvidenceItem& item : solution.evidence) {
    Json row;
    row["quantity"] = item.quantity;
    row["source"] = item.provenance.source;
    if (!item.provenance.locator.empty()) row["locator"] = item.provenance.locator;
    if (!item.provenance.dataset.empty()) row["dataset"] = item.provenance.dataset;
    row["grade"] = std::string(1, item.provenance.grade);
    row["evidence"] = evidence_name(item.provenance.evidence);
    row["verified"] = verdict::is_verified(item);
    put(row, "relative_uncertainty", item.provenance.relative_uncertainty);
    row["flags"] = flags_json(item.flags);
    if (!item.note.empty()) row["note"] = item.note;
    out.push_back(std::move(row));
  }
  return out;
}

}  // namespace

std::string json(const Page& page) {
  const Solution& s = page.solution;
  Json out;
  out["format"] = json_format;
  out["status"] = status_word(s.status);
  out["reason"] = s.reason;
  out["level"] = s.level == Level::mean ? "mean" : "depth";
  out["balance_choice"] = s.balance == Balance::full ? "full" : "constant-share";
  out["version"] = s.version;
  if (!page.input_sha256.empty()) out["input_sha256"] = page.input_sha256;
  put(out, "time_ms", 1e3 * s.wall_time);
  out["iterations"] = s.rounds;
  out["cavity_solves"] = s.cavity_rounds;
  out["steps"] = s.steps;
  put(out, "residual", s.residual);
  out["stamps"] = verdict::stamps(page.line, s);
  if (s.status != Status::refused && !s.profile.empty()) {
    out["line"] = line_json(page);
    out["answer"] = answer_json(page);
    out["power"] = power_json(s);
    out["product"] = product_json(s);
    out["cavities"] = cavities_json(s);
    out["generators"] = generators_json(s);
    out["air"] = air_json(s);
    out["ends"] = ends_json(s);
    if (s.band) out["band"] = band_json(*s.band);
    out["profile"] = profile_json(page);
    Json balance;
    put(balance, "water_relative", s.balances.water);
    put(balance, "energy_relative", s.balances.energy);
    put(balance, "power_relative", s.balances.power);
    out["balance"] = balance;
  }
  out["margins"] = margins_json(page);
  out["cautions"] = cautions_json(page);
  out["not_assessed"] = verdict::not_assessed();
  out["evidence"] = evidence_json(s);
  // A name the user wrote need not be valid UTF-8; the answer must be.
  return out.dump(2, ' ', false, Json::error_handler_t::replace) + '\n';
}

}  // namespace lossline::report
