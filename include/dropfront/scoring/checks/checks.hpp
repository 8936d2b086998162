#pragma once
#include <optional>

#include "dropfront/scoring/check.hpp"
#include "dropfront/scoring/evidence.hpp"

namespace dropfront::scoring {

/// One function a check, each in a file of its name in src/scoring/checks/, listed in check_table.cpp.
/// Meanings and limits stand beside each. nullopt: does not apply.
using CheckFunction = std::optional<Check>(Evidence& evidence);

CheckFunction supply_margin;
CheckFunction supply_start;
CheckFunction supply_start_time;
CheckFunction supply_burst;
CheckFunction supply_stable;
CheckFunction supply_dip;
CheckFunction rail_max;
CheckFunction rail_transient;
CheckFunction output_band;
CheckFunction standby_power;
CheckFunction dropper_voltage;
CheckFunction dropper_class;
CheckFunction dropper_series_rated;
CheckFunction dropper_slew;
CheckFunction dropper_impulse;
CheckFunction resistor_power;
CheckFunction resistor_voltage;
CheckFunction resistor_pulse;
CheckFunction resistor_pulse_voltage;
CheckFunction resistor_surge;
CheckFunction resistor_opens;
CheckFunction resistor_body;
CheckFunction clamp_power;
CheckFunction clamp_junction;
CheckFunction clamp_pulse;
CheckFunction clamp_surge;
CheckFunction rectifier_reverse;
CheckFunction rectifier_surge;
CheckFunction thyristor_latch;
CheckFunction thyristor_current;
CheckFunction thyristor_turn_off;
CheckFunction varistor_continuous;
CheckFunction varistor_energy;
CheckFunction varistor_current;
CheckFunction varistor_protected;
CheckFunction reservoir_voltage;
CheckFunction reservoir_ripple;
CheckFunction reservoir_life;
CheckFunction reservoir_leakage;
CheckFunction discharge_voltage;
CheckFunction discharge_power;
CheckFunction discharge_working_voltage;
CheckFunction discharge_surge;
CheckFunction output_stage_junction;
CheckFunction output_stage_input;
CheckFunction fuse_hold;
CheckFunction fuse_opens;
CheckFunction fuse_voltage;
CheckFunction board_height;

}  // namespace dropfront::scoring
