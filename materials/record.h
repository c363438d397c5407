#pragma once
// One data set as it comes out of a database: parameters, ranges, points and provenance in one
// plain struct, so that models are built and goldens run without SQL.

#include <complex>
#include <map>
#include <optional>
#include <string>
#include <vector>

#include "materials/database.h"
#include "planner/product/provenance.h"

namespace lossline::materials {

struct RangeRecord {
  double lo = 0, hi = 0;
  std::string low_policy, high_policy;
};

struct ParamRecord {
  double value = 0;
  std::string unit, printed, evidence, note;
};

struct PointRecord {
  std::optional<double> X, T, f;
  double value = 0;
  std::optional<double> value_im;
  std::string printed;
};

/// A data set. Values SI; X dry basis, T [K], f [Hz].
struct DatasetRecord {
  std::string id, material, quantity, kind, form, branch, moisture_basis, of_phase, origin, note;
  std::optional<double> bulk_density;
  int priority = 100;
  double rel_unc = 0;
  std::string unc_kind;
  std::string evidence, discrepancy, provenance_note, reprint;
  Provenance provenance;
  std::map<std::string, ParamRecord> params;
  std::map<std::string, RangeRecord> ranges;
  std::vector<PointRecord> points;

  /// A parameter by name; throws Error database naming the data set when it is missing.
  [[nodiscard]] double param(const std::string& name) const;
  [[nodiscard]] double param_or(const std::string& name, double fallback) const;
};

/// The provenance of row `prov_id`, with the citation in one line.
[[nodiscard]] Provenance read_provenance(const Database& database, std::int64_t prov_id);

/// A citation in one line: authors, title, container volume, pages, year.
[[nodiscard]] std::string citation(const Database& database, const std::string& source_id);

/// All active data sets of a material, best first: by priority, then grade, then id.
[[nodiscard]] std::vector<DatasetRecord> read_datasets(const Database& database,
                                                       const std::string& material);

/// One data set by id.
[[nodiscard]] DatasetRecord read_dataset(const Database& database, const std::string& id);

/// The evidence enum of a word of the schema; throws Error database for an unknown word.
[[nodiscard]] Evidence evidence_of(const std::string& word);

}  // namespace lossline::materials
