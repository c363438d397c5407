#include "planner/base/quantity.h"

#include <algorithm>
#include <charconv>
#include <cmath>

#include "planner/base/error.h"
#include "planner/base/nearest.h"
#include "planner/base/scales.h"

namespace lossline {
namespace {

std::string quoted(std::string_view text) {
  return '"' + std::string(text) + '"';
}

/// Bytes to 1-based code points.
std::size_t column_of(std::string_view text, std::size_t byte) {
  std::size_t column = 1;
  for (std::size_t i = 0; i < byte && i < text.size(); ++i)
    if ((static_cast<unsigned char>(text[i]) & 0xC0) != 0x80) ++column;
  return column;
}

/// What was read so far of one text.
struct Reading {
  std::string_view text;
  const QuantityKind& kind;
  double number = 0;
  std::size_t unit_begin = 0;
  std::string_view unit;

  [[nodiscard]] QuantityResult fault(const std::string& wrong, std::string right,
                                     std::size_t byte) const {
    return {std::nullopt, {quoted(text) + wrong, std::move(right), column_of(text, byte)}};
  }
  [[nodiscard]] std::string as_in() const {
    return "write " + std::string(kind.noun) + " as in " + quoted(kind.example);
  }
  [[nodiscard]] QuantityResult wrong_unit() const {
    return fault(": '" + std::string(unit) + "' does not measure " + std::string(kind.noun),
                 as_in(), unit_begin);
  }
  [[nodiscard]] QuantityResult accepted(double value) const {
    if (std::isfinite(value)) return {value, {}};
    return fault(" is not a finite number", as_in(), 0);
  }
};

/// A comma or an apostrophe after the number; the text after it decides what was meant.
QuantityResult separator_fault(const Reading& r, std::size_t at) {
  std::size_t digits = 0;
  while (at + 1 + digits < r.text.size() && r.text[at + 1 + digits] >= '0' &&
         r.text[at + 1 + digits] <= '9')
    ++digits;
  std::string point(r.text), joined(r.text);
  point[at] = '.';
  joined.erase(at, 1);
  const std::string sign(1, r.text[at]);
  if (r.text[at] == ',' && digits != 3)
    return r.fault(": a comma is not a decimal point", "write " + quoted(point), at);
  if (r.text[at] == ',')
    return r.fault(": a comma is neither a decimal point nor a separator of thousands",
                   "write " + quoted(joined) + " or " + quoted(point), at);
  return r.fault(": digits are not grouped", "write " + quoted(joined), at);
}

/// The symbol most likely meant by an unknown one: same letters in another case first, then one
/// that makes a unit of the right dimension, then the larger unit (MW, not mW).
std::string meant_symbol(const Reading& r, const UnitFault& fault) {
  const std::string_view word = r.unit.substr(fault.begin, fault.length);
  const int most_edits = word.size() <= 3 ? 1 : 2;
  std::string best;
  double best_score = 0;
  for (const std::string& candidate : known_symbols()) {
    const bool same = same_but_for_case(word, candidate);
    const int edits = same ? 0 : edit_distance(word, candidate);
    if (edits > most_edits) continue;
    std::string repaired(r.unit);
    repaired.replace(fault.begin, fault.length, candidate);
    const auto unit = read_unit(repaired);
    const Unit* good = std::get_if<Unit>(&unit);
    const bool fits = good != nullptr && good->dimension == r.kind.dimension;
    if (!fits && !same) continue;
    const double size = good != nullptr ? std::log10(good->up / good->down) : 0;
    const double score = 1000 - 300 * edits + (fits ? 150 : 0) + std::clamp(size, -40.0, 40.0);
    if (score > best_score) {
      best_score = score;
      best = candidate;
    }
  }
  return best;
}

QuantityResult read_dimensional(const Reading& r) {
  const auto unit = read_unit(r.unit);
  if (const auto* fault = std::get_if<UnitFault>(&unit)) {
    const std::string meant = fault->length > 0 ? meant_symbol(r, *fault) : "";
    return r.fault(": " + fault->message,
                   meant.empty() ? r.as_in() : "did you mean '" + meant + "'?",
                   r.unit_begin + fault->begin);
  }
  const Unit& good = std::get<Unit>(unit);
  if (good.dimension != r.kind.dimension) return r.wrong_unit();
  return r.accepted(good.to_si(r.number));
}

/// Forms whose units are a short list and no products of symbols.
QuantityResult read_scaled(const Reading& r) {
  if (const Scale* scale = find_scale(r.kind.form, r.unit)) {
    if (scale->wet_basis) {
      const double wet = scale->to_si(r.number);
      if (!(wet < 1))
        return r.fault(" would be nothing but water",
                       "moisture on the wet basis lies below 100 % wb", 0);
      return r.accepted(wet / (1 - wet));
    }
    return r.accepted(scale->to_si(r.number));
  }
  const std::string number(r.text.substr(0, r.unit_begin));
  const bool bare = r.unit == "%" || r.unit == "kg/kg" || r.unit == "g/g" || r.unit == "lb/lb";
  switch (r.kind.form) {
    case QuantityForm::temperature_difference:
      if (find_scale(QuantityForm::temperature, r.unit) == nullptr) break;
      if (r.unit.ends_with('F'))
        return r.fault(" is a temperature, not a difference",
                       "write " + quoted(number + "degF diff"), r.unit_begin);
      return r.fault(" is a temperature, not a difference", "write " + quoted(number + "K"),
                     r.unit_begin);
    case QuantityForm::moisture:
      if (!bare) break;
      return r.fault(" does not say its basis",
                     "write " + quoted(std::string(r.text) + " wb") +
                         " for water over wet product, or " + quoted(std::string(r.text) + " db") +
                         " for water over dry solids",
                     r.unit_begin);
    case QuantityForm::moisture_difference:
      if (bare)
        return r.fault(" does not say its basis",
                       "write it dry basis, as in " + quoted(std::string(r.text) + " db"),
                       r.unit_begin);
      if (find_scale(QuantityForm::moisture, r.unit) == nullptr) break;
      return r.fault(": a difference on the wet basis depends on where it is taken",
                     "write it dry basis, as in " + quoted(r.kind.example), r.unit_begin);
    case QuantityForm::humidity:
      if (r.unit != "%") break;
      return r.fault(" could be a relative humidity",
                     "write the humidity ratio, as in " + quoted(r.kind.example), r.unit_begin);
    default:
      break;
  }
  const std::string meant = nearest_scale(r.kind.form, r.unit);
  if (!meant.empty())
    return r.fault(": '" + std::string(r.unit) + "' does not measure " + std::string(r.kind.noun),
                   "did you mean '" + meant + "'?", r.unit_begin);
  return r.wrong_unit();
}

QuantityResult read_plain(const Reading& r) {
  const bool whole = r.kind.form == QuantityForm::count;
  if (!r.unit.empty())
    return r.fault(" carries a unit",
                   std::string("write ") + (whole ? "a whole number" : "a plain number") +
                       ", as in " + std::string(r.kind.example),
                   r.unit_begin);
  if (whole && !(r.number == std::floor(r.number)))
    return r.fault(" is not a whole number", "write it as in " + std::string(r.kind.example), 0);
  return r.accepted(r.number);
}

}  // namespace

QuantityResult read_quantity(std::string_view text, const QuantityKind& kind) {
  Reading r{text, kind, 0, 0, {}};
  std::size_t begin = text.find_first_not_of(' ');
  if (begin == std::string_view::npos) return r.fault(" is empty", r.as_in(), 0);
  if (text[begin] == '+' && begin + 1 < text.size() && text[begin + 1] != '-') ++begin;
  const char* const end = text.data() + text.size();
  const auto [next, error] = std::from_chars(text.data() + begin, end, r.number);
  if (error == std::errc::result_out_of_range)
    return r.fault(" is beyond any number", r.as_in(), begin);
  if (error != std::errc{}) return r.fault(" does not begin with a number", r.as_in(), begin);
  if (!std::isfinite(r.number)) return r.fault(" is not a finite number", r.as_in(), begin);
  const auto after = static_cast<std::size_t>(next - text.data());
  if (after + 1 < text.size() && (text[after] == ',' || text[after] == '\'') &&
      text[after + 1] >= '0' && text[after + 1] <= '9')
    return separator_fault(r, after);
  r.unit_begin = std::min(text.find_first_not_of(' ', after), text.size());
  r.unit = text.substr(r.unit_begin);
  while (r.unit.ends_with(' ')) r.unit.remove_suffix(1);
  if (!r.unit.empty() && r.unit[0] >= '0' && r.unit[0] <= '9' && !r.unit.starts_with("1/"))
    return r.fault(": digits are not grouped", r.as_in(), r.unit_begin);
  if (kind.form == QuantityForm::number || kind.form == QuantityForm::count) return read_plain(r);
  if (r.unit.empty()) return r.fault(" has no unit", r.as_in(), text.size());
  return kind.form == QuantityForm::dimensional ? read_dimensional(r) : read_scaled(r);
}

double parse_quantity(std::string_view text, const QuantityKind& kind) {
  const QuantityResult result = read_quantity(text, kind);
  if (result.value) return *result.value;
  throw Error(ErrorKind::bad_input, result.fault.wrong + "; " + result.fault.right);
}

}  // namespace lossline
