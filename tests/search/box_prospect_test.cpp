// Which split brings the halves of a box nearer to being discarded.
#include "dropfront/search/box_prospect.hpp"

#include "support/catch.hpp"

using namespace dropfront::search;

namespace {

/// Two slots of four options, 0 to 3. The one objective is the sum of the options; the share of the one limit
/// is a tenth of the first slot's option plus what every design uses of it.
struct Sums : Bounder {
  double used = 0;
  Bounds bound(const Box& box, int) const override {
    Bounds bounds;
    bounds.objectives = {static_cast<double>(box.options[0].front() + box.options[1].front())};
    bounds.kinds = {BoundKind::exact};
    return bounds;
  }
  Bounds outlook(const Box& box) const override {
    Bounds bounds = bound(box, 0);
    bounds.shares = {used + 0.1 * box.options[0].front()};
    if (bounds.shares.front() > 1) bounds.broken = 0;
    return bounds;
  }
  double reduce(Box&) const override { return 0; }
};

const Box whole{{{0, 1, 2, 3}, {0, 1, 2, 3}}};
const std::pair<Box, Box> first{Box{{{0, 1}, {0, 1, 2, 3}}}, Box{{{2, 3}, {0, 1, 2, 3}}}};
const std::pair<Box, Box> second{Box{{{0, 1, 2, 3}, {0, 1}}}, Box{{{0, 1, 2, 3}, {2, 3}}}};

/// A front of one member with that objective, and an extent of 10.
struct Front {
  explicit Front(double objective) : archive({0.0}) { archive.insert({objective}, {0, 0}, 0); }
  FrontGauge gauge() const { return FrontGauge(archive, {10.0}); }
  ParetoArchive archive;
};

}  // namespace

TEST_CASE("A half nearer to a limit leaves less work, and so does one nearer to the front") {
  const Front front(8);
  const FrontGauge gauge = front.gauge();
  Sums sums;
  sums.used = 0.5;
  const std::vector<double> known{0.0};
  const Prospect prospect(sums, gauge, whole, known);
  // Both splits raise one half's objective by 2; only the first takes that half nearer to the limit.
  CHECK(prospect.work_left(first) < prospect.work_left(second));
  // Of two splits that the limit does not tell apart, none is better.
  sums.used = -10;
  const Prospect equal(sums, gauge, whole, known);
  CHECK(equal.work_left(second) == equal.work_left({second.second, second.first}));
}

TEST_CASE("A half that is discarded at once leaves nothing but the other") {
  const Front front(8);
  const FrontGauge gauge = front.gauge();
  Sums sums;
  const std::vector<double> known{0.0};
  const Prospect prospect(sums, gauge, whole, known);
  const double none = prospect.work_left({whole, whole});
  sums.used = 0.85;  // the upper half of the first slot now breaks the limit
  const Prospect broken(sums, gauge, whole, known);
  CHECK(broken.work_left(first) < broken.work_left(second));
  CHECK(broken.work_left(first) < none);
  // Behind the front: with a member at 2 the upper half of either slot holds nothing better.
  sums.used = -10;
  const Front near(2);
  const FrontGauge close = near.gauge();
  const Prospect dominated(sums, close, whole, known);
  CHECK(dominated.work_left(second) < none);
}

TEST_CASE("What is known of a box counts for its halves") {
  const Front front(8);
  const FrontGauge gauge = front.gauge();
  Sums sums;
  sums.used = -10;
  const std::vector<double> nothing{0.0}, beyond{9.0};
  const Prospect open(sums, gauge, whole, nothing);
  const Prospect closed(sums, gauge, whole, beyond);
  CHECK(closed.work_left(first) < open.work_left(first));
}
