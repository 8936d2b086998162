#pragma once
#include <optional>
#include <string>
#include <string_view>

namespace dropfront::values {

/// The shortest decimal text that reads back as the same double, valid as a JSON number: plain from 1e-4 to
/// 1e15, with an exponent outside. Minus zero is "0". Not finite: "nan", "inf", "-inf" (callers write null).
std::string number_text(double value);

/// Strict reading of a whole text as a plain finite number ("1e-6", "-.5", "12"); nothing else around it.
std::optional<double> parse_number(std::string_view text);

}  // namespace dropfront::values
