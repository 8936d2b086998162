#include "dropfront/values/unit.hpp"

namespace dropfront::values {
namespace {

struct Words {
  std::string_view name;
  std::string_view example;
};

constexpr Words words_of(Unit unit) {
  switch (unit) {
    case Unit::count:
      return {"a plain number", "2"};
    case Unit::volt:
      return {"a voltage", "230 V"};
    case Unit::ampere:
      return {"a current", "0.3 mA"};
    case Unit::ohm:
      return {"a resistance", "4k7"};
    case Unit::farad:
      return {"a capacitance", "470 nF"};
    case Unit::watt:
      return {"a power", "0.5 W"};
    case Unit::joule:
      return {"an energy", "2 J"};
    case Unit::second:
      return {"a time", "15 ms"};
    case Unit::hour:
      return {"a time in hours", "2000 h"};
    case Unit::hertz:
      return {"a frequency", "50 Hz"};
    case Unit::share:
      return {"a share", "10 %"};
    case Unit::degC:
      return {"a temperature", "60 °C"};
    case Unit::kelvin:
      return {"a temperature difference", "25 K"};
    case Unit::per_kelvin:
      return {"a temperature coefficient", "-200 ppm/K"};
    case Unit::K_per_W:
      return {"a thermal resistance", "12 K/W"};
    case Unit::V_per_s:
      return {"a rate of voltage", "150 V/us"};
    case Unit::A2s:
      return {"a melting integral", "3.7 A2s"};
    case Unit::square_metre:
      return {"an area", "1 mm2"};
    case Unit::metre:
      return {"a length", "25 mm"};
    case Unit::millimetre:
      return {"a length in mm", "26.5"};
    case Unit::degree:
      return {"an angle in degrees", "180"};
  }
  return {"a value", "1"};
}

}  // namespace

std::string_view quantity_name(Unit unit) { return words_of(unit).name; }

std::string_view example_text(Unit unit) { return words_of(unit).example; }

}  // namespace dropfront::values
