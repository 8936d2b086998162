#pragma once
#include <string_view>

#include "dropfront/report/json_writer.hpp"
#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// The value of `proof` in candidates.json; null when no proof was made or tried:
/// {complete, method, weakest_class, space, discarded: [{why, class, designs}], scored, boxes, open}, and in
/// `open`, null when complete, {designs, boxes, at_best: the objectives}.
void write_proof(JsonWriter& json, const Result& result);

/// "exact", "theorem", "monotone by test".
std::string_view bound_kind_name(search::BoundKind kind);

}  // namespace dropfront::report
