#include "dropfront/values/unit_symbols.hpp"

#include <array>
#include <utility>

#include "dropfront/values/year.hpp"

namespace dropfront::values {
namespace {

struct Symbol {
  Unit unit;
  std::string_view text;
  int exponent = 0;
  double multiple = 1;
  bool takes_prefix = false;
};

constexpr Symbol symbols[] = {
    {Unit::volt, "V", 0, 1, true},
    {Unit::volt, "volt"},
    {Unit::volt, "volts"},
    {Unit::ampere, "A", 0, 1, true},
    {Unit::ampere, "ampere"},
    {Unit::ampere, "amperes"},
    {Unit::ohm, "ohm", 0, 1, true},
    {Unit::ohm, "ohms", 0, 1, true},
    {Unit::ohm, "Ohm", 0, 1, true},
    {Unit::ohm, "R"},
    {Unit::farad, "F", 0, 1, true},
    {Unit::farad, "farad"},
    {Unit::watt, "W", 0, 1, true},
    {Unit::watt, "watt"},
    {Unit::watt, "watts"},
    {Unit::joule, "J", 0, 1, true},
    {Unit::joule, "joule"},
    {Unit::joule, "joules"},
    {Unit::second, "s", 0, 1, true},
    {Unit::second, "min", 0, 60},
    {Unit::second, "h", 0, 3600},
    {Unit::second, "hour", 0, 3600},
    {Unit::second, "hours", 0, 3600},
    {Unit::second, "d", 0, 86400},
    {Unit::second, "day", 0, 86400},
    {Unit::second, "days", 0, 86400},
    {Unit::second, "year", 0, kSecondsPerYear},
    {Unit::second, "years", 0, kSecondsPerYear},
    {Unit::hour, "h"},
    {Unit::hour, "hour"},
    {Unit::hour, "hours"},
    {Unit::hour, "s", 0, 1.0 / 3600},
    {Unit::hour, "min", 0, 1.0 / 60},
    {Unit::hour, "d", 0, 24},
    {Unit::hour, "day", 0, 24},
    {Unit::hour, "days", 0, 24},
    {Unit::hour, "year", 0, kHoursPerYear},
    {Unit::hour, "years", 0, kHoursPerYear},
    {Unit::hertz, "Hz", 0, 1, true},
    {Unit::share, "%", -2},
    {Unit::share, "percent", -2},
    {Unit::share, "ppm", -6},
    {Unit::degC, "degC"},
    {Unit::degC, "C"},
    {Unit::kelvin, "K"},
    {Unit::per_kelvin, "ppm/K", -6},
    {Unit::per_kelvin, "ppm/C", -6},
    {Unit::per_kelvin, "ppm/degC", -6},
    {Unit::per_kelvin, "%/K", -2},
    {Unit::per_kelvin, "%/C", -2},
    {Unit::per_kelvin, "%/degC", -2},
    {Unit::per_kelvin, "1/K"},
    {Unit::per_kelvin, "/K"},
    {Unit::K_per_W, "K/W"},
    {Unit::K_per_W, "C/W"},
    {Unit::K_per_W, "degC/W"},
    {Unit::V_per_s, "V/s"},
    {Unit::V_per_s, "kV/s", 3},
    {Unit::V_per_s, "V/ms", 3},
    {Unit::V_per_s, "kV/ms", 6},
    {Unit::V_per_s, "V/us", 6},
    {Unit::V_per_s, "kV/us", 9},
    {Unit::V_per_s, "V/ns", 9},
    {Unit::A2s, "A2s"},
    {Unit::square_metre, "mm2", -6},
    {Unit::square_metre, "cm2", -4},
    {Unit::square_metre, "m2"},
    {Unit::metre, "um", -6},
    {Unit::metre, "mm", -3},
    {Unit::metre, "cm", -2},
    {Unit::metre, "m"},
    {Unit::millimetre, "um", -3},
    {Unit::millimetre, "mm"},
    {Unit::millimetre, "cm", 1},
    {Unit::millimetre, "m", 3},
    {Unit::degree, "deg"},
    {Unit::degree, "degrees"},
};

constexpr std::pair<char, int> prefixes[] = {{'p', -12}, {'n', -9}, {'u', -6}, {'m', -3},
                                             {'k', 3},   {'M', 6},  {'G', 9},  {'T', 12}};

std::optional<int> prefix_exponent(char letter, Unit unit) {
  if (letter == 'K' && unit == Unit::ohm) return 3;  // upper case is usual on resistors
  for (const auto& [symbol, exponent] : prefixes) {
    // Nothing above the farad: "1 MF" has meant a microfarad on old parts.
    if (symbol == letter && !(unit == Unit::farad && exponent > 0)) return exponent;
  }
  return std::nullopt;
}

// "15 m" could be minutes or milliseconds, so a time needs its unit.
bool prefix_alone_is_clear(Unit unit) {
  switch (unit) {
    case Unit::volt:
    case Unit::ampere:
    case Unit::ohm:
    case Unit::farad:
    case Unit::watt:
    case Unit::joule:
    case Unit::hertz:
      return true;
    default:
      return false;
  }
}

}  // namespace

std::string plain_spelling(std::string_view text) {
  static constexpr std::array<std::pair<std::string_view, std::string_view>, 12> spellings = {{
      {"\u00b5", "u"},
      {"\u03bc", "u"},
      {"\u2126", "ohm"},
      {"\u03a9", "ohm"},
      {"\u2103", "degC"},
      {"\u00b0", "deg"},
      {"\u00b2", "2"},
      {"^2", "2"},
      {"\u2212", "-"},
      {"\u00a0", " "},
      {"\u202f", " "},
      {"\t", " "},
  }};
  std::string plain;
  while (!text.empty()) {
    std::string_view found = text.substr(0, 1);
    std::string_view replacement = found;
    for (const auto& spelling : spellings) {
      if (text.substr(0, spelling.first.size()) == spelling.first) {
        found = spelling.first;
        replacement = spelling.second;
        break;
      }
    }
    plain += replacement;
    text.remove_prefix(found.size());
  }
  return plain;
}

std::optional<Scale> suffix_scale(std::string_view suffix, Unit unit) {
  if (suffix.empty()) return Scale{};
  for (const Symbol& symbol : symbols) {
    if (symbol.unit != unit) continue;
    if (symbol.text == suffix) return Scale{symbol.exponent, symbol.multiple};
    if (symbol.takes_prefix && suffix.substr(1) == symbol.text) {
      if (const auto exponent = prefix_exponent(suffix[0], unit)) return Scale{*exponent, 1};
    }
  }
  if (suffix.size() == 1 && prefix_alone_is_clear(unit)) {
    if (const auto exponent = prefix_exponent(suffix[0], unit)) return Scale{*exponent, 1};
  }
  return std::nullopt;
}

std::optional<int> code_letter_exponent(char letter, Unit unit) {
  if (unit == Unit::volt && letter == 'V') return 0;
  if (unit == Unit::ohm) {
    if (letter == 'R') return 0;
    if (letter == 'L') return -3;
    const auto exponent = prefix_exponent(letter, unit);
    if (exponent && *exponent > 0) return exponent;
  }
  if (unit == Unit::farad) {
    if (letter == 'F') return 0;
    return prefix_exponent(letter, unit);
  }
  return std::nullopt;
}

std::optional<Unit> kind_of_suffix(std::string_view suffix, Unit except) {
  // A lone letter is a prefix to most kinds, so only whole unit symbols identify one.
  for (const Symbol& symbol : symbols) {
    if (symbol.unit == except || suffix.empty()) continue;
    const bool prefixed = symbol.takes_prefix && suffix.size() > symbol.text.size() &&
                          suffix.substr(1) == symbol.text && prefix_exponent(suffix[0], symbol.unit);
    if (symbol.text == suffix || prefixed) return symbol.unit;
  }
  return std::nullopt;
}

}  // namespace dropfront::values
