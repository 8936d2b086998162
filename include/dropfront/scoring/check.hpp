#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace dropfront::scoring {

/// A number a formula took, by the name it has there; the name carries its unit and kind.
struct Term {
  std::string_view name;
  double value = 0;
};

/// Where a check was at its worst.
struct At {
  std::string supply;  ///< empty with a single unnamed supply; filled in by the scorer
  std::string corner;  ///< lean_cold, ..., plug_in, shorted, unplug, fault
  std::optional<double> ambient_degC;
  std::string load;  ///< name, "none", or a current as text
  std::optional<double> phase_deg;
  std::string ends;          ///< which ends of the free tolerances, e.g. "series_resistor high"
  std::vector<Term> values;  ///< of the elements in that corner; empty where no network is solved
};

/// One check's verdict.
struct Check {
  std::string_view id;
  std::optional<double> value;  ///< absent: could not be computed (reason in basis)
  std::optional<double> limit;  ///< absent: no rating given
  std::string_view unit;
  bool at_most = true;       ///< side "<=", else ">="
  std::optional<bool> pass;  ///< null: no rating given, or unsolved
  bool unsolved = false;     ///< no steady state or transient to judge by: never accepted as a missing rating
  At at;
  std::string basis;          ///< what was compared, the rule or source by name
  std::vector<Term> figures;  ///< what the formula (check_formula) took beside the corner's values

  /// 1 - value/limit for "<=", value/limit - 1 for ">="; null where the limit is 0 or anything is missing.
  std::optional<double> headroom() const;
  /// A yes/no check: value and limit are 0 or 1, so its headroom says nothing about how close it is.
  bool yes_or_no() const { return unit.empty() && !at_most; }
};

}  // namespace dropfront::scoring
