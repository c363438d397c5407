#include "materials/commands.h"

#include <fmt/format.h>

#include <algorithm>
#include <map>
#include <ostream>
#include <sstream>
#include <string_view>
#include <vector>

#include "materials/card_builder.h"
#include "materials/goldens.h"
#include "planner/base/constants.h"
#include "planner/base/error.h"

namespace lossline::materials {
namespace {

/// Writes text wrapped at page_width, the first line after `head`, further lines indented by it.
void wrapped(std::ostream& out, const std::string& head, const std::string& text) {
  std::istringstream words(text);
  std::string word, line = head;
  bool empty = true;
  while (words >> word) {
    if (!empty && line.size() + 1 + word.size() > page_width) {
      out << line << '\n';
      line = std::string(head.size(), ' ');
      empty = true;
    }
    if (!empty) line += ' ';
    line += word;
    empty = false;
  }
  if (!text.empty()) out << line << '\n';
}

std::string cut(const std::string& text, std::size_t width) {
  return text.size() <= width ? text : text.substr(0, width - 2) + "..";
}

/// A value of an axis in the unit people read.
std::string axis_value(const std::string& axis, double value) {
  if (axis == "T") return fmt::format("{:g} degC", value - celsius_zero);
  if (axis == "f") return fmt::format("{:g} MHz", value / 1e6);
  if (axis == "p") return fmt::format("{:g} Pa", value);
  return fmt::format("{:.4g}", value);
}

std::string ranges_text(const DatasetRecord& record) {
  std::string out;
  for (const auto& [axis, range] : record.ranges) {
    if (!out.empty()) out += "; ";
    out += fmt::format("{} {}", axis, axis_value(axis, range.lo));
    if (range.hi != range.lo) out += " to " + axis_value(axis, range.hi);
  }
  return out;
}

std::string params_text(const DatasetRecord& record) {
  std::string out;
  for (const auto& [name, param] : record.params) {
    if (!out.empty()) out += "; ";
    out +=
        name + " = " + (param.printed.empty() ? fmt::format("{:g}", param.value) : param.printed);
    if (!param.evidence.empty()) out += " (" + param.evidence + ")";
  }
  return out;
}

/// The publications of one page, numbered in the order they are first named.
class SourceList {
 public:
  /// "[3]" for a citation.
  std::string mark(const std::string& source) {
    const auto at = std::find(sources_.begin(), sources_.end(), source);
    const auto number = at - sources_.begin() + 1;
    if (at == sources_.end()) sources_.push_back(source);
    return fmt::format("[{}]", number);
  }
  [[nodiscard]] const std::vector<std::string>& sources() const { return sources_; }

 private:
  std::vector<std::string> sources_;
};

std::string provenance_text(const Provenance& p, SourceList& sources) {
  std::string out = fmt::format("grade {}, {}", p.grade, evidence_name(p.evidence));
  if (!p.source.empty()) out += " " + sources.mark(p.source);
  if (!p.locator.empty()) out += ", " + p.locator;
  return out;
}

std::string limit_text(const ProductLimit& limit) {
  std::string value;
  switch (limit.kind) {
    case LimitKind::product_temperature:
      value = fmt::format("product up to {:g} degC", limit.value - celsius_zero);
      break;
    case LimitKind::runaway_temperature:
      value = fmt::format("runaway or fire from {:g} degC", limit.value - celsius_zero);
      break;
    case LimitKind::internal_pressure:
      value = fmt::format("overpressure inside up to {:g} kPa", limit.value / 1e3);
      break;
    case LimitKind::heating_rate:
      value = fmt::format("heating up to {:g} K/min", limit.value * 60);
      break;
    case LimitKind::drying_rate:
      value = fmt::format("drying up to {:g} 1/s", limit.value);
      break;
    case LimitKind::final_moisture_low:
      value = fmt::format("final moisture from {:g} dry basis", limit.value);
      break;
    case LimitKind::field_strength:
      value = fmt::format("field up to {:g} V/m rms", limit.value);
      break;
  }
  if (limit.moisture_from) value += fmt::format(", above X = {:g}", *limit.moisture_from);
  if (limit.moisture_to) value += fmt::format(", below X = {:g}", *limit.moisture_to);
  return value;
}

void show_dataset(std::ostream& out, const DatasetRecord& record, bool used, SourceList& sources) {
  std::string head = record.quantity + ": " + record.kind;
  if (!record.form.empty()) head += " " + record.form;
  if (record.kind == "points") head += fmt::format(", {} points", record.points.size());
  if (record.kind == "constant" && !record.points.empty())
    head += " " + record.points.front().printed;
  out << fmt::format("  {} {}  [{}]\n", used ? '*' : ' ', head, record.id);
  std::string origin = provenance_text(record.provenance, sources);
  if (!record.reprint.empty()) origin += ", seen in " + sources.mark(record.reprint);
  wrapped(out, "      ", origin);
  wrapped(out, "      ",
          fmt::format("of the {}; uncertainty {:g} % ({}){}", record.of_phase, record.rel_unc * 100,
                      record.unc_kind, record.origin == "user" ? "; the user's own" : ""));
  if (const std::string ranges = ranges_text(record); !ranges.empty())
    wrapped(out, "      ", "range: " + ranges);
  if (const std::string params = params_text(record); !params.empty())
    wrapped(out, "      ", "constants: " + params);
  if (record.kind == "points")
    for (const PointRecord& p : record.points)
      if (p.X && p.T && p.f && p.value_im)
        out << fmt::format("      X {:8.4f}  {:6.1f} degC  {:7.1f} MHz  eps {:8.3f} - j{:.4f}\n",
                           *p.X, *p.T - celsius_zero, *p.f / 1e6, p.value, *p.value_im);
  if (!record.discrepancy.empty()) wrapped(out, "      ", "disagreement: " + record.discrepancy);
  if (!record.provenance_note.empty()) wrapped(out, "      ", "note: " + record.provenance_note);
}

/// SI unit of every quantity.
std::map<std::string, std::string> units_of(const Database& database) {
  std::map<std::string, std::string> units;
  Statement rows = database.prepare("SELECT quantity_id, si_unit FROM quantity");
  while (rows.step()) units[rows.text(0)] = rows.text(1) == "1" ? "" : rows.text(1);
  return units;
}

void show_card(std::ostream& out, const ProductCard& card,
               const std::map<std::string, std::string>& units) {
  out << "\nCard\n";
  const auto line = [&](const std::string& name, const std::string& value, const Provenance& p) {
    out << fmt::format("  {:<27}{:<36} {}  {}\n", name, value, p.grade, evidence_name(p.evidence));
  };
  if (card.permittivity)
    line("permittivity",
         card.permittivity_phase == Phase::bulk ? "of the bed as it lies" : "of one piece",
         card.permittivity_provenance);
  else
    out << "  permittivity               none\n";
  if (card.sorption)
    line("sorption", fmt::format("water is free above X = {:.3g}", card.sorption->moisture_end()),
         card.sorption_provenance);
  else
    out << "  sorption                   none: all water behaves as free water\n";
  if (card.cure) line("cure", "kinetics", card.cure_provenance);
  for (const std::string& name : scalar_quantities())
    if (const auto* property = scalar(card, name); property != nullptr && property->has_value())
      line(name, fmt::format("{:.5g} {}", (*property)->value, units.at(name)),
           (*property)->provenance);
}

/// Which data set of each quantity the card uses.
bool is_used(const ProductCard& card, const DatasetRecord& record) {
  if (record.quantity == "eps") return card.permittivity_provenance.dataset == record.id;
  if (record.quantity == "isotherm") return card.sorption_provenance.dataset == record.id;
  if (record.quantity == "cure") return card.cure_provenance.dataset == record.id;
  const auto* property = scalar(card, record.quantity);
  return property != nullptr && property->has_value() &&
         (*property)->provenance.dataset == record.id;
}

void show_goldens(std::ostream& out, const std::vector<GoldenResult>& goldens) {
  if (goldens.empty()) return;
  out << "\nCheck values\n";
  for (const GoldenResult& g : goldens) {
    const std::string value = g.expected_im
                                  ? fmt::format("{:.5g} - j{:.5g}", g.expected, *g.expected_im)
                                  : fmt::format("{:.5g}", g.expected);
    const std::string what = g.dataset.substr(g.dataset.find('.') + 1);
    out << fmt::format("  {} {:<24} {:<42} {:<17} {}\n", g.passed ? "ok    " : "FAILED",
                       cut(what, 24), cut(g.state, 42), value,
                       g.origin == "printed" ? "print" : "comp.");
    if (!g.passed) wrapped(out, "         ", g.failure);
  }
}

}  // namespace

void list(std::ostream& out, const Store& store) {
  constexpr auto row = "{:<21}{:<34}{:<10}{:>5}{:>5}{:>5}{:>5}{:>5}{:>5}{:>5}\n";
  out << "Evidence grade of what each card uses: A best, E guess or estimate, - nothing known.\n"
         "A star marks materials with data of your own.\n\n";
  out << fmt::format(row, "id", "name", "family", "eps", "heat", "sorp", "dens", "tran", "cure",
                     "lim");
  const auto grade = [](char c) { return std::string(1, c); };
  for (const MaterialSummary& m : store.list())
    out << fmt::format(row, cut(m.id + (m.user_data ? "*" : ""), 20), cut(m.name, 33), m.family,
                       grade(m.permittivity), grade(m.heat), grade(m.sorption), grade(m.density),
                       grade(m.transport), grade(m.cure), grade(m.limits));
}

void show(std::ostream& out, const Store& store, const std::string& id) {
  const MaterialDescription d = store.describe(id);
  out << fmt::format("{}: {}\n", d.summary.id, d.summary.name);
  out << fmt::format("  family {}, form {}, status {}\n", d.summary.family, d.summary.form,
                     d.summary.status);
  wrapped(out, "  ", d.description);
  if (!d.card.permittivity)
    wrapped(out, "  needs: ", d.needs.empty() ? "eps at the line frequency" : d.needs);
  else if (!d.needs.empty())
    wrapped(out, "  would be better with: ", d.needs);
  show_card(out, d.card, units_of(store.base()));
  SourceList sources;
  if (!d.card.limits.empty()) out << "\nLimits\n";
  for (const ProductLimit& limit : d.card.limits) {
    wrapped(out, "    ", limit_text(limit) + " (" + limit.reason + ")");
    wrapped(out, "      ", provenance_text(limit.provenance, sources));
  }
  out << "\nData sets (* used by the card)\n";
  for (const DatasetRecord& record : d.datasets)
    show_dataset(out, record, is_used(d.card, record), sources);
  show_goldens(out, run_goldens(store.base(), id));
  if (!sources.sources().empty()) out << "\nSources\n";
  int number = 0;
  for (const std::string& source : sources.sources())
    wrapped(out, fmt::format("  {:>4} ", fmt::format("[{}]", ++number)), source);
}

bool check(std::ostream& out, const Store& store) {
  bool sound = true;
  std::vector<const Database*> files = {&store.base()};
  if (store.user() != nullptr) files.push_back(store.user());
  for (const Database* file : files) {
    const std::string fault = file->integrity_fault();
    wrapped(out, "", file->path() + ": " + (fault.empty() ? "sound" : "NOT SOUND: " + fault));
    sound = sound && fault.empty();
  }
  const auto goldens = run_goldens(store.base());
  const auto failed = std::count_if(goldens.begin(), goldens.end(),
                                    [](const GoldenResult& g) { return !g.passed; });
  out << fmt::format("check values: {} of {} met\n",
                     goldens.size() - static_cast<std::size_t>(failed), goldens.size());
  for (const GoldenResult& g : goldens)
    if (!g.passed) wrapped(out, "  FAILED ", g.id + ", " + g.state + ": " + g.failure);
  sound = sound && failed == 0;

  Statement rows = store.base().prepare(
      "SELECT material_id, sum(evidence = 'from_memory'), sum(evidence = 'model_derived'),"
      " max(grade), (SELECT count(*) FROM limit_value l JOIN provenance USING(prov_id)"
      " WHERE l.material_id = v.material_id AND evidence = 'common_practice')"
      " FROM v_unverified v GROUP BY material_id ORDER BY material_id");
  out << "\nunverified                from memory  by a model  worst grade  limits by practice\n";
  bool any = false;
  while (rows.step()) {
    any = true;
    out << fmt::format("  {:<24}{:>11}{:>12}{:>13}{:>20}\n", rows.text(0), rows.integer(1),
                       rows.integer(2), rows.text(3), rows.integer(4));
  }
  if (!any) out << "  none\n";
  const auto wrong = store.base().integer(
      "SELECT count(*) FROM v_unverified JOIN material USING(material_id)"
      " WHERE status = 'complete'");
  if (wrong != 0) out << fmt::format("  {} of them in materials marked complete: WRONG\n", wrong);
  return sound && wrong == 0;
}

void print(std::ostream& out, const ImportReport& report) {
  out << fmt::format("import {}: {} rows accepted, {} rejected\n", report.import_id,
                     report.accepted, report.rejected.size());
  out << fmt::format("  material {}, data set {}\n", report.material, report.dataset);
  out << fmt::format("  grade {}, {}\n", report.grade, report.evidence);
  wrapped(out, "  read as ", report.reading);
  for (const RejectedRow& row : report.rejected)
    wrapped(out, fmt::format("  line {}: ", row.line), row.reason);
  for (const std::string& missing : report.missing) wrapped(out, "  wanting: ", missing);
}

void import_file(std::ostream& out, const Store& store, const std::string& user_path,
                 const std::string& csv_path, const std::string& today) {
  print(out, import_series(store, user_path, csv_path, today));
}

}  // namespace lossline::materials
