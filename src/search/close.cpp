#include "dropfront/search/close.hpp"

#include <algorithm>
#include <limits>
#include <set>

#include "dropfront/search/elites.hpp"
#include "dropfront/search/mixture.hpp"
#include "dropfront/search/neighbours.hpp"
#include "dropfront/search/prospects.hpp"
#include "dropfront/search/spread_order.hpp"

namespace dropfront::search {
namespace {

class Closer {
 public:
  Closer(SearchState& state, Prospects& prospects)
      : state_(state),
        prospects_(prospects),
        singles_(state.evaluator.objective_count()),
        pairs_(state.evaluator.objective_count()),
        elites_(state.evaluator.resolution()),
        random_(state.options.seed) {
    for (std::size_t tag = 0; tag < state.ledger.compliant().size(); ++tag)
      admit(static_cast<std::int64_t>(tag));
    for (const auto& member : state.ledger.front().entries())
      if (member.alive) join(member.tag);
  }

  bool run() {
    while (!state_.ended() && state_.may_evaluate()) {
      // Looks are cheap beside evaluations: new members are taken up at once, and more as long as the queue
      // holds too little of promise.
      while (take_up_singles() && prospects_.promising() < evaluation_batch) {
      }
      take_up_mixtures();
      if (prospects_.promising() == 0 && !take_up_pairs() && prospects_.empty() && !prospects_.recall()) {
        if (++dry_rounds_ > most_dry_rounds) break;
        continue;
      }
      dry_rounds_ = 0;
      evaluate_batch();
      state_.report("close", progress());
    }
    return !state_.ended() && prospects_.empty() && prospects_.aside() == 0 && !state_.looks_refused &&
           singles_.empty();
  }

 private:
  void join(std::int64_t tag) {
    const auto& objectives = state_.ledger.compliant()[tag].evaluation.objectives;
    singles_.add(tag, objectives);
    if (!state_.space.coupled.empty()) pairs_.add(tag, objectives);
  }

  void admit(std::int64_t tag) {
    const Candidate& design = state_.ledger.compliant()[tag];
    elites_.add(state_.region_of(design.choice), design.evaluation.objectives, design.choice, tag);
  }

  void evaluate_batch() {
    const auto choices = prospects_.take(evaluation_batch);
    for (const Merged& merged : state_.evaluate(choices)) {
      for (std::int64_t tag : merged.entered.removed) {
        singles_.remove(tag);
        pairs_.remove(tag);
      }
      // A newcomer may have been displaced by a later one of its own batch: add, then remove, in order.
      if (merged.entered.front) join(merged.entered.tag);
      if (merged.entered.tag >= 0) admit(merged.entered.tag);
    }
  }

  std::vector<Parent> members(SpreadOrder& order) {
    std::vector<Parent> parents;
    for (int n = 0; n < members_a_round; ++n) {
      const std::int64_t tag = order.pick();
      if (tag < 0) break;
      parents.push_back(parent(tag));
    }
    return parents;
  }

  Parent parent(std::int64_t tag) const {
    const Candidate& member = state_.ledger.compliant()[tag];
    return Parent{member.choice, state_.quantities_of(member.evaluation), 0, tag};
  }

  // While nothing complies: the designs closest to complying.
  std::vector<Parent> broken() {
    std::vector<Parent> parents;
    for (const auto& entry : state_.ledger.nearest_broken().entries()) {
      if (parents.size() == members_a_round) break;
      if (!broken_taken_.insert(entry.second).second) continue;
      parents.push_back(Parent{entry.second, {}, entry.first[0], -1});
    }
    return parents;
  }

  bool take_up_singles() {
    if (state_.ended() || !state_.may_look()) {
      if (!singles_.empty()) state_.looks_refused = true;
      return false;
    }
    std::vector<Parent> parents = members(singles_);
    if (parents.empty() && state_.ledger.front().size() == 0) parents = broken();
    return take_up(parents, [this](const Parent& p) { return one_part_changes(state_.space, p.choice); });
  }

  bool take_up_pairs() {
    // One-part changes come first: a quarter of the looks stays theirs.
    if (state_.ended()) return false;
    if (4 * state_.ledger.counts().looked > 3 * state_.plan.looks) {
      state_.pairs_refused = state_.pairs_refused || !pairs_.empty();
      return false;
    }
    return take_up(members(pairs_), [this](const Parent& p) {
      return two_part_changes(state_.space, state_.axes, p.choice, state_.plan.pair_window);
    });
  }

  // Mixtures of the best designs: by one objective, of the front as it is, of any region.
  void take_up_mixtures() {
    if (elites_.empty() || state_.ended() || !mixing_allowed()) return;
    const std::vector<std::int64_t> front = state_.ledger.front().tags();
    const std::vector<std::int64_t> ends = state_.ledger.front().ends();
    const auto draw = [&] {
      const std::uint64_t kind = random_.below(4);
      if (kind == 0) return ends[random_.below(ends.size())];
      if (kind == 1) return front[random_.below(front.size())];
      return elites_.draw(random_);
    };
    std::vector<Parent> parents;
    std::vector<Choice> choices;
    std::vector<std::size_t> made_from;
    for (int n = 0; n < mixtures_a_round; ++n) {
      parents.push_back(parent(draw()));
      const Choice& second = state_.ledger.compliant()[draw()].choice;
      choices.push_back(mix(state_.space, state_.axes, parents.back().choice, second, random_));
      made_from.push_back(parents.size() - 1);
    }
    prospects_.add(parents, choices, made_from);
  }

  // One-part changes come first: half of the looks stays theirs.
  bool mixing_allowed() const { return 2 * state_.ledger.counts().looked < state_.plan.looks; }

  template <class Changes>
  bool take_up(const std::vector<Parent>& parents, const Changes& changes) {
    std::vector<Choice> choices;
    std::vector<std::size_t> made_from;
    for (std::size_t p = 0; p < parents.size(); ++p)
      for (Choice& choice : changes(parents[p])) {
        choices.push_back(std::move(choice));
        made_from.push_back(p);
      }
    prospects_.add(parents, choices, made_from);
    return !parents.empty();
  }

  double progress() const {
    const auto share = [](std::int64_t part, std::int64_t whole) {
      return static_cast<double>(part) / static_cast<double>(whole);
    };
    const double looks = share(state_.ledger.counts().looked, state_.plan.looks);
    const double scores = share(state_.evaluations(), state_.plan.evaluations);
    return std::max(looks, scores);
  }

  SearchState& state_;
  Prospects& prospects_;
  SpreadOrder singles_, pairs_;
  Elites elites_;
  values::RandomStream random_;
  int dry_rounds_ = 0;  ///< in a row without a design worth its evaluation
  std::set<Choice> broken_taken_;
};

}  // namespace

bool close(SearchState& state, Prospects& prospects) { return Closer(state, prospects).run(); }

}  // namespace dropfront::search
