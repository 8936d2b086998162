#include "dropfront/values/number_text.hpp"

#include <cmath>
#include <limits>

#include "dropfront/values/random.hpp"
#include "support/catch.hpp"

using namespace dropfront::values;

TEST_CASE("Number texts are the shortest that people would write") {
  CHECK(number_text(0.1) == "0.1");
  CHECK(number_text(230) == "230");
  CHECK(number_text(100000) == "100000");
  CHECK(number_text(4.7e-7) == "4.7e-07");
  CHECK(number_text(1e22) == "1e+22");
  CHECK(number_text(-0.0) == "0");
  CHECK(number_text(std::nan("")) == "nan");
  CHECK(number_text(-std::numeric_limits<double>::infinity()) == "-inf");
}

TEST_CASE("Any finite double survives the way to text and back") {
  RandomStream stream(5);
  for (int i = 0; i < 20000; ++i) {
    const double value = std::ldexp(stream.uniform(-1, 1), static_cast<int>(stream.below(600)) - 300);
    REQUIRE(parse_number(number_text(value)) == value);
  }
  for (const double value : {std::numeric_limits<double>::max(), std::numeric_limits<double>::min()}) {
    CHECK(parse_number(number_text(value)) == value);
  }
}

TEST_CASE("Only whole plain finite numbers are read") {
  CHECK(parse_number("1e-6") == 1e-6);
  CHECK(parse_number("+2") == 2.0);
  for (const char* text : {"", " 1", "1 ", "1,5", "nan", "inf", "1e999", "0x10", "+-1", "1V", "+"}) {
    CAPTURE(text);
    CHECK_FALSE(parse_number(text));
  }
}
