#pragma once
#include <stdexcept>
#include <string>
#include <string_view>

#include "dropfront/values/unit.hpp"

namespace dropfront::values {

/// A text that is not a quantity of the wanted kind. Local: readers turn it into an InputError with its
/// place. The message quotes what was found and says what is allowed.
class ParseError : public std::runtime_error {
 public:
  using std::runtime_error::runtime_error;
};

/// Engineering text to a number in the unit named beside `Unit`. Accepted:
/// - a plain number, already in that unit: "230", "1e-6", "-.5";
/// - number, optional space, optional SI prefix, unit: "470 nF", "0.3 mA", "15 ms", "10 %", "-200 ppm/K";
/// - number and prefix alone: "470n", "4.7k" (refused where it could mean another unit: "15 m" for a time);
/// - the letter codes of IEC 60062 for resistances and capacitances: "4k7", "R47", "1u5", "p33"; "3V3" for
///   voltages (trade custom).
/// The micro sign, the Greek mu and u are one. The result is the correctly rounded double of the decimal
/// text, so "470 nF", "0.47 uF" and 470e-9 are equal. Throws ParseError: empty, not finite, trailing text,
/// unit of another kind.
double parse_quantity(std::string_view text, Unit unit);

/// For people: "470 nF", "1.5 uF", "47 ohm", "0.3 mA", "4.7 kohm", "5 %", "60 °C", "10 years".
/// `significant` digits at least (digits before the point are never dropped), trailing zeros removed. A
/// prefix serves from a tenth of it up, farads from one. Not finite: "not a number" or "infinite".
std::string format_quantity(double value, Unit unit, int significant = 3);

}  // namespace dropfront::values
