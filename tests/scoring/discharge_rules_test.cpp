#include "dropfront/scoring/discharge_rules.hpp"

#include <cmath>

#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using test::Example;
using test::judge;

/// Nothing but line, dropper and one element: all tolerances 0, pure sine, at the film's reference.
Example bare(const char* rule, double line_Vrms, double capacitance_F, double chain_ohm) {
  Example example;
  example.supply() = {"", {line_Vrms, line_Vrms, line_Vrms}, {50, 50, 50}, {}, true, false};
  example.requirement.surroundings.ambient_degC = {20, 20, 20};
  example.requirement.limits.discharge = discharge_rule(rule);
  example.dropper.capacitance_F = capacitance_F;
  example.dropper.tolerance = 0;
  example.discharge.tolerance = 0;
  example.discharge.resistance_ohm = chain_ohm;
  example.discharge_count = 1;
  return example;
}

TEST_CASE("each named rule is known by its name alone, and says where it is from and how it is known") {
  CHECK(discharge_rule_names() == std::vector<std::string>{"60335-1", "62368-1", "61010-1", "60950-1"});
  for (const auto& name : discharge_rule_names()) {
    const auto rule = discharge_rule(name);
    REQUIRE(rule);
    INFO(name << ": " << rule->basis);
    CHECK(rule->name == name);
    CHECK(rule->basis.find("IEC " + name) != std::string::npos);
    CHECK(rule->basis.find("as restated, copy not kept") != std::string::npos);
  }
  CHECK(discharge_rule("62368-1")->basis.find("from memory") != std::string::npos);
  CHECK_FALSE(discharge_rule("60335"));
}

TEST_CASE("a chain just inside the largest bleeder of a rule passes, just outside fails") {
  // Largest chains in megohm, worked by hand from t/(C·ln(Vpk/V)): 34 V in 1 s and 60 V in 2 s at 264 V and
  // 0.47 uF; 60 V in 5 s is 5/2 of the latter; one time constant of 1 s is 1/C, and 37 % lies a little above
  // it: 1/(C·ln(1/0.37)).
  struct Row {
    const char* rule;
    double megohm;
  };
  for (const auto& row : {Row{"60335-1", 0.888}, Row{"62368-1", 2.328}, Row{"61010-1", 2.5 * 2.328},
                          Row{"60950-1", 2.128 / std::log(1 / 0.37)}}) {
    INFO(row.rule);
    auto inside = bare(row.rule, 264, 0.47e-6, 0.998e6 * row.megohm);
    CHECK(judge(inside, discharge_voltage).value().pass == true);
    auto outside = bare(row.rule, 264, 0.47e-6, 1.002e6 * row.megohm);
    CHECK(judge(outside, discharge_voltage).value().pass == false);
  }
}

TEST_CASE("the ES1 limit passes through its table, falls with capacitance and ends flat") {
  // IEC 62368-1 table 5, charged capacitor, from memory.
  const std::vector<std::pair<double, double>> table{{300, 60}, {170, 75}, {91, 100},   {61, 125},
                                                     {41, 150}, {28, 200}, {18, 250},   {12, 350},
                                                     {8, 500},  {4, 1000}, {1.6, 2000}, {0.8, 5000}};
  // Linear in between, so a point of the table comes back to rounding.
  for (const auto& [nanofarads, volts] : table)
    CHECK_THAT(es1_capacitor_V(nanofarads * 1e-9), WithinRel(volts, 1e-12));
  CHECK(es1_capacitor_V(10e-6) == 60);
  CHECK(es1_capacitor_V(0.1e-9) == 5000);
  CHECK_THAT(es1_capacitor_V(235e-9), WithinAbs(67.5, 1e-9));  // half way from 170 nF to 300 nF
  double last = es1_capacitor_V(0.5e-9);
  for (double c = 0.9e-9; c < 400e-9; c *= 1.1) {
    CHECK(es1_capacitor_V(c) <= last);
    last = es1_capacitor_V(c);
  }
}

TEST_CASE("a small dropper may hold more under 62368-1, and its tolerance counts against it") {
  auto small = bare("62368-1", 230, 170e-9, 1e6);
  CHECK_THAT(*judge(small, discharge_voltage).value().limit, WithinRel(75.0, 1e-9));
  small.dropper.tolerance = 0.2;  // 204 nF
  CHECK(*judge(small, discharge_voltage).value().limit < 75);
}

TEST_CASE("a share of the crest allows more on a higher line; a voltage does not") {
  for (const auto& name : discharge_rule_names()) {
    auto low = bare(name.c_str(), 115, 0.47e-6, 1e6), high = bare(name.c_str(), 230, 0.47e-6, 1e6);
    const double ratio =
        *judge(high, discharge_voltage).value().limit / *judge(low, discharge_voltage).value().limit;
    INFO(name);
    // The crest is twice as high; it is searched, to a small share of itself.
    CHECK_THAT(ratio, WithinRel(name == "60950-1" ? 2.0 : 1.0, 1e-6));
  }
}

TEST_CASE("60335-1 and 60950-1 ask nothing up to 0.1 uF, the others always") {
  for (const auto& name : discharge_rule_names()) {
    auto example = bare(name.c_str(), 230, 0.1e-6, 1e6);
    const bool exempt = name == "60335-1" || name == "60950-1";
    INFO(name);
    CHECK(judge(example, discharge_voltage).has_value() != exempt);
  }
}

}  // namespace
}  // namespace dropfront::scoring
