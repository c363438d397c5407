#pragma once
// Whether a frequency lies in a band set aside for industrial heating. Never a silent yes: only
// what is plainly listed counts, everything else is a question to the radio authority.
//
// Sources: [RR] ITU Radio Regulations No. 5.150: 2400-2500, 5725-5875 MHz and 24.00-24.25 GHz
// worldwide, 902-928 MHz in Region 2 only (from memory, except that 902-928 is Region 2 only).
// [CFR] 47 CFR 18.301: 915 +- 13, 2450 +- 50, 5800 +- 75 MHz in the United States.

#include <string>

namespace lossline::verdict {

enum class BandStatus {
  listed,    ///< listed for the country or worldwide
  national,  ///< a national or regional matter: ask
  unlisted,  ///< in no band for industrial heating known here: ask
  unknown,   ///< no country given
};

struct BandAnswer {
  BandStatus status = BandStatus::unknown;
  std::string text;      ///< one sentence
  std::string document;  ///< that decides
};

/// Looks a frequency up.
///
///   frequency  [Hz], > 0
///   country    free text as in the line file; may be empty
[[nodiscard]] BandAnswer radio_band(double frequency, const std::string& country);

}  // namespace lossline::verdict
