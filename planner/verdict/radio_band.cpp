#include "planner/verdict/radio_band.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cctype>

namespace lossline::verdict {
namespace {

bool inside(double frequency, double low_MHz, double high_MHz) {
  return frequency >= low_MHz * 1e6 && frequency <= high_MHz * 1e6;
}

bool united_states(std::string country) {
  std::erase_if(country, [](unsigned char c) { return std::isalpha(c) == 0; });
  std::transform(country.begin(), country.end(), country.begin(),
                 [](unsigned char c) { return static_cast<char>(std::tolower(c)); });
  constexpr std::array names{"us", "usa", "unitedstates", "unitedstatesofamerica"};
  return std::find(names.begin(), names.end(), country) != names.end();
}

}  // namespace

BandAnswer radio_band(double frequency, const std::string& country) {
  const std::string mhz = fmt::format("{:.5g} MHz", 1e-6 * frequency);
  const bool worldwide = inside(frequency, 2400, 2500) || inside(frequency, 5725, 5875) ||
                         inside(frequency, 24'000, 24'250);
  const bool regional = inside(frequency, 902, 928);
  const bool listed_us = regional || inside(frequency, 2400, 2500) || inside(frequency, 5725, 5875);
  if (country.empty())
    return {BandStatus::unknown, "no country is given, so nothing is known about using " + mhz,
            "the radio authority's allocation table"};
  if (united_states(country) && listed_us)
    return {BandStatus::listed, mhz + " is listed for industrial heating in the United States",
            "47 CFR 18.301"};
  if (worldwide)
    return {BandStatus::listed, mhz + " lies in a band designated worldwide",
            "ITU Radio Regulations No. 5.150"};
  if (regional)
    return {BandStatus::national,
            mhz + " is designated in ITU Region 2 only; elsewhere it needs national permission",
            "ITU Radio Regulations No. 5.150"};
  if (inside(frequency, 886, 906))
    return {BandStatus::national, mhz + " is a national matter of a few countries",
            "national radio regulations"};
  return {BandStatus::unlisted, mhz + " lies in no band for industrial heating known here",
          "national radio regulations"};
}

}  // namespace lossline::verdict
