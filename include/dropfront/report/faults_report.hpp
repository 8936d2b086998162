#pragma once
#include <string>
#include <vector>

#include "dropfront/report/json_writer.hpp"
#include "dropfront/scoring/faults.hpp"

namespace dropfront::report {

/// The table of single faults: what the rail does, which ratings of other parts are exceeded, what opens.
std::string faults_text(const std::vector<scoring::FaultRow>& faults);

/// The same with every figure, as an array.
void write_faults(JsonWriter& json, const std::vector<scoring::FaultRow>& faults);

}  // namespace dropfront::report
