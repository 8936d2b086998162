#include "dropfront/values/quantity.hpp"

#include <fmt/format.h>

#include <cmath>
#include <optional>

#include "dropfront/values/number_text.hpp"
#include "dropfront/values/unit_symbols.hpp"

namespace dropfront::values {
namespace {

bool is_digit(char c) { return c >= '0' && c <= '9'; }
bool is_letter(char c) { return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z'); }

std::string_view trimmed(std::string_view text) {
  while (!text.empty() && text.front() == ' ') text.remove_prefix(1);
  while (!text.empty() && text.back() == ' ') text.remove_suffix(1);
  return text;
}

/// A text cut into decimal digits, its power of ten and what follows.
struct Pieces {
  std::string digits;  ///< sign, digits, at most one point; empty when the text begins with no number
  int exponent = 0;
  std::string_view suffix;
};

Pieces cut(std::string_view text) {
  Pieces pieces;
  std::size_t i = 0;
  if (i < text.size() && (text[i] == '-' || text[i] == '+')) ++i;
  bool any = false;
  bool point = false;
  for (; i < text.size() && (is_digit(text[i]) || (text[i] == '.' && !point)); ++i) {
    any = any || is_digit(text[i]);
    point = point || text[i] == '.';
  }
  if (!any) return pieces;
  pieces.digits = text.substr(text[0] == '+' ? 1 : 0, i - (text[0] == '+' ? 1 : 0));
  if (i < text.size() && (text[i] == 'e' || text[i] == 'E')) {
    std::size_t j = i + 1;
    const bool minus = j < text.size() && text[j] == '-';
    if (j < text.size() && (text[j] == '-' || text[j] == '+')) ++j;
    const std::size_t first = j;
    int exponent = 0;
    for (; j < text.size() && is_digit(text[j]); ++j) {
      if (exponent < 10000) exponent = exponent * 10 + (text[j] - '0');
    }
    if (j > first) {
      pieces.exponent = minus ? -exponent : exponent;
      i = j;
    }
  }
  pieces.suffix = trimmed(text.substr(i));
  return pieces;
}

/// IEC 60062: one letter in place of the point, digits behind it; the unit may follow.
std::optional<Pieces> cut_letter_code(std::string_view text, Unit unit) {
  std::size_t i = 0;
  while (i < text.size() && is_digit(text[i])) ++i;
  if (i + 1 >= text.size() || !is_letter(text[i]) || !is_digit(text[i + 1])) return std::nullopt;
  const auto exponent = code_letter_exponent(text[i], unit);
  if (!exponent) return std::nullopt;
  std::size_t end = i + 1;
  while (end < text.size() && is_digit(text[end])) ++end;
  Pieces pieces;
  pieces.digits = std::string(text.substr(0, i)) + '.' + std::string(text.substr(i + 1, end - i - 1));
  pieces.exponent = *exponent;
  pieces.suffix = trimmed(text.substr(end));
  const bool unit_follows = !pieces.suffix.empty();
  const auto scale = suffix_scale(pieces.suffix, unit);
  if (unit_follows && (!scale || scale->exponent != 0)) return std::nullopt;
  return pieces;
}

/// "A2 s", "ppm / K" and "V / us" are one unit.
std::string closed_up(std::string_view suffix) {
  std::string closed;
  for (const char c : suffix) {
    if (c != ' ') closed += c;
  }
  const bool joins = closed.find('/') != std::string::npos || closed == "A2s";
  return joins ? closed : std::string(suffix);
}

[[noreturn]] void refuse(std::string_view found, std::string_view what, Unit unit) {
  throw ParseError(
      fmt::format("'{}' {}, {} is wanted, such as {}", found, what, quantity_name(unit), example_text(unit)));
}

double assemble(const Pieces& pieces, const Scale& scale, std::string_view found, Unit unit) {
  // One decimal text, rounded once: 470 nF is the double nearest to 470e-9.
  const auto value = parse_number(fmt::format("{}e{}", pieces.digits, pieces.exponent + scale.exponent));
  if (!value || !std::isfinite(*value * scale.multiple)) refuse(found, "is out of range", unit);
  return *value * scale.multiple;
}

}  // namespace

double parse_quantity(std::string_view text, Unit unit) {
  const std::string plain = plain_spelling(text);
  const std::string_view body = trimmed(plain);
  if (body.empty())
    throw ParseError(
        fmt::format("is empty, {} is wanted, such as {}", quantity_name(unit), example_text(unit)));
  if (const auto code = cut_letter_code(body, unit)) return assemble(*code, Scale{}, text, unit);

  const Pieces pieces = cut(body);
  const std::string suffix = closed_up(pieces.suffix);
  if (!pieces.digits.empty()) {
    if (const auto scale = suffix_scale(suffix, unit)) return assemble(pieces, *scale, text, unit);
  }
  for (const Unit other : {Unit::ohm, Unit::farad, Unit::volt}) {
    if (other == unit || !cut_letter_code(body, other)) continue;
    refuse(text, fmt::format("is {}", quantity_name(other)), unit);
  }
  if (pieces.digits.empty()) refuse(text, "is not a finite number with unit", unit);
  if (suffix[0] == ',') refuse(text, "has a comma where decimals take a point", unit);
  if (const auto other = kind_of_suffix(suffix, unit)) {
    refuse(text, fmt::format("is {}", quantity_name(*other)), unit);
  }
  refuse(text, fmt::format("ends in '{}', which is no unit of the kind", suffix), unit);
}

}  // namespace dropfront::values
