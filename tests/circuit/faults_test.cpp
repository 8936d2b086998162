#include "dropfront/circuit/faults.hpp"

#include "circuit/support_values.hpp"
#include "dropfront/circuit/transient.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

namespace {

/// The rail after some seconds of 253 V with one part gone, next to no load.
double rail_after_V(const char* arrangement, Owner owner, FaultKind kind) {
  ElementValues v = ordinary_values();
  v.mains = Waveform(253, 50);
  v.reservoir_F = 22e-6;
  v.rail_current_A = 1e-6;
  TransientOptions options;
  options.duration_s = 20;
  const Network network = find_arrangement(arrangement)->build(v);
  REQUIRE(fault_places(network, owner) >= 1);
  const auto run = run_transient(with_fault(network, owner, kind, 0), {0.0, 0.0}, options);
  INFO(run.reason);
  REQUIRE(run.usable);
  return run.rail_max_V;
}

}  // namespace

TEST_CASE("An open zener lets the rail rise to twice the crest, behind a bridge to the crest") {
  // 703 and 355 V stated beforehand; drops and the leak take a per cent or two.
  REQUIRE_THAT(rail_after_V("half-wave-clamp-across", Owner::clamp, FaultKind::open), WithinRel(703.0, 0.03));
  REQUIRE_THAT(rail_after_V("bridge-clamp-across", Owner::clamp, FaultKind::open), WithinRel(355.0, 0.03));
}

TEST_CASE("A shorted zener keeps the rail at next to nothing") {
  REQUIRE(rail_after_V("half-wave-clamp-across", Owner::clamp, FaultKind::shorted) < 1.0);
}
