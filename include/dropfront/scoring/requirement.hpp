#pragma once
#include <cstdint>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/circuit/waveform.hpp"
#include "dropfront/values/spread.hpp"

namespace dropfront::scoring {

/// One mains supply the design must live on.
struct Supply {
  std::string name;  ///< empty when the problem names a single one
  values::Spread voltage_Vrms;
  values::Spread frequency_Hz;
  std::vector<circuit::Harmonic> harmonics;
  bool harmonics_given = false;  ///< false: lean/rich take the default third harmonic
  bool phases_as_given = false;
};

/// One load. At the output: alternative states unless `duration_s`; at the rail: always on unless
/// `duration_s`.
struct Load {
  std::string name;
  bool at_rail = false;
  double current_A = 0;
  std::optional<double> min_voltage_V;  ///< rail loads; default V_required
  std::optional<double> duration_s;     ///< set: a burst on top of the heaviest state
  std::optional<double> period_s;       ///< unset on a burst: once only, mean 0
};

struct OutputNeed {
  double voltage_V = 0;
  double tolerance = 0.05;
  std::vector<Load> loads;
  std::optional<int> standby_load;  ///< index into loads; unset: no load
  double start_load_A = 0;          ///< at the output
};

/// Ripple term of an electrolytic's life; see ripple_life.hpp for the laws and their names.
enum class RippleLife { halves_each_5_K, excess_over_5_K, excess_over_10_K, two_or_four, none };

struct Surroundings {
  values::Spread ambient_degC{0, 25, 50};
  double mean_over_life_degC = 37.5;
  double enclosure_K_per_W = 0;
  double life_years = 10;
  int pollution_degree = 2;
  std::string material_group = "IIIa";  ///< I, II, IIIa, IIIb
  std::optional<double> max_height_mm;
  RippleLife ripple_life = RippleLife::halves_each_5_K;
};

enum class ConnectionKind { plug, switched, fixed };

struct Connection {
  ConnectionKind kind = ConnectionKind::plug;
  int plug_ins = 1000;
  int chatter = 1;  ///< closings in a row each time, half a period apart: a contact bounces
};

/// What may be left on the dropper after unplugging. `allowed_voltage_V` (discharge_rules.hpp) gives the
/// limit for one dropper on one line.
struct DischargeRule {
  double voltage_V = 34;
  double after_s = 1;
  double not_below_F = 0.1e-6;                ///< no rule when the greatest dropper capacitance is <= this
  std::string basis;                          ///< named source, and how it is known
  std::string name = {};                      ///< of the named rule; empty for one in figures
  std::optional<double> share_of_start = {};  ///< set: the limit is this share of the crest, not voltage_V
  bool more_when_small = false;               ///< small capacitors may hold more than voltage_V, by a table
};

struct Surge {
  double voltage_V = 0;
  double source_ohm = 2;
};

struct Dip {
  double residual = 0;  ///< fraction of the voltage left
  double cycles = 0.5;
};

/// An absent limit is no check.
struct Limits {
  std::optional<double> standby_power_W;
  double current_margin = 0;  ///< fraction of the heaviest sustained output current
  std::optional<double> start_time_s;
  std::optional<DischargeRule> discharge;
  std::optional<Surge> surge;
  std::optional<double> fast_burst_V;  ///< IEC 61000-4-4 level; an energy estimate only
  std::vector<Dip> dips;
  bool series_rated = false;  ///< true: only series-rated droppers comply
};

struct Derating {
  double resistor_power = 0.60;
  double reservoir_voltage = 0.80;
  double dropper_voltage = 1.00;
  double clamp_power = 1.00;
  double junction_K = 25;
};

enum class Objective { cost, standby_loss, board_area, current_margin };

/// All that a design is scored against, parts lists and search settings excluded.
struct Requirement {
  std::vector<Supply> supplies;  ///< at least one
  OutputNeed output;
  Surroundings surroundings;
  Connection connection;
  Limits limits;
  Derating derating;
  std::int64_t volume = 1000;
  std::string currency = "EUR";
  std::int64_t placement_cost_micro = 0;  ///< per placed part
  bool accept_missing_ratings = false;
  std::vector<Objective> objectives{Objective::cost, Objective::standby_loss, Objective::board_area,
                                    Objective::current_margin};
};

}  // namespace dropfront::scoring
