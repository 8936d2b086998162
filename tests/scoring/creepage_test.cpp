#include "dropfront/scoring/creepage.hpp"

#include "support/catch.hpp"

using namespace dropfront::scoring;

TEST_CASE("Creepage grows with voltage, pollution and with weaker material") {
  for (int degree = 1; degree <= 3; ++degree) {
    for (const char* group : {"I", "II", "IIIa", "IIIb"}) {
      std::int64_t last = 0;
      for (double v = 10; v < 700; v += 5) {
        const auto here = creepage_um(v, degree, group);
        REQUIRE(here >= last);
        if (degree < 3) REQUIRE(here < creepage_um(v, degree + 1, group));
        last = here;
      }
    }
  }
  REQUIRE(creepage_um(230, 2, "I") < creepage_um(230, 2, "II"));
  REQUIRE(creepage_um(230, 2, "II") < creepage_um(230, 2, "IIIa"));
  REQUIRE(creepage_um(230, 2, "IIIa") == creepage_um(230, 2, "IIIb"));
}

TEST_CASE("Rows of IEC 60664-1 table F.4 for pollution degree 2, from memory") {
  struct Row {
    double V;
    std::int64_t one, two, three;
  };
  for (const auto& row : {Row{100, 710, 1000, 1400}, Row{125, 750, 1050, 1500}, Row{160, 800, 1100, 1600},
                          Row{200, 1000, 1400, 2000}, Row{250, 1250, 1800, 2500}, Row{320, 1600, 2200, 3200},
                          Row{400, 2000, 2800, 4000}}) {
    REQUIRE(creepage_um(row.V, 2, "I") == row.one);
    REQUIRE(creepage_um(row.V, 2, "II") == row.two);
    REQUIRE(creepage_um(row.V, 2, "IIIa") == row.three);
  }
  // Pollution degree 3 at 250 V: 3.2/3.6/4.0 mm, from memory.
  REQUIRE(creepage_um(250, 3, "I") == 3200);
  REQUIRE(creepage_um(250, 3, "II") == 3600);
  REQUIRE(creepage_um(250, 3, "IIIa") == 4000);
}

TEST_CASE("From 160 V on, group III at pollution degree 2 is 1 mm a hundred volts and twice group I") {
  for (const double v : {160.0, 200.0, 250.0, 320.0, 400.0, 500.0}) {
    REQUIRE(creepage_um(v, 2, "IIIa") == static_cast<std::int64_t>(10 * v));
    REQUIRE(creepage_um(v, 2, "IIIa") == 2 * creepage_um(v, 2, "I"));
  }
}

TEST_CASE("A voltage between two rows takes the next row up") {
  REQUIRE(creepage_um(250, 2, "IIIa") == 2500);
  REQUIRE(creepage_um(250.1, 2, "IIIa") == 3200);
  REQUIRE(creepage_um(253, 2, "IIIa") == 3200);
  REQUIRE(creepage_um(1000, 2, "IIIa") == 10000);
}
