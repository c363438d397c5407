#include "planner/base/units.h"

#include <gtest/gtest.h>

#include "planner/base/quantity_kinds.h"

namespace lossline {
namespace {

Unit unit(const char* text) {
  const auto read = read_unit(text);
  if (const auto* fault = std::get_if<UnitFault>(&read)) {
    ADD_FAILURE() << text << ": " << fault->message;
    return {};
  }
  return std::get<Unit>(read);
}

UnitFault fault(const char* text) {
  const auto read = read_unit(text);
  if (const auto* bad = std::get_if<UnitFault>(&read)) return *bad;
  ADD_FAILURE() << text << " was read";
  return {};
}

TEST(Units, ReadProductsQuotientsAndPowersInEveryUsualSpelling) {
  for (const char* text :
       {"W/(m2 K)", "W/m2/K", "W/(m^2*K)", "W/(m²·K)", "W m-2 K-1", "W/( m2.K )"}) {
    EXPECT_EQ(unit(text).dimension, quantity::heat_transfer.dimension) << text;
    EXPECT_EQ(unit(text).to_si(25), 25) << text;
  }
  EXPECT_EQ(unit("kJ/(kg K)").to_si(1.6), 1600);
  EXPECT_EQ(unit("MWh").to_si(1), 3.6e9);
  EXPECT_EQ(unit("µm").to_si(4), 4e-6);
  EXPECT_EQ(unit("m³/h").to_si(3600), 1);
}

TEST(Units, ADivisionHoldsForTheNextFactorOnly) {
  EXPECT_NE(unit("W/m2 K").dimension, quantity::heat_transfer.dimension);
}

TEST(Units, DecimalFactorsGiveTheNearestDouble) {
  EXPECT_EQ(unit("mm").to_si(8), 0.008);
  EXPECT_EQ(unit("mm").to_si(86.4), 0.0864);
  EXPECT_EQ(unit("kW").to_si(0.1), 100);
  EXPECT_EQ(unit("t/h").to_si(1.8), 0.5);
}

// NIST SP 811, 2008, appendix B.8 and B.9, printed to 7 figures: 1 Btu_IT h-1 ft-2 degF-1 =
// 5.678263 W m-2 K-1; 1 Btu_IT lb-1 degF-1 = 4186.8 J kg-1 K-1; 1 psi = 6894.757 Pa; 1 lb/ft3 =
// 16.01846 kg/m3; 1 horsepower (550 ft lbf/s) = 745.6999 W; 1 Btu_IT h-1 ft-1 degF-1 = 1.730735
// W m-1 K-1 (the handbook prints it per inch and per foot). From memory; half a unit of the last
// printed figure.
TEST(Units, UsCustomaryFactorsMatchNistSp811) {
  EXPECT_NEAR(unit("BTU/(h ft2 degF)").to_si(1), 5.678263, 5e-7);
  EXPECT_NEAR(unit("BTU/(lb degF)").to_si(1), 4186.8, 1e-7);
  EXPECT_NEAR(unit("psi").to_si(1), 6894.757, 5e-4);
  EXPECT_NEAR(unit("lb/ft3").to_si(1), 16.01846, 5e-6);
  EXPECT_NEAR(unit("hp").to_si(1), 745.6999, 5e-5);
  EXPECT_NEAR(unit("BTU/(h ft degF)").to_si(1), 1.730735, 5e-7);
}

TEST(Units, FaultsSayWhereTheyAre) {
  EXPECT_EQ(fault("kg/hr").begin, 3U);
  EXPECT_EQ(fault("kg/hr").message, "'hr' is not a known unit");
  EXPECT_EQ(fault("m//s").message, "a unit is expected here");
  EXPECT_EQ(fault("t/").message, "a unit is missing at the end");
  EXPECT_EQ(fault("W/(m2 K").message, "')' is missing");
  EXPECT_EQ(fault("W/m2)").message, "')' without '('");
  EXPECT_EQ(fault("m^x").message, "a whole exponent is expected here");
  EXPECT_EQ(fault("m0").message, "the exponent is out of any sensible range");
  EXPECT_EQ(fault("((((((((((m))))))))))").message, "too many parentheses");
  EXPECT_EQ(fault("cW").length, 2U);
}

TEST(Units, EveryKnownSymbolIsReadable) {
  for (const std::string& symbol : known_symbols())
    EXPECT_TRUE(std::holds_alternative<Unit>(read_unit(symbol))) << symbol;
}

}  // namespace
}  // namespace lossline
