#include "dropfront/report/make_result.hpp"

#include <algorithm>
#include <atomic>
#include <charconv>
#include <map>
#include <thread>

#include "dropfront/report/arrangements.hpp"
#include "dropfront/report/cautions.hpp"
#include "dropfront/report/second_sources.hpp"

namespace dropfront::report {

namespace {

/// Calls work(i) for 0 <= i < count on `threads` threads (0: all cores). Each i writes its own place only.
template <typename Work>
void for_each_index(int count, int threads, const Work& work) {
  const int cores = static_cast<int>(std::max(1u, std::thread::hardware_concurrency()));
  const int beside = std::min(count, threads > 0 ? threads : cores) - 1;
  std::atomic<int> next{0};
  const auto run = [&] {
    for (int i = next++; i < count; i = next++) work(i);
  };
  std::vector<std::jthread> pool;
  for (int i = 0; i < beside; ++i) pool.emplace_back(run);
  run();
}

std::string set_name(const search::RankedSet& set, const std::vector<scoring::Objective>& objectives) {
  constexpr std::string_view kPrefix = "objective ";
  if (!set.name.starts_with(kPrefix)) return set.name;
  std::size_t index = objectives.size();
  std::from_chars(set.name.data() + kPrefix.size(), set.name.data() + set.name.size(), index);
  return index < objectives.size() ? std::string(ranked_name(objectives[index])) : set.name;
}

Status status_of(const search::SearchOutcome& outcome) {
  if (outcome.cut_short) return Status::cut_short;
  if (!outcome.front.empty()) return Status::done;
  return outcome.proof && outcome.proof->complete ? Status::proven_none : Status::none_found;
}

/// The check of that name with its value and limit, as a design meets it; empty when it was not made. A score
/// that may end at the first broken limit mostly gets there, and costs less.
std::optional<scoring::Check> check_of(const scoring::Scorer& scorer, const scoring::Design& design,
                                       const std::string& name) {
  for (const auto depth : {scoring::Depth::compliant, scoring::Depth::full})
    for (const auto& check : scorer.score(design, depth).checks)
      if (check.id == name) return check;
  return std::nullopt;
}

void add_conflict(Result& result, const problem::BoundProblem& bound, const scoring::Scorer& scorer,
                  const search::SearchOutcome& outcome) {
  const auto& names = bound.check_names();
  for (std::size_t i = 0; i < outcome.tallies.size() && i < names.size(); ++i) {
    const auto& tally = outcome.tallies[i];
    if (tally.failed > 0)
      result.conflict.push_back({names[i], tally.failed, tally.least_shortfall,
                                 check_of(scorer, bound.design(tally.closest), names[i])});
  }
  std::stable_sort(result.conflict.begin(), result.conflict.end(),
                   [](const auto& a, const auto& b) { return a.failed > b.failed; });
}

}  // namespace

const scoring::Check* tightest_check(const scoring::Score& score) {
  const scoring::Check* tightest = nullptr;
  for (const auto& check : score.checks) {
    const auto headroom = check.headroom();
    if (!headroom || !check.pass.value_or(false) || check.yes_or_no()) continue;
    if (tightest == nullptr || *headroom < *tightest->headroom()) tightest = &check;
  }
  return tightest;
}

std::string_view effort_name(search::Effort effort) {
  switch (effort) {
    case search::Effort::quick:
      return "quick";
    case search::Effort::deep:
      return "deep";
    case search::Effort::normal:
      break;
  }
  return "normal";
}

std::string_view status_name(Status status) {
  switch (status) {
    case Status::none_found:
      return "none found";
    case Status::proven_none:
      return "proven none";
    case Status::cut_short:
      return "cut short";
    case Status::done:
      break;
  }
  return "done";
}

std::string_view ranked_name(scoring::Objective objective) {
  switch (objective) {
    case scoring::Objective::standby_loss:
      return "lowest_standby";
    case scoring::Objective::board_area:
      return "smallest";
    case scoring::Objective::current_margin:
      return "most_margin";
    case scoring::Objective::cost:
      break;
  }
  return "cheapest";
}

Result make_result(const problem::BoundProblem& bound, const search::SearchOutcome& outcome,
                   const search::SearchOptions& options, const std::string& version) {
  const problem::Problem& problem = bound.problem();
  Result result;
  result.problem = &problem;
  result.version = version;
  result.status = status_of(outcome);
  result.counts = outcome.counts;
  result.seed = options.seed;
  result.effort = effort_name(options.effort);
  result.closed = outcome.closed;
  result.proof = outcome.proof;
  result.check_names = bound.check_names();
  result.cautions = with_standing_cautions(problem.cautions);

  std::map<search::Choice, int> numbers;
  const auto add_entry = [&](std::vector<Entry>& list, const search::Choice& choice, bool on_front) {
    const int number = static_cast<int>(numbers.size()) + 1;
    if (!numbers.emplace(choice, number).second) return;
    Entry entry;
    entry.number = number;
    entry.design = bound.design(choice);
    entry.on_front = on_front;
    list.push_back(std::move(entry));
  };
  for (const auto& candidate : outcome.front) add_entry(result.front, candidate.choice, true);
  std::vector<bool> ranked(outcome.front.size(), false);
  for (const auto& set : outcome.ranked) {
    RankedList list{set_name(set, problem.requirement.objectives), {}};
    for (const auto& candidate : set.candidates) {
      add_entry(result.extras, candidate.choice, false);
      const int number = numbers.at(candidate.choice);
      list.numbers.push_back(number);
      if (number <= static_cast<int>(ranked.size())) ranked[number - 1] = true;
    }
    result.ranked.push_back(std::move(list));
  }

  const SecondSources sources(problem);
  const scoring::Scorer scorer(problem.requirement);
  const int on_front = static_cast<int>(result.front.size());
  for_each_index(on_front + static_cast<int>(result.extras.size()), options.threads, [&](int i) {
    Entry& entry = i < on_front ? result.front[i] : result.extras[i - on_front];
    const bool full = i >= on_front || ranked[i];
    scoring::Score score =
        scorer.score(entry.design, full ? scoring::Depth::full : scoring::Depth::compliant);
    entry.objectives = score.objectives;
    if (const scoring::Check* tightest = tightest_check(score)) {
      entry.tightest_check = tightest->id;
      entry.tightest_headroom = tightest->headroom();
      entry.tightest_supply = tightest->at.supply;
    }
    entry.standby_supply = score.standby_supply;
    entry.margin_supply = score.margin_supply;
    entry.alternatives = sources.of(entry.design);
    if (!full) return;
    score.faults = scoring::faults_of(entry.design, problem.requirement);
    entry.evidence = std::move(score);
  });

  const auto& names = bound.check_names();
  for (const auto& miss : outcome.near_misses)
    if (miss.check >= 0 && miss.check < static_cast<int>(names.size()))
      result.near_misses.push_back({bound.design(miss.choice), names[miss.check], miss.shortfall,
                                    check_of(scorer, bound.design(miss.choice), names[miss.check])});
  result.arrangements = arrangements_of(result);
  if (result.front.empty()) add_conflict(result, bound, scorer, outcome);
  return result;
}

}  // namespace dropfront::report
