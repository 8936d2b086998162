// An invented parts-list problem with bounds, for the tests of the proof. One set of formulas serves designs
// (numbers) and boxes (intervals). Rounding is monotone, so an interval of the same operations in the same
// order encloses the figure of every member to the bit.
#pragma once
#include <algorithm>
#include <cmath>
#include <limits>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/search/search.hpp"
#include "search/toy_lists.hpp"

namespace toy {

struct Interval {
  double low, high;
};
inline Interval operator+(Interval a, Interval b) { return {a.low + b.low, a.high + b.high}; }
inline Interval operator-(Interval a, Interval b) { return {a.low - b.high, a.high - b.low}; }
inline Interval operator*(Interval a, Interval b) {
  const auto ends = std::minmax({a.low * b.low, a.low * b.high, a.high * b.low, a.high * b.high});
  return {ends.first, ends.second};
}
/// Of positive b.
inline Interval operator/(Interval a, Interval b) {
  const auto ends = std::minmax({a.low / b.low, a.low / b.high, a.high / b.low, a.high / b.high});
  return {ends.first, ends.second};
}
inline double root(double x) { return std::sqrt(x); }
inline Interval root(Interval x) { return {std::sqrt(x.low), std::sqrt(x.high)}; }

/// What can be wrong with bounds; `none` is right.
enum class Fault {
  none,
  cost_high,       ///< the greatest cost of a box for the least
  area_high,       ///<
  loss_high,       ///<
  question_low,    ///< the same where it is asked for by out_of_reach()
  margin_low,      ///< the least margin for the greatest
  broken_by_any,   ///< a limit that some member breaks
  unknown_breaks,  ///< a missing rating taken for a broken limit of the whole box
  window_swapped,  ///< the two sides of a window exchanged
  reduce_rating,   ///< a part replaced whatever its rating
  reduce_dearer,   ///< a part replaced by a dearer one
  reduce_first     ///< of parts the objectives do not tell apart the later one stays
};

struct BoxPart {
  double value = 1, loss = 1;
  int price = 0, area = 0;  ///< integers: sums are exact and ties abound
  double rating = 0;        ///< NaN: not given
};

struct ProofShape {
  std::uint64_t seed = 1;
  std::vector<int> sizes{2, 4, 6, 5, 4, 4, 3};  ///< one a slot, see slot names
  int objectives = 4;                           ///< 1: cost; 2: + loss; 3: + area; 4: + margin
  double resolution = 0;
  double least_margin = 0.1;
};

/// Slots: arrangement (category), stage (category in groups of two), dropper, resistor, clamp, reservoir,
/// maker (no say in the circuit). Ratings, prices and areas do not sort with the values; some rows are copies
/// of others, some ratings are not given, and some reservoirs make the loss not a number.
class ProofLists : public Evaluator, public Bounder {
 public:
  explicit ProofLists(const ProofShape& shape, Fault fault = Fault::none);

  const Space& space() const override { return space_; }
  int objective_count() const override { return shape_.objectives; }
  const std::vector<double>& resolution() const override { return resolution_; }
  const std::vector<std::string>& check_names() const override { return names_; }
  Evaluation look(const Choice& c) const override;
  Evaluation evaluate(const Choice& c, const Dominated& dominated) const override;
  Evaluation relaxed(const Choice& categories, const std::vector<double>& position) const override;
  Bounds bound(const Box& box, int depth) const override;
  bool out_of_reach(const Box& box, int objective, double value) const override;
  double reduce(Box& box) const override;

 private:
  template <class T>
  struct Figures {
    T cost, loss, area, margin;
    std::vector<T> stress;  ///< one a check, allowed up to the rating of its part or the limit
  };
  template <class T>
  struct Values {
    T value[7], loss[7], price[7], area[7];
  };
  template <class T>
  Figures<T> figures(const Values<T>& v, double way) const;
  std::vector<double> objectives(const Figures<double>& f) const;
  Values<double> values_of(const Choice& c) const;
  Values<Interval> values_of(const Box& box) const;
  /// Ratings that check k allows: of the part, or a limit; NaN: not given.
  double allowed(int check, const Choice& c) const;
  Interval allowed(int check, const Box& box, bool& all_given) const;
  bool replaces(int slot, int better, int worse, const Figures<Interval>& f) const;

  ProofShape shape_;
  Fault fault_;
  Space space_;
  std::vector<std::vector<BoxPart>> parts_;
  std::vector<double> resolution_;
  std::vector<std::string> names_{"resistor.power", "clamp.power", "reservoir.voltage", "rail.min",
                                  "rail.max",       "margin",      "dropper.voltage"};
};

}  // namespace toy
