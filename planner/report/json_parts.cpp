#include "planner/report/json_parts.h"

#include <cmath>

namespace lossline::report {
namespace {

const char* validity_name(field::ValidityKind kind) {
  switch (kind) {
    case field::ValidityKind::small_cavity:
      return "small_cavity";
    case field::ValidityKind::few_modes:
      return "few_modes";
    case field::ValidityKind::thin_bed:
      return "thin_bed";
    case field::ValidityKind::weak_bed:
      return "weak_bed";
  }
  return "unknown";
}

}  // namespace

Json power_json(const Solution& solution) {
  const PowerLedger& p = solution.power;
  Json out;
  put(out, "mains_W", p.mains);
  put(out, "fuel_W", p.fuel);
  put(out, "generator_mains_W", p.generator_mains);
  put(out, "supply_loss_W", p.supply_loss);
  put(out, "tube_loss_W", p.tube_loss);
  put(out, "forward_W", p.forward);
  put(out, "run_loss_W", p.run_loss);
  put(out, "reflected_W", p.reflected);
  put(out, "product_W", p.bed);
  put(out, "belt_W", p.belt);
  put(out, "walls_W", p.walls);
  put(out, "ends_W", p.ends);
  put(out, "other_W", p.other);
  put(out, "air_heating_W", p.air_heating);
  put(out, "fans_W", p.fans);
  return out;
}

Json cavities_json(const Solution& solution) {
  const bool field = solution.balance == Balance::full;
  Json out = Json::array();
  for (const CavityReport& c : solution.cavities) {
    Json row;
    row["name"] = c.name;
    put(row, "frequency_Hz", c.frequency);
    put(row, "forward_W", c.launched);
    put(row, "product_W", c.bed);
    if (field) {
      put(row, "product_top_W", c.bed_top);
      put(row, "product_bottom_W", c.bed_bottom);
      put(row, "product_side_W", c.bed_side);
      put(row, "belt_W", c.belt);
      put(row, "walls_W", c.walls);
      put(row, "reflected_W", c.returned);
      put(row, "ends_W", c.ends);
      put(row, "links_W", c.links);
      put(row, "field_rms_V_per_m", c.field_above);
      put(row, "field_below_rms_V_per_m", c.field_below);
      put(row, "modal_overlap", c.modal_overlap);
      put(row, "share_low", c.share_low);
      put(row, "share_unmixed", c.share_unmixed);
      put(row, "share_high", c.share_mixed);
      put(row, "hot_spot_pitch_m", c.hot_spot_pitch);
      put(row, "uneven_low", c.uneven_low);
      put(row, "uneven_high", c.uneven_high);
    }
    put(row, "other_W", c.other);
    Json flags = Json::array();
    for (const field::ValidityFlag& flag : c.validity)
      flags.push_back({{"name", validity_name(flag.kind)},
                       {"usable", flag.grade == field::ValidityGrade::caution},
                       {"text", flag.sentence}});
    row["flags"] = flags;
    out.push_back(std::move(row));
  }
  return out;
}

Json generators_json(const Solution& solution) {
  Json out = Json::array();
  for (const GeneratorReport& g : solution.generators) {
    Json row;
    row["name"] = g.name;
    put(row, "rated_W", g.rated);
    put(row, "output_W", g.output);
    put(row, "launched_W", g.launched);
    if (solution.balance == Balance::full) put(row, "reflected_W", g.reflected);
    put(row, "run_loss_W", g.run_loss);
    put(row, "tube_loss_W", g.tube_loss);
    put(row, "supply_loss_W", g.supply_loss);
    put(row, "mains_W", g.mains);
    out.push_back(std::move(row));
  }
  return out;
}

Json air_json(const Solution& solution) {
  Json out = Json::array();
  for (const AirReport& a : solution.air) {
    Json row;
    row["loop"] = a.name;
    put(row, "dry_air_kg_per_s", a.dry_air_flow);
    put(row, "fresh_air_kg_per_s", a.fresh_air_flow);
    put(row, "supply_temperature_K", a.supply_temperature);
    put(row, "supply_humidity_kg_per_kg", a.supply_humidity);
    put(row, "exhaust_temperature_K", a.exhaust_temperature);
    put(row, "exhaust_humidity_kg_per_kg", a.exhaust_humidity);
    put(row, "exhaust_relative_humidity", a.exhaust_relative_humidity);
    put(row, "exhaust_dew_point_K", a.exhaust_dew_point);
    put(row, "heater_W", a.heater_duty);
    put(row, "heater_bought_W", a.heater_bought);
    put(row, "fan_W", a.fan_power);
    put(row, "shell_loss_W", a.shell_loss);
    put(row, "water_kg_per_s", a.water_taken);
    row["fog"] = a.fog;
    out.push_back(std::move(row));
  }
  return out;
}

Json ends_json(const Solution& solution) {
  Json out = Json::array();
  if (solution.balance != Balance::full) return out;
  for (const EndReport& e : solution.ends) {
    Json row;
    row["name"] = e.name;
    put(row, "frequency_Hz", e.frequency);
    put(row, "arriving_W", e.arriving);
    put(row, "taken_W", e.taken);
    put(row, "leaving_W", e.leaving);
    out.push_back(std::move(row));
  }
  return out;
}

Json profile_json(const Page& page) {
  const std::vector<Station>& stations = page.solution.profile;
  Json out;
  auto column = [&](const char* key, double Station::*member) {
    Json values = Json::array();
    for (const Station& s : stations) {
      if (!std::isfinite(s.*member)) return;  // a column with a hole in it says nothing
      values.push_back(s.*member);
    }
    out[key] = std::move(values);
  };
  column("x_m", &Station::x);
  Json names = Json::array();
  for (const Station& s : stations)
    names.push_back(s.stretch < page.line.stretches.size() ? page.line.stretches[s.stretch].name
                                                           : std::string());
  out["stretch"] = std::move(names);
  column("moisture_db", &Station::moisture);
  column("surface_moisture_db", &Station::surface_moisture);
  column("temperature_K", &Station::temperature);
  column("air_temperature_K", &Station::air_temperature);
  column("air_humidity", &Station::air_humidity);
  column("product_W_per_m", &Station::product_power);
  column("air_heat_W_per_m", &Station::air_heat);
  column("evaporation_kg_per_s_m", &Station::evaporation);
  column("heating_rate_K_per_s", &Station::heating_rate);
  column("drying_rate_db_per_s", &Station::drying_rate);
  column("overpressure_Pa", &Station::overpressure);
  column("cure", &Station::cure);
  // The field exists in cavities only: null elsewhere, never zero.
  auto cavity_column = [&](const char* key, double Station::*member) {
    Json values = Json::array();
    for (const Station& s : stations)
      values.push_back(s.eps_real > 0 && std::isfinite(s.*member) ? Json(s.*member) : Json());
    out[key] = std::move(values);
  };
  cavity_column("eps_real", &Station::eps_real);
  cavity_column("loss_factor", &Station::loss_factor);
  cavity_column("penetration_depth_m", &Station::penetration_depth);
  return out;
}

}  // namespace lossline::report
