#include "dropfront/search/relax.hpp"

#include <algorithm>
#include <cmath>
#include <functional>

#include "dropfront/search/aims.hpp"
#include "dropfront/search/nlopt_run.hpp"
#include "dropfront/search/sequence.hpp"

namespace dropfront::search {
namespace {

constexpr std::size_t regions_an_aim = 3;
constexpr int sampled = 8;

// One local run.
struct Run {
  std::size_t region = 0;
  std::vector<double> weights;
  RelaxedDesign start;
  RelaxedLog log;
};

class Relaxer {
 public:
  explicit Relaxer(SearchState& state)
      : state_(state),
        dimensions_(static_cast<int>(state.axes.size())),
        regions_(regions_of(state.space, state.plan.most_regions)),
        logs_(regions_.size()),
        range_(state.evaluator.objective_count()),
        polish_evaluations_(8 * (dimensions_ + 1)) {
    for (const Axis& axis : state.axes) high_.push_back(axis.position.size() > 1 ? 1.0 : 0.0);
  }

  Relaxation run() {
    Relaxation result{{}, {}, range_};
    run_batches(result);
    measure();
    result.range = range_;
    const std::int64_t share = state_.plan.evaluations / (8 * static_cast<std::int64_t>(regions_.size())) + 1;
    const auto wanted = static_cast<std::size_t>(std::min<std::int64_t>(state_.plan.starts, share));
    for (const RelaxedLog& log : logs_) {
      for (RelaxedDesign& design : spread_of(log, wanted, range_))
        result.starts.push_back(RelaxedOptimum{std::move(design), balanced_aim(objectives())});
      teach(log);
    }
    return result;
  }

 private:
  int objectives() const { return state_.evaluator.objective_count(); }

  void run_batches(Relaxation& result) {
    const std::int64_t half = state_.plan.relaxed / 2;
    if (!batch(regions_.size(), [this](std::size_t r) { sample(r); })) return;
    // What the first regions leave of their share goes to those that need more.
    for (std::int64_t allowed : {half - spent(), half + half / 2 - spent()}) {
      std::vector<std::size_t> open;
      for (std::size_t r = 0; r < regions_.size(); ++r)
        if (!complies(logs_[r])) open.push_back(r);
      const std::int64_t share = open.empty() ? 0 : allowed / static_cast<std::int64_t>(open.size());
      if (!batch(open.size(), [&](std::size_t i) { seek_compliance(open[i], share); })) return;
    }
    measure();
    if (!polish(balanced_runs(), result)) return;
    measure();
    polish(aimed_runs(), result);
  }

  // False when the end came first: then the logs are as before. How far each thread had come by then depends
  // on their timing, so nothing of an unfinished batch may count.
  bool batch(std::size_t count, const std::function<void(std::size_t)>& body) {
    std::vector<std::size_t> before;
    for (const RelaxedLog& log : logs_) before.push_back(log.size());
    state_.workers.for_each(count, 1, body);
    if (!state_.ended()) return true;
    for (std::size_t r = 0; r < logs_.size(); ++r)
      logs_[r].erase(logs_[r].begin() + static_cast<std::ptrdiff_t>(before[r]), logs_[r].end());
    return false;
  }

  void sample(std::size_t region) {
    for (int n = 0; n < sampled && !state_.ended(); ++n) {
      std::vector<double> position = spread_point(n, dimensions_, n == 0 ? 0 : state_.options.seed);
      for (int k = 0; k < dimensions_; ++k) position[k] *= high_[k];
      logs_[region].push_back(evaluate_relaxed(state_.evaluator, regions_[region], position));
    }
  }

  NloptRequest request(NloptMethod method, std::int64_t evaluations, std::uint64_t stream) const {
    NloptRequest r;
    r.method = method;
    r.low.assign(dimensions_, 0.0);
    r.high = high_;
    r.max_evaluations = static_cast<int>(std::max<std::int64_t>(evaluations, 1));
    r.seed = state_.options.seed * 1000003 + stream;
    r.stop = &state_.halted();
    return r;
  }

  static bool complies(const RelaxedLog& log) {
    return std::any_of(log.begin(), log.end(), [](const RelaxedDesign& d) { return d.violation == 0; });
  }

  std::int64_t spent() const {
    std::int64_t sum = 0;
    for (const RelaxedLog& log : logs_) sum += static_cast<std::int64_t>(log.size());
    return sum;
  }

  // First globally; where that has been tried in vain, locally from the best so far.
  void seek_compliance(std::size_t region, std::int64_t share) {
    if (state_.ended() || share < 1) return;
    RelaxedLog& log = logs_[region];
    const bool first = log.size() <= sampled;
    NloptRequest r = request(first ? NloptMethod::direct_l : NloptMethod::sbplx, share, region);
    r.stop_value = 0;
    r.start = std::min_element(log.begin(), log.end(), [](const RelaxedDesign& a, const RelaxedDesign& b) {
                return a.violation < b.violation;
              })->position;
    run_nlopt(r, [&](const std::vector<double>& position) {
      state_.ended();
      log.push_back(evaluate_relaxed(state_.evaluator, regions_[region], position));
      return log.back().violation;
    });
  }

  // Scale of the objectives over what complies; over everything while nothing does.
  void measure() {
    for (bool complying : {true, false}) {
      range_ = ObjectiveRange(objectives());
      for (const RelaxedLog& log : logs_)
        for (const RelaxedDesign& d : log)
          if (!complying || d.violation == 0) range_.take(d.objectives);
      if (!range_.empty()) return;
    }
  }

  // The region's run for an aim; regions without a complying design have none, unless no region has one.
  std::vector<std::pair<double, Run>> runs_for(const std::vector<double>& weights) const {
    std::vector<std::pair<double, Run>> runs;
    for (bool complying : {true, false}) {
      for (std::size_t r = 0; r < regions_.size(); ++r) {
        const RelaxedDesign* best = best_of(logs_[r], weights, range_);
        if (!best || (complying && best->violation > 0)) continue;
        const double value = achievement(best->objectives, best->violation, weights, range_);
        runs.emplace_back(value, Run{r, weights, *best, {}});
      }
      if (!runs.empty()) break;
    }
    std::stable_sort(runs.begin(), runs.end(),
                     [](const auto& a, const auto& b) { return a.first < b.first; });
    return runs;
  }

  std::vector<Run> balanced_runs() const {
    std::vector<Run> runs;
    for (auto& entry : runs_for(balanced_aim(objectives()))) runs.push_back(std::move(entry.second));
    return runs;
  }

  std::vector<Run> aimed_runs() const {
    std::vector<Run> runs;
    for (const auto& weights : spread_aims(objectives(), state_.plan.aims)) {
      auto ordered = runs_for(weights);
      if (ordered.size() > regions_an_aim) ordered.resize(regions_an_aim);
      for (auto& entry : ordered) runs.push_back(std::move(entry.second));
    }
    return runs;
  }

  bool polish(std::vector<Run> runs, Relaxation& result) {
    const std::int64_t left = state_.plan.relaxed - spent();
    const std::int64_t affordable = std::max<std::int64_t>(left / polish_evaluations_, 0);
    if (static_cast<std::int64_t>(runs.size()) > affordable)
      runs.erase(runs.begin() + static_cast<std::ptrdiff_t>(affordable), runs.end());
    if (!batch(runs.size(), [&](std::size_t i) { polish(runs[i]); })) return false;
    for (Run& run : runs) {
      RelaxedLog& log = logs_[run.region];
      run.log.push_back(run.start);
      result.optima.push_back(RelaxedOptimum{*best_of(run.log, run.weights, range_), run.weights});
      run.log.pop_back();
      log.insert(log.end(), run.log.begin(), run.log.end());
    }
    return true;
  }

  void polish(Run& run) {
    if (state_.ended()) return;
    NloptRequest r = request(NloptMethod::sbplx, polish_evaluations_, 7919 + run.region);
    r.start = run.start.position;
    run_nlopt(r, [&](const std::vector<double>& position) {
      state_.ended();
      run.log.push_back(evaluate_relaxed(state_.evaluator, regions_[run.region], position));
      return achievement(run.log.back().objectives, run.log.back().violation, run.weights, range_);
    });
  }

  void teach(const RelaxedLog& log) {
    for (const RelaxedDesign& design : log) {
      ++state_.ledger.counts().relaxed;
      if (design.violation == 0) state_.compliant_range.take(design.objectives);
      // Far outside the limits objectives may be stand-ins.
      if (!(design.violation < 1)) continue;
      Evaluation learnt;
      learnt.objectives = design.objectives;
      learnt.headroom = design.headroom;
      state_.relaxed_model.add(state_.region_of(design.categories), design.position,
                               state_.quantities_of(learnt));
    }
  }

  SearchState& state_;
  int dimensions_;
  std::vector<Choice> regions_;
  std::vector<RelaxedLog> logs_;  ///< one a region
  ObjectiveRange range_;
  std::int64_t polish_evaluations_;
  std::vector<double> high_;  ///< 1, or 0 for an axis of one coordinate
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

Relaxation relax(SearchState& state) { return Relaxer(state).run(); }

}  // namespace dropfront::search
