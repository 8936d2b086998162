// A design and a requirement to start a test from: 230 V, 50 Hz, 0.68 uF, 47 ohm, 12 V, direct output. The
// zeners carry the data of the JEDEC 1N4728A to 1N4764A family; everything else is made up here.
#pragma once
#include <utility>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring::test {

/// 1 W zener at 5 %: VZ, IZT, ZZT, ZZK, IZK of the 1N47xxA table; 100 K/W; tempco by voltage.
inline parts::Clamp one_watt_zener(double voltage_V, double test_A, double slope_ohm, double knee_ohm,
                                   double knee_A, double tempco_per_K) {
  parts::Clamp clamp;
  clamp.info.name = "zener";
  clamp.voltage_V = voltage_V;
  clamp.voltage_min_V = 0.95 * voltage_V;
  clamp.voltage_max_V = 1.05 * voltage_V;
  clamp.test_current_A = test_A;
  clamp.slope_min_ohm = slope_ohm / 10;
  clamp.slope_resistance_ohm = slope_ohm;
  clamp.knee_current_A = knee_A;
  clamp.knee_resistance_ohm = knee_ohm;
  clamp.rated_power_W = 1.0;
  clamp.temperature_coefficient_per_K = tempco_per_K;
  clamp.thermal_resistance_K_per_W = 100;
  clamp.max_junction_degC = 150;
  return clamp;
}

inline parts::Clamp zener_4V7() { return one_watt_zener(4.7, 0.053, 8, 500, 1e-3, -0.0001); }
inline parts::Clamp zener_10V() { return one_watt_zener(10, 0.025, 7, 700, 0.25e-3, 0.00075); }
inline parts::Clamp zener_12V() { return one_watt_zener(12, 0.021, 9, 700, 0.25e-3, 0.00077); }
inline parts::Clamp zener_24V() { return one_watt_zener(24, 0.0105, 25, 750, 0.25e-3, 0.00088); }
inline parts::Clamp zener_47V() { return one_watt_zener(47, 0.0055, 80, 1500, 0.25e-3, 0.00095); }

inline void set_body(parts::PartInfo& info, const char* name, std::int64_t length_um, std::int64_t width_um,
                     std::int64_t price_micro) {
  info.name = name;
  info.length_um = length_um;
  info.width_um = width_um;
  info.height_um = 10'000;
  info.price_breaks = {{1, price_micro}};
}

struct Example {
  parts::Dropper dropper;
  parts::Resistor series_resistor;
  parts::Clamp clamp = zener_12V();
  parts::Reservoir reservoir;
  parts::Rectifier rectifier;
  parts::OutputStage stage;
  parts::Resistor discharge;
  parts::Thyristor thyristor;  // used by the shunt arrangements only
  parts::Resistor gate_resistor;
  parts::Varistor varistor;  // in front of the series resistor, only where `guarded`
  parts::Fuse fuse;          // only where `fused`
  bool guarded = false, fused = false, varistor_before = true;
  Requirement requirement;
  const circuit::Arrangement* arrangement = nullptr;
  int discharge_count = 2;

  explicit Example(const char* wiring = "half-wave-clamp-ahead")
      : arrangement(circuit::find_arrangement(wiring)) {
    dropper.capacitance_F = 0.68e-6;
    dropper.tolerance = 0.10;
    dropper.rated_voltage_Vrms = 310;
    dropper.class_name = "X2";
    dropper.series_rated = true;
    dropper.end_of_life_loss = 0.10;
    dropper.slew_V_per_s = 150e6;
    dropper.impulse_V = 2500;
    series_resistor.resistance_ohm = 47;
    series_resistor.tolerance = 0.05;
    series_resistor.rated_power_W = 2;
    series_resistor.rated_voltage_Vrms = 350;
    series_resistor.overload_voltage_V = 1000;
    series_resistor.construction = parts::Construction::wirewound;
    series_resistor.pulse_energy_J = 2;
    series_resistor.fusible = true;
    series_resistor.opens_at = 25;
    clamp.pulse_power_W = 4.5;
    clamp.pulse_time_s = 8.3e-3;
    reservoir.capacitance_F = 220e-6;
    reservoir.tolerance = 0.20;
    reservoir.rated_voltage_V = 25;
    reservoir.surge_voltage_V = 32;
    reservoir.esr_ohm = 0.8;
    reservoir.esr_cold_ohm = 1.6;
    reservoir.ripple_current_Arms = 0.3;
    reservoir.leakage_A = 55e-6;
    reservoir.life_h = 5000;
    reservoir.life_temperature_degC = 105;
    rectifier.reverse_voltage_V = 1000;
    rectifier.surge_current_A = 30;
    stage.kind = parts::StageKind::direct;
    stage.output_voltage_V = 12;
    stage.tolerance = 0.05;
    discharge.resistance_ohm = 470e3;
    discharge.tolerance = 0.05;
    discharge.rated_power_W = 0.25;
    discharge.rated_voltage_Vrms = 200;
    thyristor.on_voltage_V = 0.9;
    thyristor.slope_resistance_ohm = 0.1;
    thyristor.trigger_current_A = 0.2e-3;
    thyristor.holding_current_A = 5e-3;
    thyristor.latching_current_A = 6e-3;
    thyristor.turn_off_time_s = 35e-6;
    thyristor.surge_current_A = 10;
    gate_resistor.resistance_ohm = 1000;
    gate_resistor.tolerance = 0.05;
    // A 14 mm disc of the 431K kind: 430 V at 1 mA, 710 V at 50 A, 71 J, 4500 A (table of a standard series,
    // from memory).
    varistor.continuous_voltage_Vrms = 275;
    varistor.clamp_voltage_V = 710;
    varistor.clamp_current_A = 50;
    varistor.energy_J = 71;
    varistor.surge_current_A = 4500;
    fuse.rated_current_A = 1;
    fuse.melting_i2t_A2s = 12;
    fuse.rated_voltage_Vrms = 253;
    set_body(varistor.info, "varistor", 15'500, 5'200, 60'000);
    set_body(fuse.info, "fuse", 8'400, 4'000, 70'000);
    discharge.overload_voltage_V = 500;
    set_body(thyristor.info, "thyristor", 4'900, 3'800, 70'000);
    set_body(gate_resistor.info, "gate resistor", 2'000, 1'250, 2'000);
    set_body(dropper.info, "film", 26'500, 8'500, 300'000);
    set_body(series_resistor.info, "series resistor", 12'000, 5'000, 50'000);
    set_body(clamp.info, "zener", 5'200, 2'700, 40'000);
    set_body(reservoir.info, "reservoir", 8'000, 8'000, 60'000);
    set_body(rectifier.info, "rectifier", 5'200, 2'700, 20'000);
    set_body(discharge.info, "chip", 3'100, 1'550, 4'000);
    requirement.supplies.push_back({"", {207, 230, 253}, {49.5, 50, 50.5}, {}, false, false});
    requirement.output.voltage_V = 12;
    requirement.output.tolerance = 0.10;
    requirement.output.loads.push_back({"asleep", false, 0.2e-3, {}, {}, {}});
    requirement.output.loads.push_back({"awake", false, 10e-3, {}, {}, {}});
    requirement.output.standby_load = 0;
    requirement.output.start_load_A = 10e-3;
  }

  Design design() const {
    Design d;
    d.arrangement = arrangement;
    d.dropper = &dropper;
    d.series_resistor = &series_resistor;
    d.clamp = &clamp;
    d.reservoir = &reservoir;
    d.rectifier = &rectifier;
    d.output_stage = &stage;
    d.discharge = discharge_count > 0 ? &discharge : nullptr;
    d.discharge_count = discharge_count;
    if (guarded) d.varistor = &varistor;
    d.varistor_before = varistor_before;
    if (fused) d.fuse = &fuse;
    if (arrangement != nullptr && arrangement->thyristor_shunt) {
      d.thyristor = &thyristor;
      d.gate_resistor = &gate_resistor;
    }
    return d;
  }
  /// Surges of that many volts behind the 2 ohm of the combination wave are asked for.
  void surge(double voltage_V) { requirement.limits.surge = Surge{voltage_V, 2}; }
  Supply& supply() { return requirement.supplies.front(); }

  /// A linear regulator in the output stage's place.
  void linear(double output_V, double tolerance, double dropout_V, double quiescent_A) {
    stage = {};
    set_body(stage.info, "regulator", 5'000, 4'000, 100'000);
    stage.kind = parts::StageKind::linear;
    stage.output_voltage_V = output_V;
    stage.tolerance = tolerance;
    stage.dropout_V = dropout_V;
    stage.quiescent_current_A = stage.quiescent_current_dropout_A = quiescent_A;
    stage.input_max_V = 30;
    requirement.output.voltage_V = output_V;
  }
};

}  // namespace dropfront::scoring::test
