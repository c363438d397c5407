#include "planner/report/json.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>
#include <nlohmann/json.hpp>

#include "tests/report/sample_page.h"

namespace lossline::report {
namespace {

nlohmann::json parsed(sample::WholePage& whole) {
  return nlohmann::json::parse(json(whole.page()));
}

TEST(Json, HasEveryKeyOfItsInterface) {
  sample::WholePage whole;
  whole.line.limits.product_temperature = 370;
  const nlohmann::json j = parsed(whole);
  const std::pair<const char*, std::vector<const char*>> sections[] = {
      {"",
       {"format",     "status",  "reason",  "level",    "version",      "input_sha256", "time_ms",
        "iterations", "line",    "answer",  "power",    "cavities",     "generators",   "profile",
        "air",        "balance", "margins", "cautions", "not_assessed", "evidence"}},
      {"line", {"name", "length_m", "heated_length_m", "belt_speed_m_per_s", "residence_s"}},
      {"answer",
       {"dry_solids_kg_per_s", "feed_kg_per_s", "product_kg_per_s", "evaporation_kg_per_s",
        "final_moisture_db", "final_temperature_K", "hottest_temperature_K", "degree_of_cure",
        "share_of_forward_in_product", "mains_J_per_kg_water", "mains_J_per_kg_product"}},
      {"power",
       {"mains_W", "supply_loss_W", "tube_loss_W", "forward_W", "run_loss_W", "reflected_W",
        "product_W", "belt_W", "walls_W", "ends_W", "air_heating_W", "fans_W", "other_W"}},
      {"profile",
       {"x_m", "moisture_db", "temperature_K", "air_temperature_K", "air_humidity",
        "product_W_per_m", "cure", "loss_factor", "penetration_depth_m"}},
      {"balance", {"water_relative", "energy_relative", "power_relative"}}};
  for (const auto& [section, keys] : sections) {
    const nlohmann::json& object = *section == '\0' ? j : j.at(section);
    for (const char* key : keys) EXPECT_TRUE(object.contains(key)) << section << '.' << key;
  }
  for (const char* key : {"name", "frequency_Hz", "forward_W", "product_W", "belt_W", "walls_W",
                          "reflected_W", "ends_W", "links_W", "field_rms_V_per_m", "modal_overlap",
                          "share_low", "share_high", "flags"})
    EXPECT_TRUE(j["cavities"][0].contains(key)) << key;
  for (const char* key : {"name", "rated_W", "output_W", "reflected_W", "mains_W"})
    EXPECT_TRUE(j["generators"][0].contains(key)) << key;
  for (const nlohmann::json& m : j["margins"])
    for (const char* key : {"name", "unit", "where", "status"}) EXPECT_TRUE(m.contains(key)) << key;
  for (const nlohmann::json& c : j["cautions"])
    for (const char* key : {"id", "text", "where"}) EXPECT_TRUE(c.contains(key)) << key;
  for (const nlohmann::json& e : j["evidence"])
    for (const char* key : {"quantity", "source", "grade", "flags"})
      EXPECT_TRUE(e.contains(key)) << key;
}

TEST(Json, CarriesTheSolutionsNumbersUnchanged) {
  sample::WholePage whole;
  const nlohmann::json j = parsed(whole);
  EXPECT_EQ(j["status"], "solved");
  EXPECT_DOUBLE_EQ(j["answer"]["final_moisture_db"], whole.solution.answer.final_moisture);
  EXPECT_DOUBLE_EQ(j["power"]["product_W"], 51e3);
  EXPECT_EQ(j["profile"]["x_m"].size(), whole.solution.profile.size());
  EXPECT_EQ(j["profile"]["stretch"][2], "cavity 1");
}

TEST(Json, LeavesOutWhatIsNotKnown) {
  sample::WholePage whole;
  whole.solution.answer.degree_of_cure = std::nan("");
  whole.solution.answer.mains_per_product = std::numeric_limits<double>::infinity();
  whole.solution.profile[1].temperature = std::nan("");
  const std::string written = json(whole.page());
  EXPECT_EQ(written.find(": nan"), std::string::npos);
  EXPECT_EQ(written.find(": inf"), std::string::npos);
  const nlohmann::json j = nlohmann::json::parse(written);
  EXPECT_FALSE(j["answer"].contains("degree_of_cure"));
  EXPECT_FALSE(j["answer"].contains("mains_J_per_kg_product"));
  EXPECT_FALSE(j["answer"].contains("final_moisture_p05_db"));  // no spread known
  EXPECT_FALSE(j["profile"].contains("temperature_K"));
  EXPECT_TRUE(j["profile"]["loss_factor"][0].is_null());
}

TEST(Json, OfARefusedLineHasNoNumbers) {
  sample::WholePage whole;
  whole.solution = Solution{};
  whole.solution.reason = "no permittivity";
  const nlohmann::json j = parsed(whole);
  EXPECT_EQ(j["status"], "refused");
  EXPECT_EQ(j["reason"], "no permittivity");
  EXPECT_FALSE(j.contains("answer"));
}

TEST(Json, SaysNothingAboutFieldsItDidNotCalculate) {
  sample::WholePage whole;
  whole.line.solve.balance = whole.solution.balance = Balance::constant_share;
  const nlohmann::json j = parsed(whole);
  EXPECT_FALSE(j["cavities"][0].contains("field_rms_V_per_m"));
  EXPECT_FALSE(j["generators"][0].contains("reflected_W"));
  EXPECT_TRUE(j["ends"].empty());
}

TEST(Json, StaysValidWhateverBytesANameHas) {
  sample::WholePage whole;
  whole.line.name = "broken \xff \"name\"\n";
  EXPECT_NO_THROW(parsed(whole));
}

}  // namespace
}  // namespace lossline::report
