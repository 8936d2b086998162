#pragma once
#include <utility>
#include <vector>

#include "dropfront/search/box.hpp"
#include "dropfront/search/evaluation.hpp"

namespace dropfront::search {

/// How a space falls into boxes: where to begin, which list to split and where.
class BoxSplitter {
 public:
  /// Looks at one design an option, to learn how far options lie apart in the objectives a look tells.
  explicit BoxSplitter(const Evaluator& evaluator);

  /// One box for each combination of groups (see Slot): disjoint, together the whole space. None when a slot
  /// offers nothing.
  std::vector<Box> roots() const;

  /// The slot whose options lie farthest apart, or -1 for a single design. The distance is that of the
  /// coordinates (natural logarithms of values) plus that of what looks tell, as shares of `extent` (one an
  /// objective: what counts as a large difference).
  int widest(const Box& box, const std::vector<double>& extent) const;

  /// Two halves of a list of at least two options: at the middle of its coordinates, of its looks where those
  /// are equal, of its numbers where these are equal too.
  std::pair<Box, Box> split(const Box& box, int slot) const;

 private:
  struct Place {
    double coordinate = 0;
    std::vector<double> known;  ///< by objective; 0 where a look does not tell
  };
  double spread(int slot, const std::vector<std::int32_t>& options, const std::vector<double>& extent) const;

  const Space& space_;
  std::vector<std::vector<Place>> places_;  ///< slot, option
};

}  // namespace dropfront::search
