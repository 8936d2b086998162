// The first-ranked designs of the shipped problems against tests/reference/first_ranked.json. Its README says
// where each figure comes from and how it was checked outside.
#include <algorithm>
#include <fstream>
#include <nlohmann/json.hpp>

#include "app/program.hpp"
#include "support/catch.hpp"

namespace dropfront::app {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using nlohmann::json;

json recorded_designs() {
  std::ifstream file(std::string(DROPFRONT_SOURCE_DIR) + "/tests/reference/first_ranked.json");
  return json::parse(file)["designs"];
}

/// The assess document of a recorded design.
json assessed(const Workshop& shop, const json& record) {
  shop.write("design.json", record["design"].dump());
  const auto finished = shop.run("assess problems/" + record["problem"].get<std::string>() +
                                 ".json --design design.json --json" + " --combination " +
                                 std::to_string(record["combination"].get<int>()));
  INFO(finished.err);
  REQUIRE(finished.status == 0);  // each of them complies
  return json::parse(finished.out);
}

std::string label(const json& record) {
  return record["problem"].get<std::string>() + " " + record["combination"].dump() + " " +
         record["sets"].dump();
}

/// Output current in the lean corner for a step-down stage, else rail current: what charge balance bounds.
double delivered_A(const json& record, const json& document) {
  if (record["design"]["output_stage"]["kind"] == "step-down")
    return document["objectives"]["current_margin_A"].get<double>() +
           document["operation"]["lean_hot"]["load_current_A"].get<double>();
  return std::min(document["operation"]["lean_cold"]["available_current_A"].get<double>(),
                  document["operation"]["lean_hot"]["available_current_A"].get<double>());
}

}  // namespace

// A change alarm. Money and area are integers inside, so they stand to the last digit; solved figures may
// move with a maths library in the tenth digit, and 1e-6 is far below anything a change of method would
// leave. A step-down stage's margin is the top of a flat hill, searched to 2e-4 of the rail voltage: its
// place moves with the last bit of a steady state, the hill's height by some 1e-5.
TEST_CASE("the recorded designs of the shipped problems score as recorded") {
  const Workshop shop;
  const json records = recorded_designs();
  REQUIRE(records.size() >= 20);
  for (const json& record : records) {
    INFO(label(record));
    const json document = assessed(shop, record);
    for (const char* name : {"cost", "board_area_mm2"}) CHECK(document["objectives"][name] == record[name]);
    const auto agrees = [&](const std::string& name, double now, double recorded) {
      const bool hill = name == "supply.margin" || name == "current_margin_A";
      CHECK_THAT(now, WithinRel(recorded, hill ? 1e-4 : 1e-6));
    };
    for (const char* name : {"standby_loss_W", "current_margin_A"})
      agrees(name, document["objectives"][name].get<double>(), record[name].get<double>());
    for (const auto& [corner, current] : record["available_current_A"].items())
      CHECK_THAT(document["operation"][corner]["available_current_A"].get<double>(),
                 WithinRel(current.get<double>(), 1e-6));
    int compared = 0;
    for (const json& check : document["checks"]) {
      const auto found = record["checks"].find(check["id"].get<std::string>());
      if (found == record["checks"].end()) continue;
      INFO(found.key());
      agrees(found.key(), check["value"].get<double>(), found->get<double>());
      ++compared;
    }
    CHECK(compared == static_cast<int>(record["checks"].size()));
  }
}

// References: charge balance (a bound: the mean current cannot exceed the charge the dropper moves; short of
// it by the ripple, and by more where the rail hangs in the zener's knee), and the standby loss summed part
// by part.
TEST_CASE("the recorded designs lie where closed forms put them") {
  const Workshop shop;
  for (const json& record : recorded_designs()) {
    INFO(label(record));
    const json document = assessed(shop, record);
    const double charge_balance_A = record["outside"]["charge_balance_A"];
    const double current_A = delivered_A(record, document);
    CHECK(current_A <= charge_balance_A);
    CHECK(current_A >= 0.8 * charge_balance_A);  // the softest knee among them loses 15 %
    // The sum takes a clamp at the mean of its current; the steepest of these zeners bends that by 6 %.
    CHECK_THAT(document["objectives"]["standby_loss_W"].get<double>(),
               WithinRel(record["outside"]["standby_by_parts_W"].get<double>(), 0.07));
  }
}

// Reference: ngspice on the deck of each design at its lean and its standby corner, smooth junctions.
// Tolerances as for all comparisons with it: rail 2 % or 0.2 V, power 3 %, current 1 %.
TEST_CASE("the recorded designs behave as ngspice found them") {
  const Workshop shop;
  for (const json& record : recorded_designs()) {
    INFO(label(record));
    const json document = assessed(shop, record);
    for (const auto& [corner, theirs] : record["outside"]["ngspice"].items()) {
      INFO(corner);
      const json& ours = document["operation"][corner];
      for (const char* rail : {"rail_min_V", "rail_mean_V"}) {
        const double volts = theirs[rail];
        CHECK_THAT(ours[rail].get<double>(), WithinAbs(volts, std::max(0.2, 0.02 * volts)));
      }
      CHECK_THAT(ours["input_power_W"].get<double>(), WithinRel(theirs["input_power_W"].get<double>(), 0.03));
      CHECK_THAT(ours["input_current_Arms"].get<double>(),
                 WithinRel(theirs["input_current_Arms"].get<double>(), 0.01));
    }
  }
}

}  // namespace dropfront::app
