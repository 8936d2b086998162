#include "problem/fixture.hpp"
#include "support/catch.hpp"

using namespace dropfront::problem::testing;
using namespace dropfront;

namespace {

const char* const kNames = R"({"arrangement": "bridge-clamp-across", "dropper": "film-1u",
  "series_resistor": "fuse-100R", "clamp": "z12", "reservoir": "e220u-35", "rectifier": "d1000",
  "output_stage": "lin-5"})";

// The form of the interface's own example.
const char* const kInline = R"({ "arrangement": "half-wave-clamp-ahead",
  "dropper": {"capacitance": "1.5 uF", "tolerance": "10 %", "rated_voltage": "275 V", "series_rated": true, "loss_tangent": 0.001, "end_of_life_loss": "10 %"},
  "series_resistor": {"resistance": "100 R", "tolerance": "5 %", "rated_power": "2 W", "pulse_energy": "2 J", "fusible": true},
  "clamp": {"voltage": "12 V", "tolerance": "5 %", "test_current": "21 mA", "slope_resistance": "9 R", "rated_power": "1 W"},
  "reservoir": {"capacitance": "220 uF", "tolerance": "20 %", "rated_voltage": "25 V", "esr": "0.8 R", "ripple_current": "300 mA"},
  "discharge": {"resistance": "470k", "tolerance": "5 %", "count": 2, "rated_power": "0.25 W", "rated_voltage": "200 V"},
  "rectifier": {"threshold_voltage": "0.67 V", "slope_resistance": "0.67 R", "reverse_voltage": "1000 V", "surge_current": "30 A"},
  "output_stage": {"kind": "linear", "output_voltage": "5 V", "tolerance": "4 %", "dropout": "1.7 V", "quiescent_current": "3 mA", "input_max": "30 V"} })";

scoring::Design design(const Bench& bench, problem::Problem& p, const std::string& text) {
  bench.write("design.json", text);
  return problem::read_design_file(bench.path("design.json"), p);
}

std::string refusal(const Bench& bench, const std::string& text) {
  auto p = bench.problem();
  try {
    design(bench, p, text);
  } catch (const values::InputError& error) {
    return error.what();
  }
  return "accepted";
}

}  // namespace

TEST_CASE("a design names parts of the lists, whatever the problem's slots offer") {
  const Bench bench;
  auto p =
      bench.problem({R"(slots={"dropper": {"only": "film-220n"}, "arrangement": "half-wave-clamp-ahead"})"});
  const auto d = design(bench, p, kNames);
  CHECK(d.arrangement->name == "bridge-clamp-across");
  CHECK(d.dropper->info.name == "film-1u");
  CHECK(d.clamp->voltage_V == 12);
  CHECK(d.discharge == nullptr);
  CHECK(d.discharge_count == 0);
  CHECK(p.inputs.back().name == "design.json");
}

TEST_CASE("a design of inline parts reads every number, and reading it moves no other part") {
  const Bench bench;
  auto p = bench.problem();
  const auto* before = p.offers.clamps[0];
  const auto d = design(bench, p, kInline);
  CHECK(d.dropper->capacitance_F == 1.5e-6);
  CHECK(d.series_resistor->pulse_energy_J.value() == 2);
  CHECK(d.series_resistor->fusible);
  CHECK(d.discharge->resistance_ohm == 470e3);
  CHECK(d.discharge_count == 2);
  CHECK(d.output_stage->kind == parts::StageKind::linear);
  CHECK(d.output_stage->input_max_V.value() == 30);
  CHECK(p.offers.clamps[0] == before);
  CHECK(before->info.name == "z6v8");
}

TEST_CASE("a discharge chain is a name, a name with a count, or an inline part with a count") {
  const Bench bench;
  auto p = bench.problem();
  const auto chain = [&](const std::string& text) {
    const auto d = design(bench, p, with(kNames, "\"clamp\"", "\"discharge\": " + text + ", \"clamp\""));
    return std::to_string(d.discharge_count) + " x " + d.discharge->info.name;
  };
  CHECK(chain("\"chip-470k\"") == "1 x chip-470k");
  CHECK(chain(R"({"part": "chip-470k", "count": 3})") == "3 x chip-470k");
  CHECK(chain(R"({"count": 2, "part": "chip-220k"})") == "2 x chip-220k");
  CHECK(chain(R"({"part": "own", "resistance": "1M", "tolerance": "1 %"})") == "1 x own");
}

TEST_CASE("mistakes of a design file name file, place and what is meant") {
  const Bench bench;
  const std::vector<std::pair<std::string, std::string>> table{
      {with(kNames, "\"clamp\": \"z12\", ", ""), "design.json:1:1: the key \"clamp\" is missing in design"},
      {with(kNames, "\"clamp\"", "\"zener\""), "design.json:2:35: unknown key \"zener\" in design"},
      {with(kNames, "\"z12\"", "\"z21\""), "design.json:2:44: /clamp: found \"z21\" (did you mean 'z12'?)"},
      {with(kNames, "\"z12\"", "12"), "/clamp: found the number 12; allowed: a part's name or an object"},
      {with(kNames, "bridge-clamp-across", "resistive"),
       "/dropper: the arrangement resistive has no dropper"},
      {with(kNames, "bridge-clamp-across", "bridge"), "allowed: half-wave-clamp-ahead"},
      {with(kInline, "\"12 V\"", "\"12 W\""), "design.json:4:24: /clamp/voltage: "},
      {with(kInline, "\"series_rated\": true", "\"series_rated\": \"yes\""),
       "/dropper/series_rated: found the text \"yes\"; allowed: true or false"},
      {with(kInline, "\"count\": 2", "\"count\": 0"), "/discharge/count: found the number 0"},
      {with(kInline, "\"fusible\"", "\"fusable\""), "/series_resistor/fusable: "},
      {with(kNames, "\"clamp\"", "\"thyristor\": \"t\", \"clamp\""),
       "/thyristor: the arrangement bridge-clamp-across has no thyristor"},
  };
  for (const auto& row : table) {
    const std::string message = refusal(bench, row.first);
    INFO(message);
    CHECK(message.find(row.second) != std::string::npos);
  }
}

TEST_CASE("a varistor says on which side of the series resistor it stands, before when not said") {
  const Bench bench;
  bench.write("lists/varistors.csv", "part,continuous_voltage,clamp_voltage\nmov-275,275 V,710 V\n");
  auto p = bench.problem();
  const auto with_varistor = [&](const char* varistor) {
    return design(bench, p,
                  with(kNames, "\"clamp\"", std::string("\"varistor\": ") + varistor + ", \"clamp\""));
  };
  CHECK(with_varistor("\"mov-275\"").varistor_before);
  const auto named = with_varistor(R"({"part": "mov-275", "place": "after"})");
  CHECK(named.varistor->info.name == "mov-275");
  CHECK_FALSE(named.varistor_before);
  const auto inlined = with_varistor(R"({"continuous_voltage": 275, "place": "after"})");
  CHECK(inlined.varistor->continuous_voltage_Vrms == 275);
  CHECK_FALSE(inlined.varistor_before);
  CHECK(refusal(bench, with(kNames, "\"clamp\"",
                            "\"varistor\": {\"part\": \"mov-275\", \"place\": "
                            "\"befor\"}, \"clamp\""))
            .find("did you mean 'before'?") != std::string::npos);
}

TEST_CASE(
    "two droppers in parallel and a split series resistor are counted as a chain is, one when not said") {
  const Bench bench;
  auto p = bench.problem();
  const auto one = design(bench, p, kNames);
  CHECK(one.dropper_count == 1);
  CHECK(one.series_resistor_count == 1);
  const auto named = design(bench, p,
                            with(with(kNames, "\"film-1u\"", R"({"part": "film-470n", "count": 2})"),
                                 "\"fuse-100R\"", R"({"count": 2, "part": "fuse-47R"})"));
  CHECK(named.dropper->info.name == "film-470n");
  CHECK(named.dropper_count == 2);
  CHECK(named.series_resistor->info.name == "fuse-47R");
  CHECK(named.series_resistor_count == 2);
  const auto inlined = design(bench, p, with(kInline, "\"100 R\"", "\"50 R\", \"count\": 2"));
  CHECK(inlined.series_resistor->resistance_ohm == 50);
  CHECK(inlined.series_resistor_count == 2);
  CHECK(refusal(bench, with(kInline, "\"100 R\"", "\"50 R\", \"count\": 0")).find("/series_resistor/count") !=
        std::string::npos);
}
