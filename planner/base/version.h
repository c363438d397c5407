#pragma once
// The version every answer carries.

namespace lossline {

inline constexpr const char* program_version = "0.1.0";

}  // namespace lossline
