// What harmonics of the mains do to the dropper's current and to every loss.
#include <cmath>
#include <numbers>

#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

using Harmonics = std::vector<circuit::Harmonic>;

test::Example on(const Harmonics& harmonics, const char* wiring) {
  test::Example example(wiring);
  example.clamp = test::zener_4V7();  // little beside the line: the network is nearly linear
  example.requirement.output.voltage_V = 3.3;
  example.supply().harmonics = harmonics;
  example.supply().harmonics_given = true;
  example.supply().phases_as_given = true;
  return example;
}

struct Losses {
  double current_Arms, resistor_W, dropper_W, discharge_W;
};

Losses losses(const test::Example& example) {
  Evidence evidence(example.design(), example.requirement, example.requirement.supplies[0]);
  const auto& state = evidence.nominal().state;
  const auto of = [&state](circuit::Owner owner) { return state.loss_W[static_cast<std::size_t>(owner)]; };
  return {state.input_current_Arms, of(circuit::Owner::series_resistor), of(circuit::Owner::dropper),
          of(circuit::Owner::discharge)};
}

const Harmonics kSquare{{3, 1.0 / 3, 0}, {5, 0.2, 0}, {7, 1.0 / 7, 0}};

}  // namespace

TEST_CASE("The current factor is the root of sum (k·p_k)² over that of sum p_k², 1 for a sine") {
  CHECK(current_factor({}) == 1);
  CHECK_THAT(current_factor({{5, 0.2, 1.0}}), WithinRel(std::sqrt(2 / 1.04), 1e-12));
  // A square wave of n tones: each adds 1 to the current's square; the voltage's tends to pi²/8.
  Harmonics square;
  for (int k = 3; k < 40; k += 2) square.push_back({k, 1.0 / k, 0});
  const double tones = 1 + static_cast<double>(square.size());
  CHECK_THAT(current_factor(square), WithinRel(std::sqrt(8 * tones) / std::numbers::pi, 0.01));
}

TEST_CASE("A public line at the limits of its standard stays below the factor that is warned of") {
  // EN 50160 harmonic voltages in percent; together they exceed its distortion limit of 8 %, so scaled to it.
  Harmonics limits{{2, 2.0, 0},  {3, 5.0, 0},  {4, 1.0, 0},  {5, 6.0, 0},  {7, 5.0, 0},
                   {9, 1.5, 0},  {11, 3.5, 0}, {13, 3.0, 0}, {15, 0.5, 0}, {17, 2.0, 0},
                   {19, 1.5, 0}, {21, 0.5, 0}, {23, 1.5, 0}, {25, 1.5, 0}};
  for (int k = 6; k <= 24; k += 2) limits.push_back({k, 0.5, 0});
  double squares = 0;
  for (const auto& h : limits) squares += h.share * h.share;
  for (auto& h : limits) h.share *= 0.08 / std::sqrt(squares);
  CHECK_THAT(current_factor(limits), WithinRel(1.25, 0.01));
}

TEST_CASE("Harmonics raise the dropper's current and the losses of the current by their law") {
  for (const char* wiring : {"half-wave-clamp-ahead", "bridge-clamp-across"}) {
    const auto sine = losses(on({}, wiring));
    for (const auto& harmonics :
         {Harmonics{{5, 0.06, 0}, {7, 0.05, 1.0}}, Harmonics{{11, 0.1, 0}}, kSquare}) {
      const auto bent = losses(on(harmonics, wiring));
      const double factor = current_factor(harmonics);
      INFO(wiring << " " << factor);
      // The law is that of a capacitor alone. The rectifier's node reverses with the current, so the clamp
      // acts like a resistance: about 9 V (4/pi of clamp and drops) in quadrature with the 33 V of the
      // eleventh takes (9/33)² = 7 % of that half of the square, the series resistor another percent.
      CHECK_THAT(bent.current_Arms / sine.current_Arms, WithinRel(factor, 0.035));
      CHECK_THAT(bent.resistor_W / sine.resistor_W, WithinRel(factor * factor, 0.07));
      CHECK_THAT(bent.dropper_W / sine.dropper_W, WithinRel(factor * factor, 0.07));
      // A resistor at the line takes by the total r.m.s., which is kept.
      CHECK_THAT(bent.discharge_W / sine.discharge_W, WithinRel(1.0, 0.02));
    }
  }
}
