#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinRel;
using test::Example;
using test::judge;

double local_degC(const Check& check) {
  for (const auto& figure : check.at.values)
    if (figure.name == "local_degC") return figure.value;
  return -1e9;
}

TEST_CASE("the body stands above its air by its thermal resistance times the power that is judged") {
  Example example;
  example.series_resistor.thermal_resistance_K_per_W = 135;  // a 2 W metal film part, common practice
  example.requirement.surroundings.enclosure_K_per_W = 12;
  example.requirement.surroundings.ambient_degC = {50, 50, 50};  // so that both judge the same point
  const Check body = judge(example, resistor_body).value(), power = judge(example, resistor_power).value();
  CHECK_THAT(*body.value - local_degC(body), WithinRel(135 * *power.value, 1e-9));
  CHECK(local_degC(body) > example.requirement.surroundings.ambient_degC.high);
  CHECK(*body.limit == 155);
}

TEST_CASE("without a thermal resistance the body takes the one of the derating line: 85 K at full power") {
  Example example;
  example.requirement.surroundings.ambient_degC = {50, 50, 50};  // so that both judge the same point
  const Check body = judge(example, resistor_body).value(), power = judge(example, resistor_power).value();
  CHECK_THAT(*body.value - local_degC(body), WithinRel(85 / 2.0 * *power.value, 1e-9));
}

TEST_CASE("a part too small for its loss is too hot, and its half no more than half as much") {
  Example example;
  example.series_resistor.rated_power_W = 0.125;
  const Check hot = judge(example, resistor_body).value();
  CHECK(hot.pass == false);
  auto design = example.design();
  example.series_resistor.resistance_ohm /= 2;
  design.series_resistor_count = 2;
  Evidence evidence(design, example.requirement, example.supply());
  const Check split = resistor_body(evidence).value();
  CHECK_THAT(*split.value - local_degC(split), WithinRel((*hot.value - local_degC(hot)) / 2, 1e-9));
}

}  // namespace
}  // namespace dropfront::scoring
