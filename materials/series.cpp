#include "materials/series.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <tuple>

#include "materials/units.h"
#include "planner/base/constants.h"
#include "planner/base/error.h"

namespace lossline::materials {
namespace {

std::string_view trimmed(std::string_view text) {
  const auto blank = [](char c) { return c == ' ' || c == '\t' || c == '\r'; };
  while (!text.empty() && blank(text.front())) text.remove_prefix(1);
  while (!text.empty() && blank(text.back())) text.remove_suffix(1);
  return text;
}

std::vector<std::string> cells_of(std::string_view line, char delimiter) {
  std::vector<std::string> cells;
  std::size_t from = 0;
  while (true) {
    const std::size_t to = line.find(delimiter, from);
    std::string_view cell = trimmed(line.substr(from, to - from));
    if (cell.size() >= 2 && cell.front() == '"' && cell.back() == '"')
      cell = cell.substr(1, cell.size() - 2);
    cells.emplace_back(cell);
    if (to == std::string_view::npos) return cells;
    from = to + 1;
  }
}

/// Everything the head of the file says about its columns.
struct Head {
  std::vector<std::string> names, units;
  char delimiter = ',';
  bool decimal_comma = false;
  bool wet = false;
  bool field_depth = false;

  [[nodiscard]] int column(const char* name) const {
    const auto at = std::find(names.begin(), names.end(), name);
    return at == names.end() ? -1 : static_cast<int>(at - names.begin());
  }
};

class Reader {
 public:
  Reader(std::string_view text, const std::string& file) : file_(file) { split(text); }

  Series read() {
    read_metadata();
    read_head();
    if (!problems_.empty()) throw InputError(ErrorKind::bad_input, std::move(problems_));
    for (std::size_t i = first_row_; i < lines_.size(); ++i) read_row(i);
    finish();
    return std::move(series_);
  }

 private:
  void split(std::string_view text) {
    if (text.starts_with("\xEF\xBB\xBF")) text.remove_prefix(3);
    std::size_t from = 0;
    while (from <= text.size()) {
      const std::size_t to = std::min(text.find('\n', from), text.size());
      lines_.push_back(trimmed(text.substr(from, to - from)));
      from = to + 1;
    }
  }

  void problem(std::size_t line, const std::string& key, const std::string& wrong,
               const std::string& right) {
    problems_.push_back({file_, static_cast<int>(line), 0, key, wrong, right});
  }

  void read_metadata() {
    for (std::size_t i = 0; i < lines_.size(); ++i) {
      if (!lines_[i].starts_with('#')) continue;
      for (const std::string& part : cells_of(lines_[i].substr(1), ';')) {
        const std::size_t equals = part.find('=');
        if (equals == std::string::npos) continue;
        series_.metadata[std::string(trimmed(std::string_view(part).substr(0, equals)))] =
            trimmed(std::string_view(part).substr(equals + 1));
      }
    }
  }

  bool is_data(std::size_t i) const { return !lines_[i].empty() && !lines_[i].starts_with('#'); }

  std::size_t next_line(std::size_t from) const {
    while (from < lines_.size() && !is_data(from)) ++from;
    return from;
  }

  void read_head() {
    const std::size_t names_at = next_line(0);
    const std::size_t units_at = next_line(names_at + 1);
    if (units_at >= lines_.size()) {
      problem(0, "", "no column names and units found",
              "a row of column names, a row of units, then data rows");
      return;
    }
    head_.delimiter = lines_[names_at].find(';') != std::string_view::npos ? ';' : ',';
    head_.decimal_comma = series_.meta("decimal") == "comma";
    head_.names = cells_of(lines_[names_at], head_.delimiter);
    head_.units = cells_of(lines_[units_at], head_.delimiter);
    first_row_ = units_at + 1;
    if (head_.decimal_comma && head_.delimiter == ',')
      problem(names_at + 1, "decimal", "decimal=comma with cells separated by commas",
              "separate the cells by semicolons");
    if (head_.names.size() != head_.units.size()) {
      problem(units_at + 1, "",
              fmt::format("{} units for {} columns", head_.units.size(), head_.names.size()),
              "one unit a column, 1 for pure numbers");
      return;
    }
    check_columns(names_at + 1);
    check_units(units_at + 1);
  }

  void check_columns(std::size_t line) {
    static const std::vector<std::string> known = {"X",      "M",         "T",     "f",    "eps_re",
                                                   "eps_im", "tan_delta", "depth", "u_re", "u_im"};
    for (std::size_t i = 0; i < head_.names.size(); ++i) {
      const std::string& name = head_.names[i];
      if (std::find(known.begin(), known.end(), name) == known.end())
        problem(line, name, "unknown column '" + name + "'",
                "X, M, T, f, eps_re, eps_im, tan_delta, depth, u_re, u_im");
      if (std::find(head_.names.begin() + static_cast<std::ptrdiff_t>(i) + 1, head_.names.end(),
                    name) != head_.names.end())
        problem(line, name, "column '" + name + "' stands twice", "each column once");
    }
    for (const char* name : {"T", "f", "eps_re"})
      if (head_.column(name) < 0) problem(line, name, "column missing", "T, f and eps_re");
    const int losses = (head_.column("eps_im") >= 0) + (head_.column("tan_delta") >= 0) +
                       (head_.column("depth") >= 0);
    if (losses != 1)
      problem(line, "eps_im", fmt::format("{} loss columns", losses),
              "exactly one of eps_im, tan_delta, depth");
    const std::string basis = series_.meta("moisture_basis");
    if ((head_.column("X") >= 0) == (head_.column("M") >= 0))
      problem(line, "X", "moisture must stand in exactly one column",
              "X (dry basis), or M with '# moisture_basis=wet' or '=dry'");
    else if (head_.column("M") >= 0 && basis != "wet" && basis != "dry")
      problem(line, "M", "is M on wet or dry basis?", "'# moisture_basis=wet' or '=dry'");
    else if (head_.column("X") >= 0 && basis == "wet")
      problem(line, "X", "X is dry basis but moisture_basis=wet", "name the column M");
    head_.wet = head_.column("M") >= 0 && basis == "wet";
    const std::string depth = series_.meta("penetration_depth");
    if (head_.column("depth") >= 0 && depth != "power" && depth != "field")
      problem(line, "depth", "does the power or the field fall to 1/e at this depth?",
              "'# penetration_depth=power' or '=field'");
    head_.field_depth = depth == "field";
  }

  void check_units(std::size_t line) {
    for (std::size_t i = 0; i < head_.names.size(); ++i) {
      const std::string& name = head_.names[i];
      std::string& unit = head_.units[i];
      std::string wanted = "1";
      if (name == "T") wanted = "K";
      if (name == "f") wanted = "Hz";
      if (name == "depth") wanted = "m";
      if (name == "X" || name == "M") {
        wanted = "kg/kg db";
        if (unit == "1" || unit == "kg/kg") unit = head_.wet ? "kg/kg wb" : "kg/kg db";
        if (unit == "%") unit = head_.wet ? "% wb" : "% db";
        if (unit.ends_with(head_.wet ? "db" : "wb"))
          problem(line, name,
                  fmt::format("unit '{}' contradicts the basis of column {}", unit, name),
                  "X is dry basis; M is what moisture_basis says");
      }
      const auto probe = to_si(0, unit);
      if (!probe || probe->si != wanted)
        problem(line, name, fmt::format("unit '{}' does not fit column '{}'", unit, name),
                fmt::format("a unit of {} (degC, K, MHz, GHz, %, kg/kg, mm, cm, 1)", wanted));
      series_.reading += fmt::format("{}{} [{}]", i ? ", " : "", name, unit);
    }
    series_.reading += head_.delimiter == ';' ? "; cells by semicolon" : "; cells by comma";
    if (head_.decimal_comma) series_.reading += ", decimal comma";
    if (head_.column("depth") >= 0)
      series_.reading += head_.field_depth ? ", depth of the field" : ", depth of the power";
  }

  std::optional<double> cell(const std::vector<std::string>& cells, int column) const {
    if (column < 0) return std::nullopt;
    std::string text = cells[static_cast<std::size_t>(column)];
    if (head_.decimal_comma) std::replace(text.begin(), text.end(), ',', '.');
    const auto value = number(text);
    if (!value) return std::nullopt;
    const auto si = to_si(*value, head_.units[static_cast<std::size_t>(column)]);
    if (!si) return std::nullopt;
    return si->value;
  }

  void read_row(std::size_t i) {
    if (!is_data(i)) return;
    SeriesPoint point;
    point.line = static_cast<int>(i) + 1;
    point.printed = lines_[i];
    const std::string reason = fill(point, cells_of(lines_[i], head_.delimiter));
    if (reason.empty())
      series_.points.push_back(std::move(point));
    else
      series_.rejected.push_back({point.line, reason});
  }

  /// Fills the point; returns why not, or empty.
  std::string fill(SeriesPoint& point, const std::vector<std::string>& cells) const {
    if (cells.size() != head_.names.size())
      return fmt::format("{} cells, {} columns", cells.size(), head_.names.size());
    for (std::size_t c = 0; c < cells.size(); ++c) {
      const bool may_be_blank = head_.names[c].starts_with("u_");
      if (cells[c].empty() && may_be_blank) continue;
      if (!cell(cells, static_cast<int>(c)))
        return fmt::format("{} = '{}' is not a usable number", head_.names[c], cells[c]);
    }
    const int X = head_.column(head_.column("X") >= 0 ? "X" : "M");
    point.moisture = *cell(cells, X);
    point.temperature = *cell(cells, head_.column("T"));
    point.frequency = *cell(cells, head_.column("f"));
    point.eps_re = *cell(cells, head_.column("eps_re"));
    point.u_re = cell(cells, head_.column("u_re"));
    point.u_im = cell(cells, head_.column("u_im"));
    const auto within = [](double value, double lo, double hi) {
      return value >= lo && value <= hi;
    };
    if (!within(point.moisture, 0, series_X_max))
      return fmt::format("moisture {:.4g} kg/kg dry basis is outside [0, {:g}]", point.moisture,
                         series_X_max);
    if (!within(point.temperature, series_T_min, series_T_max))
      return fmt::format("T = {:.4g} K is outside [{:g}, {:g}] K", point.temperature, series_T_min,
                         series_T_max);
    if (!within(point.frequency, series_f_min, series_f_max))
      return fmt::format("f = {:.4g} Hz is outside [{:g}, {:g}] Hz", point.frequency, series_f_min,
                         series_f_max);
    if (!within(point.eps_re, 1, series_eps_re_max))
      return fmt::format("eps' = {:.4g} is outside [1, {:g}]", point.eps_re, series_eps_re_max);
    if (const auto loss = cell(cells, head_.column("eps_im"))) point.eps_im = *loss;
    if (const auto tangent = cell(cells, head_.column("tan_delta")))
      point.eps_im = *tangent * point.eps_re;
    if (const auto depth = cell(cells, head_.column("depth"))) {
      if (!(*depth > 0)) return fmt::format("penetration depth {:.4g} m is not positive", *depth);
      point.eps_im =
          loss_from_depth(point.eps_re, head_.field_depth ? *depth / 2 : *depth, point.frequency);
    }
    if (!within(point.eps_im, 0, series_eps_im_max))
      return fmt::format("eps'' = {:.4g} is outside [0, {:g}]", point.eps_im, series_eps_im_max);
    return {};
  }

  void finish() {
    series_.basis_converted = head_.wet;
    const auto key = [](const SeriesPoint& p) {
      return std::tuple(p.frequency, p.temperature, p.moisture, p.line);
    };
    std::sort(series_.points.begin(), series_.points.end(),
              [&](const SeriesPoint& a, const SeriesPoint& b) { return key(a) < key(b); });
    std::vector<SeriesPoint> unique;
    for (SeriesPoint& point : series_.points) {
      const bool twin = !unique.empty() && unique.back().frequency == point.frequency &&
                        unique.back().temperature == point.temperature &&
                        unique.back().moisture == point.moisture;
      if (twin)
        series_.rejected.push_back(
            {point.line, fmt::format("same f, T and moisture as line {}", unique.back().line)});
      else
        unique.push_back(std::move(point));
    }
    series_.points = std::move(unique);
    std::sort(series_.rejected.begin(), series_.rejected.end(),
              [](const RejectedRow& a, const RejectedRow& b) { return a.line < b.line; });
  }

  std::string file_;
  std::vector<std::string_view> lines_;
  std::vector<Problem> problems_;
  Head head_;
  std::size_t first_row_ = 0;
  Series series_;
};

}  // namespace

std::string Series::meta(const std::string& key) const {
  const auto at = metadata.find(key);
  return at == metadata.end() ? std::string{} : at->second;
}

double loss_from_depth(double eps_re, double depth, double frequency) {
  const double n_im = speed_of_light / (4 * pi * frequency * depth);
  const double n_re = std::sqrt(eps_re + n_im * n_im);
  return 2 * n_re * n_im;
}

Series read_series(std::string_view text, const std::string& file_name) {
  return Reader(text, file_name).read();
}

}  // namespace lossline::materials
