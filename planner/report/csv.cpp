#include "planner/report/csv.h"

#include <fmt/format.h>

#include <array>
#include <cmath>

namespace lossline::report {
namespace {

struct Column {
  const char* heading;
  double Station::*member;
  bool cavity_only = false;  ///< means something inside microwave stretches only
};

constexpr std::array columns{Column{"moisture_db_kg_per_kg", &Station::moisture},
                             Column{"surface_moisture_db_kg_per_kg", &Station::surface_moisture},
                             Column{"temperature_K", &Station::temperature},
                             Column{"air_temperature_K", &Station::air_temperature},
                             Column{"air_humidity_kg_per_kg", &Station::air_humidity},
                             Column{"product_power_W_per_m", &Station::product_power},
                             Column{"air_heat_W_per_m", &Station::air_heat},
                             Column{"evaporation_kg_per_s_m", &Station::evaporation},
                             Column{"heating_rate_K_per_s", &Station::heating_rate},
                             Column{"drying_rate_db_per_s", &Station::drying_rate},
                             Column{"overpressure_Pa", &Station::overpressure},
                             Column{"degree_of_cure_1", &Station::cure},
                             Column{"eps_real_1", &Station::eps_real, true},
                             Column{"loss_factor_1", &Station::loss_factor, true},
                             Column{"penetration_depth_m", &Station::penetration_depth, true}};

/// Quoted when it holds a comma, a quote or a line break (RFC 4180, section 2).
std::string field_text(const std::string& text) {
  if (text.find_first_of(",\"\r\n") == std::string::npos) return text;
  std::string out = "\"";
  for (const char c : text) {
    if (c == '"') out += '"';
    out += c;
  }
  return out + '"';
}

}  // namespace

std::string csv(const Page& page) {
  std::string out = "x_m,stretch";
  for (const Column& column : columns) out += fmt::format(",{}", column.heading);
  out += '\n';
  for (const Station& s : page.solution.profile) {
    const bool known = s.stretch < page.line.stretches.size();
    out += fmt::format("{:.9g},{}", s.x,
                       known ? field_text(page.line.stretches[s.stretch].name) : std::string());
    for (const Column& column : columns) {
      const double value = s.*column.member;
      const bool empty = !std::isfinite(value) || (column.cavity_only && s.eps_real == 0);
      out += empty ? std::string(",") : fmt::format(",{:.9g}", value);
    }
    out += '\n';
  }
  return out;
}

}  // namespace lossline::report
