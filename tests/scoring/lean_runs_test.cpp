// The worst of an event is looked for over ends and ambients by turns: here every combination is tried.
#include "dropfront/scoring/lean_runs.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/disturbance.hpp"
#include "dropfront/scoring/lean_search.hpp"
#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using test::Example;

struct Bench {
  explicit Bench(Example& example)
      : design(example.design()),
        shapes(mains_shapes(example.supply())),
        points(design, example.requirement, required_V(example)),
        search(points, shapes.lean, example.stage.quiescent_current_A + example.reservoir.leakage_A, 1) {
    runs.points = &points;
    runs.solver = &search.solver();
    runs.ends = search.least().where.ends;
    runs.transients = &count;
    const auto& ambient = example.requirement.surroundings.ambient_degC;
    for (const double t : {ambient.low, ambient.high}) {
      const LoadCase load{"awake", 10e-3, example.reservoir.leakage_A, Quiescent::data, true};
      heaviest.push_back(points.solve("lean", runs.solver->recipe(runs.ends), load, t));
    }
    runs.heaviest = {&heaviest[0], &heaviest[1]};
  }
  static double required_V(Example& example) {
    return required_rail_V(example.stage, example.requirement.output,
                           load_profile(example.requirement.output))
        .value();
  }

  Design design;
  MainsShapes shapes;
  PointSolver points;
  LeanSearch search;
  LeanRuns runs;
  std::vector<OperatingPoint> heaviest;
  int count = 0;
};

/// Least rail over all ends, both ambients and every 15 degrees.
double exhaustive_V(const Bench& bench, const LeanEvent& event) {
  double least_V = INFINITY;
  for (const auto& settled : bench.heaviest) {
    for (int ends = 0; ends < 8; ++ends) {
      const auto end = [ends](int bit) { return (ends >> bit) & 1 ? End::high : End::low; };
      const auto before = bench.runs.values(settled, {end(0), end(1), end(2)}, event.before);
      auto during = before;
      event.disturb(during);
      const auto start = bench.runs.steady(before, settled);
      circuit::Disturbance disturbed(bench.runs.network(before), bench.runs.network(during), event.duration_s,
                                     start, bench.runs.required_V());
      for (double phase_deg = 0; phase_deg < 360; phase_deg += 15) {
        least_V = std::min(least_V, disturbed.at(phase_deg).rail_V);
      }
    }
  }
  return least_V;
}

void check_against_all(Example& example) {
  Bench bench(example);
  const auto& stage = example.stage;
  const double leakage_A = example.reservoir.leakage_A;
  LeanEvent burst, dip;
  burst.before = dip.before = rail_load(stage, 10e-3, leakage_A, Quiescent::data);
  burst.duration_s = 15e-3;
  burst.disturb = [&](circuit::ElementValues& values) {
    hang(rail_load(stage, 10e-3, leakage_A + 20e-3, Quiescent::data), stage, bench.runs.required_V(), values);
  };
  dip.duration_s = 0.01;
  dip.disturb = [](circuit::ElementValues& values) {
    values.mains = values.mains.scaled(0);
    values.source_ohm = 1e9;
  };
  for (const auto& event : {burst, dip}) {
    const auto found = worst_event(bench.runs, {event});
    INFO(example.arrangement->name << ", " << event.duration_s << " s");
    REQUIRE(found.usable);
    // Ends are turned one at a time at the grid's phase: what joint turns and a shifted phase add is
    // millivolts.
    CHECK(found.rail_min_V < exhaustive_V(bench, event) + 5e-3);
  }
  CHECK(bench.count > 0);
}

TEST_CASE("no combination of ends, ambient and phase takes the rail lower than the worst that is found") {
  for (const char* wiring : {"half-wave-clamp-ahead", "bridge-clamp-across", "half-wave-thyristor-shunt"}) {
    Example example(wiring);
    example.linear(5, 0.04, 1.7, 1e-3);
    check_against_all(example);
    if (example.arrangement->thyristor_shunt) continue;
    test::step_down(example);
    check_against_all(example);
  }
}

TEST_CASE("of several events the worst is named") {
  Example example;
  example.linear(5, 0.04, 1.7, 1e-3);
  Bench bench(example);
  std::vector<LeanEvent> events(3);
  for (std::size_t i = 0; i < events.size(); ++i) {
    events[i].before = rail_load(example.stage, 10e-3, 55e-6, Quiescent::data);
    events[i].duration_s = i == 1 ? 0.03 : 0.01;
    events[i].disturb = [](circuit::ElementValues& values) { values.mains = values.mains.scaled(0); };
  }
  CHECK(worst_event(bench.runs, events).event == 1);
  bench.runs.reason = "no answer there";
  CHECK(worst_event(bench.runs, events).reason == "no answer there");
  CHECK_FALSE(worst_event(bench.runs, events).usable);
}

}  // namespace
}  // namespace dropfront::scoring
