#include "dropfront/scoring/check_formulas.hpp"

#include <array>
#include <utility>

namespace dropfront::scoring {

std::string_view check_formula(std::string_view id) {
  using Line = std::pair<std::string_view, std::string_view>;
  static constexpr auto kFormulas = std::to_array<Line>({
      {"supply.margin",
       "capability_A - heaviest_load_A >= wanted_share x heaviest_load_A; capability_A = "
       "available_rail_current_A - overhead_current_A (step-down: greatest of efficiency x (I - "
       "overhead_current_A) x rail minimum / output voltage over rail currents I), available_rail_current_A "
       "the largest steady rail current whose rail minimum reaches required_rail_V"},
      {"supply.burst",
       "least rail while the load is greater by burst_A for burst_s, and after, never above "
       "steady_rail_min_V >= "
       "greater of required_rail_V and the burst's min_voltage"},
      {"supply.start",
       "largest steady rail current whose rail minimum reaches starting_rail_V >= start_load_A (step-down: "
       "output voltage x start_load_A / (efficiency x starting_rail_V)) + overhead_current_A"},
      {"supply.start_time",
       "last moment at which the rail is below required_rail_V, from switching on with empty capacitors <= "
       "limit; load start_load_A (step-down: its power, from turn_on_V on) and overhead_current_A"},
      {"supply.stable",
       "least rail of the last 32 of 64 periods from 0.99 x the steady state's capacitor voltages >= "
       "required_rail_V; steady_rail_min_V where nothing can keep a kick alive"},
      {"supply.dip",
       "least rail while the line is residual_share of itself, or open, for cycles periods, and after, never "
       "above steady_rail_min_V >= required_rail_V"},
      {"rail.max",
       "greatest steady rail without series diode drop <= least of reservoir_rated_voltage_V x derating and "
       "input_max_V"},
      {"rail.transient",
       "greatest rail after closing_voltage_V (surge: surge_V behind surge_source_ohm) is put on "
       "series_resistor_ohm and dropper_F, reservoir_esr_ohm included <= least of surge_voltage_V and "
       "input_max_V"},
      {"output.band",
       "greatest distance of the output from asked_voltage_V <= asked_voltage_V x asked_tolerance; output = "
       "stage_voltage_V x (1 +/- stage_tolerance), or the rail where there is no stage"},
      {"standby.power", "mean of line voltage x line current over a period <= limit"},
      {"dropper.voltage", "line r.m.s. at its high end <= rated_voltage_Vrms x derating"},
      {"dropper.class", "1 where the class is X1 or X2"},
      {"dropper.series_rated", "1 where the maker states use in series with the mains"},
      {"dropper.slew", "2 x line_crest_V / (series_resistor_ohm x dropper_F) <= slew rating"},
      {"dropper.impulse",
       "greatest voltage on dropper_F in the surge (surge_V behind surge_source_ohm) <= impulse rating, or "
       "2.5 kV (X2), 4 kV (X1), above 1 uF over sqrt(capacitance_F / 1 uF)"},
      {"resistor.power",
       "loss_W / parts_in_series x harmonics_heating <= rated_power_W x ambient_line x derating; "
       "ambient_line 1 up to 70 degC, straight to 0 at 155 degC"},
      {"resistor.voltage",
       "sqrt(loss_W x series_resistor_ohm) / parts_in_series <= rated voltage of one part"},
      {"resistor.pulse",
       "energy_J x share_of_one_part x closings_in_a_row <= rated_energy_J (wirewound), or rated_energy_J x "
       "sqrt(pulse_s / 1 ms) (film); pulse_s = R x C / 2"},
      {"resistor.pulse_voltage",
       "greatest of 2 x line_crest_V and surge_V x R / (R + surge_source_ohm), times share_of_one_part <= "
       "overload "
       "voltage"},
      {"resistor.surge",
       "energy_J x share_of_one_part <= rated_energy_J (wirewound), or rated_energy_J x sqrt(pulse_s / 1 ms) "
       "(film); pulse_s = energy_J / (peak_current_A^2 x series_resistor_ohm)"},
      {"resistor.opens",
       "line_voltage_Vrms^2 / series_resistor_ohm / parts_in_series >= opens_at x rated_power_W"},
      {"resistor.body",
       "local_degC + thermal_resistance_K_per_W x loss_W / parts_in_series x harmonics_heating <= 155 degC"},
      {"clamp.power",
       "mean of voltage x current of one of clamp_parts over a period <= rated_power_W x derating"},
      {"clamp.junction",
       "local_degC + thermal_resistance_K_per_W x power_W <= max_junction_degC - derating_K"},
      {"clamp.pulse",
       "stress_W_sqrt_s / (rated_pulse_power_W x sqrt(rated_pulse_s)) x (max_junction_degC - 25) / "
       "(max_junction_degC - clamp_junction_degC) <= 1; stress_W_sqrt_s the greatest over t of half the "
       "integral of P(u) / sqrt(t - u), at least peak power x sqrt(shortest_pulse_s); "
       "share_without_extrapolation: the same with rated_pulse_s for shortest_pulse_s"},
      {"clamp.surge", "as clamp.pulse, with the power in one clamp part during the surge"},
      {"rectifier.reverse", "2 x line_crest_V (half-wave) or line_crest_V (bridge) <= reverse voltage"},
      {"rectifier.surge",
       "greatest rectifier current after closing on the crest, the dropper at the opposite one, and in the "
       "surge "
       "where one is asked for <= surge current"},
      {"thyristor.latch",
       "line_crest_V / hypot(1 / (omega x dropper_F), series_resistor_ohm) at low line and frequency >= 3 x "
       "latching current"},
      {"thyristor.current",
       "greatest of plug_in_peak_A (closing on the crest, the dropper at the opposite one, the rail at its "
       "threshold), firing_peak_A and surge_peak_A <= surge current"},
      {"thyristor.turn_off",
       "least time at or below its on-voltage between dropping out and positive anode voltage >= turn-off "
       "time"},
      {"varistor.continuous", "continuous_voltage of the varistor >= line r.m.s. at its high end"},
      {"varistor.energy",
       "integral of voltage x current of the varistor over one surge <= energy rating; voltage = "
       "clamp_voltage x (I / clamp_current)^exponent"},
      {"varistor.current", "greatest current of the varistor in the surge <= surge current rating"},
      {"varistor.protected",
       "1 where a fuse, or a fusible series resistor in front of it, opens when it has worn to a short"},
      {"reservoir.voltage", "greatest rail <= rated_voltage_V x derating"},
      {"reservoir.ripple",
       "r.m.s. current of the reservoir <= rated_ripple_Arms x m(running) / m(rated_frequency_Hz), m = 0.8 "
       "up "
       "to 60 Hz, 1 at 120 Hz, 1.6 from 100 kHz, straight in log f; running: the line's frequency, twice it "
       "for a bridge"},
      {"reservoir.life",
       "rated_life_h x 2^((rated_life_degC - can_degC) / 10) x ripple_factor >= life; can_degC not below 35"},
      {"reservoir.leakage",
       "data_leakage_A x rail_V / rated_voltage_V x warm_factor <= data_leakage_A + spare_rail_current_A; "
       "warm_factor = 5^((air_degC - 20) / 65), not below 1"},
      {"discharge.voltage", "line_crest_V x exp(-after_s / (discharge_chain_ohm x dropper_F)) <= the rule's"},
      {"discharge.power",
       "chain_Vrms^2 x R / (sum of R)^2, each R element_ohm x (1 +/- tolerance) at its worst <= "
       "rated_power_W x ambient_line x derating"},
      {"discharge.working_voltage",
       "chain_Vrms x greatest_share <= rated voltage of one element; greatest_share = R_max / (R_max + sum "
       "of "
       "the others' R_min)"},
      {"discharge.surge",
       "chain_peak_V x greatest_share <= overload voltage of one element; greatest_share = R_max / (R_max + "
       "sum of the others' R_min)"},
      {"output_stage.junction",
       "local_degC + thermal_resistance_K_per_W x power_W <= max_junction_degC - derating_K; power_W = "
       "(rail_mean_V - least output) x load + rail_mean_V x Iq (linear), output power x (1/efficiency - 1) + "
       "rail_mean_V x Iq (step-down)"},
      {"output_stage.input", "greatest rail under load <= input_max_V"},
      {"fuse.hold",
       "greatest of line_current_Arms / (allowed_share x rated_current_A) and pulse_A2s / (allowed_share x "
       "melting_A2s) <= 1"},
      {"fuse.opens", "line_voltage_Vrms / series_resistor_ohm >= 4 x rated_current_A"},
      {"fuse.voltage", "nominal line r.m.s. <= rated voltage of the fuse"},
      {"board.height", "greatest height of a placed part <= max_height_mm"},
  });
  for (const auto& [known, formula] : kFormulas) {
    if (known == id) return formula;
  }
  return {};
}

}  // namespace dropfront::scoring
