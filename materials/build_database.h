#pragma once
// Builds the shipped database from the authored sheets: read, check, insert, run every check
// value, compact, and note the digest of every input. The same inputs give the same dump.

#include <string>

namespace lossline::materials {

/// What was built.
struct BuildReport {
  int materials = 0, datasets = 0, goldens = 0, sources = 0;
};

/// Builds the file; an existing file at `output` is replaced only when everything succeeded.
///
///   data_folder  with sources.toml, quantities.toml, forms.toml and one folder per material
///   schema_file  schema.sql
///   throws       InputError bad_input listing every fault as file:line: key: wrong; right;
///                Error not_found, Error database
BuildReport build_database(const std::string& data_folder, const std::string& schema_file,
                           const std::string& output);

}  // namespace lossline::materials
