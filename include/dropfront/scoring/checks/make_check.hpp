#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/scoring/check.hpp"
#include "dropfront/scoring/lean.hpp"
#include "dropfront/scoring/operating_point.hpp"
#include "dropfront/scoring/plug_in.hpp"
#include "dropfront/scoring/surge.hpp"

namespace dropfront::scoring {

/// "value <= limit". No limit (rating not given): pass null. A value that is not finite is kept out of the
/// result: +infinity breaks the limit, NaN is unsolved.
Check at_most(std::string_view id, std::optional<double> value, std::optional<double> limit,
              std::string_view unit, At at, std::string basis);

/// "value >= limit", else as at_most; -infinity breaks the limit.
Check at_least(std::string_view id, std::optional<double> value, std::optional<double> limit,
               std::string_view unit, At at, std::string basis);

/// 1 for yes, 0 for no, against 1. Absent: not given.
Check must_be(std::string_view id, std::optional<bool> yes, At at, std::string basis);

/// The check with what its formula took; ratings that are not given are left out.
Check with(Check check, std::vector<Term> figures);
void add_figure(Check& check, std::string_view name, const std::optional<double>& value);

/// The corner this check needs has no answer: no value, no verdict, the reason in the basis.
Check unsolved(Check check, const std::string& reason);

/// `limits` that all apply: the least of those given. If one is absent the check passes nothing (no limit)
/// unless the value already breaks a given one.
Check at_most_each(std::string_view id, double value, const std::vector<std::optional<double>>& limits,
                   std::string_view unit, At at, std::string basis);

/// Where an operating point was solved.
At at_point(const OperatingPoint& point);
/// The lean corner that decides.
At at_lean(const LeanAnswer& lean, const std::string& load);
/// Where a plug-in was run: closing on the crest.
At at_plug_in(const PlugIn& run);
/// Where a surge was run; its voltage (signed) and source among the values.
At at_surge(const SurgeRun& run);
/// A place without an operating point; empty where no corner decides. `ends` and `ambient_degC` as far as
/// they matter.
At at_corner(std::string corner, std::optional<double> ambient_degC = {}, std::string ends = {});

/// The worse of two verdicts on the same check: failed before unsolved before not given before passed, then
/// the lesser headroom; the first where they are alike.
Check worse(Check first, Check second);

/// The worst of `judge(point)` over the points; a point without a steady state counts as unsolved.
template <class Judge>
Check worst_over(const std::vector<const OperatingPoint*>& points, Judge judge) {
  std::optional<Check> worst;
  for (const OperatingPoint* point : points) {
    Check check = judge(*point);
    if (!point->state.usable()) check = unsolved(check, point->state.reason);
    worst = worst ? worse(*worst, check) : check;
  }
  return *worst;
}

}  // namespace dropfront::scoring
