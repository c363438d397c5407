#include "planner/base/units.h"

#include <charconv>
#include <cmath>

#include "planner/base/constants.h"

namespace lossline {
namespace {

struct Symbol {
  std::string_view name;
  Dimension dimension;
  double up, down;
  bool prefixed;
};

// Factors are exact by definition unless noted.
// SI and units accepted with it: BIPM, The International System of Units, 9th edition, 2019.
// Inch, foot, pound, grain, gallon, pound-force, standard atmosphere, international-table Btu and
// calorie, horsepower, conventional inch of water (rounded to 8 figures): NIST SP 811, 2008,
// appendix B (from memory).
constexpr double pound = 0.45359237, foot = 0.3048, btu = 1055.05585262;
constexpr Dimension mass = dimension(1), metre = dimension(0, 1), time = dimension(0, 0, 1);
constexpr Dimension volume = dimension(0, 3), kelvin = dimension(0, 0, 0, 1);
constexpr Dimension energy = dimension(1, 2, -2), power = dimension(1, 2, -3);
constexpr Dimension pressure = dimension(1, -1, -2);
constexpr Dimension none = dimension(0);

constexpr std::array symbols{
    Symbol{"kg", mass, 1, 1, false},
    Symbol{"g", mass, 1, 1000, true},
    Symbol{"t", mass, 1000, 1, false},
    Symbol{"m", metre, 1, 1, true},
    Symbol{"s", time, 1, 1, true},
    Symbol{"min", time, 60, 1, false},
    Symbol{"h", time, 3600, 1, false},
    Symbol{"d", time, 86400, 1, false},
    Symbol{"K", kelvin, 1, 1, false},
    Symbol{"degC", kelvin, 1, 1, false},
    Symbol{"°C", kelvin, 1, 1, false},
    Symbol{"A", dimension(0, 0, 0, 0, 1), 1, 1, true},
    Symbol{"mol", dimension(0, 0, 0, 0, 0, 1), 1, 1, true},
    Symbol{"Hz", dimension(0, 0, -1), 1, 1, true},
    Symbol{"N", dimension(1, 1, -2), 1, 1, true},
    Symbol{"Pa", pressure, 1, 1, true},
    Symbol{"bar", pressure, 1e5, 1, true},
    Symbol{"atm", pressure, 101325, 1, false},
    Symbol{"J", energy, 1, 1, true},
    Symbol{"Wh", energy, 3600, 1, true},
    Symbol{"W", power, 1, 1, true},
    Symbol{"V", dimension(1, 2, -3, 0, -1), 1, 1, true},
    Symbol{"ohm", dimension(1, 2, -3, 0, -2), 1, 1, true},
    Symbol{"Ω", dimension(1, 2, -3, 0, -2), 1, 1, true},
    Symbol{"S", dimension(-1, -2, 3, 0, 2), 1, 1, true},
    Symbol{"L", volume, 1, 1000, true},
    Symbol{"CU", dimension(0, 0, 0, 0, 0, 0, 1), 1, 1, true},
    Symbol{"dB", dimension(0, 0, 0, 0, 0, 0, 0, 1), 1, 1, false},
    Symbol{"rad", dimension(0, 0, 0, 0, 0, 0, 0, 0, 1), 1, 1, true},
    Symbol{"deg", dimension(0, 0, 0, 0, 0, 0, 0, 0, 1), pi, 180, false},
    Symbol{"°", dimension(0, 0, 0, 0, 0, 0, 0, 0, 1), pi, 180, false},
    Symbol{"%", none, 1, 100, false},
    Symbol{"in", metre, 0.0254, 1, false},
    Symbol{"ft", metre, foot, 1, false},
    Symbol{"lb", mass, pound, 1, false},
    Symbol{"gr", mass, pound, 7000, false},
    Symbol{"oz", mass, pound, 16, false},
    Symbol{"degF", kelvin, 5, 9, false},
    Symbol{"°F", kelvin, 5, 9, false},
    Symbol{"gal", volume, 3.785411784, 1000, false},
    Symbol{"psi", pressure, pound * 9.80665, 0.0254 * 0.0254, false},
    Symbol{"inH2O", pressure, 249.08891, 1, false},
    Symbol{"BTU", energy, btu, 1, false},
    Symbol{"MMBTU", energy, 1e6 * btu, 1, false},
    Symbol{"kcal", energy, 4186.8, 1, false},
    Symbol{"hp", power, 550 * foot* pound * 9.80665, 1, false},
};

struct Prefix {
  std::string_view name;
  double up, down;
};

constexpr std::array prefixes{Prefix{"k", 1e3, 1}, Prefix{"M", 1e6, 1}, Prefix{"G", 1e9, 1},
                              Prefix{"m", 1, 1e3}, Prefix{"c", 1, 1e2}, Prefix{"u", 1, 1e6},
                              Prefix{"µ", 1, 1e6}, Prefix{"n", 1, 1e9}, Prefix{"h", 1e2, 1}};

/// hPa and cm are usual; centiwatts and hectometres are slips.
bool usual(std::string_view prefix, std::string_view symbol) {
  if (prefix == "h") return symbol == "Pa";
  if (prefix == "c") return symbol == "m";
  return true;
}

std::optional<Unit> symbol_unit(std::string_view text) {
  for (const Symbol& s : symbols)
    if (s.name == text) return Unit{s.dimension, s.up, s.down};
  for (const Prefix& p : prefixes) {
    if (!text.starts_with(p.name)) continue;
    for (const Symbol& s : symbols)
      if (s.prefixed && s.name == text.substr(p.name.size()) && usual(p.name, s.name))
        return Unit{s.dimension, s.up * p.up, s.down * p.down};
  }
  return std::nullopt;
}

/// Takes whole factors common to both halves of the fraction out of it.
void reduce(Unit& unit) {
  if (std::fmod(unit.up, unit.down) == 0) {
    unit.up /= unit.down;
    unit.down = 1;
  } else if (std::fmod(unit.down, unit.up) == 0) {
    unit.down /= unit.up;
    unit.up = 1;
  }
}

/// u times v to the power n; false when an exponent leaves any sensible range.
bool multiply(Unit& u, const Unit& v, int n) {
  for (std::size_t k = 0; k < u.dimension.size(); ++k) {
    const int exponent = u.dimension[k] + n * v.dimension[k];
    if (!(exponent >= -99 && exponent <= 99)) return false;
    u.dimension[k] = static_cast<signed char>(exponent);
  }
  for (int i = 0; i < std::abs(n); ++i) {
    u.up *= n > 0 ? v.up : v.down;
    u.down *= n > 0 ? v.down : v.up;
  }
  reduce(u);
  return std::isfinite(u.up) && std::isfinite(u.down) && u.up > 0 && u.down > 0;
}

class Reader {
 public:
  explicit Reader(std::string_view text) : text_(text) {}

  std::variant<Unit, UnitFault> all() {
    Unit unit;
    if (expression(unit, 0) && !done()) fail("')' without '('");
    if (fault_) return *fault_;
    return unit;
  }

 private:
  static constexpr int deepest = 8;

  std::string_view text_;
  std::size_t at_ = 0;
  std::optional<UnitFault> fault_;

  [[nodiscard]] bool done() const { return at_ >= text_.size(); }
  [[nodiscard]] std::string_view rest() const { return text_.substr(at_); }
  void skip_blanks() {
    while (!done() && text_[at_] == ' ') ++at_;
  }
  bool take(std::string_view token) {
    if (!rest().starts_with(token)) return false;
    at_ += token.size();
    return true;
  }
  bool fail(std::string message, std::size_t length = 0) {
    fault_ = UnitFault{std::move(message), at_, length};
    return false;
  }

  bool expression(Unit& unit, int depth) {
    if (!power_of(unit, 1, depth)) return false;
    for (;;) {
      skip_blanks();
      if (done() || text_[at_] == ')') return true;
      int sign = 1;
      if (take("/"))
        sign = -1;
      else if (!take("*") && !take("."))
        take("·");
      skip_blanks();
      if (!power_of(unit, sign, depth)) return false;
    }
  }

  /// One factor with its exponent, multiplied onto the unit.
  bool power_of(Unit& unit, int sign, int depth) {
    Unit factor;
    if (done()) return fail("a unit is missing at the end");
    if (take("(")) {
      if (depth >= deepest) return fail("too many parentheses");
      skip_blanks();
      if (!expression(factor, depth + 1)) return false;
      if (!take(")")) return fail("')' is missing");
    } else if (!symbol(factor)) {
      return false;
    }
    int exponent = 1;
    if (take("²")) {
      exponent = 2;
    } else if (take("³")) {
      exponent = 3;
    } else {
      const bool raised = take("^");
      const char* end = text_.data() + text_.size();
      const auto [next, error] = std::from_chars(text_.data() + at_, end, exponent);
      if (error == std::errc{})
        at_ = static_cast<std::size_t>(next - text_.data());
      else if (raised || error == std::errc::result_out_of_range)
        return fail("a whole exponent is expected here");
    }
    if (!(exponent >= -9 && exponent <= 9) || exponent == 0 ||
        !multiply(unit, factor, sign * exponent))
      return fail("the exponent is out of any sensible range");
    return true;
  }

  static bool letter(std::string_view rest) {
    for (const char* other : {"·", "²", "³"})
      if (rest.starts_with(other)) return false;
    const auto c = static_cast<unsigned char>(rest.front());
    return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || c >= 0x80 || c == '%' || c == '_';
  }

  bool symbol(Unit& unit) {
    if (take("1")) {
      if (!done() && text_[at_] >= '0' && text_[at_] <= '9') {
        --at_;
        return fail("a unit is expected here, not a number");
      }
      return true;
    }
    std::size_t length = 0;
    // A pressure head is the one symbol with a digit inside.
    if (rest().starts_with("inH2O")) length = 5;
    while (at_ + length < text_.size() && letter(text_.substr(at_ + length))) ++length;
    if (length == 0) return fail("a unit is expected here");
    const std::string_view name = text_.substr(at_, length);
    const auto known = symbol_unit(name);
    if (!known) return fail('\'' + std::string(name) + "' is not a known unit", length);
    unit = *known;
    at_ += length;
    return true;
  }
};

}  // namespace

std::variant<Unit, UnitFault> read_unit(std::string_view text) {
  return Reader(text).all();
}

std::vector<std::string> known_symbols() {
  std::vector<std::string> names;
  names.reserve(symbols.size() * prefixes.size());
  for (const Symbol& s : symbols) names.emplace_back(s.name);
  for (const Prefix& p : prefixes)
    for (const Symbol& s : symbols)
      if (s.prefixed && usual(p.name, s.name))
        names.push_back(std::string(p.name) + std::string(s.name));
  return names;
}

}  // namespace lossline
