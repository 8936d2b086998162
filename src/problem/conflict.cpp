#include "dropfront/problem/conflict.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/problem/limit_search.hpp"
#include "dropfront/problem/slot_space.hpp"
#include "dropfront/scoring/score.hpp"
#include "dropfront/search/parallel.hpp"

namespace dropfront::problem {
namespace {

/// What one design would need of each knob, all else kept; empty: it fails whatever the limits.
struct Needs {
  std::vector<double> values;
  std::vector<bool> kept;
};

/// Knobs the problem sets.
std::vector<const LimitKnob*> set_knobs(const scoring::Requirement& requirement) {
  std::vector<const LimitKnob*> knobs;
  for (const LimitKnob& knob : limit_knobs())
    if (knob.asked(requirement)) knobs.push_back(&knob);
  return knobs;
}

bool advance(search::Choice& choice, const search::Space& space) {
  for (std::size_t s = choice.size(); s-- > 0;) {
    if (++choice[s] < space.slots[s].size) return true;
    choice[s] = 0;
  }
  return false;
}

/// Every design scored once with all valued limits widened; those without a value are tried both ways.
class Everything {
 public:
  Everything(const Problem& problem, const search::SearchOptions& options)
      : problem_(problem), slots_(make_space(problem.offers)), knobs_(set_knobs(problem.requirement)) {
    if (slots_.space.size() < 1) return;
    search::Choice choice(slots_.space.slots.size(), 0);
    do {
      choices_.push_back(choice);
    } while (advance(choice, slots_.space));
    needs_.resize(choices_.size());
    scoring::Requirement wide = problem.requirement;
    for (const LimitKnob* knob : knobs_)
      if (knob->needed != nullptr) knob->widen(wide);
    const scoring::Scorer scorer(wide);
    search::Workers(options.threads).for_each(choices_.size(), 8, [&](std::size_t i) {
      if (options.stop == nullptr || !options.stop->load(std::memory_order_relaxed))
        needs_[i] = needs_of(scorer, wide, choices_[i]);
    });
    finished_ = options.stop == nullptr || !options.stop->load(std::memory_order_relaxed);
  }

  ConflictSet explain() const {
    ConflictSet set;
    set.every_design = true;
    set.proven = finished_;
    set.scored = static_cast<std::int64_t>(choices_.size());
    std::vector<bool> in(knobs_.size(), true);
    if (any_keeps(std::vector<bool>(knobs_.size(), false)))
      for (std::size_t k = 0; k < knobs_.size(); ++k) {
        // Those that alone admit a design belong to every set; for the others the deletion decides.
        in[k] = false;
        if (any_keeps(in)) in[k] = true;
      }
    else
      in.assign(knobs_.size(), false);
    for (std::size_t k = 0; k < knobs_.size(); ++k)
      if (in[k]) set.limits.push_back(relaxation(k));
    return set;
  }

 private:
  Needs needs_of(const scoring::Scorer& scorer, const scoring::Requirement& wide,
                 const search::Choice& choice) const {
    const scoring::Design design = design_of(problem_.offers, slots_.ids, choice);
    scoring::Requirement bare = wide;
    Needs needs;
    // Limits without a value: dropped one by one until the rest of the design holds.
    auto score = scorer.score(design, scoring::Depth::compliant);
    std::vector<bool> dropped(knobs_.size(), false);
    for (std::size_t k = 0; k < knobs_.size() && !holds(score); ++k) {
      if (knobs_[k]->needed != nullptr) continue;
      knobs_[k]->widen(bare);
      const auto with_less = scoring::score(design, bare, scoring::Depth::compliant);
      dropped[k] = true;
      score = with_less;
    }
    if (!holds(score)) return needs;
    for (std::size_t k = 0; k < knobs_.size(); ++k) {
      const double asked = *knobs_[k]->asked(problem_.requirement);
      const auto value = needed_value(*knobs_[k], score.checks, design, wide);
      needs.values.push_back(value.value_or(asked));
      needs.kept.push_back(!dropped[k] && (!value || keeps(*knobs_[k], *value, asked)));
    }
    return needs;
  }
  static bool holds(const scoring::Score& score) {
    return score.complete && score.verdict == scoring::Verdict::compliant;
  }

  /// Whether a design keeps all knobs marked.
  bool any_keeps(const std::vector<bool>& marked) const {
    return std::any_of(needs_.begin(), needs_.end(), [&](const Needs& needs) {
      if (needs.values.empty()) return false;
      for (std::size_t k = 0; k < marked.size(); ++k)
        if (marked[k] && !needs.kept[k]) return false;
      return true;
    });
  }

  ConflictLimit relaxation(std::size_t knob) const {
    ConflictLimit limit;
    limit.knob = knobs_[knob];
    limit.asked = *limit.knob->asked(problem_.requirement);
    limit.proven = finished_;
    for (std::size_t i = 0; i < needs_.size(); ++i) {
      const Needs& needs = needs_[i];
      if (needs.values.empty()) continue;
      bool others = true;
      for (std::size_t k = 0; k < knobs_.size(); ++k) others = others && (k == knob || needs.kept[k]);
      if (!others) continue;
      limit.droppable = true;
      const double value = needs.values[knob];
      const bool nearer = limit.knob->at_most ? value < limit.needed.value_or(INFINITY)
                                              : value > limit.needed.value_or(-INFINITY);
      if (limit.choice && !nearer) continue;
      limit.choice = choices_[i];
      if (limit.knob->needed != nullptr) limit.needed = value;
    }
    return limit;
  }

  const Problem& problem_;
  SlotSpace slots_;
  std::vector<const LimitKnob*> knobs_;
  std::vector<search::Choice> choices_;
  std::vector<Needs> needs_;
  bool finished_ = false;
};

/// The same by searches: one a limit for its relaxation, one a limit that does not give way alone.
ConflictSet by_searches(const Problem& problem, const search::SearchOptions& options) {
  const auto knobs = set_knobs(problem.requirement);
  const auto over = [&] { return options.stop != nullptr && options.stop->load(std::memory_order_relaxed); };
  ConflictSet set;
  std::vector<bool> in(knobs.size(), true);
  const auto all_but = [&](const std::vector<bool>& kept) {
    scoring::Requirement requirement = problem.requirement;
    for (std::size_t k = 0; k < knobs.size(); ++k)
      if (!kept[k]) knobs[k]->widen(requirement);
    return requirement;
  };
  std::vector<ConflictLimit> found;
  for (std::size_t k = 0; k < knobs.size() && !over(); ++k) {
    found.push_back(nearest_value(problem, *knobs[k], options, set.scored));
  }
  if (found.size() < knobs.size()) return set;
  const Feasibility none = feasible(problem, all_but(std::vector<bool>(knobs.size(), false)), options);
  set.scored += none.scored;
  if (!none.found) {
    set.proven = none.proven;
    return set;
  }
  for (std::size_t k = 0; k < knobs.size() && !over(); ++k) {
    if (found[k].choice) continue;  // keeps all but this one: it belongs to every set
    in[k] = false;
    const Feasibility rest = feasible(problem, all_but(in), options);
    set.scored += rest.scored;
    if (rest.found) in[k] = true;
    if (!rest.found) set.proven = rest.proven;
  }
  if (over()) set.proven = false;
  for (std::size_t k = 0; k < knobs.size(); ++k)
    if (in[k]) set.limits.push_back(found[k]);
  return set;
}

}  // namespace

ConflictSet explain_conflict(const Problem& problem, const search::SearchOptions& options,
                             double every_below) {
  if (make_space(problem.offers).space.size() <= every_below) return Everything(problem, options).explain();
  return by_searches(problem, options);
}

}  // namespace dropfront::problem
