#include "dropfront/scoring/checks/make_check.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include "dropfront/scoring/corner_figures.hpp"

namespace dropfront::scoring {
namespace {

Check compare(Check check) {
  if (check.limit && !std::isfinite(*check.limit)) return unsolved(check, "the limit is not a number");
  if (!check.value) return check;
  if (std::isnan(*check.value)) return unsolved(check, "the value is not a number");
  if (check.limit) check.pass = check.at_most ? *check.value <= *check.limit : *check.value >= *check.limit;
  if (!std::isfinite(*check.value)) check.value.reset();
  return check;
}

Check make(std::string_view id, std::optional<double> value, std::optional<double> limit,
           std::string_view unit, bool at_most, At at, std::string basis) {
  Check check;
  check.id = id;
  check.value = value;
  check.limit = limit;
  check.unit = unit;
  check.at_most = at_most;
  check.at = std::move(at);
  check.basis = std::move(basis);
  return compare(std::move(check));
}

/// 0 failed, 1 unsolved, 2 not given, 3 passed.
int rank(const Check& check) {
  if (check.pass) return *check.pass ? 3 : 0;
  return check.unsolved ? 1 : 2;
}

}  // namespace

Check at_most(std::string_view id, std::optional<double> value, std::optional<double> limit,
              std::string_view unit, At at, std::string basis) {
  return make(id, value, limit, unit, true, std::move(at), std::move(basis));
}

Check at_least(std::string_view id, std::optional<double> value, std::optional<double> limit,
               std::string_view unit, At at, std::string basis) {
  return make(id, value, limit, unit, false, std::move(at), std::move(basis));
}

Check must_be(std::string_view id, std::optional<bool> yes, At at, std::string basis) {
  if (!yes) return at_least(id, std::nullopt, std::nullopt, "", std::move(at), std::move(basis));
  return at_least(id, *yes ? 1.0 : 0.0, 1.0, "", std::move(at), std::move(basis));
}

Check with(Check check, std::vector<Term> figures) {
  check.figures.insert(check.figures.end(), figures.begin(), figures.end());
  return check;
}

void add_figure(Check& check, std::string_view name, const std::optional<double>& value) {
  if (value) check.figures.push_back({name, *value});
}

Check unsolved(Check check, const std::string& reason) {
  check.value.reset();
  check.limit.reset();
  check.pass.reset();
  check.unsolved = true;
  check.basis = "no answer: " + reason;
  return check;
}

Check at_most_each(std::string_view id, double value, const std::vector<std::optional<double>>& limits,
                   std::string_view unit, At at, std::string basis) {
  std::optional<double> least;
  bool all_given = true;
  for (const auto& limit : limits) {
    if (!limit) all_given = false;
    if (limit) least = least ? std::min(*least, *limit) : *limit;
  }
  const bool broken = least && !(value <= *least);
  if (!all_given && !broken) least.reset();
  return at_most(id, value, least, unit, std::move(at), std::move(basis));
}

At at_point(const OperatingPoint& point) {
  At at;
  at.corner = point.corner;
  at.ambient_degC = point.ambient_degC;
  at.load = point.load;
  at.ends = point.ends;
  at.values = corner_figures(point.values, point.local_degC, point.clamp_junction_degC);
  at.values.push_back({"load_current_A", point.load_current_A});
  return at;
}

At at_lean(const LeanAnswer& lean, const std::string& load) {
  At at = at_corner(lean.hot_decides ? "lean_hot" : "lean_cold", lean.ambient_degC, lean.ends);
  at.load = load;
  if (lean.usable) at.values = corner_figures(lean.values, lean.local_degC, lean.clamp_junction_degC);
  return at;
}

At at_plug_in(const PlugIn& run) {
  At at = at_corner("plug_in", run.ambient_degC, run.ends);
  at.load = "none";
  at.phase_deg = 90;
  at.values = corner_figures(run.values, run.local_degC, run.clamp_junction_degC);
  return at;
}

At at_surge(const SurgeRun& run) {
  At at = at_corner("surge", run.ambient_degC, run.ends);
  at.load = "none";
  at.phase_deg = run.phase_deg;
  at.values = corner_figures(run.values, run.local_degC, run.clamp_junction_degC);
  at.values.push_back({"surge_V", run.surge_V});
  at.values.push_back({"surge_source_ohm", run.values.source_ohm});
  return at;
}

At at_corner(std::string corner, std::optional<double> ambient_degC, std::string ends) {
  At at;
  at.corner = std::move(corner);
  at.ambient_degC = ambient_degC;
  at.ends = std::move(ends);
  return at;
}

Check worse(Check first, Check second) {
  if (rank(first) != rank(second)) return rank(first) < rank(second) ? first : second;
  const auto a = first.headroom(), b = second.headroom();
  if (a && b) return *b < *a ? second : first;
  if (first.value && second.value) {
    const bool second_is_worse = first.at_most ? *second.value > *first.value : *second.value < *first.value;
    return second_is_worse ? second : first;
  }
  // A failed check without a finite value is beyond any headroom.
  return !second.value && first.value ? second : first;
}

}  // namespace dropfront::scoring
