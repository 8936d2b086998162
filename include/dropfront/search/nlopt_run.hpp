#pragma once
#include <atomic>
#include <cstdint>
#include <functional>
#include <vector>

namespace dropfront::search {

enum class NloptMethod { direct_l, crs2, sbplx, bobyqa, cobyla };

/// A function over a box to be minimised. May return anything: a value that is not finite, or beyond
/// `penalty_cap`, is passed on as `penalty_cap`.
using BoxFunction = std::function<double(const std::vector<double>& position)>;

/// What one run is asked to do. Positions belong in the unit cube, logarithmic axes scaled beforehand.
struct NloptRequest {
  NloptMethod method = NloptMethod::sbplx;
  std::vector<double> low, high;  ///< axes with low = high are held there and not given to the method
  std::vector<double> start;      ///< pulled into the box; ignored by the global methods
  int max_evaluations = 200;      ///< >= 1, never exceeded
  double x_tolerance = 1e-4;      ///< absolute, on every axis; > 0, since some methods freeze without one
  double initial_step = 0.1;      ///< local methods
  double stop_value = -1e300;     ///< the run ends at the first value not above it
  std::uint64_t seed = 1;         ///< random methods
  const std::atomic<bool>* stop = nullptr;
};

/// What a run found: the best of the log of its evaluations, whatever the method returned.
struct NloptLog {
  std::vector<double> best;
  double best_value = 0;
  int evaluations = 0;
};

constexpr double penalty_cap = 1e12;

/// One NLopt run in the calling thread. The method's return code and returned point decide nothing. An
/// exception of `function` ends the run and is thrown again here, type and text intact.
NloptLog run_nlopt(const NloptRequest& request, const BoxFunction& function);

}  // namespace dropfront::search
