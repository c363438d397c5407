#pragma once
// The authored material sheets as plain data: what stands in materials/data, normalised to SI but
// not yet in a database. Reading collects every fault with file and line before it gives up.
//
// Layout of the folder: sources.toml, quantities.toml, forms.toml, and one folder per material
// with material.toml and, where there are series, CSV files in the format of series.h.

#include <map>
#include <optional>
#include <string>
#include <vector>

#include "planner/base/error.h"

namespace lossline::materials {

/// Where something was written.
struct Place {
  std::string file;
  int line = 0;
};

struct SheetSource {
  Place place;
  std::string id, kind, authors, title, container, volume, pages, publisher, standard_no, doi, note,
      licence, obtained;
  std::optional<double> year;
};

struct SheetQuantity {
  Place place;
  std::string id, si_unit, description, transform;
  std::optional<double> min_phys, max_phys;
};

struct SheetForm {
  Place place;
  std::string id, formula, inputs, note;
  double version = 1;
};

struct SheetProvenance {
  std::string evidence, grade, source, locator, reprint, reprint_locator, discrepancy, note,
      entered_by, entered_on;
};

struct SheetParam {
  std::string name, unit, printed, evidence, note;
  double value = 0;
};

struct SheetRange {
  std::string axis, low_policy, high_policy;
  double lo = 0, hi = 0;
};

struct SheetPoint {
  std::optional<double> X, T, f;
  double value = 0;
  std::optional<double> value_im, u_value, u_im;
  std::string printed;
};

struct SheetGolden {
  Place place;
  std::optional<double> X, T, f, aw, alpha, p, expect_im;
  double expect = 0, tolerance = 0;
  std::string band, origin;
};

struct SheetDataset {
  Place place;
  std::string id, quantity, kind, form, direction, branch, moisture_basis, of_phase, unc_kind, note;
  std::optional<double> bulk_density;
  double priority = 100, rel_unc = 0;
  bool safety_use = false;
  SheetProvenance provenance;
  std::vector<SheetParam> params;
  std::vector<SheetRange> ranges;
  std::vector<SheetPoint> points;
  std::vector<SheetGolden> goldens;
};

struct SheetLimit {
  Place place;
  std::string kind, unit, printed, reason, severity;
  double value = 0;
  std::optional<double> X_from, X_to;
  SheetProvenance provenance;
};

struct SheetMaterial {
  Place place;
  std::string id, name, family, form, status, description, needs, created;
  std::vector<std::string> aliases;
  std::vector<SheetParam> composition;  ///< mass fractions
  std::string composition_basis;
  SheetProvenance composition_provenance;
  std::vector<SheetDataset> datasets;
  std::vector<SheetLimit> limits;
};

struct Sheets {
  std::vector<SheetSource> sources;
  std::vector<SheetQuantity> quantities;
  std::vector<SheetForm> forms;
  std::vector<SheetMaterial> materials;       ///< sorted by id
  std::map<std::string, std::string> inputs;  ///< path inside the folder -> sha256
};

/// Reads all sheets below a folder.
///
///   folder  the data folder
///   throws  InputError bad_input listing every fault as file:line: key: wrong; right,
///           Error not_found when the folder or one of its three files is missing
[[nodiscard]] Sheets read_sheets(const std::string& folder);

}  // namespace lossline::materials
