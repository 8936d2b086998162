#include "dropfront/parts/output_stage.hpp"

#include "parts/map_source.hpp"
#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

const MapSource linear = part_of({{"kind", "linear"}, {"output_voltage", "5 V"}, {"tolerance", "4 %"}});
const MapSource buck = part_of({{"kind", "step-down"},
                                {"output_voltage", "5 V"},
                                {"tolerance", "4 %"},
                                {"efficiency", "80 %"},
                                {"input_min", "8 V"}});

TEST_CASE("A linear stage that states nothing is taken for an old and thirsty one") {
  const OutputStage part = read_output_stage(linear, true);
  CHECK(part.kind == StageKind::linear);
  CHECK(part.dropout_V == 2);
  CHECK(part.quiescent_current_A == 6e-3);
  CHECK(part.quiescent_current_dropout_A == 6e-3);
  CHECK(part.max_junction_degC == 150.0);
  CHECK_FALSE(part.thermal_resistance_K_per_W);
  CHECK_FALSE(part.input_max_V);
  CHECK(read_output_stage(linear.with("quiescent_current", "2 uA"), true).quiescent_current_dropout_A ==
        2e-6);
}

TEST_CASE("A direct stage drops and draws nothing") {
  const OutputStage part = read_output_stage(linear.with("kind", "direct"), true);
  CHECK(part.kind == StageKind::direct);
  CHECK(part.dropout_V == 0);
  CHECK(part.quiescent_current_A == 0);
}

TEST_CASE("A step-down stage needs its efficiency and least input") {
  CHECK(read_output_stage(buck, true).efficiency == 0.8);
  CHECK(refusal(read_output_stage, buck.without("efficiency")).find("efficiency is missing") !=
        std::string::npos);
  CHECK(refusal(read_output_stage, buck.without("input_min")).find("input_min is missing") !=
        std::string::npos);
  CHECK(refusal(read_output_stage, buck.with("input_min", "4 V")).find("less than output_voltage") !=
        std::string::npos);
  CHECK(refusal(read_output_stage, buck.with("efficiency", "120 %")).find("out of range") !=
        std::string::npos);
}

TEST_CASE("Inputs of a stage must be in order") {
  CHECK(refusal(read_output_stage, buck.with("input_max", "8 V")).find("not above input_min") !=
        std::string::npos);
  CHECK(
      refusal(read_output_stage, buck.with("input_on", "9 V").with("input_off", "10 V")).find("input_off") !=
      std::string::npos);
  CHECK(refusal(read_output_stage, linear.with("input_max", "4 V")).find("less than output_voltage") !=
        std::string::npos);
  CHECK(refusal(read_output_stage, linear.with("kind", "liner")).find("did you mean 'linear'?") !=
        std::string::npos);
}

}  // namespace
}  // namespace dropfront::parts
