#pragma once
#include "dropfront/problem/binding.hpp"
#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// Where nothing complies and nobody cut the search short: which limits cannot hold together, and what each
/// would take (problem/conflict.hpp). Left open at quick effort where the space is not small.
void explain(Result& result, const problem::BoundProblem& bound, const search::SearchOptions& options);

}  // namespace dropfront::report
