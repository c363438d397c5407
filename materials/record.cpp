#include "materials/record.h"

#include "planner/base/error.h"

namespace lossline::materials {
namespace {

void append(std::string& out, const std::string& part, const char* before = ", ") {
  if (part.empty()) return;
  if (!out.empty()) out += before;
  out += part;
}

}  // namespace

double DatasetRecord::param(const std::string& name) const {
  const auto at = params.find(name);
  if (at == params.end())
    throw Error(ErrorKind::database, "data set '" + id + "' lacks the parameter '" + name + "'");
  return at->second.value;
}

double DatasetRecord::param_or(const std::string& name, double fallback) const {
  const auto at = params.find(name);
  return at == params.end() ? fallback : at->second.value;
}

Evidence evidence_of(const std::string& word) {
  for (const Evidence evidence :
       {Evidence::primary_read, Evidence::secondary_two, Evidence::secondary_one,
        Evidence::abstract_only, Evidence::from_memory, Evidence::model_derived,
        Evidence::user_measured, Evidence::user_estimate, Evidence::common_practice})
    if (word == evidence_name(evidence)) return evidence;
  throw Error(ErrorKind::database, "unknown evidence '" + word + "'");
}

std::string citation(const Database& database, const std::string& source_id) {
  if (source_id.empty()) return {};
  Statement row = database.prepare(
      "SELECT authors, title, container, volume, pages, publisher, standard_no, year, doi"
      " FROM source WHERE source_id = ?1");
  row.bind(1, source_id);
  if (!row.step()) return source_id;
  std::string out = row.text(0);
  append(out, row.text(1));
  append(out, row.text(2));
  append(out, row.text(3), " ");
  append(out, row.text(4));
  append(out, row.text(5));
  if (row.text(1).find(row.text(6)) == std::string::npos) append(out, row.text(6));
  if (!row.is_null(7)) append(out, std::to_string(row.integer(7)));
  if (!row.is_null(8)) append(out, "doi " + row.text(8));
  return out;
}

Provenance read_provenance(const Database& database, std::int64_t prov_id) {
  Statement row = database.prepare(
      "SELECT evidence, grade, source_id, locator FROM provenance WHERE prov_id = ?1");
  row.bind(1, prov_id);
  if (!row.step()) throw Error(ErrorKind::database, "a value without provenance");
  Provenance out;
  out.evidence = evidence_of(row.text(0));
  out.grade = row.text(1).front();
  out.source = citation(database, row.text(2));
  if (out.source.empty()) {
    if (out.evidence == Evidence::from_memory) out.source = "from memory, no source named";
    if (out.evidence == Evidence::common_practice) out.source = "common practice";
    if (out.evidence == Evidence::model_derived) out.source = "derived from a general model";
  }
  out.locator = row.text(3);
  return out;
}

DatasetRecord read_dataset(const Database& database, const std::string& id) {
  Statement row = database.prepare(
      "SELECT d.material_id, d.quantity_id, d.kind, m.form_id, d.branch, d.moisture_basis,"
      " d.of_phase, d.origin, d.note, d.bulk_density, d.priority, d.rel_unc, d.unc_kind, d.prov_id,"
      " p.evidence, p.discrepancy, p.note, p.reprint_source_id, p.reprint_locator"
      " FROM dataset d JOIN provenance p USING(prov_id)"
      " LEFT JOIN dataset_model m USING(dataset_id) WHERE d.dataset_id = ?1");
  row.bind(1, id);
  if (!row.step()) throw Error(ErrorKind::not_found, "data set '" + id + "' not found");
  DatasetRecord out;
  out.id = id;
  out.material = row.text(0);
  out.quantity = row.text(1);
  out.kind = row.text(2);
  out.form = row.text(3);
  out.branch = row.text(4);
  out.moisture_basis = row.text(5);
  out.of_phase = row.text(6);
  out.origin = row.text(7);
  out.note = row.text(8);
  out.bulk_density = row.real_or_none(9);
  out.priority = static_cast<int>(row.integer(10));
  out.rel_unc = row.real(11);
  out.unc_kind = row.text(12);
  out.provenance = read_provenance(database, row.integer(13));
  out.provenance.dataset = id;
  out.provenance.relative_uncertainty = out.rel_unc;
  out.evidence = row.text(14);
  out.discrepancy = row.text(15);
  out.provenance_note = row.text(16);
  out.reprint = citation(database, row.text(17));
  append(out.reprint, row.text(18));

  Statement params = database.prepare(
      "SELECT name, value, unit, as_printed, evidence, note FROM model_param WHERE dataset_id = "
      "?1");
  params.bind(1, id);
  while (params.step())
    out.params[params.text(0)] = {params.real(1), params.text(2), params.text(3), params.text(4),
                                  params.text(5)};
  Statement ranges = database.prepare(
      "SELECT axis, lo, hi, low_policy, high_policy FROM axis_range WHERE dataset_id = ?1");
  ranges.bind(1, id);
  while (ranges.step())
    out.ranges[ranges.text(0)] = {ranges.real(1), ranges.real(2), ranges.text(3), ranges.text(4)};
  Statement points = database.prepare(
      "SELECT X, T, f, value, value_im, as_printed FROM point WHERE dataset_id = ?1 ORDER BY seq");
  points.bind(1, id);
  while (points.step())
    out.points.push_back({points.real_or_none(0), points.real_or_none(1), points.real_or_none(2),
                          points.real(3), points.real_or_none(4), points.text(5)});
  return out;
}

std::vector<DatasetRecord> read_datasets(const Database& database, const std::string& material) {
  Statement rows = database.prepare(
      "SELECT d.dataset_id FROM dataset d JOIN provenance p USING(prov_id)"
      " WHERE d.material_id = ?1 AND d.active = 1 ORDER BY d.priority, p.grade, d.dataset_id");
  rows.bind(1, material);
  std::vector<DatasetRecord> out;
  while (rows.step()) out.push_back(read_dataset(database, rows.text(0)));
  return out;
}

}  // namespace lossline::materials
