#include "planner/base/quantity.h"

#include <gtest/gtest.h>

#include <clocale>
#include <cmath>
#include <random>
#include <vector>

#include "planner/base/error.h"
#include "planner/base/quantity_kinds.h"

namespace lossline {
namespace {

namespace q = quantity;

const std::vector<QuantityKind> all_kinds{q::length,
                                          q::small_length,
                                          q::time,
                                          q::minutes,
                                          q::hours,
                                          q::speed,
                                          q::rate,
                                          q::frequency,
                                          q::angle,
                                          q::mass,
                                          q::mass_per_length,
                                          q::mass_flow,
                                          q::dry_air_flow,
                                          q::volume_flow,
                                          q::density,
                                          q::pressure,
                                          q::permeability,
                                          q::diffusivity,
                                          q::temperature,
                                          q::temperature_difference,
                                          q::heating_rate,
                                          q::power,
                                          q::areal_power,
                                          q::specific_power,
                                          q::specific_energy,
                                          q::specific_heat,
                                          q::heat_capacity,
                                          q::heat_capacity_slope,
                                          q::conductivity,
                                          q::heat_transfer,
                                          q::conductance,
                                          q::activation_energy,
                                          q::moisture,
                                          q::moisture_difference,
                                          q::drying_rate,
                                          q::humidity,
                                          q::share,
                                          q::number,
                                          q::resistivity,
                                          q::field_strength,
                                          q::attenuation,
                                          q::energy_price,
                                          q::carbon_intensity};

std::string message(const char* text, const QuantityKind& kind) {
  const QuantityResult result = read_quantity(text, kind);
  if (result.value) return "was read";
  return std::to_string(result.fault.column) + ": " + result.fault.wrong + "; " +
         result.fault.right;
}

TEST(Quantity, IsReadWithTheUnitsOfTheTrade) {
  EXPECT_EQ(parse_quantity("75 kW", q::power), 75e3);
  EXPECT_EQ(parse_quantity("75kW", q::power), 75e3);
  EXPECT_EQ(parse_quantity(" +2.4 m/min ", q::speed), 0.04);
  EXPECT_EQ(parse_quantity("1.8 t/h", q::mass_flow), 0.5);
  EXPECT_EQ(parse_quantity("800 lb/h", q::mass_flow), 800 * 0.45359237 / 3600);
  EXPECT_EQ(parse_quantity("0.5 in", q::small_length), 0.0127);
  EXPECT_EQ(parse_quantity("2450 MHz", q::frequency), 2.45e9);
  EXPECT_EQ(parse_quantity("1.2 kWh/kg", q::specific_energy), 4.32e6);
  EXPECT_EQ(parse_quantity("36 CU/MWh", q::energy_price), 1e-8);
  EXPECT_EQ(parse_quantity("40 1/h", q::rate), 40.0 / 3600);
  EXPECT_EQ(parse_quantity("95 kJ/mol", q::activation_energy), 95e3);
  EXPECT_EQ(parse_quantity("-3 dB", q::attenuation), -3);
  EXPECT_EQ(parse_quantity("40 %", q::share), 0.4);
  EXPECT_EQ(parse_quantity("2", q::count), 2);
  EXPECT_NEAR(parse_quantity("180 deg", q::angle), 3.141592653589793, 1e-15);
}

TEST(Quantity, TemperaturesHaveAScaleAndDifferencesHaveNot) {
  EXPECT_EQ(parse_quantity("20 degC", q::temperature), 293.15);
  EXPECT_EQ(parse_quantity("20 °C", q::temperature), 293.15);
  EXPECT_EQ(parse_quantity("32 degF", q::temperature), 273.15);
  EXPECT_NEAR(parse_quantity("60 degF", q::temperature), 288.70555555555555, 1e-12);
  EXPECT_EQ(parse_quantity("10 K", q::temperature_difference), 10);
  EXPECT_EQ(parse_quantity("18 degF diff", q::temperature_difference), 10);
  EXPECT_EQ(message("10 degC", q::temperature_difference),
            "4: \"10 degC\" is a temperature, not a difference; write \"10 K\"");
  EXPECT_EQ(message("10 C", q::temperature),
            "4: \"10 C\": 'C' does not measure a temperature; did you mean 'degC'?");
}

TEST(Quantity, MoistureSaysItsBasisAndIsKeptDryBasis) {
  EXPECT_NEAR(parse_quantity("25 % wb", q::moisture), 1.0 / 3, 1e-16);
  EXPECT_EQ(parse_quantity("33 % db", q::moisture), 0.33);
  EXPECT_EQ(parse_quantity("33%db", q::moisture), 0.33);
  EXPECT_EQ(parse_quantity("0.33 kg/kg db", q::moisture), 0.33);
  EXPECT_EQ(message("25 %", q::moisture),
            "4: \"25 %\" does not say its basis; write \"25 % wb\" for water over wet product, or "
            "\"25 % db\" for water over dry solids");
  EXPECT_EQ(message("100 % wb", q::moisture),
            "1: \"100 % wb\" would be nothing but water; moisture on the wet basis lies below "
            "100 % wb");
  EXPECT_EQ(message("2 % wb", q::moisture_difference),
            "3: \"2 % wb\": a difference on the wet basis depends on where it is taken; write it "
            "dry basis, as in \"0.9 % db\"");
  EXPECT_EQ(message("60 %", q::humidity),
            "4: \"60 %\" could be a relative humidity; write the humidity ratio, as in "
            "\"0.009 kg/kg\"");
}

TEST(Quantity, RefusalsNameTheRepair) {
  EXPECT_EQ(message("75", q::power), "3: \"75\" has no unit; write a power as in \"75 kW\"");
  EXPECT_EQ(message("75 kw", q::power),
            "4: \"75 kw\": 'kw' is not a known unit; did you mean 'kW'?");
  EXPECT_EQ(message("2 mw", q::power), "3: \"2 mw\": 'mw' is not a known unit; did you mean 'MW'?");
  EXPECT_EQ(message("915 mhz", q::frequency),
            "5: \"915 mhz\": 'mhz' is not a known unit; did you mean 'MHz'?");
  EXPECT_EQ(message("800 kg/hr", q::mass_flow),
            "8: \"800 kg/hr\": 'hr' is not a known unit; did you mean 'h'?");
  EXPECT_EQ(message("75 kg", q::power),
            "4: \"75 kg\": 'kg' does not measure a power; write a power as in \"75 kW\"");
  EXPECT_EQ(message("2,4 m/min", q::speed),
            "2: \"2,4 m/min\": a comma is not a decimal point; write \"2.4 m/min\"");
  EXPECT_EQ(message("1,200 kg/h", q::mass_flow),
            "2: \"1,200 kg/h\": a comma is neither a decimal point nor a separator of thousands; "
            "write \"1200 kg/h\" or \"1.200 kg/h\"");
  EXPECT_EQ(message("1 200 kg/h", q::mass_flow),
            "3: \"1 200 kg/h\": digits are not grouped; write a mass flow as in \"1.8 t/h\"");
  EXPECT_EQ(message("fast", q::speed),
            "1: \"fast\" does not begin with a number; write a speed as in \"2.4 m/min\"");
  EXPECT_EQ(message("", q::speed), "1: \"\" is empty; write a speed as in \"2.4 m/min\"");
  EXPECT_EQ(message("2.6 mm", q::number),
            "5: \"2.6 mm\" carries a unit; write a plain number, as in 2.6");
  EXPECT_EQ(message("2.5", q::count), "1: \"2.5\" is not a whole number; write it as in 2");
}

TEST(Quantity, RefusesWhatIsNotFinite) {
  for (const char* text : {"nan kW", "inf kW", "-inf kW", "1e999 kW", "NaN kW", "1e308 MW"})
    EXPECT_FALSE(read_quantity(text, q::power).value) << text;
}

TEST(Quantity, ThrowsBadInputWithTheSameSentence) {
  try {
    (void)parse_quantity("75", q::power);
    FAIL();
  } catch (const Error& error) {
    EXPECT_EQ(error.kind(), ErrorKind::bad_input);
    EXPECT_STREQ(error.what(), "\"75\" has no unit; write a power as in \"75 kW\"");
  }
}

TEST(Quantity, TheExampleOfEveryKindIsReadable) {
  for (const QuantityKind& kind : all_kinds)
    EXPECT_TRUE(read_quantity(kind.example, kind).value) << kind.noun;
}

// 12 significant digits leave at most half a unit in the 12th place: 5e-12 relative, and 273.15
// over the smallest scale value is at most one more digit for temperatures.
TEST(Quantity, WhatIsWrittenIsReadBackInBothUnitSets) {
  std::mt19937_64 random(20240601);
  std::uniform_real_distribution<double> exponent(-6, 6);
  for (const QuantityKind& kind : all_kinds) {
    for (int i = 0; i < 500; ++i) {
      const double value =
          std::pow(10, exponent(random)) * (kind.form == QuantityForm::temperature ? 1
                                            : i % 2 == 0                           ? 1
                                                                                   : -1);
      for (const UnitSet set : {UnitSet::si_engineering, UnitSet::us_customary}) {
        const std::string text = format_quantity(value, kind, set, 12);
        const QuantityResult back = read_quantity(text, kind);
        ASSERT_TRUE(back.value) << text << ": " << back.fault.wrong;
        const double scale = kind.form == QuantityForm::temperature
                                 ? std::max(std::abs(value), 273.15)
                                 : std::abs(value);
        EXPECT_NEAR(*back.value, value, 1e-9 * scale) << text;
      }
    }
  }
}

TEST(Quantity, ExactTextGivesTheSameNumberAndStaysShort) {
  EXPECT_EQ(exact_quantity(0.06, q::small_length), "60 mm");
  EXPECT_EQ(exact_quantity(75e3, q::power), "75 kW");
  EXPECT_EQ(exact_quantity(293.15, q::temperature), "20 degC");
  EXPECT_EQ(exact_quantity(0.04, q::speed), "2.4 m/min");
  EXPECT_EQ(exact_quantity(140 / 3.6e9, q::energy_price), "140 CU/MWh");
  EXPECT_EQ(exact_quantity(55000.0 / 3600, q::mass_flow), "55000 kg/h");
  std::mt19937_64 random(7);
  std::uniform_real_distribution<double> any(0.1, 1000);
  for (int i = 0; i < 1000; ++i) {
    const double value = any(random);
    const double back = parse_quantity(exact_quantity(value, q::mass_flow), q::mass_flow);
    EXPECT_LE(std::abs(back - value), std::numeric_limits<double>::epsilon() * value);
  }
}

TEST(Quantity, DoesNotDependOnTheLocale) {
  const char* before = std::setlocale(LC_ALL, nullptr);
  const std::string saved = before == nullptr ? "C" : before;
  // Where the locale is not installed the call changes nothing and the check still holds.
  (void)std::setlocale(LC_ALL, "de_DE.UTF-8");
  EXPECT_EQ(parse_quantity("2.4 m/min", q::speed), 0.04);
  EXPECT_EQ(format_quantity(0.04, q::speed), "2.4 m/min");
  (void)std::setlocale(LC_ALL, saved.c_str());
}

}  // namespace
}  // namespace lossline
