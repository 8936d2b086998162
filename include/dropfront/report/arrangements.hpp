#pragma once
#include <string>
#include <vector>

#include "dropfront/report/json_writer.hpp"
#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// The front member with the least standby loss of each arrangement; empty with fewer than two arrangements
/// on the front. Solves two corners for each.
std::vector<ArrangementBest> arrangements_of(const Result& result);

/// Side by side for people; empty for none.
std::string arrangements_text(const std::vector<ArrangementBest>& rows);

void write_arrangements(JsonWriter& json, const std::vector<ArrangementBest>& rows);

}  // namespace dropfront::report
