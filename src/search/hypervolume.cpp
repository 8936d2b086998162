#include "dropfront/search/hypervolume.hpp"

#include <algorithm>
#include <map>

#include "dropfront/search/objective_key.hpp"

namespace dropfront::search {
namespace {

using Points = std::vector<std::vector<double>>;

double area(Points points, const std::vector<double>& reference) {
  std::sort(points.begin(), points.end());
  double sum = 0;
  double height = reference[1];
  for (const auto& p : points) {
    if (!(p[1] < height)) continue;
    sum += (reference[0] - p[0]) * (height - p[1]);
    height = p[1];
  }
  return sum;
}

// The staircase x -> y of the points swept so far, x ascending and y descending, and the area below the
// reference that it dominates.
class Staircase {
 public:
  Staircase(double x_end, double y_end) : x_end_(x_end), y_end_(y_end) {}

  void add(double x, double y) {
    auto right = steps_.lower_bound(x);
    if (right != steps_.end() && right->first == x && right->second <= y) return;
    double top = y_end_;
    if (right != steps_.begin()) {
      top = std::prev(right)->second;
      if (top <= y) return;
    }
    double from = x;
    double gained = 0;
    while (right != steps_.end() && y <= right->second) {
      gained += (right->first - from) * (top - y);
      top = right->second;
      from = right->first;
      right = steps_.erase(right);
    }
    const double to = right == steps_.end() ? x_end_ : right->first;
    gained += (to - from) * (top - y);
    steps_[x] = y;
    area_ += gained;
  }
  double area() const { return area_; }

 private:
  double x_end_, y_end_, area_ = 0;
  std::map<double, double> steps_;
};

double volume(Points points, const std::vector<double>& reference) {
  std::sort(points.begin(), points.end(),
            [](const auto& a, const auto& b) { return a[2] != b[2] ? a[2] < b[2] : a < b; });
  Staircase staircase(reference[0], reference[1]);
  double sum = 0;
  for (std::size_t i = 0; i < points.size(); ++i) {
    staircase.add(points[i][0], points[i][1]);
    const double next = i + 1 < points.size() ? points[i + 1][2] : reference[2];
    sum += staircase.area() * (next - points[i][2]);
  }
  return sum;
}

// In lexicographic order nothing dominates an earlier point.
Points non_dominated(Points points) {
  std::sort(points.begin(), points.end());
  Points kept;
  for (auto& p : points)
    if (std::none_of(kept.begin(), kept.end(), [&](const auto& q) { return q == p || dominates(q, p); }))
      kept.push_back(std::move(p));
  return kept;
}

double any_dimension(Points points, const std::vector<double>& reference);

// What p adds to the points after it: its own box less what they cover of it.
double exclusive(const Points& points, std::size_t i, const std::vector<double>& reference) {
  const auto& p = points[i];
  double box = 1;
  for (std::size_t k = 0; k < p.size(); ++k) box *= reference[k] - p[k];
  Points limited;
  for (std::size_t j = i + 1; j < points.size(); ++j) {
    limited.push_back(p);
    for (std::size_t k = 0; k < p.size(); ++k) limited.back()[k] = std::max(p[k], points[j][k]);
  }
  if (limited.empty()) return box;
  return box - any_dimension(std::move(limited), reference);
}

double any_dimension(Points points, const std::vector<double>& reference) {
  if (points.empty()) return 0;
  const std::size_t d = reference.size();
  if (d == 1) return reference[0] - (*std::min_element(points.begin(), points.end()))[0];
  if (d == 2) return area(std::move(points), reference);
  if (d == 3) return volume(std::move(points), reference);
  points = non_dominated(std::move(points));
  // Worst last value first: then every limited set is flat in that value and one dimension is saved.
  std::sort(points.begin(), points.end(),
            [](const auto& a, const auto& b) { return a.back() != b.back() ? a.back() > b.back() : a < b; });
  const std::vector<double> below(reference.begin(), reference.end() - 1);
  double sum = 0;
  for (std::size_t i = 0; i < points.size(); ++i) {
    const double depth = reference.back() - points[i].back();
    Points flat;
    for (std::size_t j = i; j < points.size(); ++j) flat.emplace_back(points[j].begin(), points[j].end() - 1);
    // Points after i have a last value no greater, so within the slab of p only the first d - 1 values count.
    sum += depth * exclusive(flat, 0, below);
  }
  return sum;
}

}  // namespace

double hypervolume(const std::vector<std::vector<double>>& points, const std::vector<double>& reference) {
  Points inside;
  for (const auto& p : points) {
    bool below = true;
    for (std::size_t k = 0; k < reference.size(); ++k) below = below && p[k] < reference[k];
    if (below) inside.push_back(p);
  }
  return any_dimension(std::move(inside), reference);
}

}  // namespace dropfront::search
