#include "planner/base/scales.h"

#include <array>
#include <vector>

#include "planner/base/constants.h"
#include "planner/base/nearest.h"

namespace lossline {
namespace {

using Form = QuantityForm;

// Degree Fahrenheit: t/degC = (t/degF - 32) 5/9; 7000 grains to the pound (NIST SP 811, 2008,
// appendix B, from memory). The first of a form is what a message suggests.
constexpr std::array scales{
    Scale{Form::temperature, "degC", 0, 1, 1, celsius_zero},
    Scale{Form::temperature, "°C", 0, 1, 1, celsius_zero},
    Scale{Form::temperature, "degF", -32, 5, 9, celsius_zero},
    Scale{Form::temperature, "°F", -32, 5, 9, celsius_zero},
    Scale{Form::temperature, "K", 0, 1, 1, 0},
    Scale{Form::temperature_difference, "K", 0, 1, 1, 0},
    Scale{Form::temperature_difference, "degC diff", 0, 1, 1, 0},
    Scale{Form::temperature_difference, "°C diff", 0, 1, 1, 0},
    Scale{Form::temperature_difference, "degF diff", 0, 5, 9, 0},
    Scale{Form::temperature_difference, "°F diff", 0, 5, 9, 0},
    Scale{Form::moisture, "% db", 0, 1, 100, 0},
    Scale{Form::moisture, "% wb", 0, 1, 100, 0, true},
    Scale{Form::moisture, "kg/kg db", 0, 1, 1, 0},
    Scale{Form::moisture, "kg/kg wb", 0, 1, 1, 0, true},
    Scale{Form::moisture, "lb/lb db", 0, 1, 1, 0},
    Scale{Form::moisture, "lb/lb wb", 0, 1, 1, 0, true},
    Scale{Form::moisture_difference, "% db", 0, 1, 100, 0},
    Scale{Form::moisture_difference, "kg/kg db", 0, 1, 1, 0},
    Scale{Form::moisture_difference, "lb/lb db", 0, 1, 1, 0},
    Scale{Form::humidity, "kg/kg", 0, 1, 1, 0},
    Scale{Form::humidity, "g/kg", 0, 1, 1000, 0},
    Scale{Form::humidity, "lb/lb", 0, 1, 1, 0},
    Scale{Form::humidity, "gr/lb", 0, 1, 7000, 0},
    Scale{Form::share, "%", 0, 1, 100, 0},
};

bool same_name(std::string_view a, std::string_view b) {
  std::size_t i = 0, j = 0;
  for (;;) {
    while (i < a.size() && a[i] == ' ') ++i;
    while (j < b.size() && b[j] == ' ') ++j;
    if (i == a.size() || j == b.size()) return i == a.size() && j == b.size();
    if (a[i++] != b[j++]) return false;
  }
}

}  // namespace

const Scale* find_scale(QuantityForm form, std::string_view name) {
  for (const Scale& scale : scales)
    if (scale.form == form && same_name(scale.name, name)) return &scale;
  return nullptr;
}

std::string nearest_scale(QuantityForm form, std::string_view name) {
  std::vector<std::string> names;
  for (const Scale& scale : scales)
    if (scale.form == form) names.emplace_back(scale.name);
  // The scales are often written by their letter alone.
  if (form == Form::temperature && (name == "C" || name == "c")) return "degC";
  if (form == Form::temperature && (name == "F" || name == "f")) return "degF";
  return nearest(name, names);
}

}  // namespace lossline
