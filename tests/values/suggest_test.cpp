#include "dropfront/values/suggest.hpp"

#include "support/catch.hpp"

using namespace dropfront::values;

TEST_CASE("Edit distance counts single edits and neighbour swaps") {
  CHECK(edit_distance("kitten", "sitting") == 3);  // the textbook pair
  CHECK(edit_distance("voltage", "votlage") == 1);
  CHECK(edit_distance("", "abc") == 3);
  CHECK(edit_distance("ESR", "esr") == 0);
}

TEST_CASE("Edit distance is a metric on a handful of names") {
  const std::vector<std::string> names = {"esr", "esr_cold", "leakage", "loss_tangent", "a", ""};
  for (const auto& a : names) {
    for (const auto& b : names) {
      CHECK(edit_distance(a, b) == edit_distance(b, a));
      for (const auto& c : names) CHECK(edit_distance(a, c) <= edit_distance(a, b) + edit_distance(b, c));
    }
  }
}

TEST_CASE("A slip of the pen finds the name meant, a strange word finds none") {
  const std::vector<std::string> names = {"capacitance", "tolerance", "rated_voltage", "esr", "esr_cold"};
  CHECK(nearest_name("capacitence", names) == "capacitance");
  CHECK(nearest_name("rated voltage", names) == "rated_voltage");
  CHECK(nearest_name("ratedVoltage", names) == "rated_voltage");
  CHECK(nearest_name("cap", names) == "capacitance");
  CHECK_FALSE(nearest_name("flavour", names));
  CHECK_FALSE(nearest_name("zz", names));
  CHECK_FALSE(nearest_name("esr", {}));
  CHECK(did_you_mean("toleranse", names) == " (did you mean 'tolerance'?)");
  CHECK(did_you_mean("flavour", names).empty());
}
