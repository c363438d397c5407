#pragma once
// Puts authored sheets into an empty database, in sorted order, so that the same sheets give the
// same rows with the same numbers.

#include <vector>

#include "materials/database.h"
#include "materials/sheets.h"

namespace lossline::materials {

/// Rules a sheet must keep beyond those of the schema: known references, unique ids, values within
/// the physical bounds of their quantity, a printed check value behind every grade B that rests on
/// one reprint, nothing unverified in a material marked complete, no shipped rank below 100.
///
///   returns  every fault, in file order; empty when the sheets can be inserted
[[nodiscard]] std::vector<Problem> faults_of(const Sheets& sheets);

/// Inserts everything in one transaction.
///
///   throws  InputError bad_input naming file and line when the schema refuses a row
void insert(const Database& database, const Sheets& sheets);

}  // namespace lossline::materials
