#include "materials/import.h"

#include <fmt/format.h>

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <set>
#include <sstream>

#include "materials/sha256.h"
#include "materials/units.h"
#include "planner/base/error.h"
#include "planner/product/permittivity_table.h"

namespace lossline::materials {
namespace {

namespace fs = std::filesystem;

std::string read_file(const std::string& path) {
  std::ifstream in(path, std::ios::binary);
  if (!in || fs::is_directory(path))
    throw Error(ErrorKind::not_found, "series '" + path + "' cannot be read");
  std::ostringstream text;
  text << in.rdbuf();
  return text.str();
}

/// A new user database: the schema and the lists of quantities and forms of the shipped one.
Database make_user_database(const Database& base, const std::string& path) {
  std::string schema = fmt::format("PRAGMA application_id = {}; PRAGMA user_version = {};\n",
                                   application_id, schema_version);
  Statement rows = base.prepare(
      "SELECT sql FROM sqlite_master WHERE sql IS NOT NULL AND name NOT LIKE 'sqlite_%'"
      " ORDER BY rowid");
  while (rows.step()) schema += rows.text(0) + ";\n";
  std::error_code ignored;
  fs::create_directories(fs::path(path).parent_path(), ignored);
  Database user = Database::create(path, schema);
  Transaction transaction(user);
  Statement quantities = base.prepare("SELECT * FROM quantity ORDER BY quantity_id");
  while (quantities.step())
    user.prepare("INSERT INTO quantity VALUES(?1,?2,?3,?4,?5,?6)")
        .bind(1, quantities.text(0))
        .bind(2, quantities.text(1))
        .bind(3, quantities.text(2))
        .bind(4, quantities.real_or_none(3))
        .bind(5, quantities.real_or_none(4))
        .bind(6, quantities.text(5))
        .run();
  transaction.commit();
  return user;
}

[[noreturn]] void refuse(const std::string& file, const std::string& key, const std::string& wrong,
                         const std::string& right) {
  throw InputError(ErrorKind::bad_input, {{file, 0, 0, key, wrong, right}});
}

/// What must be known beside the points.
struct Labels {
  std::string material, name, family, form, phase;
  std::optional<double> bulk_density;
  bool new_material = false, measured = false;
};

Labels labels_of(const Series& series, const Store& store, const Database& user,
                 const std::string& file) {
  Labels out;
  out.material = series.meta("material");
  if (out.material.empty())
    refuse(file, "material", "which material?", "a metadata line '# material=ID'");
  if (const std::string quantity = series.meta("quantity"); !quantity.empty() && quantity != "eps")
    refuse(file, "quantity", "'" + quantity + "' cannot be imported", "eps");
  out.phase = series.meta("of_phase");
  if (out.phase != "bulk" && out.phase != "particle")
    refuse(file, "of_phase", "measured on the bed as it lies, or on one piece?",
           "'# of_phase=bulk' or '=particle'");
  if (const std::string density = series.meta("bulk_density"); !density.empty()) {
    const auto with_unit = unit_value(density);
    out.bulk_density =
        with_unit && with_unit->si == "kg/m3" ? std::optional(with_unit->value) : number(density);
    if (!out.bulk_density || !(*out.bulk_density > 0))
      refuse(file, "bulk_density", "'" + density + "' is not a density", "a number in kg/m3");
  }
  const auto find = [&](const Database& database) {
    Statement row =
        database.prepare("SELECT name, family, form FROM material WHERE material_id = ?1");
    row.bind(1, out.material);
    if (!row.step()) return false;
    out.name = row.text(0);
    out.family = row.text(1);
    out.form = row.text(2);
    return true;
  };
  if (!find(user)) {
    out.new_material = true;
    if (!find(store.base())) {
      out.name = series.meta("name");
      out.family = series.meta("family");
      out.form = series.meta("form");
      if (out.name.empty() || out.family.empty() || out.form.empty())
        refuse(file, "material",
               "material '" + out.material +
                   "' is not in the database, and name, family or form "
                   "of a new one is missing",
               "an id of 'lossline materials list', or '# name=...; family=...; form=...'");
    }
  }
  out.measured = !series.meta("instrument").empty() && !series.meta("calibrated").empty();
  return out;
}

/// What is still missing for a run, in words.
std::vector<std::string> shortfall(const Series& series, const Labels& labels) {
  std::set<double> moistures, temperatures;
  for (const SeriesPoint& p : series.points) {
    moistures.insert(p.moisture);
    temperatures.insert(p.temperature);
  }
  std::vector<std::string> out;
  if (moistures.size() < 4)
    out.push_back(fmt::format("{} moistures; four or more from feed to below the outlet are wanted",
                              moistures.size()));
  if (temperatures.size() < 2) out.emplace_back("one temperature; two or more are wanted");
  if (!temperatures.empty() && *temperatures.rbegin() < 273.15 + 60)
    out.emplace_back("no temperature of 60 degC or more");
  if (labels.phase == "bulk" && !labels.bulk_density) out.emplace_back("no bulk density");
  if (!labels.measured)
    out.emplace_back("no instrument and calibration date: taken as an estimate, grade E");
  return out;
}

/// Makes sure that a card can use the points before they are stored.
void require_table(const Series& series, const std::string& file) {
  std::vector<PermittivityPoint> points;
  for (const SeriesPoint& p : series.points)
    points.push_back({p.frequency, p.moisture, p.temperature, {p.eps_re, -p.eps_im}});
  try {
    (void)PermittivityTable(points, {std::nullopt, {}, "series"});
  } catch (const Error& error) {
    refuse(file, "", error.what(), "a table as described in the user guide");
  }
}

/// The newest measurement ranks first, then older ones, then estimates in the same order.
std::int64_t next_priority(const Database& user, const std::string& material, bool measured) {
  const int first = measured ? user_priority : user_estimate_priority;
  Statement rows = user.prepare(
      "SELECT count(*) FROM dataset WHERE material_id = ?1 AND priority <= ?2 AND priority > ?3");
  rows.bind(1, material).bind(2, first).bind(3, first - 40);
  return rows.step() ? std::max<std::int64_t>(first - 39, first - rows.integer(0)) : first;
}

void write_points(const Database& user, const std::string& dataset, const Series& series) {
  int seq = 0;
  for (const SeriesPoint& p : series.points)
    user.prepare(
            "INSERT INTO point(dataset_id, seq, X, T, f, value, value_im, u_value, u_im,"
            " as_printed) VALUES(?1,?2,?3,?4,?5,?6,?7,?8,?9,?10)")
        .bind(1, dataset)
        .bind(2, ++seq)
        .bind(3, p.moisture)
        .bind(4, p.temperature)
        .bind(5, p.frequency)
        .bind(6, p.eps_re)
        .bind(7, p.eps_im)
        .bind(8, p.u_re)
        .bind(9, p.u_im)
        .bind(10, p.printed)
        .run();
  for (const char* axis : {"X", "T", "f"})
    user.prepare(fmt::format("INSERT INTO axis_range(dataset_id, axis, lo, hi, low_policy,"
                             " high_policy) SELECT ?1, ?2, min({0}), max({0}), ?3, ?4 FROM point"
                             " WHERE dataset_id = ?1",
                             axis))
        .bind(1, dataset)
        .bind(2, axis)
        .bind(3, *axis == 'f' ? "refuse" : "anchor")
        .bind(4, *axis == 'f' ? "refuse" : "clamp")
        .run();
}

}  // namespace

ImportReport import_series(const Store& store, const std::string& user_path,
                           const std::string& csv_path, const std::string& today) {
  const std::string text = read_file(csv_path);
  const std::string file = fs::path(csv_path).filename().string();
  const Series series = read_series(text, file);
  if (series.points.empty())
    refuse(
        file, "",
        fmt::format("no usable row, {} rejected", series.rejected.size()) +
            (series.rejected.empty() ? std::string{}
                                     : fmt::format("; first, line {}: {}", series.rejected[0].line,
                                                   series.rejected[0].reason)),
        "at least one row of data");
  require_table(series, file);
  std::error_code ignored;
  const bool fresh = !fs::exists(user_path, ignored);
  const Database user =
      fresh ? make_user_database(store.base(), user_path) : Database::open_user(user_path);
  const Labels labels = labels_of(series, store, user, file);

  Transaction transaction(user);
  const std::string digest = sha256(text);
  Statement seen =
      user.prepare("SELECT import_id, imported_on FROM import_batch WHERE sha256 = ?1");
  seen.bind(1, digest);
  if (seen.step())
    refuse(file, "",
           fmt::format("already imported on {} as number {}", seen.text(1), seen.integer(0)),
           "a new file, or undo that import first");

  ImportReport report;
  report.material = labels.material;
  report.accepted = static_cast<int>(series.points.size());
  report.rejected = series.rejected;
  report.reading = series.reading;
  report.evidence = labels.measured ? "user_measured" : "user_estimate";
  report.grade = labels.measured ? 'B' : 'E';
  report.missing = shortfall(series, labels);
  const std::string who = series.meta("operator").empty() ? "user" : series.meta("operator");
  std::string reject_log;
  for (const RejectedRow& row : series.rejected)
    reject_log += fmt::format("line {}: {}\n", row.line, row.reason);

  if (labels.new_material)
    user.prepare(
            "INSERT INTO material(material_id, name, family, form, status, origin, created)"
            " VALUES(?1,?2,?3,?4,'screening','user',?5)")
        .bind(1, labels.material)
        .bind(2, labels.name)
        .bind(3, labels.family)
        .bind(4, labels.form)
        .bind(5, today)
        .run();
  user.prepare(
          "INSERT INTO import_batch(file_name, sha256, imported_on, imported_by, method,"
          " instrument, calibration, sample_prep, rows_ok, rows_rejected, reject_log)"
          " VALUES(?1,?2,?3,?4,?5,?6,?7,?8,?9,?10,?11)")
      .bind(1, file)
      .bind(2, digest)
      .bind(3, today)
      .bind(4, who)
      .bind(5, series.meta("method").empty() ? "not stated" : series.meta("method"))
      .bind(6, std::optional(series.meta("instrument")))
      .bind(7, std::optional(series.meta("calibrated")))
      .bind(8, std::optional(series.meta("sample_prep")))
      .bind(9, report.accepted)
      .bind(10, static_cast<std::int64_t>(series.rejected.size()))
      .bind(11, std::optional(reject_log))
      .run();
  report.import_id = user.integer("SELECT max(import_id) FROM import_batch");
  report.dataset = fmt::format("{}.eps.user_{}", labels.material, report.import_id);

  const std::string source = fmt::format("user_series_{}", report.import_id);
  user.prepare(
          "INSERT INTO source(source_id, kind, title, obtained)"
          " VALUES(?1,'user_lab',?2,'full_text')")
      .bind(1, source)
      .bind(2, "the user's series " + file)
      .run();
  user.prepare(
          "INSERT INTO provenance(evidence, grade, source_id, locator, entered_by, entered_on)"
          " VALUES(?1,?2,?3,?4,?5,?6)")
      .bind(1, report.evidence)
      .bind(2, std::string(1, report.grade))
      .bind(3, source)
      .bind(4, fmt::format("import {}", report.import_id))
      .bind(5, who)
      .bind(6, today)
      .run();
  user.prepare(
          "INSERT INTO dataset(dataset_id, material_id, quantity_id, kind, moisture_basis,"
          " of_phase, bulk_density, prov_id, priority, origin, import_id, rel_unc, unc_kind)"
          " SELECT ?1, ?2, 'eps', 'points', ?3, ?4, ?5, max(prov_id), ?6, 'user', ?7, ?8,"
          " 'guess' FROM provenance")
      .bind(1, report.dataset)
      .bind(2, labels.material)
      .bind(3, series.basis_converted ? "wet" : "dry")
      .bind(4, labels.phase)
      .bind(5, labels.bulk_density)
      .bind(6, next_priority(user, labels.material, labels.measured))
      .bind(7, report.import_id)
      .bind(8, labels.measured ? 0.05 : 0.55)
      .run();
  write_points(user, report.dataset, series);
  transaction.commit();
  return report;
}

void undo_import(const std::string& user_path, std::int64_t import_id) {
  const Database user = Database::open_user(user_path);
  Transaction transaction(user);
  Statement found = user.prepare("SELECT material_id, prov_id FROM dataset WHERE import_id = ?1");
  found.bind(1, import_id);
  if (!found.step())
    throw Error(ErrorKind::not_found, fmt::format("there is no import {}", import_id));
  const std::string material = found.text(0);
  const std::int64_t provenance = found.integer(1);
  found.reset();
  const auto run = [&](const char* sql, std::int64_t id) { user.prepare(sql).bind(1, id).run(); };
  run("DELETE FROM dataset WHERE import_id = ?1", import_id);
  run("DELETE FROM provenance WHERE prov_id = ?1", provenance);
  run("DELETE FROM import_batch WHERE import_id = ?1", import_id);
  user.prepare("DELETE FROM source WHERE source_id = ?1")
      .bind(1, fmt::format("user_series_{}", import_id))
      .run();
  user.prepare(
          "DELETE FROM material WHERE material_id = ?1 AND origin = 'user' AND NOT EXISTS"
          " (SELECT 1 FROM dataset WHERE material_id = ?1)")
      .bind(1, material)
      .run();
  transaction.commit();
}

}  // namespace lossline::materials
