#include "dropfront/search/nlopt_run.hpp"

#include <cmath>
#include <limits>
#include <stdexcept>

#include "support/catch.hpp"

using namespace dropfront::search;
using Catch::Matchers::WithinAbs;

namespace {

const NloptMethod all_methods[] = {NloptMethod::direct_l, NloptMethod::crs2, NloptMethod::sbplx,
                                   NloptMethod::bobyqa, NloptMethod::cobyla};

NloptRequest unit_cube(NloptMethod method, int dimensions) {
  NloptRequest request;
  request.method = method;
  request.low.assign(dimensions, 0.0);
  request.high.assign(dimensions, 1.0);
  request.max_evaluations = 2000;
  request.x_tolerance = 1e-6;
  return request;
}

double bowl(const std::vector<double>& x) {
  double sum = 0;
  for (std::size_t k = 0; k < x.size(); ++k) {
    const double d = x[k] - 0.3 - 0.1 * static_cast<double>(k);
    sum += d * d;
  }
  return sum;
}

}  // namespace

TEST_CASE("every method finds the bottom of a bowl and keeps to its evaluations") {
  for (NloptMethod method : all_methods)
    for (int dimensions : {1, 2, 4}) {
      const NloptLog log = run_nlopt(unit_cube(method, dimensions), bowl);
      CHECK(log.evaluations <= 2000);
      // Global methods stop by count: 2,000 evaluations place them within a hundredth or so.
      for (int k = 0; k < dimensions; ++k) CHECK_THAT(log.best[k], WithinAbs(0.3 + 0.1 * k, 0.02));
      CHECK(log.best_value == bowl(log.best));
    }
}

TEST_CASE("evaluations are never exceeded, whatever the method does by itself") {
  for (NloptMethod method : all_methods)
    for (int most : {1, 7, 50}) {
      NloptRequest request = unit_cube(method, 3);
      request.max_evaluations = most;
      int calls = 0;
      const NloptLog log = run_nlopt(request, [&calls](const std::vector<double>& x) {
        ++calls;
        return bowl(x);
      });
      CHECK(calls <= most);
      CHECK(log.evaluations == calls);
    }
}

TEST_CASE("values that are not finite become penalties and the rest of the box is still searched") {
  for (NloptMethod method : all_methods) {
    NloptRequest request = unit_cube(method, 2);
    request.start = {0.9, 0.9};
    const NloptLog log = run_nlopt(request, [](const std::vector<double>& x) {
      if (x[0] > 0.95) return std::numeric_limits<double>::quiet_NaN();
      if (x[1] > 0.95) return std::numeric_limits<double>::infinity();
      return bowl(x);
    });
    CHECK(std::isfinite(log.best_value));
    CHECK_THAT(log.best[0], WithinAbs(0.3, 0.02));
  }
}

TEST_CASE("an exception of the function comes out as thrown and ends the run at once") {
  for (NloptMethod method : all_methods) {
    int calls = 0;
    const auto faulty = [&calls](const std::vector<double>& x) {
      if (++calls == 5) throw std::out_of_range("row 7 of the table");
      return bowl(x);
    };
    CHECK_THROWS_MATCHES(run_nlopt(unit_cube(method, 2), faulty), std::out_of_range,
                         Catch::Matchers::Message("row 7 of the table"));
    CHECK(calls == 5);
  }
}

TEST_CASE("axes without extent are held, starts outside the box or not a number are mended") {
  for (NloptMethod method : all_methods) {
    NloptRequest request = unit_cube(method, 3);
    request.low[1] = request.high[1] = 0.25;
    request.start = {std::nextafter(1.0, 2.0), 0.9, std::nan("")};
    const NloptLog log = run_nlopt(request, bowl);
    CHECK(log.best[1] == 0.25);
    CHECK_THAT(log.best[0], WithinAbs(0.3, 0.02));
  }
  NloptRequest fixed = unit_cube(NloptMethod::sbplx, 2);
  fixed.high = fixed.low;
  const NloptLog log = run_nlopt(fixed, bowl);
  CHECK(log.evaluations == 1);
  CHECK(log.best == fixed.low);
}

TEST_CASE("the same seed gives the same run, also of a random method") {
  const NloptRequest request = unit_cube(NloptMethod::crs2, 3);
  const NloptLog first = run_nlopt(request, bowl);
  const NloptLog again = run_nlopt(request, bowl);
  CHECK(first.best == again.best);
  CHECK(first.evaluations == again.evaluations);
}

TEST_CASE("a stop flag ends a run") {
  for (NloptMethod method : all_methods) {
    std::atomic<bool> stop{false};
    NloptRequest request = unit_cube(method, 2);
    request.stop = &stop;
    const NloptLog log = run_nlopt(request, [&stop](const std::vector<double>& x) {
      stop = true;
      return bowl(x);
    });
    CHECK(log.evaluations == 1);
  }
}
