#include "dropfront/scoring/operations.hpp"

#include <cmath>

namespace dropfront::scoring {

SupplyOperations operations_of(Evidence& evidence) {
  SupplyOperations rows;
  rows.supply = evidence.supply().name;
  const auto add = [&](const char* name, const OperatingPoint& point) {
    Operation row;
    row.corner = name;
    row.ambient_degC = point.ambient_degC;
    row.ends = point.ends;
    row.load_current_A = point.load_current_A;
    row.rail_current_A = point.rail_current_A;
    row.available_current_A = evidence.available_A(point);
    if (row.available_current_A && !std::isfinite(*row.available_current_A)) row.available_current_A.reset();
    row.state = point.state;
    row.note = point.state.reason;
    rows.operations.push_back(std::move(row));
  };
  add("nominal", evidence.nominal());
  add("lean_cold", evidence.lean_cold());
  add("lean_hot", evidence.lean_hot());
  add("rich_empty", evidence.rich_empty());
  add("rich_loaded", evidence.rich_loaded());
  add("standby", evidence.standby());
  add("standby_worst", evidence.standby_worst());
  return rows;
}

}  // namespace dropfront::scoring
