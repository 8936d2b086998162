#pragma once
#include <optional>

#include "dropfront/scoring/bounds/box_question.hpp"

namespace dropfront::scoring::bounds {

/// A bound on an objective: what no member beats, in the objective's own unit (cost in millionths, area in
/// square micrometres). Absent: nothing known.
using ObjectiveBound = std::optional<double>(const BoxQuestion&);

/// A bound on a limit: no member's check stands at less than this share of what is allowed (value/limit, or
/// limit/value where more is better). Above 1 every member breaks it. 0: nothing known.
using LimitBound = double(const BoxQuestion&);

// One file each in src/scoring/bounds/rules/, listed in bound_table.cpp with its class and range.
ObjectiveBound cost;
ObjectiveBound board_area;
ObjectiveBound margin_by_charge;
ObjectiveBound margin_by_engine;
ObjectiveBound shunt_margin;
ObjectiveBound shunt_standby;
ObjectiveBound standby_by_charge;
ObjectiveBound standby_by_engine;

LimitBound board_height;
LimitBound clamp_junction;
LimitBound clamp_junction_by_engine;
LimitBound clamp_power;
LimitBound clamp_power_by_engine;
LimitBound clamp_pulse_by_engine;
LimitBound discharge_power;
LimitBound discharge_voltage;
LimitBound discharge_working_voltage;
LimitBound dropper_class;
LimitBound dropper_series_rated;
LimitBound dropper_slew;
LimitBound dropper_voltage;
LimitBound output_band;
LimitBound output_stage_input;
LimitBound output_stage_junction;
LimitBound rail_max;
LimitBound rail_max_by_engine;
LimitBound rail_transient;
LimitBound rail_transient_by_engine;
LimitBound rectifier_reverse;
LimitBound rectifier_surge;
LimitBound reservoir_life;
LimitBound reservoir_voltage;
LimitBound resistor_opens;
LimitBound resistor_power;
LimitBound resistor_pulse;
LimitBound resistor_pulse_voltage;
LimitBound resistor_voltage;
LimitBound supply_start;

}  // namespace dropfront::scoring::bounds
