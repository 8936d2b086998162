#pragma once
#include "dropfront/report/json_writer.hpp"
#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// Value of "conflict": null where something complies; else limits that cannot hold together, `proven`, and
/// `checks`: what failed, most often first.
void write_conflict(JsonWriter& json, const Result& result);

/// Value, limit, unit and side of a broken check as members, where it was made.
void write_side(JsonWriter& json, const std::optional<scoring::Check>& check);

}  // namespace dropfront::report
