#include "dropfront/search/relax.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/search/aims.hpp"
#include "dropfront/search/nlopt_run.hpp"
#include "dropfront/search/sequence.hpp"

namespace dropfront::search {
namespace {

using Log = std::vector<RelaxedDesign>;

constexpr std::size_t regions_an_aim = 3;

struct Run {
  std::size_t region = 0;
  std::vector<double> weights;
  RelaxedDesign start;
  Log log;
};

const RelaxedDesign* best_of(const Log& log, const std::vector<double>& weights,
                             const ObjectiveRange& range) {
  const RelaxedDesign* best = nullptr;
  double least = 0;
  for (const RelaxedDesign& design : log) {
    const double value = achievement(design.objectives, design.violation, weights, range);
    if (best && !(value < least)) continue;
    best = &design;
    least = value;
  }
  return best;
}

class Relaxer {
 public:
  explicit Relaxer(Session& session)
      : session_(session),
        dimensions_(static_cast<int>(session.axes.size())),
        regions_(regions_of(session.space, session.plan.most_regions)),
        logs_(regions_.size()),
        range_(session.evaluator.objective_count()) {
    for (const Axis& axis : session.axes) high_.push_back(axis.position.size() > 1 ? 1.0 : 0.0);
    const int share = static_cast<int>(session.plan.relaxed / (4 * static_cast<long>(regions_.size())));
    sampled_ = std::clamp(share, 4, 20 * (dimensions_ + 1));
  }

  Relaxation run() {
    for_regions([this](std::size_t r) { sample(r); });
    measure();
    for_regions([this](std::size_t r) { search_globally(r); });
    measure();
    std::vector<Run> runs = plan_polish();
    session_.workers.for_each(runs.size(), 1, [&](std::size_t i) { polish(runs[i]); });
    Relaxation result{{}, range_};
    for (Run& run : runs) {
      const RelaxedDesign* best = best_of(run.log, run.weights, range_);
      const bool started_better =
          !best || achievement(run.start.objectives, run.start.violation, run.weights, range_) <
                       achievement(best->objectives, best->violation, run.weights, range_);
      result.optima.push_back(RelaxedOptimum{started_better ? run.start : *best, run.weights});
      auto& log = logs_[run.region];
      log.insert(log.end(), run.log.begin(), run.log.end());
    }
    for (const Log& log : logs_)
      for (const RelaxedDesign& design : log) {
        ++session_.ledger.counts().relaxed;
        // Far outside the limits objectives may be stand-ins.
        if (!(design.violation < 1)) continue;
        if (design.violation == 0) session_.compliant_range.take(design.objectives);
        Evaluation learnt;
        learnt.objectives = design.objectives;
        learnt.headroom = design.headroom;
        session_.model.add(session_.region_of(design.categories), design.position,
                           session_.quantities_of(learnt));
      }
    measure();
    result.range = range_;
    return result;
  }

 private:
  template <class Body>
  void for_regions(const Body& body) {
    session_.workers.for_each(regions_.size(), 1, [&](std::size_t r) {
      if (!session_.ended()) body(r);
    });
  }

  RelaxedDesign evaluate(std::size_t region, const std::vector<double>& position) const {
    Evaluation e = session_.evaluator.relaxed(regions_[region], position);
    RelaxedDesign design;
    design.categories = regions_[region];
    design.position = position;
    design.violation = std::isfinite(e.violation) ? std::max(e.violation, 0.0) : penalty_cap;
    for (double x : e.objectives)
      if (!std::isfinite(x)) design.violation = penalty_cap;
    design.objectives = std::move(e.objectives);
    design.headroom = std::move(e.headroom);
    return design;
  }

  void sample(std::size_t region) {
    for (int n = 0; n < sampled_; ++n) {
      std::vector<double> position = spread_point(n, dimensions_, n == 0 ? 0 : session_.options.seed);
      for (int k = 0; k < dimensions_; ++k) position[k] *= high_[k];
      logs_[region].push_back(evaluate(region, position));
    }
  }

  NloptRequest request(int evaluations, std::uint64_t stream) const {
    NloptRequest r;
    r.low.assign(dimensions_, 0.0);
    r.high = high_;
    r.max_evaluations = evaluations;
    r.seed = session_.options.seed * 1000003 + stream;
    r.stop = &session_.halted();
    return r;
  }

  BoxFunction logged(std::size_t region, const std::vector<double>& weights, Log& log) {
    return [this, region, weights, &log](const std::vector<double>& position) {
      session_.ended();
      log.push_back(evaluate(region, position));
      return achievement(log.back().objectives, log.back().violation, weights, range_);
    };
  }

  void search_globally(std::size_t region) {
    const std::size_t m = static_cast<std::size_t>(session_.evaluator.objective_count());
    const std::vector<double> balanced(m, 1.0 / static_cast<double>(m));
    NloptRequest r = request(sampled_, region);
    r.method = NloptMethod::direct_l;
    run_nlopt(r, logged(region, balanced, logs_[region]));
  }

  void polish(Run& run) {
    if (session_.ended()) return;
    NloptRequest r = request(polish_evaluations_, 7919 + run.region);
    r.method = NloptMethod::sbplx;
    r.start = run.start.position;
    run_nlopt(r, logged(run.region, run.weights, run.log));
  }

  // Scale of the objectives over what complies; over everything while nothing does.
  void measure() {
    for (bool complying : {true, false}) {
      range_ = ObjectiveRange(session_.evaluator.objective_count());
      for (const Log& log : logs_)
        for (const RelaxedDesign& d : log)
          if (!complying || d.violation == 0) range_.take(d.objectives);
      if (!range_.empty()) return;
    }
  }

  std::vector<Run> plan_polish() {
    std::vector<Run> runs;
    for (const auto& weights : spread_aims(session_.evaluator.objective_count(), session_.plan.aims)) {
      std::vector<std::pair<double, std::size_t>> order;
      for (std::size_t r = 0; r < regions_.size(); ++r)
        if (const RelaxedDesign* best = best_of(logs_[r], weights, range_))
          order.emplace_back(achievement(best->objectives, best->violation, weights, range_), r);
      std::sort(order.begin(), order.end());
      if (order.size() > regions_an_aim) order.resize(regions_an_aim);
      for (const auto& place : order)
        runs.push_back(Run{place.second, weights, *best_of(logs_[place.second], weights, range_), {}});
    }
    std::int64_t spent = 0;
    for (const Log& log : logs_) spent += static_cast<std::int64_t>(log.size());
    const std::int64_t left = std::max<std::int64_t>(session_.plan.relaxed - spent, 0);
    const std::int64_t share = runs.empty() ? 0 : left / static_cast<std::int64_t>(runs.size());
    polish_evaluations_ = static_cast<int>(std::clamp<std::int64_t>(share, 1, 40 * (dimensions_ + 1)));
    return runs;
  }

  Session& session_;
  int dimensions_;
  std::vector<Choice> regions_;
  std::vector<Log> logs_;
  ObjectiveRange range_;
  std::vector<double> high_;
  int sampled_ = 0;
  int polish_evaluations_ = 1;
};

}  // namespace

std::vector<Choice> regions_of(const Space& space, int most) {
  double total = 1;
  for (int slot : category_slots(space)) total *= space.slots[slot].size;
  const double count = std::min<double>(total, most);
  std::vector<Choice> regions;
  for (double n = 0; n < count; ++n) {
    double index = total > count ? std::floor((n + 0.5) * total / count) : n;
    Choice region(space.slots.size(), 0);
    for (int slot : category_slots(space)) {
      const double size = space.slots[slot].size;
      region[slot] = static_cast<std::int32_t>(std::fmod(index, size));
      index = std::floor(index / size);
    }
    regions.push_back(std::move(region));
  }
  return regions;
}

Relaxation relax(Session& session) { return Relaxer(session).run(); }

}  // namespace dropfront::search
