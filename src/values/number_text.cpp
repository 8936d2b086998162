#include "dropfront/values/number_text.hpp"

#include <charconv>
#include <cmath>

namespace dropfront::values {

std::string number_text(double value) {
  if (std::isnan(value)) return "nan";
  if (std::isinf(value)) return value > 0 ? "inf" : "-inf";
  if (value == 0) return "0";
  const double size = std::fabs(value);
  const auto form = size >= 1e-4 && size < 1e15 ? std::chars_format::fixed : std::chars_format::scientific;
  char text[64];
  const auto end = std::to_chars(text, text + sizeof text, value, form);
  return {text, end.ptr};
}

std::optional<double> parse_number(std::string_view text) {
  if (!text.empty() && text[0] == '+' && text.size() > 1 && text[1] != '-') text.remove_prefix(1);
  double value = 0;
  const auto end = std::from_chars(text.data(), text.data() + text.size(), value);
  if (end.ec != std::errc() || end.ptr != text.data() + text.size() || !std::isfinite(value)) {
    return std::nullopt;
  }
  return value;
}

}  // namespace dropfront::values
