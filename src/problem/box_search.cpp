#include "dropfront/problem/box_search.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/search/nlopt_run.hpp"
#include "dropfront/search/sequence.hpp"

namespace dropfront::problem {
namespace {

/// Tries points and keeps the worst.
class Hunt {
 public:
  Hunt(const scoring::ToleranceBox& box, scoring::BoxQuantity quantity, int evaluations)
      : box_(box), sign_(scoring::least_counts(quantity) ? 1 : -1), left_(evaluations) {}

  int left() const { return left_; }
  /// The quantity so signed that less is worse; the penalty where there is no answer.
  double tried(const std::vector<double>& position) {
    if (left_ <= 0) return search::penalty_cap;
    --left_;
    ++worst_.evaluations;
    const auto value = box_.at(position);
    if (!value) return search::penalty_cap;
    if (!worst_.value || sign_ * *value < sign_ * *worst_.value) {
      worst_.value = value;
      worst_.position = position;
    }
    return sign_ * *value;
  }
  /// One NLopt run on a scale of its own, so that tolerances mean the same for volts and milliamperes.
  void run(search::NloptMethod method, const std::vector<double>& start, int evaluations,
           std::uint64_t seed) {
    if (evaluations < 1 || left_ <= 0) return;
    search::NloptRequest request;
    request.method = method;
    request.low.assign(start.size(), 0);
    request.high.assign(start.size(), 1);
    request.start = start;
    request.max_evaluations = std::min(evaluations, left_);
    request.initial_step = 0.3;
    request.x_tolerance = 1e-3;
    request.seed = seed;
    const double scale = worst_.value ? std::max(1e-12, std::abs(*worst_.value)) : 1;
    search::run_nlopt(request, [&](const std::vector<double>& x) { return tried(x) / scale; });
  }
  BoxWorst& worst() { return worst_; }

 private:
  const scoring::ToleranceBox& box_;
  double sign_;
  int left_;
  BoxWorst worst_;
};

}  // namespace

BoxWorst search_box(const scoring::ToleranceBox& box, scoring::BoxQuantity quantity, int evaluations,
                    std::uint64_t seed) {
  Hunt hunt(box, quantity, evaluations);
  const std::vector<double> corner = box.corner();
  const double at_corner = hunt.tried(corner);
  std::vector<double> joined = corner;
  for (std::size_t k = 0; k < corner.size(); ++k) {
    std::vector<double> turned = corner;
    turned[k] = 1 - turned[k];
    if (hunt.tried(turned) < at_corner) joined[k] = turned[k];
  }
  if (joined != corner) hunt.tried(joined);
  if (corner.empty()) return hunt.worst();
  const std::vector<double> start = hunt.worst().value ? hunt.worst().position : corner;
  hunt.run(search::NloptMethod::bobyqa, start, (2 * hunt.left() + 2) / 3, seed);
  hunt.run(search::NloptMethod::sbplx, search::spread_point(1, static_cast<int>(corner.size()), seed),
           hunt.left(), seed);
  return hunt.worst();
}

}  // namespace dropfront::problem
