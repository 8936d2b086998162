#include "dropfront/scoring/discharge_rules.hpp"

#include <algorithm>
#include <array>
#include <utility>

namespace dropfront::scoring {

namespace {

constexpr const char* kRestated = " (as restated, copy not kept)";

const std::vector<DischargeRule>& named_rules() {
  static const std::vector<DischargeRule> rules = [] {
    const std::string restated = kRestated;
    std::vector<DischargeRule> made(4);
    made[0].name = "60335-1";
    made[0].voltage_V = 34;
    made[0].after_s = 1;
    made[0].not_below_F = 0.1e-6;
    made[0].basis =
        "IEC 60335-1 clause 22.5: plug pins at most 34 V, 1 s after disconnection, not below 0.1 uF" +
        restated;
    made[1].name = "62368-1";
    made[1].voltage_V = 60;
    made[1].after_s = 2;
    made[1].not_below_F = 0;
    made[1].more_when_small = true;
    made[1].basis = "IEC 62368-1 clause 5.5.2.2: 2 s after disconnection" + restated +
                    "; ES1 limit of a charged capacitor, table 5, straight between its points (from memory)";
    made[2].name = "61010-1";
    made[2].voltage_V = 60;
    made[2].after_s = 5;
    made[2].not_below_F = 0;
    made[2].basis = "IEC 61010-1 clause 6.10.3: plug pins at most 60 V, 5 s after disconnection" + restated +
                    "; its limit by charge is not taken";
    made[3].name = "60950-1";
    made[3].after_s = 1;
    made[3].not_below_F = 0.1e-6;
    made[3].share_of_start = 0.37;
    made[3].basis =
        "IEC 60950-1 (withdrawn) clause 2.1.1.7: 37 % of the start within 1 s, pluggable type A, above 0.1 "
        "uF" +
        restated;
    return made;
  }();
  return rules;
}

}  // namespace

const std::vector<std::string>& discharge_rule_names() {
  static const std::vector<std::string> names = [] {
    std::vector<std::string> all;
    for (const auto& rule : named_rules()) all.push_back(rule.name);
    return all;
  }();
  return names;
}

std::optional<DischargeRule> discharge_rule(std::string_view name) {
  for (const auto& rule : named_rules()) {
    if (rule.name == name) return rule;
  }
  return std::nullopt;
}

double allowed_voltage_V(const DischargeRule& rule, double capacitance_F, double start_V) {
  if (rule.share_of_start) return *rule.share_of_start * start_V;
  if (rule.more_when_small) return std::max(rule.voltage_V, es1_capacitor_V(capacitance_F));
  return rule.voltage_V;
}

double es1_capacitor_V(double capacitance_F) {
  // Rising in capacitance: nanofarads, volts.
  constexpr std::array<std::pair<double, double>, 12> kTable{{{0.8, 5000},
                                                              {1.6, 2000},
                                                              {4.0, 1000},
                                                              {8.0, 500},
                                                              {12, 350},
                                                              {18, 250},
                                                              {28, 200},
                                                              {41, 150},
                                                              {61, 125},
                                                              {91, 100},
                                                              {170, 75},
                                                              {300, 60}}};
  const double nanofarads = capacitance_F * 1e9;
  if (!(nanofarads > kTable.front().first)) return kTable.front().second;
  for (std::size_t i = 1; i < kTable.size(); ++i) {
    const auto& [right_nF, right_V] = kTable[i];
    if (!(nanofarads <= right_nF)) continue;
    const auto& [left_nF, left_V] = kTable[i - 1];
    return left_V + (right_V - left_V) * (nanofarads - left_nF) / (right_nF - left_nF);
  }
  return kTable.back().second;
}

}  // namespace dropfront::scoring
