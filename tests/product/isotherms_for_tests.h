#pragma once
// One isotherm of each published form, for tests that hold for all of them. Constants from the
// sources named in tests/published/product_isotherm_test.cpp; those of Halsey, Peleg and Dubinin
// are made up, of usual size.

#include <string>
#include <utility>
#include <vector>

#include "planner/product/isotherm.h"

namespace lossline::product::test {

inline std::vector<std::pair<std::string, Isotherm>> isotherms() {
  return {
      {"GAB potato", {Gab{{0.0560, 1390}, {0.017, 20000}, {0.94, -920}}, 303.15, 333.15}},
      {"GAB pasta",
       {Gab{{4.40e-3, 6840}, {2.86e-9, 60000}, {0.1313, 4920}}, 313.15, 363.15, 0.025, 0.9}},
      {"GAB potato 2", {Gab{{0.209, 0}, {4.416, 0}, {0.976, 0}}, 313.15, 323.15}},
      {"GAB kraft", {Gab{{0.0578, 0}, {0.4273, 8448}, {0.1011, 5364}}, 298.15, 353.15}},
      {"BET", {Bet{{0.06, 1000}, {2, 5000}}, 293.15, 333.15, 0.05, 0.5}},
      {"Oswin pasta", {Oswin{0.176, -1.748e-3, 0.182, 6.946e-3}, 313.15, 353.15}},
      {"Oswin fixed", {Oswin{0.1, 0, 0.5, 0}, 298.15, 298.15}},
      {"Henderson corn", {ModifiedHenderson{8.6541e-5, 1.8634, 49.810}, 273.15, 343.15}},
      {"Chung wheat", {ModifiedChungPfost{610.34, 0.15526, 93.213}, 283.15, 323.15}},
      {"Chung corn", {ModifiedChungPfost{312.40, 0.16958, 30.205}, 273.15, 343.15}},
      {"Oswin corn", {ModifiedOswin{15.303, -0.10164, 3.0358}, 273.15, 343.15}},
      {"Halsey", {ModifiedHalsey{4.2, -0.012, 2.1}, 283.15, 323.15}},
      {"Peleg", {Peleg{0.12, 0.6, 0.25, 6}, 298.15, 323.15}},
      {"wood", {HailwoodHorrobin{}, 273.15, 373.15}},
      {"zeolite 13X",
       {Toth{0.271875, 2.408e-10, 6852, 0.3974, -4.199}, 273.15, 373.15, 0.003, 0.6}},
      {"zeolite 5A", {Toth{0.422675, 4.714e-13, 9955, 0.3548, -51.14}, 273.15, 373.15, 0.003, 0.6}},
      {"silica Toth",
       {Toth{114219.59, 2.787e-8, 1093, -0.00119, 22.13}, 273.15, 348.15, 0.003, 0.9}},
      {"silica power", {Freundlich{0.346, 0.625}, 293.15, 353.15}},
      {"Dubinin", {DubininAstakhov{0.3, 8000, 1.8}, 293.15, 373.15}},
  };
}

}  // namespace lossline::product::test
