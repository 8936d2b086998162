// An invented parts-list problem for the tests: smooth physics under noisy prices and ratings, as in real
// lists.
#pragma once
#include <algorithm>
#include <atomic>
#include <cmath>
#include <cstdint>
#include <limits>
#include <map>
#include <string>
#include <vector>

#include "dropfront/search/objective_key.hpp"
#include "dropfront/search/search.hpp"

namespace toy {

using namespace dropfront::search;

struct Random {
  std::uint64_t state;
  double uniform() {
    state += 0x9e3779b97f4a7c15u;
    std::uint64_t h = state;
    h = (h ^ (h >> 30)) * 0xbf58476d1ce4e5b9u;
    h = (h ^ (h >> 27)) * 0x94d049bb133111ebu;
    return static_cast<double>((h ^ (h >> 31)) >> 11) * 0x1p-53;
  }
  double between(double a, double b) { return a + (b - a) * uniform(); }
};

struct Part {
  double value = 1, price = 0, area = 0, rating = 0, loss = 0;
};

struct Shape {
  std::uint64_t seed = 1;
  int arrangements = 2, droppers = 12, resistors = 8, clamps = 6, reservoirs = 6, chains = 2;
  int objectives = 4;     ///< 1: cost; 2: cost, loss; 3: + area; 4: + margin
  double resolution = 0;  ///< in shares of 1 (all objectives are of that order)
  double least_margin = 0.0;
  double most_loss = 1e9;
};

/// Slots: arrangement (category), dropper, resistor, clamp, reservoir (axes), chain (none).
class Lists : public Evaluator {
 public:
  explicit Lists(const Shape& shape) : shape_(shape) {
    Random random{shape.seed * 977 + 5};
    const int sizes[] = {shape.arrangements, shape.droppers,   shape.resistors,
                         shape.clamps,       shape.reservoirs, shape.chains};
    const double least[] = {0, 0.1, 20, 5, 20, 0};
    const double most[] = {0, 3.0, 400, 40, 1000, 0};
    const char* names[] = {"arrangement", "dropper", "resistor", "clamp", "reservoir", "chain"};
    for (int s = 0; s < 6; ++s) {
      Slot slot;
      slot.name = names[s];
      slot.size = sizes[s];
      slot.category = s == 0;
      std::vector<Part> parts;
      for (int i = 0; i < sizes[s]; ++i) {
        Part part;
        const bool axis = s >= 1 && s <= 4;
        // Two options at most coordinates: a dear one with a better rating and a cheap one.
        const int steps = std::max(1, (sizes[s] + 1) / 2 - 1);
        const double u = axis ? std::min(1.0, (i / 2) / static_cast<double>(steps)) : 0;
        if (axis) {
          part.value = least[s] * std::pow(most[s] / least[s], u);
          slot.coordinate.push_back(std::log(part.value));
        }
        part.rating = (i % 2 ? 1.0 : 0.6) * random.between(0.8, 1.2);
        part.price = (0.1 + 0.25 * u + 0.1 * part.rating) * random.between(0.85, 1.25);
        part.area = (0.1 + 0.4 * u) * random.between(0.85, 1.25);
        part.loss = random.between(0.9, 1.1);
        parts.push_back(part);
      }
      space_.slots.push_back(slot);
      parts_.push_back(parts);
    }
    space_.coupled = {{1, 2}, {3, 4}};
    resolution_.assign(shape.objectives, shape.resolution);
  }

  const Space& space() const override { return space_; }
  int objective_count() const override { return shape_.objectives; }
  const std::vector<double>& resolution() const override { return resolution_; }
  const std::vector<std::string>& check_names() const override { return names_; }

  Evaluation look(const Choice& c) const override {
    ++looks;
    const std::vector<Part> p = take(c);
    Evaluation e;
    e.outcome = Outcome::compliant;
    const std::vector<double> all{price(p), nan(), area(p), nan()};
    e.objectives.assign(all.begin(), all.begin() + shape_.objectives);
    need(e, 0, p[4].rating * 45, p[3].value);  // reservoir voltage against the clamp
    return e;
  }

  Evaluation evaluate(const Choice& c, const Dominated& dominated) const override {
    ++evaluations;
    const std::vector<Part> p = take(c);
    Evaluation e = look(c);
    --looks;
    const std::vector<double> exact = objectives(p, c[0]);
    const auto stop = [&] {
      if (!dominated) return false;
      if (!e.broken.empty()) return true;
      return dominated(e.objectives);
    };
    const auto unfinished = [&e] {
      e.complete = false;
      return e;
    };
    if (stop()) return unfinished();
    if (shape_.objectives == 4) e.objectives[3] = exact[3];
    need(e, 1, -exact[3], shape_.least_margin);
    if (stop()) return unfinished();
    if (shape_.objectives >= 2) e.objectives[1] = exact[1];
    need(e, 2, shape_.most_loss, exact[1]);
    if (stop()) return unfinished();
    for (const auto& [check, have, want] : stresses(p)) {
      need(e, check, have, want);
      if (stop()) return unfinished();
    }
    return e;
  }

  Evaluation relaxed(const Choice& categories, const std::vector<double>& position) const override {
    ++relaxations;
    std::vector<Part> p(6);
    p[0] = parts_[0][categories[0]];
    p[5] = parts_[5][0];
    for (int s = 1; s <= 4; ++s) {
      const auto& list = parts_[s];
      const double low = std::log(list.front().value);
      const double high = std::log(list.back().value);
      const double u = position[s - 1];
      p[s].value = std::exp(low + u * (high - low));
      p[s].rating = 0.9;
      p[s].price = 0.19 + 0.25 * u;
      p[s].area = 0.1 + 0.4 * u;
      p[s].loss = 1;
    }
    Evaluation e;
    e.outcome = Outcome::compliant;
    const std::vector<double> all = objectives(p, categories[0]);
    e.objectives.assign(all.begin(), all.begin() + shape_.objectives);
    need(e, 0, p[4].rating * 45, p[3].value);
    need(e, 1, -all[3], shape_.least_margin);
    need(e, 2, shape_.most_loss, all[1]);
    for (const auto& [check, have, want] : stresses(p)) need(e, check, have, want);
    return e;
  }

  Evaluation exact(const Choice& c) const { return evaluate(c, Dominated{}); }

  mutable std::atomic<long> looks{0}, evaluations{0}, relaxations{0};

 private:
  struct Stress {
    int check;
    double have, want;
  };
  static double nan() { return std::numeric_limits<double>::quiet_NaN(); }

  std::vector<Part> take(const Choice& c) const {
    std::vector<Part> p;
    for (std::size_t s = 0; s < c.size(); ++s) p.push_back(parts_[s][c[s]]);
    return p;
  }
  static double price(const std::vector<Part>& p) {
    double sum = 0;
    for (const Part& part : p) sum += part.price;
    return sum;
  }
  static double area(const std::vector<Part>& p) {
    double sum = 0;
    for (const Part& part : p) sum += part.area;
    return sum;
  }
  // A dropper's current less what the ripple eats; the clamp burns what is not used.
  static std::vector<double> objectives(const std::vector<Part>& p, int arrangement) {
    const double way = arrangement % 2 ? 1.8 : 1.0;
    const double current = way * p[1].value / (1 + 0.0015 * p[2].value * p[1].value) * (1 - p[3].value / 120);
    const double ripple = 8 * current / std::sqrt(p[4].value);
    const double margin = current - 0.15 * ripple - 4 / p[3].value;
    const double loss = 0.15 * current * p[3].value / 12 * p[1].loss +
                        0.0012 * p[2].value * current * current * p[2].loss + 0.05 * p[5].loss +
                        0.02 * (arrangement % 3);
    return {price(p), loss, area(p), -margin};
  }
  static std::vector<Stress> stresses(const std::vector<Part>& p) {
    return {
        {3, p[2].rating * 2.0, 0.004 * p[2].value * p[1].value * p[1].value + 3.0 / std::sqrt(p[2].value)},
        {4, p[3].rating * 3.0, p[1].value * p[3].value / 20},
        {5, p[1].rating * 1.3, 1.0 + 2.0 / p[2].value}};
  }
  static void need(Evaluation& e, int check, double have, double want) {
    if (have >= want) return;
    const double shortfall = (want - have) / std::max(1e-9, std::abs(want));
    e.outcome = Outcome::breaks_limits;
    e.violation += shortfall;
    e.broken.push_back(static_cast<std::int16_t>(check));
    e.shortfall.push_back(shortfall);
  }

  Shape shape_;
  Space space_;
  std::vector<std::vector<Part>> parts_;
  std::vector<double> resolution_;
  std::vector<std::string> names_{"reservoir.voltage", "margin",      "loss",
                                  "resistor.power",    "clamp.power", "dropper.voltage"};
};

/// Every choice of a space, last slot fastest.
inline std::vector<Choice> every_choice(const Space& space) {
  std::vector<Choice> all;
  Choice c(space.slots.size(), 0);
  for (;;) {
    all.push_back(c);
    std::size_t s = c.size();
    while (s > 0 && ++c[s - 1] == space.slots[s - 1].size) c[--s] = 0;
    if (s == 0) return all;
  }
}

/// The definition of the front, written down plainly: of each set of equal keys the least (raw, choice), then
/// whatever no other key dominates.
inline std::vector<Candidate> front_by_definition(const Evaluator& lists) {
  std::map<std::vector<double>, Candidate> best;
  for (const Choice& c : every_choice(lists.space())) {
    const Evaluation e = lists.evaluate(c, Dominated{});
    if (e.outcome != Outcome::compliant) continue;
    // What is not a number has no place on a front.
    if (std::any_of(e.objectives.begin(), e.objectives.end(), [](double x) { return std::isnan(x); })) continue;
    const auto keys = objective_keys(e.objectives, lists.resolution());
    const auto found = best.find(keys);
    if (found == best.end()) {
      best[keys] = Candidate{c, e, true};
    } else if (std::make_pair(e.objectives, c) <
               std::make_pair(found->second.evaluation.objectives, found->second.choice)) {
      found->second = Candidate{c, e, true};
    }
  }
  std::vector<Candidate> front;
  for (const auto& one : best) {
    bool beaten = false;
    for (const auto& other : best) {
      if (other.first[0] > one.first[0]) break;
      if ((beaten = dominates(other.first, one.first))) break;
    }
    if (!beaten) front.push_back(one.second);
  }
  std::sort(front.begin(), front.end(), [](const Candidate& a, const Candidate& b) {
    return std::make_pair(a.evaluation.objectives, a.choice) <
           std::make_pair(b.evaluation.objectives, b.choice);
  });
  return front;
}

}  // namespace toy
