// The current at a step-down's turn-on threshold: the ends that decide there, by trying them all.
#include <array>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/lean_search.hpp"
#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

struct Tried {
  double least_A = 1e9;          ///< over all ends and both states of warmth
  double at_known_ends_A = 1e9;  ///< over both states of warmth, at the ends that decide at V_required
};

Tried by_trying_all(const test::Example& example, double rail_V, double& found_A, int& steady_states) {
  const auto shapes = mains_shapes(example.requirement.supplies[0]);
  const auto design = example.design();
  PointSolver points(design, example.requirement, *example.stage.input_min_V);
  const double overhead_A = example.stage.quiescent_current_A + example.reservoir.leakage_A;
  LeanSearch search(points, shapes.lean, overhead_A, 1);
  const auto known = search.least();
  REQUIRE(known.usable);
  const int before = points.steady_states();
  const auto answer = search.current_at_A(rail_V);
  REQUIRE(answer);
  found_A = *answer;
  steady_states = points.steady_states() - before;
  Tried tried;
  const auto& ambient = example.requirement.surroundings.ambient_degC;
  const std::array<std::pair<double, Rises>, 2> warmth{{{ambient.low, Rises{}}, {ambient.high, known.rises}}};
  for (const auto& [degC, rises] : warmth) {
    for (const End series : {End::low, End::high}) {
      for (const End esr : {End::low, End::high}) {
        for (const End discharge : {End::low, End::high}) {
          const LeanEnds ends{series, esr, discharge};
          const auto values = points.values(search.solver().recipe(ends), rises, degC);
          const auto found = circuit::find_available_current(design.arrangement->build, values, rail_V);
          REQUIRE(found.usable);
          tried.least_A = std::min(tried.least_A, found.current_A);
          if (ends == known.where.ends)
            tried.at_known_ends_A = std::min(tried.at_known_ends_A, found.current_A);
        }
      }
    }
  }
  return tried;
}

}  // namespace

TEST_CASE("At the turn-on threshold the least over both states of warmth and all ends is found") {
  int other_ends = 0;
  for (const auto* wiring :
       {"half-wave-clamp-ahead", "half-wave-clamp-across", "bridge-clamp-across", "bridge-clamp-ahead"}) {
    for (const double rail_V : {9.0, 10.0, 11.0}) {
      for (const bool one_ambient : {false, true}) {
        test::Example example(wiring);
        test::step_down(example);
        example.series_resistor.resistance_ohm = 150;
        example.reservoir.capacitance_F = 100e-6;
        if (one_ambient) example.requirement.surroundings.ambient_degC = {40, 40, 40};
        INFO(wiring << " at " << rail_V << " V, " << (one_ambient ? "one ambient" : "both"));
        double found_A = 0;
        int steady_states = 0;
        const auto tried = by_trying_all(example, rail_V, found_A, steady_states);
        // Both found to a millionth; the rail's own tolerance of a microvolt is a nanoampere in the knee.
        CHECK_THAT(found_A, WithinRel(tried.least_A, 1e-5) || WithinAbs(tried.least_A, 1e-8));
        CHECK(steady_states <= 40);
        if (tried.at_known_ends_A > tried.least_A * 1.0005) ++other_ends;
      }
    }
  }
  // Elsewhere the ends of V_required would have said too much.
  CHECK(other_ends >= 4);
}
