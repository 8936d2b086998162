#pragma once
#include <optional>
#include <vector>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/circuit/steady_state.hpp"
#include "dropfront/parts/output_stage.hpp"
#include "dropfront/parts/resistor.hpp"
#include "dropfront/scoring/evidence.hpp"

namespace dropfront::scoring {

/// Factor on the series resistor's loss where the problem names no harmonics: heating follows sum (k·p_k)²,
/// and a real line's harmonics heat more than they lift the crest.
inline constexpr double kUnstatedHarmonicsHeating = 1.15;

/// Mean power in the output stage with a mean rail voltage and a steady output current: rail power less the
/// least output power (linear), P_out·(1/efficiency - 1) (step-down), both with the quiescent current. Never
/// negative; 0 for a direct output.
double stage_loss_W(const parts::OutputStage& stage, double rail_mean_V, double output_current_A);

/// Energy a resistor may take in a pulse as long as a rectangle of `pulse_s`: the joule rating (wirewound), or
/// the rating at 1 ms carried along P·√t (film). Absent: not given.
std::optional<double> pulse_limit_J(const parts::Resistor& part, double pulse_s);

/// Energy the series resistor may take at plug-in through `resistance_ohm` from `capacitance_F`: the joule
/// rating (wirewound), or the rating at 1 ms carried along P·√t to the pulse's own length R·C/2 (film).
std::optional<double> pulse_energy_limit_J(const parts::Resistor& part, double resistance_ohm,
                                           double capacitance_F);

/// R.m.s. current in the reservoir at a solved point.
double reservoir_current_Arms(const Evidence& evidence, const OperatingPoint& point);

/// The reservoir's ripple rating at the frequency it runs at: the line's (half-wave) or twice that (bridge).
/// Absent: not given.
std::optional<double> carried_ripple_rating_Arms(const Evidence& evidence, const OperatingPoint& point);

/// Whether an input_max matters: always for a regulating stage, for a direct output only when it is given.
bool has_input_rating(const parts::OutputStage& stage);

/// R.m.s. voltage across the whole discharge chain at a solved point, from its loss.
double discharge_chain_Vrms(const OperatingPoint& point);

/// Rich points at which powers are compared: empty at both ambients (heat takes capacitance from the film,
/// cold raises zeners below 4.7 V), then every rich load.
std::vector<const OperatingPoint*> rich_points(Evidence& evidence);

/// Every rich load.
std::vector<const OperatingPoint*> loaded_points(Evidence& evidence);

}  // namespace dropfront::scoring
