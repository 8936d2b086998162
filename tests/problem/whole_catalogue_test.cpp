// The search without enumeration against every design of a shipped problem with fewer parts. Reference: the
// definition of a front, applied to all of its designs; nothing of the search takes part in it.
#include <algorithm>
#include <map>
#include <mutex>

#include "dropfront/problem/binding.hpp"
#include "dropfront/search/objective_key.hpp"
#include "dropfront/search/parallel.hpp"
#include "dropfront/search/search.hpp"
#include "problem/fixture.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using search::Candidate;
using search::Choice;
using search::Evaluation;

namespace {

/// The leak alarm with the parts of its good designs and some that break its limits: 2,400 designs.
problem::ProblemFile reduced() {
  const std::vector<std::string> sets{
      R"(objectives=["standby_loss", "cost", "board_area", "current_margin"])",
      R"(slots={"arrangement": ["half-wave-clamp-ahead", "bridge-clamp-across"],
                "output_stage": {"only": ["LM5", "BL5"]},
                "dropper": {"only": ["SR310J-270n", "SR310-330n", "SR310J-470n", "SR275-820n", "SR310J-1u5"]},
                "series_resistor": {"only": ["WF1-22R", "WF2-47R"]},
                "clamp": {"only": ["1N4737A", "1N4738A", "ZP-18V", "1N4747A", "ZP-24V", "1N4756A"]},
                "reservoir": {"only": ["EL35-33u", "EL35-100u", "EL16-470u", "EL50-47u", "EG16-470u"]},
                "discharge": {"only": ["C0805-1M", "C1206-470k"], "count": [2]},
                "rectifier": {"only": ["DA-400"]}})"};
  return problem::read_problem_file(std::string(DROPFRONT_SOURCE_DIR) + "/problems/leak-alarm.json", sets);
}

std::vector<Candidate> every_design(const search::Evaluator& evaluator) {
  std::vector<Candidate> all;
  const auto& slots = evaluator.space().slots;
  Choice choice(slots.size(), 0);
  for (std::size_t s = slots.size(); s > 0;) {
    all.push_back({choice, {}, true});
    for (s = slots.size(); s > 0; --s) {
      if (++choice[s - 1] < slots[s - 1].size) break;
      choice[s - 1] = 0;
    }
  }
  // Never says "dominated": only a broken limit ends a score early.
  const search::Dominated nothing = [](const std::vector<double>&) { return false; };
  search::Workers(2).for_each(
      all.size(), 16, [&](std::size_t i) { all[i].evaluation = evaluator.evaluate(all[i].choice, nothing); });
  return all;
}

/// Answers from the table of all designs and remembers relaxed ones: the same answers as the evaluator below,
/// so that several searches cost no more than one.
class Remembered : public search::Evaluator {
 public:
  Remembered(const search::Evaluator& below, const std::vector<Candidate>& all) : below_(below) {
    for (const Candidate& design : all) table_.emplace(design.choice, &design.evaluation);
  }
  /// The step of each objective from here on.
  void set_resolution(std::vector<double> resolution) { resolution_ = std::move(resolution); }

  const search::Space& space() const override { return below_.space(); }
  int objective_count() const override { return below_.objective_count(); }
  const std::vector<double>& resolution() const override { return resolution_; }
  const std::vector<std::string>& check_names() const override { return below_.check_names(); }
  Evaluation look(const Choice& choice) const override { return below_.look(choice); }
  Evaluation evaluate(const Choice& choice, const search::Dominated&) const override {
    return *table_.at(choice);
  }
  Evaluation relaxed(const Choice& categories, const std::vector<double>& position) const override {
    const auto key = std::make_pair(categories, position);
    {
      const std::lock_guard lock(mutex_);
      if (const auto found = relaxed_.find(key); found != relaxed_.end()) return found->second;
    }
    const Evaluation answer = below_.relaxed(categories, position);
    const std::lock_guard lock(mutex_);
    return relaxed_.emplace(key, answer).first->second;
  }

 private:
  const search::Evaluator& below_;
  std::map<Choice, const Evaluation*> table_;
  std::vector<double> resolution_;
  mutable std::mutex mutex_;
  mutable std::map<std::pair<Choice, std::vector<double>>, Evaluation> relaxed_;
};

bool better(const Candidate& a, const Candidate& b) {
  return std::make_pair(a.evaluation.objectives, a.choice) <
         std::make_pair(b.evaluation.objectives, b.choice);
}

std::vector<Candidate> front_by_definition(const std::vector<Candidate>& all,
                                           const std::vector<double>& resolution) {
  std::map<std::vector<double>, Candidate> of_key;
  for (const Candidate& design : all) {
    if (design.evaluation.outcome != search::Outcome::compliant) continue;
    const auto [at, fresh] =
        of_key.emplace(search::objective_keys(design.evaluation.objectives, resolution), design);
    if (!fresh && better(design, at->second)) at->second = design;
  }
  std::vector<Candidate> front;
  for (const auto& one : of_key) {
    const bool beaten = std::any_of(of_key.begin(), of_key.end(), [&](const auto& other) {
      return search::dominates(other.first, one.first);
    });
    if (!beaten) front.push_back(one.second);
  }
  std::sort(front.begin(), front.end(), better);
  return front;
}

void check_equal(const std::vector<Candidate>& found, const std::vector<Candidate>& exact) {
  REQUIRE(found.size() == exact.size());
  for (std::size_t i = 0; i < exact.size(); ++i) {
    INFO("member " << i + 1 << " of " << exact.size());
    CHECK(found[i].choice == exact[i].choice);
    CHECK(found[i].evaluation.objectives == exact[i].evaluation.objectives);
  }
}

}  // namespace

TEST_CASE(
    "on a shipped problem with fewer parts the search finds the front of all designs, design for design") {
  const auto file = reduced();
  const auto bound = problem::bind(file.problems[0]);
  const auto all = every_design(*bound);
  REQUIRE(all.size() == 2400);
  Remembered evaluator(*bound, all);
  for (const bool raw : {true, false}) {
    evaluator.set_resolution(raw ? std::vector<double>(4, 0.0) : bound->resolution());
    const auto exact = front_by_definition(all, evaluator.resolution());
    CHECK(exact.size() >= 15);  // a front worth comparing
    for (const bool enumerate : {true, false}) {
      INFO((raw ? "raw, " : "default resolution, ") << (enumerate ? "enumerated" : "searched"));
      search::SearchOptions options;
      options.switches.enumerate = enumerate;
      const auto outcome = search::run_search(evaluator, options);
      CHECK(outcome.exhaustive == enumerate);
      check_equal(outcome.front, exact);
    }
  }
}
