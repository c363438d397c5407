#pragma once
// What each table of a line file holds, in the order in which it is written.

#include "planner/line/line.h"
#include "planner/linefile/fields.h"

namespace lossline::linefile {

/// The whole file but its `format`.
void line_file_fields(Fields& f, Line& line);

void duty_fields(Fields& f, Duty& duty);
void limit_fields(Fields& f, Limits& limits);
void price_fields(Fields& f, Prices& prices);
void solve_fields(Fields& f, SolveChoices& solve);
/// Returns whether the kind of the product is known afterwards.
bool product_fields(Fields& f, Product& product);
void belt_fields(Fields& f, Belt& belt);
/// Keys that mean nothing for the kind of product are reported; without a kind all are taken.
void feed_fields(Fields& f, Feed& feed, std::optional<ProductKind> kind);
void stretch_fields(Fields& f, Stretch& stretch);
void end_trap_fields(Fields& f, EndTrap& trap);
void generator_fields(Fields& f, Generator& generator);
void air_fields(Fields& f, AirLoop& loop);
void surface_fields(Fields& f, Surface& surface);

/// `evidence` and `source` of the values beside them.
void evidence_fields(Fields& f, Provenance& provenance);

}  // namespace lossline::linefile
