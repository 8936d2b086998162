#include "dropfront/search/box_trial.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "dropfront/search/box_prospect.hpp"

namespace dropfront::search {
namespace {

constexpr double few_members = 4;      // so few that any split does
constexpr double corner_members = 12;  // so few that bounds of depth 2 are worth their time
constexpr double unknown = -std::numeric_limits<double>::infinity();

Choice least_choice(const Box& box) {
  Choice choice;
  for (const auto& list : box.options) choice.push_back(list.front());
  return choice;
}

// Keeps the better of what was known and what is found now.
void sharpen(OpenBox& open, const Bounds& found) {
  for (std::size_t k = 0; k < open.bound.size() && k < found.objectives.size(); ++k) {
    if (!(found.objectives[k] > open.bound[k])) continue;  // NaN: nothing was found
    open.bound[k] = found.objectives[k];
    open.kinds[k] = k < found.kinds.size() ? found.kinds[k] : BoundKind::monotone;
  }
}

// Steps to the next member, last slot fastest; false after the last one.
bool advance(std::vector<std::size_t>& at, const Box& box) {
  for (std::size_t s = at.size(); s-- > 0;) {
    if (++at[s] < box.options[s].size()) return true;
    at[s] = 0;
  }
  return false;
}

}  // namespace

OpenBox open_box(Box box, int objectives) {
  OpenBox open;
  open.box = std::move(box);
  open.bound.assign(static_cast<std::size_t>(objectives), unknown);
  open.kinds.assign(static_cast<std::size_t>(objectives), BoundKind::exact);
  return open;
}

bool BoxTrial::discard(OpenBox& open, int depth, Verdict& verdict) const {
  const Bounds found = bounder_.bound(open.box, depth);
  if (found.broken >= 0) {
    verdict.fate = Fate::broken;
    verdict.check = found.broken;
    verdict.kind = found.broken_kind;
    return true;
  }
  if (found.undefined) {
    verdict.fate = Fate::undefined;
    return true;
  }
  sharpen(open, found);
  if (!found.corners.empty()) open.corners = found.corners;
  if (!rejects(open, BoundKind::monotone)) return depth == 1 && discard_by_questions(open, verdict);
  verdict.fate = Fate::dominated;
  // The strongest reasoning that suffices.
  verdict.kind = BoundKind::exact;
  for (const BoundKind kind : {BoundKind::theorem, BoundKind::monotone})
    if (!rejects(open, verdict.kind)) verdict.kind = kind;
  return true;
}

// Asks of each objective by itself whether the box can be as good in it as the front makes it have to be.
bool BoxTrial::discard_by_questions(const OpenBox& open, Verdict& verdict) const {
  for (int k = 0; k < static_cast<int>(open.bound.size()); ++k) {
    double value = open.corners.empty() ? front_.surely_rejected_from(open.bound, k) : unknown;
    for (std::vector<double> corner : open.corners) {
      for (std::size_t j = 0; j < corner.size(); ++j) corner[j] = std::max(corner[j], open.bound[j]);
      value = std::max(value, front_.surely_rejected_from(corner, k));
    }
    // Asked once for both: the front or the limit on it, whichever is the harder.
    const Bounder::Limit limit = bounder_.limit_on(k);
    const bool by_limit = limit.check >= 0 && !(value < limit.value);
    if (by_limit) value = limit.value;
    if (!std::isfinite(value) || !bounder_.out_of_reach(open.box, k, value)) continue;
    verdict.fate = by_limit ? Fate::broken : Fate::dominated;
    verdict.check = by_limit ? limit.check : -1;
    verdict.kind = BoundKind::monotone;
    return true;
  }
  return false;
}

// Takes out the options with which no member has a chance, whatever the others are.
void BoxTrial::shave(OpenBox& open, Tried& tried) const {
  for (auto& list : open.box.options) {
    if (list.size() < 2) continue;
    const std::vector<std::int32_t> all = list;
    const double share = open.box.members() / static_cast<double>(all.size());
    std::vector<std::int32_t> kept;
    for (const auto option : all) {
      list = {option};
      OpenBox slice = open;
      Tried::Shaved shaved;
      shaved.members = share;
      if (discard(slice, 0, shaved.verdict))
        tried.shaved.push_back(shaved);
      else
        kept.push_back(option);
    }
    list = kept;
    if (kept.empty()) return;
  }
}

// Whether the front rejects whatever the box can hold, by bounds of a kind no weaker than given.
bool BoxTrial::rejects(const OpenBox& open, BoundKind weakest) const {
  const Choice least = least_choice(open.box);
  std::vector<double> bound = open.bound;
  for (std::size_t k = 0; k < bound.size(); ++k)
    if (open.kinds[k] > weakest) bound[k] = unknown;
  if (open.corners.empty()) return front_.rejects(bound, least);
  return std::all_of(open.corners.begin(), open.corners.end(), [&](std::vector<double> corner) {
    for (std::size_t k = 0; k < corner.size(); ++k) corner[k] = std::max(corner[k], bound[k]);
    return front_.rejects(corner, least);
  });
}

Tried::Single BoxTrial::settle(const Choice& choice) const {
  Tried::Single single;
  single.choice = choice;
  single.fate = Fate::settled;
  single.seen = state_.seen(choice);
  if (state_.evaluated(choice)) {
    single.seen = true;
    return single;
  }
  single.look = state_.evaluator.look(choice);
  if (!single.look.broken.empty()) {
    single.fate = Fate::broken;
    single.check = single.look.broken.front();
  } else if (single.look.outcome != Outcome::compliant) {
    single.fate = Fate::undefined;
  } else if (front_.rejects(single.look.objectives, choice)) {
    single.fate = Fate::dominated;
  } else {
    Box box;
    for (const auto option : choice) box.options.push_back({option});
    OpenBox open = open_box(std::move(box), state_.evaluator.objective_count());
    // An evaluation costs more than the deepest bound.
    if (discard(open, 1, single)) return single;
    single.evaluation = state_.evaluator.evaluate(
        choice, [&](const std::vector<double>& objectives) { return front_.rejects(objectives, choice); });
  }
  return single;
}

void BoxTrial::settle(const Box& box, Tried& tried) const {
  tried.fate = Fate::settled;
  std::vector<std::size_t> at(box.options.size(), 0);
  do {
    Choice choice;
    for (std::size_t s = 0; s < at.size(); ++s) choice.push_back(box.options[s][at[s]]);
    tried.singles.push_back(settle(choice));
  } while (advance(at, box));
}

/// The split whose halves come nearest to being discarded, judged by what costs no solving; where none comes
/// nearer, that of the list whose options lie farthest apart.
std::pair<Box, Box> BoxTrial::split(const OpenBox& open, const FrontGauge& gauge) const {
  const Prospect now(bounder_, gauge, open.box, open.bound);
  int best_slot = splitter_.widest(open.box, gauge.extent());
  std::pair<Box, Box> best = splitter_.split(open.box, best_slot);
  if (open.box.members() <= few_members) return best;
  double least = now.work_left(best);
  for (int slot = 0; slot < static_cast<int>(open.box.options.size()); ++slot) {
    if (slot == best_slot || open.box.options[slot].size() < 2) continue;
    auto halves = splitter_.split(open.box, slot);
    const double left = now.work_left(halves);
    if (!(left < least)) continue;
    least = left;
    best = std::move(halves);
  }
  return best;
}

Tried BoxTrial::run(OpenBox open, const FrontGauge& gauge) const {
  Tried tried;
  if (state_.over()) return tried;
  tried.members = open.box.members();
  if (discard(open, 0, tried)) return tried;
  bounder_.reduce(open.box);
  tried.reduced = tried.members - open.box.members();
  shave(open, tried);
  tried.members = open.box.members();
  if (tried.members == 0) {
    tried.fate = Fate::shaved;
  } else if (discard(open, 1, tried) ||
             (tried.members > 1 && tried.members <= corner_members && discard(open, 2, tried))) {
  } else if (tried.members <= most_singles) {
    settle(open.box, tried);
  } else {
    tried.fate = Fate::split;
    auto halves = split(open, gauge);
    for (Box* half : {&halves.first, &halves.second})
      tried.halves.push_back(OpenBox{std::move(*half), open.bound, open.kinds, {}, open.weight / 2});
  }
  return tried;
}

}  // namespace dropfront::search
