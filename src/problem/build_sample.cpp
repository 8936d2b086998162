#include "dropfront/problem/build_sample.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/values/sobol.hpp"

namespace dropfront::problem {
namespace {

using scoring::BoxQuantity;

/// Student's t for 15 degrees of freedom, two-sided 95 % (any table of it).
constexpr double kStudent15 = 2.131;

bool within(BoxQuantity quantity, double value, double limit) {
  return scoring::least_counts(quantity) ? value >= limit : value <= limit;
}

/// The worse over supplies, by quantity; absent where any supply has no answer.
scoring::BuildFigures worst_of(const std::vector<scoring::CornerTrial>& trials,
                               const std::vector<double>& parts) {
  scoring::BuildFigures worst = trials.front().at(parts);
  for (std::size_t s = 1; s < trials.size(); ++s) {
    const auto next = trials[s].at(parts);
    for (std::size_t q = 0; q < worst.size(); ++q) {
      if (!worst[q] || !next[q]) {
        worst[q].reset();
      } else {
        const bool least = scoring::least_counts(static_cast<BoxQuantity>(q));
        worst[q] = least ? std::min(*worst[q], *next[q]) : std::max(*worst[q], *next[q]);
      }
    }
  }
  return worst;
}

std::optional<Quantiles> quantiles(std::vector<double> values) {
  if (values.empty()) return std::nullopt;
  std::sort(values.begin(), values.end());
  const auto at = [&](double share) {
    return values[static_cast<std::size_t>(share * static_cast<double>(values.size() - 1) + 0.5)];
  };
  return Quantiles{values.front(), at(0.01), at(0.5), at(0.99), values.back()};
}

}  // namespace

ScrambleTally try_scramble(const Problem& problem, const scoring::Design& design, int scramble) {
  ScrambleTally tally;
  const auto& requirement = problem.requirement;
  std::vector<scoring::CornerTrial> trials;
  trials.reserve(requirement.supplies.size());
  for (const auto& supply : requirement.supplies) trials.emplace_back(design, requirement, supply);
  const std::size_t parts = trials.front().parts();
  const values::Sobol sobol(static_cast<int>(parts));
  const values::RandomStream stream =
      values::RandomStream(problem.seed).split(static_cast<std::uint64_t>(scramble));
  const values::ShiftedSobol shifted(sobol, stream);
  for (int i = 0; i < kBuildsAScramble; ++i) {
    std::vector<double> position = shifted.point(static_cast<std::uint32_t>(i));
    position.resize(parts);
    const auto figures = worst_of(trials, position);
    bool all = true;
    for (int q = 0; q < scoring::kBoxQuantities; ++q) {
      const auto quantity = static_cast<BoxQuantity>(q);
      const auto limit = scoring::box_limit(quantity, design, requirement);
      if (!limit) continue;
      const bool passed = figures[q] && within(quantity, *figures[q], *limit);
      if (passed) ++tally.passed[q];
      all = all && passed;
    }
    if (all) ++tally.passed_all;
    const auto& margin = figures[static_cast<std::size_t>(BoxQuantity::margin)];
    const auto& standby = figures[static_cast<std::size_t>(BoxQuantity::standby)];
    if (margin) tally.margins_A.push_back(*margin);
    if (standby) tally.standbys_W.push_back(*standby);
  }
  return tally;
}

Yield yield_of(const std::string& check, const std::vector<int>& passed, int builds_each) {
  Yield yield;
  yield.check = check;
  const double n = static_cast<double>(passed.size());
  if (passed.empty() || builds_each < 1) return yield;
  double sum = 0, squares = 0;
  for (const int count : passed) {
    const double share = static_cast<double>(count) / builds_each;
    yield.passed += count;
    sum += share;
    squares += share * share;
  }
  yield.builds = builds_each * static_cast<int>(passed.size());
  yield.share = static_cast<double>(yield.passed) / yield.builds;
  // None or all: of n builds at the 97.5 % level.
  const double end = std::pow(0.025, 1.0 / yield.builds);
  if (yield.passed == 0 || yield.passed == yield.builds) {
    yield.low = yield.passed == 0 ? 0 : end;
    yield.high = yield.passed == 0 ? 1 - end : 1;
    return yield;
  }
  const double variance = n > 1 ? std::max(0.0, (squares - sum * sum / n) / (n - 1)) : 0.25;
  const double reach = kStudent15 * std::sqrt(variance / n);
  yield.low = std::max(0.0, yield.share - reach);
  yield.high = std::min(1.0, yield.share + reach);
  return yield;
}

BuildSample summed(const Problem& problem, const scoring::Design& design,
                   const std::vector<ScrambleTally>& scrambles) {
  BuildSample sample;
  std::vector<double> margins, standbys;
  std::vector<int> all;
  for (const auto& scramble : scrambles) {
    margins.insert(margins.end(), scramble.margins_A.begin(), scramble.margins_A.end());
    standbys.insert(standbys.end(), scramble.standbys_W.begin(), scramble.standbys_W.end());
    all.push_back(scramble.passed_all);
  }
  for (int q = 0; q < scoring::kBoxQuantities; ++q) {
    const auto quantity = static_cast<BoxQuantity>(q);
    if (!scoring::box_limit(quantity, design, problem.requirement)) continue;
    std::vector<int> passed;
    for (const auto& scramble : scrambles) passed.push_back(scramble.passed[q]);
    sample.yields.push_back(
        yield_of(std::string(scoring::box_quantity_name(quantity)), passed, kBuildsAScramble));
  }
  sample.yields.push_back(yield_of("all of these", all, kBuildsAScramble));
  sample.margin_A = quantiles(std::move(margins));
  sample.standby_W = quantiles(std::move(standbys));
  return sample;
}

}  // namespace dropfront::problem
