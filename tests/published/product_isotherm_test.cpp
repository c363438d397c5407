// Sorption isotherms and thin layers against published constants. The moistures were worked out
// from those constants by an independent program; the tolerance is half a unit in the last printed
// digit unless a comment says otherwise.

#include <gtest/gtest.h>

#include <cmath>
#include <map>
#include <string>

#include "planner/product/isotherm.h"
#include "planner/product/thin_layer.h"
#include "tests/published/product_csv.h"

namespace lossline::product {
namespace {

constexpr double K(double celsius) {
  return celsius + 273.15;
}

// ASAE/ASABE D245.5 (from memory).
const Isotherm corn_henderson{ModifiedHenderson{8.6541e-5, 1.8634, 49.810}, K(0), K(70)};
const Isotherm wheat_henderson{ModifiedHenderson{2.3007e-5, 2.2857, 55.815}, K(0), K(70)};
const Isotherm rice_henderson{ModifiedHenderson{1.9187e-5, 2.4451, 51.161}, K(0), K(70)};
const Isotherm corn_chung{ModifiedChungPfost{312.40, 0.16958, 30.205}, K(0), K(70)};
const Isotherm corn_oswin{ModifiedOswin{15.303, -0.10164, 3.0358}, K(0), K(70)};
const Isotherm wood{HailwoodHorrobin{}, K(0), K(100)};
const Isotherm gab{Gab{{0.10, 0}, {10, 0}, {0.9, 0}}, K(20), K(40)};

}  // namespace

TEST(Isotherms, MatchD245CornByThreeEquations) {
  EXPECT_NEAR(moisture(corn_henderson, 0.5, K(25)), 0.12280, 0.51e-5);
  EXPECT_NEAR(moisture(corn_henderson, 0.7, K(25)), 0.16516, 0.51e-5);
  EXPECT_NEAR(moisture(corn_chung, 0.5, K(25)), 0.12382, 0.51e-5);
  EXPECT_NEAR(moisture(corn_chung, 0.7, K(25)), 0.16300, 0.51e-5);
  EXPECT_NEAR(moisture(corn_oswin, 0.5, K(25)), 0.12762, 0.51e-5);
  EXPECT_NEAR(moisture(corn_oswin, 0.7, K(25)), 0.16871, 0.51e-5);
  EXPECT_NEAR(moisture(wheat_henderson, 0.7, K(25)), 0.16980, 0.51e-5);
  EXPECT_NEAR(moisture(rice_henderson, 0.7, K(25)), 0.15579, 0.51e-5);
}

TEST(Isotherms, MatchTheTabulatedGrid) {
  const std::map<std::string, Isotherm> forms{{"MH/corn", corn_henderson},
                                              {"MH/wheat_hard", wheat_henderson},
                                              {"CP/corn", corn_chung},
                                              {"MO/corn", corn_oswin},
                                              {"HH/wood", wood}};
  int rows = 0;
  for (const auto& row : test::table("isotherms.csv")) {
    const bool closed = row[0] == "GAB";
    const Isotherm& form = closed ? gab : forms.at(row[0] + "/" + row[1]);
    const double T = closed ? K(25) : K(std::stod(row[2]));
    const double a = std::stod(row[3]), X = 0.01 * std::stod(row[4]);
    EXPECT_NEAR(moisture(form, a, T), X, 0.51e-6) << row[0] << " " << row[2] << " " << row[3];
    EXPECT_NEAR(activity(form, X, T), a, 1e-4) << row[0] << " " << row[2] << " " << row[3];
    ++rows;
  }
  EXPECT_EQ(rows, 129);
}

TEST(GabIsotherm, MatchesTheClosedFormAndItsMonolayer) {
  EXPECT_NEAR(moisture(gab, 0.3, K(25)), 0.107832, 0.51e-6);
  EXPECT_NEAR(moisture(gab, 0.5, K(25)), 0.162016, 0.51e-6);
  EXPECT_NEAR(moisture(gab, 0.8, K(25)), 0.343774, 0.51e-6);
  // at X = Xm the activity is 1/(K (1 + sqrt(C)))
  EXPECT_NEAR(activity(gab, 0.10, K(25)), 0.266948, 0.51e-6);
  const Isotherm bet{Bet{{0.10, 0}, {10, 0}}, K(20), K(40), 0.05, 0.5};
  EXPECT_NEAR(moisture(bet, 0.3, K(25)), 0.115830, 0.51e-6);
}

// Kiranoudis et al. 1993 as refitted by Singh et al. 1996, potato, 45 degC. Chemkhi et al. 2004 is
// a second set for potato, twice as high.
TEST(GabIsotherm, MatchesPotato) {
  const Isotherm potato{Gab{{0.0560, 1390}, {0.017, 20000}, {0.94, -920}}, K(30), K(60)};
  EXPECT_NEAR(moisture(potato, 0.30, K(45)), 0.1053, 0.51e-4);
  EXPECT_NEAR(moisture(potato, 0.50, K(45)), 0.1335, 0.51e-4);
  EXPECT_NEAR(moisture(potato, 0.70, K(45)), 0.1709, 0.51e-4);
  EXPECT_NEAR(moisture(potato, 0.85, K(45)), 0.2124, 0.51e-4);
}

// Waananen, PhD thesis, Purdue 1989; Xiong et al. 1991 (Oswin), pasta, 60 degC. The moistures were
// worked out with R = 8.314 J/(mol K); at 60 kJ/mol the exact R changes them by 0.1 %, so the
// energies are raised by the ratio of the two.
TEST(Isotherms, MatchPastaByTwoSources) {
  constexpr double r = 8.314462618 / 8.314;
  const Isotherm waananen{Gab{{4.40e-3, 6840 * r}, {2.86e-9, 60000 * r}, {0.1313, 4920 * r}}, K(40),
                          K(90)};
  const Isotherm xiong{Oswin{0.176, -1.748e-3, 0.182, 6.946e-3}, K(40), K(80)};
  const double a[] = {0.3, 0.5, 0.7, 0.85};
  const double by_gab[] = {0.0467, 0.0699, 0.1020, 0.1426};
  const double by_oswin[] = {0.0428, 0.0711, 0.1181, 0.2009};
  for (int i = 0; i < 4; ++i) {
    EXPECT_NEAR(moisture(waananen, a[i], K(60)), by_gab[i], 0.51e-4);
    EXPECT_NEAR(moisture(xiong, a[i], K(60)), by_oswin[i], 0.51e-4);
  }
}

// ASAE D245 yellow dent, 40 degC; Storage of Cereal Grains and Their Products, 5th ed., p. 272,
// wheat, 40 degC. Printed to 0.01 per cent.
TEST(Isotherms, MatchMaizeAndWheatAt40DegC) {
  const Isotherm wheat{ModifiedChungPfost{610.34, 0.15526, 93.213}, K(10), K(50)};
  const double a[] = {0.3, 0.5, 0.7, 0.85};
  const double maize_db[] = {7.79, 11.13, 14.97, 19.11};
  const double wheat_db[] = {8.61, 12.16, 16.44, 21.51};
  for (int i = 0; i < 4; ++i) {
    EXPECT_NEAR(100 * moisture(corn_henderson, a[i], K(40)), maize_db[i], 0.0051);
    EXPECT_NEAR(100 * moisture(wheat, a[i], K(40)), wheat_db[i], 0.0051);
  }
}

// Simpson 1998, USDA FPL-RN-0268; printed to 0.01 per cent. Wood Handbook FPL-GTR-190 table 4-2,
// 21.1 degC, printed to 0.1 per cent.
TEST(WoodIsotherm, MatchesSimpsonAndTheWoodHandbook) {
  const double h[] = {0.2, 0.5, 0.8, 0.9};
  const double at20[] = {4.51, 9.27, 16.04, 20.53};
  const double at60[] = {3.57, 7.66, 13.56, 17.70};
  const double at80[] = {2.88, 6.60, 12.02, 15.87};
  for (int i = 0; i < 4; ++i) {
    EXPECT_NEAR(100 * moisture(wood, h[i], K(20)), at20[i], 0.0051);
    EXPECT_NEAR(100 * moisture(wood, h[i], K(60)), at60[i], 0.0051);
    EXPECT_NEAR(100 * moisture(wood, h[i], K(80)), at80[i], 0.0051);
  }
  const double humidity[] = {0.30, 0.50, 0.65, 0.80, 0.90};
  const double book[] = {6.2, 9.2, 12.0, 16.0, 20.5};
  for (int i = 0; i < 5; ++i)
    EXPECT_NEAR(100 * moisture(wood, humidity[i], K(21.1)), book[i], 0.051);
}

// Tryding et al., Drying Technol. 2022 (doi 10.1080/07373937.2022.2084104), bleached kraft; the
// energies are printed over the gas constant of water, 0.4615 kJ/(kg K), here in J/mol.
TEST(GabIsotherm, MatchesBleachedKraft) {
  const double molar = 8.314462618 / 0.4615;  // J/mol per kJ/kg, by that gas constant
  const Isotherm kraft{Gab{{0.0578, 0}, {0.4273, 468.93 * molar}, {0.1011, 297.74 * molar}}, K(25),
                       K(80)};
  const double a[] = {0.2, 0.5, 0.8, 0.9};
  const double at25[] = {0.0515, 0.0940, 0.1891, 0.2724};
  const double at80[] = {0.0345, 0.0654, 0.1028, 0.1208};
  for (int i = 0; i < 4; ++i) {
    EXPECT_NEAR(moisture(kraft, a[i], K(25)), at25[i], 0.51e-4);
    EXPECT_NEAR(moisture(kraft, a[i], K(80)), at80[i], 0.51e-4);
  }
}

// Wang and LeVan 2009, Toth constants; w to four decimals.
TEST(TothIsotherm, MatchesZeolitesAndSilicaGel) {
  const Toth x13{0.271875, 2.408e-10, 6852, 0.3974, -4.199};
  const Toth a5{0.422675, 4.714e-13, 9955, 0.3548, -51.14};
  const Toth silica{114219.59, 2.787e-8, 1093, -0.00119, 22.13};
  EXPECT_NEAR(x13.loading(1000, 298.15), 0.2385, 0.51e-4);
  EXPECT_NEAR(x13.loading(1000, 373.15), 0.1380, 0.51e-4);
  EXPECT_NEAR(a5.loading(1000, 298.15), 0.2361, 0.51e-4);
  EXPECT_NEAR(silica.loading(1000, 298.15), 0.1870, 0.51e-4);
  EXPECT_NEAR(silica.loading(1000, 348.15), 0.0285, 0.51e-4);
  // heat at zero coverage, Q R: 57.0 and 82.8 kJ/mol
  EXPECT_NEAR(6852 * 8.314462618e-3, 57.0, 0.051);
  // 5000 Pa at 298.15 K is more than saturation: held at activity 1
  const Isotherm bed{silica, 273, 348};
  EXPECT_NEAR(moisture(bed, 5000 / 3169.9, 298.15), moisture(bed, 1, 298.15), 1e-15);
}

// Sakoda and Suzuki 1984: 0.346 (p/psat)^0.625; worked by hand: 0.346 * 0.5^0.625 = 0.22435.
TEST(FreundlichIsotherm, MatchesSilicaGel) {
  const Isotherm silica{Freundlich{0.346, 0.625}, 293, 353};
  EXPECT_NEAR(moisture(silica, 0.5, 300), 0.22435, 0.51e-5);
}

// Li and Morey, Trans. ASAE 27(2), 1984; 60 degC, 25 % dry basis, minutes.
TEST(ThinLayer, MatchesCorn) {
  const PageConstants page = corn_layer(K(60), 0.25);
  EXPECT_NEAR(page.k, 0.0318002, 0.51e-7);
  EXPECT_NEAR(page.n, 0.731219, 0.51e-6);
  EXPECT_NEAR(page_ratio(page.k, page.n, 10), 0.84260, 0.51e-5);
  EXPECT_NEAR(page_ratio(page.k, page.n, 60), 0.53003, 0.51e-5);
  EXPECT_NEAR(page_ratio(page.k, page.n, 120), 0.34860, 0.51e-5);
}

// O'Callaghan, Menzies and Bailey 1971; 50 degC, one hour.
TEST(ThinLayer, MatchesWheat) {
  EXPECT_NEAR(wheat_layer_rate(K(50)), 2.85099e-4, 0.51e-9);
  EXPECT_NEAR(lewis_ratio(wheat_layer_rate(K(50)), 3600), 0.35831, 0.51e-5);
}

}  // namespace lossline::product
