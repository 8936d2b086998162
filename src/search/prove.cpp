#include "dropfront/search/prove.hpp"

#include <algorithm>
#include <limits>
#include <utility>

#include "dropfront/search/box_trial.hpp"

namespace dropfront::search {
namespace {

std::size_t index(BoundKind kind) { return static_cast<std::size_t>(kind); }

class Prover {
 public:
  Prover(SearchState& state, const Bounder& bounder)
      : state_(state), bounder_(bounder), splitter_(state.evaluator), trial_(state, bounder, splitter_) {
    proof_.broken.resize(state.evaluator.check_names().size());
    for (Box& box : splitter_.roots())
      open_.push_back(open_box(std::move(box), state.evaluator.objective_count()));
    for (OpenBox& box : open_) box.weight = 1 / static_cast<double>(open_.size());
    // The stack is taken from its end: first things first.
    std::reverse(open_.begin(), open_.end());
    proof_.space = state.space.size();
  }

  Proof run() {
    while (!open_.empty() && !state_.ended()) {
      const std::size_t count = std::min({proof_batch, open_.size(), affordable()});
      if (count == 0) {
        state_.looks_refused = true;
        break;
      }
      if (!batch(count)) break;
      double waiting = 0;
      for (const OpenBox& box : open_) waiting += box.weight;
      state_.report("prove", 1 - waiting);
    }
    proof_.complete = open_.empty();
    proof_.open_boxes = static_cast<std::int64_t>(open_.size());
    for (const OpenBox& box : open_) leave(box);
    return std::move(proof_);
  }

 private:
  // Boxes that the budget still pays for, each with all it may look at.
  std::size_t affordable() const {
    const std::int64_t left = state_.plan.looks - state_.ledger.counts().looked - proof_.boxes;
    if (!state_.options.budget) return proof_batch;
    return static_cast<std::size_t>(std::max<std::int64_t>(0, left / (1 + BoxTrial::most_singles)));
  }

  // False when the end came first: then everything is as before, for which boxes were tried by then depends
  // on the threads' timing.
  bool batch(std::size_t count) {
    std::vector<OpenBox> boxes;
    for (; boxes.size() < count; open_.pop_back()) boxes.push_back(std::move(open_.back()));
    const FrontGauge gauge = state_.gauge();
    std::vector<Tried> tried(count);
    state_.workers.for_each(count, 1, [&](std::size_t i) { tried[i] = trial_.run(boxes[i], gauge); });
    if (state_.ended()) {
      for (; !boxes.empty(); boxes.pop_back()) open_.push_back(std::move(boxes.back()));
      return false;
    }
    for (Tried& one : tried) merge(one);
    // What the first box fell into comes to the end of the stack, so that it is taken up first.
    for (std::size_t i = count; i-- > 0;) {
      for (std::size_t h = tried[i].halves.size(); h-- > 0;) open_.push_back(std::move(tried[i].halves[h]));
    }
    return true;
  }

  void merge(const Tried& tried) {
    ++proof_.boxes;
    proof_.reduced[index(bounder_.reduce_kind())] += tried.reduced;
    for (const Tried::Shaved& shaved : tried.shaved) count(shaved.verdict, shaved.members);
    if (tried.fate == Fate::settled)
      for (const Tried::Single& single : tried.singles) merge(single);
    else
      count(tried, tried.members);
  }

  void merge(const Tried::Single& single) {
    Ledger& ledger = state_.ledger;
    count(single, 1);
    if (!single.seen) ledger.look(single.choice, single.look);
    if (single.evaluation) ledger.merge(single.choice, *single.evaluation);
  }

  void count(const Verdict& verdict, double members) {
    switch (verdict.fate) {
      case Fate::broken:
        proof_.broken[verdict.check][index(verdict.kind)] += members;
        break;
      case Fate::undefined:
        proof_.undefined += members;
        break;
      case Fate::dominated:
        proof_.dominated[index(verdict.kind)] += members;
        break;
      case Fate::settled:
        proof_.scored += members;
        break;
      case Fate::untried:
      case Fate::shaved:
      case Fate::split:
        break;
    }
  }

  void leave(const OpenBox& open) {
    proof_.left += open.box.members();
    proof_.open_bounds.resize(open.bound.size(), std::numeric_limits<double>::infinity());
    for (std::size_t k = 0; k < open.bound.size(); ++k)
      proof_.open_bounds[k] = std::min(proof_.open_bounds[k], open.bound[k]);
  }

  SearchState& state_;
  const Bounder& bounder_;
  BoxSplitter splitter_;
  BoxTrial trial_;
  Proof proof_;
  std::vector<OpenBox> open_;  ///< a stack
};

}  // namespace

bool worth_proving(const SearchState& state) {
  return state.options.prove || state.space.size() <= static_cast<double>(state.plan.proof_limit);
}

Proof prove(SearchState& state, const Bounder& bounder) { return Prover(state, bounder).run(); }

}  // namespace dropfront::search
