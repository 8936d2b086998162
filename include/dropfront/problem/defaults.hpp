#pragma once
#include <optional>
#include <string>
#include <string_view>

#include "dropfront/problem/cursor.hpp"
#include "dropfront/problem/problem.hpp"
#include "dropfront/problem/scalars.hpp"

namespace dropfront::problem {

/// Records that `key` of `object` was left out and what stands in its place.
void note_default(Problem& problem, const Cursor& object, std::string_view key, const std::string& value,
                  const std::string& reason);

/// The quantity, or `fallback` with a note.
double quantity_or(Problem& problem, ObjectReader& reader, std::string_view key, values::Unit unit,
                   Allowed allowed, double fallback, const std::string& reason);

/// The quantity, or nothing with the note "none".
std::optional<double> quantity_or_none(Problem& problem, ObjectReader& reader, std::string_view key,
                                       values::Unit unit, Allowed allowed, const std::string& reason);

}  // namespace dropfront::problem
