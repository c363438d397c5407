#pragma once
// A small sound line file for tests, with ways to spoil it.

#include <gtest/gtest.h>

#include <string>
#include <vector>

#include "planner/linefile/read.h"

namespace lossline::linefile {

inline const std::string small_line = R"(format = 1  # the first

[line]
name = "Test line"  # "quoted" # twice

[duty]
feed_rate = "1.8 t/h"
feed_moisture = "25 % wb"
feed_temperature = "50 degC"
target_moisture = "0.1 kg/kg db"

[product]
material = "carrot"
kind = "slab"

[belt]
width = "1200 mm"

[feed]
width = "1.0 m"
depth = "20 mm"

[[stretch]]
name = "cavity 1"
kind = "microwave"
length = "2.4 m"
width = "1.4 m"
height = "1.0 m"
launchers = 2
air = "main"

[[stretch]]
name = "cavity 1b"
kind = "microwave"
length = "1.2 m"
width = "1.4 m"
height = "1.0 m"

[[generator]]
name = "G1"
frequency = "2450 MHz"
rated = "15 kW"
set_point = "70 %"
minimum_stable = "1500 W"
tube_efficiency = "68 %"
supply_efficiency = "88 %"
feeds = ["cavity 1", "cavity 1b"]
shares = ["60 %", "40 %"]

[[air]]
name = "main"
pattern = "cross"
dry_air_flow = "1000 kg/h"
)";

/// The text with its first `from` turned into `to`.
inline std::string with(std::string text, const std::string& from, const std::string& to) {
  const std::size_t at = text.find(from);
  EXPECT_NE(at, std::string::npos) << from;
  return at == std::string::npos ? text : text.replace(at, from.size(), to);
}

/// All that is wrong with a text, one problem a line; "sound" when nothing is.
inline std::string faults(const std::string& text, const std::vector<Setting>& settings = {}) {
  try {
    (void)read_text(text, "test.toml", settings);
  } catch (const InputError& error) {
    return error.what();
  }
  return "sound";
}

}  // namespace lossline::linefile
