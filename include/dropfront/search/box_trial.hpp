#pragma once
#include <optional>
#include <vector>

#include "dropfront/search/box_split.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// A box that waits, with the best bound known of it (its own or that of a box around it).
struct OpenBox {
  Box box;
  std::vector<double> bound;                 ///< one an objective; -infinity: not known
  std::vector<BoundKind> kinds;              ///< of each
  std::vector<std::vector<double>> corners;  ///< see Bounds
  double weight = 1;  ///< share of the work it is guessed to be: half of that of the box it is half of
};

/// A box of which nothing is known.
OpenBox open_box(Box box, int objectives);

enum class Fate {
  untried,    ///< the end came first: its batch does not count
  broken,     ///< every member breaks a limit
  undefined,  ///< every member lacks a figure
  dominated,  ///< the front dominates what any member could be at best
  shaved,     ///< nothing was left of it after single options were discarded
  split,      ///< in two halves
  settled     ///< design by design; of a design: evaluated
};

/// What became of a box or a design, and why.
struct Verdict {
  Fate fate = Fate::untried;
  int check = -1;                     ///< fate broken: the limit
  BoundKind kind = BoundKind::exact;  ///< of the reasoning that discarded it
};

/// What was done with one box.
struct Tried : Verdict {
  double reduced = 0;  ///< members dropped first
  struct Shaved {
    Verdict verdict;
    double members = 0;
  };
  std::vector<Shaved> shaved;   ///< members discarded next, option by option
  double members = 0;           ///< those that remained
  std::vector<OpenBox> halves;  ///< fate split
  struct Single : Verdict {
    Choice choice;
    bool seen = false;  ///< looked at before the proof
    Evaluation look;    ///< empty when evaluated before the proof
    std::optional<Evaluation> evaluation;
  };
  std::vector<Single> singles;  ///< fate settled
};

/// Tries boxes against a front that stays as it is meanwhile. Safe from several threads at once.
class BoxTrial {
 public:
  BoxTrial(const SearchState& state, const Bounder& bounder, const BoxSplitter& splitter)
      : state_(state), bounder_(bounder), splitter_(splitter), front_(state.ledger.front()) {}

  /// `gauge`: of the front as it is.
  Tried run(OpenBox open, const FrontGauge& gauge) const;

  /// Boxes of at most so many members are settled design by design.
  static constexpr int most_singles = 2;

 private:
  bool discard(OpenBox& open, int depth, Verdict& verdict) const;
  void shave(OpenBox& open, Tried& tried) const;
  bool discard_by_questions(const OpenBox& open, Verdict& verdict) const;
  bool rejects(const OpenBox& open, BoundKind weakest) const;
  std::pair<Box, Box> split(const OpenBox& open, const FrontGauge& gauge) const;
  void settle(const Box& box, Tried& tried) const;
  Tried::Single settle(const Choice& choice) const;

  const SearchState& state_;
  const Bounder& bounder_;
  const BoxSplitter& splitter_;
  const ParetoArchive& front_;
};

}  // namespace dropfront::search
