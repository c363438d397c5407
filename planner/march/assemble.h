#pragma once
// Turns the last round of a solve into the report: profile, ledgers, balances, evidence.

#include <vector>

#include "planner/march/air_loops.h"
#include "planner/march/field_round.h"
#include "planner/march/solution.h"

namespace lossline::march {

/// The last round, complete.
struct LastRound {
  Iterate iterate;  ///< what the pass ran with
  Pass pass;
  FieldRound field;  ///< empty when no cavity has power or the share is constant
  AirRound air;
};

/// Fills everything of `out` but status, reason, rounds and timing.
void assemble(const Setup& setup, const LastRound& last, Solution& out);

/// The pieces, one per part of the report.
void fill_profile(const Setup& setup, const LastRound& last, Solution& out);
void fill_power(const Setup& setup, const LastRound& last, Solution& out);
void fill_answer(const Setup& setup, const LastRound& last, Solution& out);
void fill_balances(const Setup& setup, const LastRound& last, Solution& out);
void fill_evidence(const Setup& setup, const LastRound& last, Solution& out);

}  // namespace lossline::march
