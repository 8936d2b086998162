#include "dropfront/values/quantity.hpp"

#include <string>

#include "support/catch.hpp"

using dropfront::values::format_quantity;
using dropfront::values::parse_quantity;
using dropfront::values::ParseError;
using dropfront::values::Unit;

namespace {

std::string refusal(const std::string& text, Unit unit) {
  try {
    parse_quantity(text, unit);
  } catch (const ParseError& error) {
    return error.what();
  }
  return "accepted";
}

struct Code {
  const char* text;
  double value;
};

}  // namespace

// Values are compared with ==: the reader rounds the whole decimal text once, as the compiler does.

TEST_CASE("Resistance letter codes of IEC 60062 read as the code's published examples say") {
  // IEC 60062 examples, as restated, copy not kept; the last rows and '2k4' from memory.
  for (const Code& code : {Code{"R47", 0.47},
                           {"4R7", 4.7},
                           {"470R", 470},
                           {"4K7", 4700},
                           {"47K", 47e3},
                           {"47K3", 47300},
                           {"470K", 470e3},
                           {"4M7", 4.7e6},
                           {"2k4", 2400},
                           {"4k7", 4700},
                           {"1M0", 1e6},
                           {"0R1", 0.1},
                           {"R10", 0.1},
                           {"1G0", 1e9},
                           {"5L6", 5.6e-3}}) {
    CAPTURE(code.text);
    CHECK(parse_quantity(code.text, Unit::ohm) == code.value);
  }
}

TEST_CASE("Capacitance letter codes of IEC 60062 read as the code's examples say") {
  // Examples from memory.
  for (const Code& code : {Code{"1u5", 1.5e-6},
                           {"1µ5", 1.5e-6},
                           {"1μ5", 1.5e-6},
                           {"100n", 100e-9},
                           {"n47", 0.47e-9},
                           {"4p7", 4.7e-12},
                           {"p33", 0.33e-12},
                           {"2m2", 2.2e-3},
                           {"1F0", 1}}) {
    CAPTURE(code.text);
    CHECK(parse_quantity(code.text, Unit::farad) == code.value);
  }
}

TEST_CASE("Every kind reads its unit with prefix and keeps the written decimal") {
  struct Row {
    const char* text;
    Unit unit;
    double value;
  };
  for (const Row& row : {Row{"230 V", Unit::volt, 230},
                         {"1 kV", Unit::volt, 1000},
                         {"3V3", Unit::volt, 3.3},
                         {"0.3 mA", Unit::ampere, 0.3e-3},
                         {"20mA", Unit::ampere, 20e-3},
                         {"470 nF", Unit::farad, 470e-9},
                         {"0.47 uF", Unit::farad, 470e-9},
                         {"47 Ω", Unit::ohm, 47},
                         {"4.7 k\u2126", Unit::ohm, 4700},
                         {"2 R", Unit::ohm, 2},
                         {"0.5 W", Unit::watt, 0.5},
                         {"1 mW", Unit::watt, 1e-3},
                         {"120 mJ", Unit::joule, 0.12},
                         {"15 ms", Unit::second, 15e-3},
                         {"2 min", Unit::second, 120},
                         {"10 years", Unit::second, 315576000},
                         {"2000 h", Unit::hour, 2000},
                         {"1 year", Unit::hour, 8766},
                         {"50.5 Hz", Unit::hertz, 50.5},
                         {"10 %", Unit::share, 0.1},
                         {"0.1", Unit::share, 0.1},
                         {"5%", Unit::share, 0.05},
                         {"60 °C", Unit::degC, 60},
                         {"-25", Unit::degC, -25},
                         {"\u221225 \u2103", Unit::degC, -25},
                         {"25 C", Unit::degC, 25},
                         {"25 K", Unit::kelvin, 25},
                         {"-200 ppm/K", Unit::per_kelvin, -200e-6},
                         {"0.077 %/°C", Unit::per_kelvin, 0.077e-2},
                         {"12 K/W", Unit::K_per_W, 12},
                         {"150 V/us", Unit::V_per_s, 150e6},
                         {"150 V/µs", Unit::V_per_s, 150e6},
                         {"3.7 A2s", Unit::A2s, 3.7},
                         {"3.7 A²s", Unit::A2s, 3.7},
                         {"1 mm2", Unit::square_metre, 1e-6},
                         {"1 mm²", Unit::square_metre, 1e-6},
                         {"25 mm", Unit::metre, 25e-3},
                         {"26.5", Unit::millimetre, 26.5},
                         {"2", Unit::count, 2},
                         {"180", Unit::degree, 180},
                         {"1e-6", Unit::farad, 1e-6},
                         {"1.5e-6 F", Unit::farad, 1.5e-6},
                         {" 470\u00a0nF ", Unit::farad, 470e-9},
                         {"+5 V", Unit::volt, 5},
                         {".5 A", Unit::ampere, 0.5}}) {
    CAPTURE(row.text);
    CHECK(parse_quantity(row.text, row.unit) == row.value);
  }
}

TEST_CASE("A unit of another kind is refused by name of both kinds") {
  CHECK(refusal("10 V", Unit::farad) == "'10 V' is a voltage, a capacitance is wanted, such as 470 nF");
  CHECK(refusal("25 K", Unit::degC) ==
        "'25 K' is a temperature difference, a temperature is wanted, such as 60 °C");
  CHECK(refusal("4k7", Unit::farad) == "'4k7' is a resistance, a capacitance is wanted, such as 470 nF");
  CHECK(refusal("n47", Unit::ohm) == "'n47' is a capacitance, a resistance is wanted, such as 4k7");
  CHECK(refusal("60 °C", Unit::kelvin) ==
        "'60 °C' is a temperature, a temperature difference is wanted, such as 25 K");
  CHECK(refusal("5 %", Unit::volt) == "'5 %' is a share, a voltage is wanted, such as 230 V");
  CHECK(refusal("2 mm2", Unit::metre) == "'2 mm2' is an area, a length is wanted, such as 25 mm");
}

TEST_CASE("Texts that are no quantity are refused with what was found") {
  for (const char* text : {"",       "   ",        "abc",   "nan",   "inf",     "-inf", "NaN V",  "1e999 V",
                           "1e-999", "12 V extra", "12 VV", "4,7 V", "1.2.3 V", "--5",  "+-5",    "5 furlong",
                           "V",      "0x10",       "1 2 V", "5e",    "k",       "4k7k", "10 V 5", "\xff"}) {
    CAPTURE(text);
    CHECK_THROWS_AS(parse_quantity(text, Unit::volt), ParseError);
  }
  CHECK(refusal("4,7 uF", Unit::farad) ==
        "'4,7 uF' has a comma where decimals take a point, a capacitance is wanted, such as 470 nF");
  CHECK(refusal("", Unit::watt) == "is empty, a power is wanted, such as 0.5 W");
  CHECK(refusal("12 V extra", Unit::volt).find("'V extra'") != std::string::npos);
}

TEST_CASE("Prefixes that could mean another unit are refused") {
  CHECK_THROWS_AS(parse_quantity("15 m", Unit::second), ParseError);  // minutes or milliseconds
  CHECK_THROWS_AS(parse_quantity("1 MF", Unit::farad), ParseError);   // once a microfarad
  CHECK_THROWS_AS(parse_quantity("1M5", Unit::farad), ParseError);
  CHECK_THROWS_AS(parse_quantity("1m5", Unit::ohm), ParseError);  // IEC 60062 uses L for milliohms
  CHECK_THROWS_AS(parse_quantity("-4k7", Unit::ohm), ParseError);
  CHECK(parse_quantity("47K", Unit::ohm) == 47e3);
  CHECK(parse_quantity("47K", Unit::kelvin) == 47);
  CHECK(parse_quantity("1 mohm", Unit::ohm) == 1e-3);
  CHECK(parse_quantity("1 Mohm", Unit::ohm) == 1e6);
}

TEST_CASE("Quantities are shown as the trade writes them") {
  struct Row {
    double value;
    Unit unit;
    const char* text;
  };
  for (const Row& row : {Row{470e-9, Unit::farad, "470 nF"},
                         {1.5e-6, Unit::farad, "1.5 uF"},
                         {2200e-6, Unit::farad, "2200 uF"},
                         {47, Unit::ohm, "47 ohm"},
                         {0.47, Unit::ohm, "0.47 ohm"},
                         {4700, Unit::ohm, "4.7 kohm"},
                         {999.9, Unit::ohm, "1 kohm"},
                         {1e6, Unit::ohm, "1 Mohm"},
                         {0.3e-3, Unit::ampere, "0.3 mA"},
                         {20e-3, Unit::ampere, "20 mA"},
                         {3e-6, Unit::ampere, "3 uA"},
                         {0.4517, Unit::watt, "0.452 W"},
                         {0, Unit::watt, "0 W"},
                         {-0.0, Unit::volt, "0 V"},
                         {230, Unit::volt, "230 V"},
                         {-12.34, Unit::volt, "-12.3 V"},
                         {0.05, Unit::share, "5 %"},
                         {60, Unit::degC, "60 °C"},
                         {-200e-6, Unit::per_kelvin, "-200 ppm/K"},
                         {150e6, Unit::V_per_s, "150 V/us"},
                         {315576000, Unit::second, "10 years"},
                         {15e-3, Unit::second, "15 ms"},
                         {12345, Unit::count, "12345"},
                         {1e-6, Unit::square_metre, "1 mm2"},
                         {26.5, Unit::millimetre, "26.5 mm"}}) {
    CHECK(format_quantity(row.value, row.unit) == row.text);
  }
  CHECK(format_quantity(1234.56, Unit::volt, 5) == "1.2346 kV");
  CHECK(format_quantity(0.0 / 0.0, Unit::volt) == "not a number");
}

TEST_CASE("What is shown reads back to the shown digits in every kind") {
  for (int kind = 0; kind <= static_cast<int>(Unit::degree); ++kind) {
    const Unit unit = static_cast<Unit>(kind);
    for (double value = 1.2345e-9; value < 1e9; value *= 7.3) {
      const std::string text = format_quantity(value, unit, 6);
      if (unit == Unit::count || unit == Unit::degree || text.find("0.000000") == 0) continue;
      CAPTURE(text);
      // Six significant digits shown: half a unit of the sixth at worst, 5e-6 relative.
      CHECK_THAT(parse_quantity(text, unit), Catch::Matchers::WithinRel(value, 5.01e-6));
    }
  }
}
