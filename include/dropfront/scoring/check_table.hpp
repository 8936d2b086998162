#pragma once
#include <optional>
#include <string_view>
#include <vector>

#include "dropfront/scoring/check.hpp"
#include "dropfront/scoring/evidence.hpp"

namespace dropfront::scoring {

/// What a check costs, so that cheap ones run first: `transient` a few short runs, `events` some hundred
/// periods.
enum class Tier { list, lean, standby, steady, transient, events };

/// One check. Adding a check is one small file in scoring/checks/, its line in
/// scoring/checks/checks.hpp, in check_table.cpp and in check_formulas.cpp.
struct CheckRule {
  std::string_view id;  ///< physics name, e.g. "clamp.power"
  Tier tier = Tier::list;
  /// Evaluates on one supply; nullopt: the check does not apply (no such limit, part or rule). The scorer
  /// keeps the worst over supplies.
  std::optional<Check> (*evaluate)(Evidence& evidence) = nullptr;
};

/// All checks in the order they are reported.
const std::vector<CheckRule>& check_table();

}  // namespace dropfront::scoring
