#pragma once
#include <optional>
#include <string>
#include <string_view>

#include "dropfront/values/unit.hpp"

namespace dropfront::values {

/// What a unit text multiplies a number by: 10^exponent · multiple (1 except for minutes, hours, years).
struct Scale {
  int exponent = 0;
  double multiple = 1;
};

/// One spelling of plain ASCII: micro and mu to u, the ohm sign to "ohm", degree sign to "deg", superscript
/// and
/// "^2" to 2, the minus sign to '-', non-breaking spaces to ' '.
std::string plain_spelling(std::string_view text);

/// Scale of a suffix in plain spelling ("nF", "V/us", "n", "years") for a kind; empty when it is not one of
/// the kind's. The empty suffix is the unit itself.
std::optional<Scale> suffix_scale(std::string_view suffix, Unit unit);

/// Exponent of an IEC 60062 letter for a resistance (R k K M G T; L for milliohm from memory), a capacitance
/// (p n u m F) or, by trade custom, a voltage (V).
std::optional<int> code_letter_exponent(char letter, Unit unit);

/// The kind that a suffix belongs to, other than `unit`: for "is a voltage, a capacitance is wanted".
std::optional<Unit> kind_of_suffix(std::string_view suffix, Unit except);

}  // namespace dropfront::values
