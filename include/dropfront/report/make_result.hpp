#pragma once
#include "dropfront/problem/binding.hpp"
#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// A search's outcome as people and files want it: front numbered from 1, ranked designs off the front after
/// it, every entry scored again from its parts alone (ranked ones in full, as evidence). `options` are those
/// the search ran with; its threads are used here too and never change the answer. The bound problem's
/// Problem must outlive the result.
Result make_result(const problem::BoundProblem& bound, const search::SearchOutcome& outcome,
                   const search::SearchOptions& options, const std::string& version);

/// The passed check with the least headroom, yes/no checks apart; null where none has one.
const scoring::Check* tightest_check(const scoring::Score& score);

/// quick, normal, deep.
std::string_view effort_name(search::Effort effort);

/// done, none found, proven none, cut short.
std::string_view status_name(Status status);

/// File name of a ranked set by the objective it goes by: cheapest, lowest_standby, smallest, most_margin.
std::string_view ranked_name(scoring::Objective objective);

}  // namespace dropfront::report
