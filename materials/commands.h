#pragma once
// What `lossline materials ...` prints: plain aligned text of at most 100 columns, no colours.

#include <iosfwd>
#include <string>

#include "materials/import.h"
#include "materials/store.h"

namespace lossline::materials {

/// Widest line printed, columns; only single words longer than that overrun it.
inline constexpr int page_width = 100;

/// All materials with the grade of what each card uses.
void list(std::ostream& out, const Store& store);

/// Everything stored about one material: card, data sets with ranges and sources, limits, check
/// values.
///
///   throws  Error not_found for an unknown id
void show(std::ostream& out, const Store& store, const std::string& id);

/// Integrity of the files, all check values run again, and the list of what is unverified.
///
///   returns  false when a file is not sound or a check value fails
bool check(std::ostream& out, const Store& store);

/// Prints what an import did.
void print(std::ostream& out, const ImportReport& report);

/// Imports a series and prints the report; arguments and refusals as import_series().
void import_file(std::ostream& out, const Store& store, const std::string& user_path,
                 const std::string& csv_path, const std::string& today);

}  // namespace lossline::materials
