#include <algorithm>
#include <set>

#include "dropfront/scoring/check_table.hpp"
#include "dropfront/scoring/discharge_rules.hpp"
#include "dropfront/scoring/ripple_life.hpp"
#include "problem/fixture.hpp"
#include "support/catch.hpp"

using namespace dropfront::problem::testing;
using namespace dropfront;
using Catch::Matchers::WithinRel;

namespace {
// One rounding of a decimal text or one arithmetic step.
constexpr double kRounding = 1e-12;
}  // namespace

TEST_CASE("every default of the interface is filled in and noted with its reason") {
  const Bench bench;
  const problem::Problem p = bench.problem();
  const std::vector<std::pair<std::string, std::string>> table{
      {"mains.frequency.low", "50 Hz"},
      {"mains.frequency.high", "50 Hz"},
      {"output.tolerance", "5 %"},
      {"output.standby_load", "asleep"},
      {"output.start_load", "8 mA"},
      {"surroundings.ambient.low", "0 °C"},
      {"surroundings.ambient.nominal", "25 °C"},
      {"surroundings.ambient.high", "50 °C"},
      {"surroundings.ambient.mean_over_life", "37.5 °C"},
      {"surroundings.enclosure", "0 K/W"},
      {"surroundings.life", "10 years"},
      {"surroundings.ripple_life", "2^(-dT/5)"},
      {"surroundings.pollution_degree", "2"},
      {"surroundings.material_group", "IIIa"},
      {"surroundings.max_height", "none"},
      {"connection.kind", "plug"},
      {"connection.plug_ins", "1000"},
      {"connection.chatter", "1"},
      {"limits.standby_power", "none"},
      {"limits.current_margin", "0 %"},
      {"limits.start_time", "none"},
      {"limits.discharge", "34 V after 1 s"},
      {"limits.surge", "none"},
      {"limits.fast_burst", "none"},
      {"limits.dips", "none"},
      {"limits.series_rated", "false"},
      {"derating.resistor.power", "60 %"},
      {"derating.reservoir.voltage", "80 %"},
      {"derating.dropper.voltage", "100 %"},
      {"derating.clamp.power", "100 %"},
      {"derating.junction", "25 K"},
      {"volume", "1000"},
      {"currency", "EUR"},
      {"placement_cost", "0"},
      {"missing_ratings", "refuse"},
      {"objectives", "cost, standby_loss, board_area, current_margin"},
      {"resolution.cost", "0.001"},
      {"resolution.standby_loss", "1 mW"},
      {"resolution.board_area", "1 mm2"},
      {"resolution.current_margin", "0.1 mA"},
      {"top", "5"},
      {"effort", "normal"},
      {"seed", "1"},
      {"slots.arrangement", "all arrangements with a dropper and no thyristor"},
      {"slots.dropper", "all rows"},
      {"slots.discharge.count", "1, 2, 3"},
      {"slots.varistor", "none"},
      {"slots.fuse", "none"},
      {"slots.ceramic", "none"},
  };
  for (const auto& row : table) {
    const problem::Default* found = find_default(p, row.first);
    INFO(row.first);
    REQUIRE(found);
    CHECK(found->value == row.second);
    CHECK_FALSE(found->reason.empty());
  }
}

TEST_CASE("no default is noted twice, and a given key is not noted") {
  const Bench bench;
  std::set<std::string> keys;
  for (const auto& entry : bench.problem().defaults) {
    INFO(entry.key);
    CHECK(keys.insert(entry.key).second);
  }
  CHECK(keys.count("output.voltage") == 0);
  const problem::Problem full = bench.problem({}, with(kProblem, "[\"lists\"]", kEverySection));
  for (const char* key :
       {"limits.surge", "derating.junction", "volume", "top", "resolution.cost", "connection.kind"}) {
    CHECK(find_default(full, key) == nullptr);
  }
}

TEST_CASE("a given value ends up where scoring looks, in its unit") {
  const Bench bench;
  const problem::Problem p = bench.problem({}, with(kProblem, "[\"lists\"]", kEverySection));
  const scoring::Requirement& r = p.requirement;
  CHECK(r.supplies.at(0).voltage_Vrms.low == 207);
  CHECK(r.supplies.at(0).voltage_Vrms.high == 253);
  CHECK(r.supplies.at(0).name.empty());
  CHECK(r.output.loads.at(1).current_A == 8e-3);
  CHECK(r.surroundings.ambient_degC.low == -10);
  CHECK(r.surroundings.mean_over_life_degC == 40);
  CHECK(r.surroundings.enclosure_K_per_W == 12);
  CHECK_THAT(r.surroundings.life_years, WithinRel(10.0, kRounding));
  CHECK(r.surroundings.pollution_degree == 3);
  CHECK(r.surroundings.material_group == "II");
  CHECK(r.surroundings.max_height_mm.value() == 25);
  CHECK(r.connection.kind == scoring::ConnectionKind::switched);
  CHECK(r.limits.standby_power_W.value() == 0.5);
  CHECK(r.limits.current_margin == 0.1);
  CHECK(r.limits.start_time_s.value() == 1);
  CHECK(r.limits.discharge.value().not_below_F == 50e-9);
  CHECK(r.limits.surge.value().voltage_V == 1000);
  CHECK(r.limits.dips.at(0).cycles == 0.5);
  CHECK(r.limits.series_rated);
  CHECK(r.derating.resistor_power == 0.5);
  CHECK(r.derating.junction_K == 20);
  CHECK(r.volume == 10000);
  CHECK(r.placement_cost_micro == 4000);
  CHECK(r.accept_missing_ratings);
  CHECK(r.objectives ==
        std::vector<scoring::Objective>{scoring::Objective::standby_loss, scoring::Objective::cost});
  CHECK(p.resolution == std::vector<double>{2e-3, 0});
  CHECK(p.top == 3);
  CHECK(p.effort == "quick");
  CHECK(p.seed == 7);
}

TEST_CASE("the discharge rule follows the kind of connection") {
  const Bench bench;
  const auto rule = [&](const char* kind) {
    return bench.problem({std::string("connection.kind=") + kind}).requirement.limits.discharge;
  };
  // IEC 60335-1 clause 22.5 and IEC 60204-1 clause 6.2.4, as restated, copy not kept.
  REQUIRE(rule("plug"));
  CHECK(rule("plug")->voltage_V == 34);
  CHECK(rule("plug")->after_s == 1);
  CHECK(rule("plug")->not_below_F == 0.1e-6);
  REQUIRE(rule("switched"));
  CHECK(rule("switched")->voltage_V == 60);
  CHECK(rule("switched")->after_s == 5);
  CHECK_FALSE(rule("fixed"));
  const auto cautions = bench.problem({"connection.kind=fixed"}).cautions;
  REQUIRE(cautions.size() == 1);
  CHECK(cautions[0].find("fixed connection") != std::string::npos);
  CHECK(bench.problem().cautions.empty());
}

TEST_CASE("a discharge rule is asked for by the number of its standard, in figures, or not at all") {
  const Bench bench;
  const auto asked = [&](const std::string& value) {
    return bench.problem({"limits.discharge=" + value}).requirement.limits.discharge;
  };
  for (const auto& name : scoring::discharge_rule_names())
    CHECK(asked("\"" + name + "\"").value().name == name);
  CHECK(asked("62368-1").value().more_when_small);  // as a person types it after --set
  CHECK(asked(R"({"voltage": "42 V", "after": "3 s"})").value().voltage_V == 42);
  CHECK_FALSE(asked("\"none\""));
  CHECK(bench.refusal(kProblem, {"limits.discharge=\"62368\""}).find("did you mean '62368-1'") !=
        std::string::npos);
}

TEST_CASE("the ripple term is one of the named ones, the most cautious unless said") {
  const Bench bench;
  CHECK(bench.problem().requirement.surroundings.ripple_life == scoring::RippleLife::halves_each_5_K);
  for (const auto& law : scoring::ripple_life_laws()) {
    const auto p = bench.problem({"surroundings.ripple_life=\"" + std::string(law.name) + "\""});
    CHECK(p.requirement.surroundings.ripple_life == law.law);
  }
  CHECK(bench.refusal(kProblem, {"surroundings.ripple_life=\"2^(-dT/6)\""}).find("2^(-dT/5)") !=
        std::string::npos);
}

TEST_CASE("a distorted line is warned of by its current, a square one is refused") {
  const Bench bench;
  const auto with_harmonics = [](const std::string& list) {
    return std::vector<std::string>{"mains.harmonics=[" + list + "]"};
  };
  const std::string third = R"({"order": 3, "percent": 33.3})", fifth = R"({"order": 5, "percent": 20})",
                    seventh = R"({"order": 7, "percent": 14.3})";
  CHECK(bench.problem(with_harmonics(R"({"order": 5, "percent": 6})")).cautions.empty());
  const auto cautions = bench.problem(with_harmonics(third + "," + fifth)).cautions;
  REQUIRE(cautions.size() == 1);
  // sqrt(3/(1 + 1/9 + 1/25)) = 1.61
  CHECK(cautions[0].find("1.61 times") != std::string::npos);
  const auto refused = bench.refusal(kProblem, with_harmonics(third + "," + fifth + "," + seventh));
  CHECK(refused.find("square or stepped wave") != std::string::npos);
  CHECK(refused.find("/mains/harmonics") != std::string::npos);
}

TEST_CASE("a limit whose check is not registered carries a caution") {
  const Bench bench;
  const auto cautions = bench.problem({}, with(kProblem, "[\"lists\"]", kEverySection)).cautions;
  const auto says = [&](const std::string& key, const std::string& id) {
    const bool cautioned = std::any_of(cautions.begin(), cautions.end(),
                                       [&](const std::string& text) { return text.rfind(key, 0) == 0; });
    const auto& table = scoring::check_table();
    const bool checked = std::any_of(table.begin(), table.end(),
                                     [&](const scoring::CheckRule& rule) { return rule.id == id; });
    INFO(key);
    CHECK(cautioned != checked);
  };
  says("limits.start_time", "supply.start_time");
  says("limits.surge", "resistor.surge");
  says("limits.dips", "supply.dip");
}

TEST_CASE("percent is percent only where the key says so") {
  const Bench bench;
  const auto shares = [&](const std::string& percent) {
    return bench
        .problem({"mains.harmonics=[{\"order\": 3, \"percent\": " + percent + ", \"phase_deg\": 180}]"})
        .requirement.supplies[0];
  };
  CHECK_THAT(shares("3").harmonics.at(0).share, WithinRel(0.03, kRounding));
  CHECK_THAT(shares("\"3 %\"").harmonics.at(0).share, WithinRel(0.03, kRounding));
  CHECK_THAT(shares("3").harmonics.at(0).phase_rad, WithinRel(3.14159265358979, kRounding));
  CHECK(shares("3").harmonics_given);
  CHECK_FALSE(bench.problem().requirement.supplies[0].harmonics_given);
}

TEST_CASE("standby_load may be none, and ties take the first listed") {
  const Bench bench;
  CHECK_FALSE(bench.problem({"output.standby_load=none"}).requirement.output.standby_load);
  CHECK(bench.problem({"output.loads.awake.current=0.2 mA"}).requirement.output.standby_load.value() == 0);
  CHECK(bench.problem().requirement.output.start_load_A == 8e-3);
}
