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
  Prover(Session& session, const Bounder& bounder)
      : session_(session),
        bounder_(bounder),
        splitter_(session.evaluator),
        trial_(session, bounder, splitter_) {
    proof_.broken.resize(session.evaluator.check_names().size());
    for (Box& box : splitter_.roots())
      open_.push_back(open_box(std::move(box), session.evaluator.objective_count()));
    for (OpenBox& box : open_) box.weight = 1 / static_cast<double>(open_.size());
    // The stack is taken from its end: first things first.
    std::reverse(open_.begin(), open_.end());
    proof_.space = session.space.size();
  }

  Proof run() {
    while (!open_.empty() && !session_.ended()) {
      const std::size_t count = std::min({proof_batch, open_.size(), affordable()});
      if (count == 0) {
        session_.looks_refused = true;
        break;
      }
      batch(count);
      double waiting = 0;
      for (const OpenBox& box : open_) waiting += box.weight;
      session_.report("prove", 1 - waiting);
    }
    proof_.complete = open_.empty();
    proof_.open_boxes = static_cast<std::int64_t>(open_.size());
    for (const OpenBox& box : open_) leave(box);
    return std::move(proof_);
  }

 private:
  // Boxes that the budget still pays for, each with all it may look at.
  std::size_t affordable() const {
    const std::int64_t left = session_.plan.looks - session_.ledger.counts().looked - proof_.boxes;
    if (!session_.options.budget) return proof_batch;
    return static_cast<std::size_t>(std::max<std::int64_t>(0, left / (1 + BoxTrial::most_singles)));
  }

  void batch(std::size_t count) {
    std::vector<OpenBox> boxes;
    for (; boxes.size() < count; open_.pop_back()) boxes.push_back(std::move(open_.back()));
    const std::vector<double> extent = session_.gauge().extent();
    std::vector<Tried> tried(count);
    session_.workers.for_each(count, 1,
                              [&](std::size_t i) { tried[i] = trial_.run(std::move(boxes[i]), extent); });
    for (Tried& one : tried) merge(one);
    // What the first box fell into comes to the end of the stack, so that it is taken up first.
    for (std::size_t i = count; i-- > 0;) {
      for (std::size_t h = tried[i].halves.size(); h-- > 0;) open_.push_back(std::move(tried[i].halves[h]));
      if (tried[i].fate == Fate::untried) open_.push_back(std::move(tried[i].rest));
    }
  }

  void merge(const Tried& tried) {
    if (tried.fate == Fate::untried) return;
    ++proof_.boxes;
    proof_.reduced[index(bounder_.reduce_kind())] += tried.reduced;
    for (const Tried::Shaved& shaved : tried.shaved) count(shaved.verdict, shaved.members);
    if (tried.fate == Fate::settled)
      for (const Tried::Single& single : tried.singles) merge(single);
    else
      count(tried, tried.members);
  }

  void merge(const Tried::Single& single) {
    Ledger& ledger = session_.ledger;
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

  Session& session_;
  const Bounder& bounder_;
  BoxSplitter splitter_;
  BoxTrial trial_;
  Proof proof_;
  std::vector<OpenBox> open_;  ///< a stack
};

}  // namespace

bool worth_proving(const Session& session) {
  return session.options.prove || session.space.size() <= static_cast<double>(session.plan.proof_limit);
}

Proof prove(Session& session, const Bounder& bounder) { return Prover(session, bounder).run(); }

}  // namespace dropfront::search
