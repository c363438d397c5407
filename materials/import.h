#pragma once
// Takes a measured permittivity series from a CSV file into the user database: one transaction,
// one import_batch row with the file's digest, undone as a whole by its number.

#include <cstdint>
#include <string>
#include <vector>

#include "materials/series.h"
#include "materials/store.h"

namespace lossline::materials {

/// What an import did.
struct ImportReport {
  std::int64_t import_id = 0;
  std::string dataset;  ///< id of the new data set
  std::string material;
  int accepted = 0;
  std::vector<RejectedRow> rejected;
  char grade = 'E';
  std::string evidence;              ///< "user_measured" or "user_estimate"
  std::string reading;               ///< how the file was read: delimiter, units, loss column
  std::vector<std::string> missing;  ///< what would make the series good enough for a run
};

/// Priorities of imported data, counted down from here with every further import: below 100, so
/// before every shipped row.
inline constexpr int user_priority = 50;           ///< measurements with calibration
inline constexpr int user_estimate_priority = 90;  ///< everything else

/// Imports a file. Metadata: material (an id of the store, or a new one with name, family, form),
/// of_phase (bulk or particle), bulk_density [kg/m3] for bulk, moisture_basis for a column M.
/// Grade B (user_measured) needs instrument and calibrated; otherwise grade E (user_estimate).
///
///   store      read for the material and the schema
///   user_path  user database; made when it does not exist
///   csv_path   the file
///   today      date for the record, YYYY-MM-DD
///   throws     InputError bad_input for a file that cannot be understood, has no usable row or was
///              imported before; Error not_found, Error database
ImportReport import_series(const Store& store, const std::string& user_path,
                           const std::string& csv_path, const std::string& today);

/// Takes an import back: its data set and its batch row.
///
///   throws  Error not_found when there is no such import
void undo_import(const std::string& user_path, std::int64_t import_id);

}  // namespace lossline::materials
