// Surges of a design as a whole, and single runs at a place of one's own choice.
#pragma once
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/recipes.hpp"
#include "dropfront/scoring/surge.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring::test {

inline SurgeAnswer surge(const Example& example) {
  Evidence evidence(example.design(), example.requirement, example.requirement.supplies.front());
  const auto answer = evidence.surge();
  INFO(answer.reason);
  REQUIRE(answer.usable);
  return answer;
}

inline Example example_with(const char* wiring, double surge_V) {
  Example example(wiring);
  example.linear(5, 0.04, 1.7, 1e-3);
  example.surge(surge_V);
  return example;
}

/// One run at a place of one's own choice.
struct SurgeBench {
  explicit SurgeBench(const Example& of)
      : example(of),
        design(example.design()),
        points(design, example.requirement, 6),
        shapes(mains_shapes(example.supply())),
        rest(points.solve("rich_empty", rich_recipe(shapes), {}, 50)),
        moments(surge_moments(points, rest, {0, 90, 180, 270})) {
    REQUIRE(rest.state.usable());
    REQUIRE(moments.size() == 4);
  }
  const SurgeMoment& moment(double phase_deg) const {
    for (const auto& m : moments)
      if (m.phase_deg == phase_deg) return m;
    FAIL("no such phase");
    return moments.front();
  }
  SurgeRun run(double phase_deg, double surge_V, double series_ohm, ZenerCurve curve = ZenerCurve::high,
               End dropper = End::high, End discharge = End::low) const {
    SurgeCase which;
    which.recipe = rich_recipe(shapes);
    which.recipe.clamp = curve;
    which.recipe.dropper = dropper;
    which.recipe.discharge = discharge;
    which.series_resistor_ohm = series_ohm;
    which.surge_V = surge_V;
    which.stress = curve == ZenerCurve::low_slope;
    auto run = run_surge(points, rest, moment(phase_deg), which);
    INFO(run.reason);
    REQUIRE(run.usable);
    REQUIRE(run.energy_residual <= 1e-6);  // energy in = dissipated + stored
    return run;
  }
  Example example;
  Design design;
  PointSolver points;
  MainsShapes shapes;
  OperatingPoint rest;
  std::vector<SurgeMoment> moments;
};

inline const char* const kSurgeWirings[] = {"half-wave-clamp-ahead", "half-wave-clamp-across",
                                            "bridge-clamp-across", "bridge-clamp-ahead"};

}  // namespace dropfront::scoring::test
