#pragma once
#include <optional>
#include <vector>

#include "dropfront/search/box_split.hpp"
#include "dropfront/search/session.hpp"

namespace dropfront::search {

/// A box that waits, with the best bound known of it (its own or that of a box around it).
struct OpenBox {
  Box box;
  std::vector<double> bound;     ///< one an objective; -infinity: not known
  std::vector<BoundKind> kinds;  ///< of each
};

/// A box of which nothing is known.
OpenBox open_box(Box box, int objectives);

/// What was done with one box.
struct Tried {
  enum class Fate { untried, broken, undefined, dominated, split, settled };
  Fate fate = Fate::untried;
  double reduced = 0;                 ///< members dropped first
  double members = 0;                 ///< those that remained
  int check = -1;                     ///< the limit that all break
  BoundKind kind = BoundKind::exact;  ///< of the reasoning that discarded it
  std::vector<OpenBox> halves;        ///< fate split
  OpenBox rest;                       ///< fate untried: the box as it is now
  struct Single {
    Choice choice;
    bool seen = false;       ///< looked at before the proof
    bool evaluated = false;  ///< evaluated before the proof
    Evaluation look;
    bool rejected = false;                 ///< by the front, from its look
    std::optional<Evaluation> evaluation;  ///< neither of the three
  };
  std::vector<Single> singles;  ///< fate settled
};

/// Tries boxes against a front that stays as it is meanwhile. Safe from several threads at once.
class BoxTrial {
 public:
  BoxTrial(const Session& session, const Bounder& bounder, const BoxSplitter& splitter)
      : session_(session), bounder_(bounder), splitter_(splitter), front_(session.ledger.front()) {}

  /// `extent`: see BoxSplitter::widest.
  Tried run(OpenBox open, const std::vector<double>& extent) const;

  /// Boxes of at most so many members are settled design by design.
  static constexpr int most_singles = 8;

 private:
  bool discard(OpenBox& open, int depth, Tried& tried) const;
  void settle(const Box& box, Tried& tried) const;

  const Session& session_;
  const Bounder& bounder_;
  const BoxSplitter& splitter_;
  const ParetoArchive& front_;
};

}  // namespace dropfront::search
