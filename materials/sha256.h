#pragma once
// SHA-256, to recognise an input file again. Source: FIPS PUB 180-4 (2015), sections 5 and 6.2.

#include <string>
#include <string_view>

namespace lossline::materials {

/// The digest of `data` as 64 lower-case hexadecimal digits.
[[nodiscard]] std::string sha256(std::string_view data);

}  // namespace lossline::materials
