#include <algorithm>
#include <map>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/circuit/steady_state.hpp"
#include "support/catch.hpp"
#include "support/ngspice.hpp"
#include "support/sample_designs.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;

/// The deck's wiring written out by hand from the drawing of each arrangement, whole zeners included
/// (breakdown and forward direction apart), so that neither our network builders nor our deck writer has a
/// part in the reference. Values: 230 V / 50 Hz, 47 ohm, 0.47 uF, diodes 0.67 V + 0.67 ohm, zener 11.2 V + 9
/// ohm, 100 uF + 0.8 ohm, 5 mA.
const std::string kMainsSide = R"(wiring by hand
VM1 line 0 SIN(0 325.2691193 50)
RS line a 47
CX a x 0.47u IC=0
RB a x 940k
.model DI D(IS=1e-9 N=0.01 RS=0.67 CJO=5p)
.model DZ D(IS=1e-9 N=0.01 RS=9 CJO=5p)
.subckt diode p n
VT p m DC 0.6664
D1 m n DI
.ends
.subckt zener anode cathode
XF anode cathode diode
VT cathode m DC 11.1964
D1 m anode DZ
.ends
)";
const std::string kHalfWaveOutput = R"(RE pos plate 0.8
CR plate 0 100u IC=10
BL pos 0 I=5e-3*(V(pos)-uramp(V(pos)-4))/4
EP rail 0 pos 0 1
)";
const std::string kBridgeOutput = R"(XD1 x pos diode
XD2 0 pos diode
XD3 neg x diode
XD4 neg 0 diode
RL1 x neg 1G
RL2 x pos 1G
RL3 neg 0 1G
RL4 pos 0 1G
RE pos plate 0.8
CR plate neg 100u IC=10
BL pos neg I=5e-3*(V(pos,neg)-uramp(V(pos,neg)-4))/4
EP rail 0 pos neg 1
)";
const std::string kRun = R"(BP power 0 V=-V(line)*I(VM1)
.options method=gear reltol=1e-4 abstol=1e-9 vntol=1e-6
.tran 20u 0.8 0.7 20u uic
.measure tran rail_min MIN V(rail) from=0.76 to=0.8
.measure tran rail_mean AVG V(rail) from=0.76 to=0.8
.measure tran input_power AVG V(power) from=0.76 to=0.8
.measure tran input_current RMS I(VM1) from=0.76 to=0.8
.save V(rail) V(power) I(VM1)
.end
)";

const std::map<std::string, std::string>& by_hand() {
  static const std::map<std::string, std::string> wiring{
      {"half-wave-clamp-ahead", "XZ 0 x zener\nXD x pos diode\n" + kHalfWaveOutput},
      {"half-wave-clamp-across", "XD1 0 x diode\nXD2 x pos diode\nXZ 0 pos zener\n" + kHalfWaveOutput},
      {"bridge-clamp-across", kBridgeOutput + "XZ neg pos zener\n"},
      {"bridge-clamp-ahead", kBridgeOutput + "XZ1 mid x zener\nXZ2 mid 0 zener\n"}};
  return wiring;
}

ElementValues same_values() {
  ElementValues v;
  v.mains = Waveform(230, 50);
  v.series_resistor_ohm = 47;
  v.dropper_F = 0.47e-6;
  v.discharge_ohm = 940e3;
  v.rectifier = Curve{0.67, 0.67};
  v.clamp.main = Curve{11.2, 9.0};
  v.reservoir_F = 100e-6;
  v.reservoir_esr_ohm = 0.8;
  v.rail_current_A = 5e-3;
  v.load_cutoff_V = 4.0;
  return v;
}

TEST_CASE("each arrangement is wired as its hand-written ngspice deck", "[wiring]") {
  for (const auto& entry : by_hand()) {
    INFO(entry.first);
    const Arrangement* arrangement = find_arrangement(entry.first);
    REQUIRE(arrangement != nullptr);
    const SteadyState ours = solve_steady_state(arrangement->build(same_values()));
    REQUIRE(ours.usable());
    const auto theirs = support::run_ngspice(kMainsSide + entry.second + kRun);
    // Closer than the 0.2 V, 3 % and 1 % asked for elsewhere: same curves, so only millivolts of junction
    // differ.
    CHECK_THAT(ours.rail_min_V, WithinAbs(theirs.at("rail_min"), 0.02));
    CHECK_THAT(ours.rail_mean_V, WithinAbs(theirs.at("rail_mean"), 0.02));
    CHECK_THAT(ours.input_power_W, WithinRel(theirs.at("input_power"), 5e-3));
    CHECK_THAT(ours.input_current_Arms, WithinRel(theirs.at("input_current"), 2e-3));
  }
}

}  // namespace
}  // namespace dropfront::circuit
