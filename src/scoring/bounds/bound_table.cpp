#include "dropfront/scoring/bounds/bound_table.hpp"

namespace dropfront::scoring {

namespace {

constexpr auto kExact = BoundClass::exact;
constexpr auto kTheorem = BoundClass::theorem;
constexpr const char* kAny = "any box";
constexpr const char* kCharge = "the four plainly clamped arrangements";
constexpr const char* kParts = "any arrangement with a dropper";
constexpr const char* kCrest = "the four plainly clamped arrangements, odd harmonics only";
constexpr const char* kSeries = "as before, w·Rs·C < 1 over the box";
constexpr const char* kStandby =
    "p = w·Rs·C <= 0.4, q = 1/(w·C·Rb) <= 0.15; behind the dropper at most (0.5 - 1.5q) of the crest, bridge "
    "(0.42 - 0.5p - 1.5q); at most four reservoirs times rectifiers";
constexpr const char* kRich =
    "the four plainly clamped arrangements; series resistor, film loss, chain and rectifier single; no clamp "
    "whose voltage falls with heat; behind the dropper at most 0.4 of the crest";
constexpr const char* kHeat = "as before, reservoir single";
constexpr const char* kPulse = "as before, reservoir and clamp single";
constexpr const char* kSingle = "series resistor, chain, rectifier and ESR single; no step-down stage";

constexpr const char* kShunt = "the thyristor shunts";
constexpr const char* kShuntStandby =
    "the thyristor shunts; p <= 0.4, q <= 0.15, peak dropper current >= 3 x the holding current, trigger "
    "zener "
    "<= 0.24 of the crest, load <= a quarter of the charge";

BoundRule objective(std::string_view id, BoundClass known, int depth, std::string_view range,
                    bounds::ObjectiveBound* rule) {
  return {id, known, depth, range, rule, nullptr};
}
BoundRule limit(std::string_view id, std::string_view range, bounds::LimitBound* rule) {
  return {id, kTheorem, 0, range, nullptr, rule};
}
BoundRule solved_limit(std::string_view id, std::string_view range, bounds::LimitBound* rule) {
  return {id, BoundClass::monotone, 2, range, nullptr, rule};
}

}  // namespace

const std::vector<BoundRule>& bound_table() {
  static const std::vector<BoundRule> table{
      objective("cost", kExact, 0, kAny, bounds::cost),
      objective("board_area", kExact, 0, kAny, bounds::board_area),
      limit("dropper.series_rated", kAny, bounds::dropper_series_rated),
      limit("dropper.class", kAny, bounds::dropper_class),
      limit("dropper.voltage", kAny, bounds::dropper_voltage),
      limit("rectifier.reverse", kAny, bounds::rectifier_reverse),
      limit("resistor.pulse_voltage", kAny, bounds::resistor_pulse_voltage),
      limit("resistor.opens", kAny, bounds::resistor_opens),
      limit("board.height", kAny, bounds::board_height),
      limit("reservoir.life", kAny, bounds::reservoir_life),
      limit("dropper.slew", kParts, bounds::dropper_slew),
      limit("discharge.voltage", kParts, bounds::discharge_voltage),
      objective("current_margin", kTheorem, 0, kCharge, bounds::margin_by_charge),
      objective("current_margin", kTheorem, 0, kShunt, bounds::shunt_margin),
      limit("supply.start", kCharge, bounds::supply_start),
      objective("standby_loss", kTheorem, 0, kCrest, bounds::standby_by_charge),
      limit("resistor.power", kSeries, bounds::resistor_power),
      limit("resistor.voltage", kSeries, bounds::resistor_voltage),
      limit("discharge.power", kSeries, bounds::discharge_power),
      limit("discharge.working_voltage", kSeries, bounds::discharge_working_voltage),
      limit("clamp.power", kCrest, bounds::clamp_power),
      limit("clamp.junction", kCrest, bounds::clamp_junction),
      limit("rail.max", kCrest, bounds::rail_max),
      limit("reservoir.voltage", kCrest, bounds::reservoir_voltage),
      limit("output_stage.input", kCrest, bounds::output_stage_input),
      limit("output_stage.junction", kCrest, bounds::output_stage_junction),
      limit("output.band", kAny, bounds::output_band),
      limit("resistor.pulse", kCrest, bounds::resistor_pulse),
      limit("rectifier.surge", kCrest, bounds::rectifier_surge),
      limit("rail.transient", kCrest, bounds::rail_transient),
      objective("standby_loss", BoundClass::monotone, 1, kStandby, bounds::standby_by_engine),
      objective("standby_loss", BoundClass::monotone, 1, kShuntStandby, bounds::shunt_standby),
      solved_limit("rail.max", kRich, bounds::rail_max_by_engine),
      solved_limit("clamp.power", kHeat, bounds::clamp_power_by_engine),
      solved_limit("clamp.junction", kHeat, bounds::clamp_junction_by_engine),
      solved_limit("rail.transient", kRich, bounds::rail_transient_by_engine),
      solved_limit("clamp.pulse", kPulse, bounds::clamp_pulse_by_engine),
      objective("current_margin", BoundClass::monotone, 3, kSingle, bounds::margin_by_engine),
  };
  return table;
}

}  // namespace dropfront::scoring
