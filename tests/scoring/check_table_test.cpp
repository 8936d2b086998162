#include "dropfront/scoring/check_table.hpp"

#include <cmath>
#include <functional>
#include <map>

#include "dropfront/scoring/check_formulas.hpp"
#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using test::Example;

/// Every arrangement with every kind of stage.
void each_example(const std::function<void(Example&)>& look) {
  for (const auto& arrangement : circuit::arrangements())
    for (int stage = 0; stage < 3; ++stage) {
      Example example(arrangement.name.data());
      example.requirement.limits.standby_power_W = 0.5;
      example.requirement.limits.series_rated = true;
      example.requirement.limits.discharge = DischargeRule{};
      example.requirement.surroundings.max_height_mm = 25;
      example.requirement.limits.start_time_s = 1;
      example.requirement.limits.dips = {{0, 0.5}};
      example.requirement.output.loads.push_back({"relay", true, 20e-3, {}, 15e-3, 2.0});
      if (stage == 1) {
        example.linear(5, 0.04, 1.7, 3e-3);
        example.surge(1000);
        example.guarded = example.fused = true;
        example.series_resistor.fusible = false;
        example.series_resistor.opens_at.reset();
      }
      if (stage == 2) test::step_down(example);
      INFO(arrangement.name << ", stage " << stage);
      look(example);
    }
}

TEST_CASE("the checks stand in their documented order, each id once") {
  const std::vector<std::string_view> documented{"supply.margin",
                                                 "supply.burst",
                                                 "supply.start",
                                                 "supply.start_time",
                                                 "supply.stable",
                                                 "supply.dip",
                                                 "rail.max",
                                                 "rail.transient",
                                                 "output.band",
                                                 "standby.power",
                                                 "dropper.voltage",
                                                 "dropper.class",
                                                 "dropper.series_rated",
                                                 "dropper.slew",
                                                 "dropper.impulse",
                                                 "resistor.power",
                                                 "resistor.voltage",
                                                 "resistor.pulse",
                                                 "resistor.pulse_voltage",
                                                 "resistor.surge",
                                                 "resistor.opens",
                                                 "resistor.body",
                                                 "clamp.power",
                                                 "clamp.junction",
                                                 "clamp.pulse",
                                                 "clamp.surge",
                                                 "rectifier.reverse",
                                                 "rectifier.surge",
                                                 "thyristor.latch",
                                                 "thyristor.current",
                                                 "thyristor.turn_off",
                                                 "varistor.continuous",
                                                 "varistor.energy",
                                                 "varistor.current",
                                                 "varistor.protected",
                                                 "reservoir.voltage",
                                                 "reservoir.ripple",
                                                 "reservoir.life",
                                                 "reservoir.leakage",
                                                 "discharge.voltage",
                                                 "discharge.power",
                                                 "discharge.working_voltage",
                                                 "discharge.surge",
                                                 "output_stage.junction",
                                                 "output_stage.input",
                                                 "fuse.hold",
                                                 "fuse.opens",
                                                 "fuse.voltage",
                                                 "board.height"};
  std::vector<std::string_view> found;
  for (const CheckRule& rule : check_table()) found.push_back(rule.id);
  CHECK(found == documented);
}

TEST_CASE("every check answers under its own id with one unit and one side and a verdict that follows") {
  std::map<std::string_view, std::pair<std::string_view, bool>> seen;
  each_example([&](Example& example) {
    Evidence evidence(example.design(), example.requirement, example.supply());
    for (const CheckRule& rule : check_table()) {
      const auto check = rule.evaluate(evidence);
      if (!check) continue;
      INFO(rule.id << ": " << check->basis);
      CHECK(check->id == rule.id);
      CHECK_FALSE(check->basis.empty());
      const auto [place, fresh] = seen.emplace(rule.id, std::pair(check->unit, check->at_most));
      CHECK((fresh || place->second == std::pair(check->unit, check->at_most)));
      CHECK_FALSE(check->unsolved);
      if (!check->value || !check->limit) {
        CHECK_FALSE(check->pass == true);
        continue;
      }
      CHECK(std::isfinite(*check->value));
      CHECK(check->pass ==
            (check->at_most ? *check->value <= *check->limit : *check->value >= *check->limit));
    }
  });
  CHECK(seen.size() == check_table().size());
}

TEST_CASE("every check says its formula, and every one that is no yes or no the numbers it took") {
  std::map<std::string_view, bool> carried;
  each_example([&](Example& example) {
    Evidence evidence(example.design(), example.requirement, example.supply());
    for (const CheckRule& rule : check_table()) {
      const auto check = rule.evaluate(evidence);
      if (!check || check->yes_or_no()) continue;
      for (const auto* list : {&check->figures, &check->at.values})
        for (const Term& figure : *list) {
          INFO(rule.id << " " << figure.name);
          CHECK_FALSE(figure.name.empty());
        }
      carried[rule.id] = carried[rule.id] || (!check->figures.empty() || !check->at.values.empty());
    }
  });
  for (const CheckRule& rule : check_table()) {
    INFO(rule.id);
    CHECK_FALSE(check_formula(rule.id).empty());
    if (carried.count(rule.id) > 0) CHECK(carried[rule.id]);
  }
  CHECK(check_formula("supply.nothing").empty());
}

TEST_CASE("cheap checks need no steady state and no transient") {
  each_example([](Example& example) {
    Evidence evidence(example.design(), example.requirement, example.supply());
    for (const CheckRule& rule : check_table())
      if (rule.tier == Tier::list) rule.evaluate(evidence);
    CHECK(evidence.steady_states() == 0);
    CHECK(evidence.transients() == 0);
  });
}

TEST_CASE("only transient checks run transients") {
  each_example([](Example& example) {
    Evidence evidence(example.design(), example.requirement, example.supply());
    for (const CheckRule& rule : check_table())
      if (rule.tier < Tier::transient) rule.evaluate(evidence);
    CHECK(evidence.transients() == 0);
  });
}

TEST_CASE("a rating that is not given is never a pass") {
  using Remove = void (*)(Example&);
  const std::vector<std::pair<std::string_view, Remove>> removals{
      {"supply.start", [](Example& e) { e.stage.input_on_V.reset(); }},
      {"supply.start_time", [](Example& e) { e.stage.input_on_V.reset(); }},
      {"rail.max", [](Example& e) { e.stage.input_max_V.reset(); }},
      {"rail.transient", [](Example& e) { e.reservoir.surge_voltage_V.reset(); }},
      {"dropper.class", [](Example& e) { e.dropper.class_name.clear(); }},
      {"dropper.slew", [](Example& e) { e.dropper.slew_V_per_s.reset(); }},
      {"resistor.power", [](Example& e) { e.series_resistor.rated_power_W.reset(); }},
      {"resistor.voltage", [](Example& e) { e.series_resistor.rated_voltage_Vrms.reset(); }},
      {"resistor.pulse", [](Example& e) { e.series_resistor.pulse_energy_J.reset(); }},
      {"resistor.pulse_voltage", [](Example& e) { e.series_resistor.overload_voltage_V.reset(); }},
      {"resistor.opens", [](Example& e) { e.series_resistor.opens_at.reset(); }},
      {"resistor.opens", [](Example& e) { e.series_resistor.rated_power_W.reset(); }},
      {"resistor.body", [](Example& e) { e.series_resistor.rated_power_W.reset(); }},
      {"clamp.power", [](Example& e) { e.clamp.rated_power_W.reset(); }},
      {"clamp.junction", [](Example& e) { e.clamp.thermal_resistance_K_per_W = 0; }},
      {"clamp.pulse", [](Example& e) { e.clamp.pulse_power_W.reset(); }},
      {"clamp.pulse", [](Example& e) { e.clamp.pulse_time_s.reset(); }},
      {"rectifier.reverse", [](Example& e) { e.rectifier.reverse_voltage_V.reset(); }},
      {"rectifier.surge", [](Example& e) { e.rectifier.surge_current_A.reset(); }},
      {"reservoir.ripple", [](Example& e) { e.reservoir.ripple_current_Arms.reset(); }},
      {"reservoir.life", [](Example& e) { e.reservoir.ripple_current_Arms.reset(); }},
      {"reservoir.life", [](Example& e) { e.reservoir.life_h.reset(); }},
      {"reservoir.life", [](Example& e) { e.reservoir.life_temperature_degC.reset(); }},
      {"discharge.power", [](Example& e) { e.discharge.rated_power_W.reset(); }},
      {"discharge.working_voltage", [](Example& e) { e.discharge.rated_voltage_Vrms.reset(); }},
      {"output_stage.junction", [](Example& e) { e.stage.thermal_resistance_K_per_W.reset(); }},
      {"output_stage.junction", [](Example& e) { e.stage.max_junction_degC.reset(); }},
      {"output_stage.input", [](Example& e) { e.stage.input_max_V.reset(); }},
      {"dropper.impulse",
       [](Example& e) {
         e.dropper.impulse_V.reset();
         e.dropper.class_name = "X3";
       }},
      {"resistor.surge", [](Example& e) { e.series_resistor.pulse_energy_J.reset(); }},
      {"clamp.surge", [](Example& e) { e.clamp.pulse_power_W.reset(); }},
      {"clamp.surge", [](Example& e) { e.clamp.pulse_time_s.reset(); }},
      {"varistor.energy", [](Example& e) { e.varistor.energy_J.reset(); }},
      {"varistor.energy", [](Example& e) { e.varistor.clamp_voltage_V.reset(); }},
      {"varistor.energy", [](Example& e) { e.varistor.clamp_current_A.reset(); }},
      {"varistor.current", [](Example& e) { e.varistor.surge_current_A.reset(); }},
      {"varistor.current", [](Example& e) { e.varistor.clamp_voltage_V.reset(); }},
      {"discharge.surge", [](Example& e) { e.discharge.overload_voltage_V.reset(); }},
      {"fuse.hold", [](Example& e) { e.fuse.melting_i2t_A2s.reset(); }},
      {"fuse.voltage", [](Example& e) { e.fuse.rated_voltage_Vrms.reset(); }},
      {"board.height", [](Example& e) { e.dropper.info.height_um.reset(); }},
  };
  for (const auto& [id, remove] : removals) {
    Example example;
    test::step_down(example);
    example.stage.input_max_V = 60;  // what is still given is not broken
    example.requirement.surroundings.max_height_mm = 25;
    example.requirement.limits.start_time_s = 1;
    example.surge(500);
    example.guarded = example.fused = true;
    example.reservoir.surge_voltage_V = 60;
    remove(example);
    for (const CheckRule& rule : check_table()) {
      if (rule.id != id) continue;
      INFO(id);
      const auto check = test::judge(example, rule.evaluate);
      REQUIRE(check);
      CHECK_FALSE(check->pass);
      CHECK_FALSE(check->limit);
      CHECK_FALSE(check->unsolved);
    }
  }
}

}  // namespace
}  // namespace dropfront::scoring
