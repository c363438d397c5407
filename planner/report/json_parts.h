#pragma once
// Internal to planner/report: sections of the JSON answer. The only header with nlohmann/json.

#include <nlohmann/json.hpp>
#include <optional>
#include <string>

#include "planner/report/page.h"

namespace lossline::report {

using Json = nlohmann::ordered_json;

/// Writes a number only when it is one.
void put(Json& object, const char* key, double value);
void put(Json& object, const char* key, const std::optional<double>& value);

[[nodiscard]] Json flags_json(Flags flags);
[[nodiscard]] Json power_json(const Solution& solution);
[[nodiscard]] Json cavities_json(const Solution& solution);
[[nodiscard]] Json generators_json(const Solution& solution);
[[nodiscard]] Json air_json(const Solution& solution);
[[nodiscard]] Json ends_json(const Solution& solution);
[[nodiscard]] Json profile_json(const Page& page);

}  // namespace lossline::report
