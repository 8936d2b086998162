#include "dropfront/search/nlopt_run.hpp"

#include <algorithm>
#include <cmath>
#include <exception>
#include <nlopt.hpp>

namespace dropfront::search {
namespace {

nlopt::algorithm algorithm_of(NloptMethod method, std::size_t dimensions) {
  switch (method) {
    case NloptMethod::direct_l:
      return nlopt::GN_DIRECT_L;
    case NloptMethod::crs2:
      return nlopt::GN_CRS2_LM;
    case NloptMethod::bobyqa:
      // Its quadratic model needs two dimensions at least.
      return dimensions < 2 ? nlopt::LN_SBPLX : nlopt::LN_BOBYQA;
    case NloptMethod::cobyla:
      return nlopt::LN_COBYLA;
    case NloptMethod::sbplx:
      break;
  }
  return nlopt::LN_SBPLX;
}

// Stands between NLopt and the function: restores held axes, logs the best, counts, parks exceptions.
class Recorder {
 public:
  Recorder(const NloptRequest& request, const BoxFunction& function)
      : request_(request), function_(function), position_(request.low) {
    for (std::size_t k = 0; k < request.low.size(); ++k)
      if (request.low[k] < request.high[k]) free_.push_back(k);
  }

  const std::vector<std::size_t>& free() const { return free_; }
  NloptLog& log() { return log_; }
  std::exception_ptr parked() const { return parked_; }
  void attach(nlopt::opt* optimiser) { optimiser_ = optimiser; }

  double evaluate(const double* x) {
    const bool reached = !log_.best.empty() && log_.best_value <= request_.stop_value;
    const bool stopped = reached || (request_.stop && request_.stop->load(std::memory_order_relaxed));
    // Some methods call on after a stop or past their limit: they get the penalty and no evaluation is made.
    if (parked_ || stopped || log_.evaluations >= request_.max_evaluations) {
      if (optimiser_) optimiser_->force_stop();
      return penalty_cap;
    }
    for (std::size_t i = 0; i < free_.size(); ++i) {
      const std::size_t k = free_[i];
      if (std::isnan(x[i])) return penalty_cap;
      position_[k] = std::clamp(x[i], request_.low[k], request_.high[k]);
    }
    double value = penalty_cap;
    try {
      ++log_.evaluations;
      value = function_(position_);
    } catch (...) {
      parked_ = std::current_exception();
      if (optimiser_) optimiser_->force_stop();
      return penalty_cap;
    }
    if (!(std::abs(value) <= penalty_cap)) value = penalty_cap;
    if (log_.best.empty() || value < log_.best_value) {
      log_.best = position_;
      log_.best_value = value;
      if (value <= request_.stop_value && optimiser_) optimiser_->force_stop();
    }
    return value;
  }

  static double callback(unsigned, const double* x, double*, void* self) {
    return static_cast<Recorder*>(self)->evaluate(x);
  }

 private:
  const NloptRequest& request_;
  const BoxFunction& function_;
  std::vector<double> position_;
  std::vector<std::size_t> free_;
  NloptLog log_;
  std::exception_ptr parked_;
  nlopt::opt* optimiser_ = nullptr;
};

}  // namespace

NloptLog run_nlopt(const NloptRequest& request, const BoxFunction& function) {
  Recorder recorder(request, function);
  const std::size_t dimensions = recorder.free().size();
  std::vector<double> low, high, x;
  for (std::size_t k : recorder.free()) {
    low.push_back(request.low[k]);
    high.push_back(request.high[k]);
    double start = k < request.start.size() ? request.start[k] : 0.5 * (low.back() + high.back());
    // A start one ulp outside the box is refused, a NaN one accepted: neither gets through.
    if (std::isnan(start)) start = 0.5 * (low.back() + high.back());
    x.push_back(std::clamp(start, low.back(), high.back()));
  }
  if (dimensions == 0) {
    recorder.evaluate(nullptr);
  } else {
    nlopt::srand(static_cast<unsigned long>(request.seed));
    nlopt::opt optimiser(algorithm_of(request.method, dimensions), static_cast<unsigned>(dimensions));
    recorder.attach(&optimiser);
    optimiser.set_lower_bounds(low);
    optimiser.set_upper_bounds(high);
    optimiser.set_min_objective(&Recorder::callback, &recorder);
    optimiser.set_maxeval(request.max_evaluations);
    optimiser.set_xtol_abs(request.x_tolerance);
    optimiser.set_initial_step(request.initial_step);
    double returned = 0;
    try {
      optimiser.optimize(x, returned);
    } catch (const std::exception&) {
      // Forced stop, round-off, refused arguments: the log says what was found.
    }
  }
  if (recorder.parked()) std::rethrow_exception(recorder.parked());
  return recorder.log();
}

}  // namespace dropfront::search
