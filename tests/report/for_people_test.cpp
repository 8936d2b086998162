#include "dropfront/report/for_people.hpp"

#include "support/catch.hpp"

namespace dropfront::report {
namespace {

TEST_CASE("values carry prefix and unit") {
  CHECK(with_unit(6.8e-7, "F") == "680 nF");
  CHECK(with_unit(47, "ohm") == "47 ohm");
  CHECK(with_unit(12, "V") == "12 V");
  CHECK(with_unit(0.25, "years") == "0.25 years");
  CHECK(with_unit(1, "") == "1");
}

TEST_CASE("rounding never leaves a sign without a number") {
  CHECK(rounded(-0.0001, 2) == "0.00");
  CHECK(rounded(-0.01, 2) == "-0.01");
  CHECK(rounded(std::nullopt, 2) == "-");
}

TEST_CASE("shares are percent, finer below ten") {
  CHECK(percent(0.034) == "3.4 %");
  CHECK(percent(0.34) == "34 %");
  CHECK(percent(-0.5) == "-50 %");
  CHECK(percent(std::nullopt) == "-");
}

TEST_CASE("counts are grouped by thousands") {
  CHECK(counted(0) == "0");
  CHECK(counted(999) == "999");
  CHECK(counted(1234567) == "1,234,567");
  CHECK(counted(7.4e17) == "7.4e+17");
}

TEST_CASE("money and area come from integers without a residue") {
  scoring::Objectives objectives;
  objectives.cost_micro = 612345;
  objectives.board_area_um2 = 1034500000;
  CHECK(cost_units(objectives) == 0.612345);
  CHECK(area_mm2(objectives) == 1034.5);
  CHECK_FALSE(cost_units(scoring::Objectives{}));
}

}  // namespace
}  // namespace dropfront::report
