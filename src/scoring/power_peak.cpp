#include "dropfront/scoring/power_peak.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::scoring {

namespace {
constexpr double kGolden = 0.3819660112501051;  // (3 - sqrt 5)/2

/// Vertex of the parabola through three points, or `otherwise` where it bends upward or is flat.
double vertex(const Peak& a, const Peak& b, const Peak& c, double otherwise) {
  const double left = (b.x - a.x) * (b.value - c.value);
  const double right = (b.x - c.x) * (b.value - a.value);
  const double bend = 2 * (left - right);
  if (!(std::abs(bend) > 0)) return otherwise;
  const double x = b.x - ((b.x - a.x) * left - (b.x - c.x) * right) / bend;
  return std::isfinite(x) ? x : otherwise;
}
}  // namespace

Peak find_peak(const std::function<double(double)>& f, double low, double high, double tolerance,
               int most_calls) {
  Peak a{low, f(low)};
  Peak c{high, f(high)};
  Peak b{low + kGolden * (high - low), 0};
  b.value = f(b.x);
  int calls = 3;
  while (calls < most_calls && c.x - a.x > tolerance) {
    const bool wider_right = c.x - b.x > b.x - a.x;
    const double golden = wider_right ? b.x + kGolden * (c.x - b.x) : b.x - kGolden * (b.x - a.x);
    double x = golden;
    if (b.value >= a.value && b.value >= c.value && calls % 3 != 0) {
      x = vertex(a, b, c, golden);  // every third step is golden, so that both sides shrink
      if (std::abs(x - b.x) < 0.25 * tolerance) x = b.x + (wider_right ? 0.25 : -0.25) * tolerance;
      if (!(x > a.x && x < c.x)) x = golden;
    }
    const Peak tried{x, f(x)};
    ++calls;
    const bool right = tried.x > b.x;
    if (tried.value >= b.value) {
      (right ? a : c) = b;
      b = tried;
    } else {
      (right ? c : a) = tried;
    }
  }
  Peak best = b;
  for (const auto& end : {a, c}) {
    if (end.value > best.value) best = end;
  }
  return best;
}

}  // namespace dropfront::scoring
