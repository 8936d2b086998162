#include "dropfront/scoring/check_table.hpp"

#include "dropfront/scoring/checks/checks.hpp"

namespace dropfront::scoring {

const std::vector<CheckRule>& check_table() {
  static const std::vector<CheckRule> table{
      {"supply.margin", Tier::lean, supply_margin},
      {"supply.burst", Tier::events, supply_burst},
      {"supply.start", Tier::lean, supply_start},
      {"supply.start_time", Tier::events, supply_start_time},
      {"supply.stable", Tier::events, supply_stable},
      {"supply.dip", Tier::events, supply_dip},
      {"rail.max", Tier::steady, rail_max},
      {"rail.transient", Tier::transient, rail_transient},
      {"output.band", Tier::steady, output_band},
      {"standby.power", Tier::standby, standby_power},
      {"dropper.voltage", Tier::list, dropper_voltage},
      {"dropper.class", Tier::list, dropper_class},
      {"dropper.series_rated", Tier::list, dropper_series_rated},
      {"dropper.slew", Tier::list, dropper_slew},
      {"dropper.impulse", Tier::transient, dropper_impulse},
      {"resistor.power", Tier::steady, resistor_power},
      {"resistor.voltage", Tier::steady, resistor_voltage},
      {"resistor.pulse", Tier::transient, resistor_pulse},
      {"resistor.pulse_voltage", Tier::list, resistor_pulse_voltage},
      {"resistor.surge", Tier::transient, resistor_surge},
      {"resistor.opens", Tier::list, resistor_opens},
      {"resistor.body", Tier::steady, resistor_body},
      {"clamp.power", Tier::steady, clamp_power},
      {"clamp.junction", Tier::steady, clamp_junction},
      {"clamp.pulse", Tier::transient, clamp_pulse},
      {"clamp.surge", Tier::transient, clamp_surge},
      {"rectifier.reverse", Tier::list, rectifier_reverse},
      {"rectifier.surge", Tier::transient, rectifier_surge},
      {"thyristor.latch", Tier::list, thyristor_latch},
      {"thyristor.current", Tier::transient, thyristor_current},
      {"thyristor.turn_off", Tier::steady, thyristor_turn_off},
      {"varistor.continuous", Tier::list, varistor_continuous},
      {"varistor.energy", Tier::transient, varistor_energy},
      {"varistor.current", Tier::transient, varistor_current},
      {"varistor.protected", Tier::list, varistor_protected},
      {"reservoir.voltage", Tier::steady, reservoir_voltage},
      {"reservoir.ripple", Tier::steady, reservoir_ripple},
      {"reservoir.life", Tier::steady, reservoir_life},
      {"reservoir.leakage", Tier::steady, reservoir_leakage},
      {"discharge.voltage", Tier::list, discharge_voltage},
      {"discharge.power", Tier::steady, discharge_power},
      {"discharge.working_voltage", Tier::steady, discharge_working_voltage},
      {"discharge.surge", Tier::transient, discharge_surge},
      {"output_stage.junction", Tier::steady, output_stage_junction},
      {"output_stage.input", Tier::steady, output_stage_input},
      {"fuse.hold", Tier::transient, fuse_hold},
      {"fuse.opens", Tier::list, fuse_opens},
      {"fuse.voltage", Tier::list, fuse_voltage},
      {"board.height", Tier::list, board_height},
  };
  return table;
}

}  // namespace dropfront::scoring
