#include "dropfront/values/series.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cctype>
#include <cmath>

#include "dropfront/values/number_text.hpp"

namespace dropfront::values {
namespace {

constexpr std::array<int, 7> members_per_decade = {3, 6, 12, 24, 48, 96, 192};
bool in_range(double value) { return value >= 1e-30 && value <= 1e30; }

constexpr double same = 1e-9;  // relative: far above rounding, far below any step of E192

/// 10^(k/n) rounded half up to whole hundredths or tenths.
std::vector<int> by_rule(int n, double scale) {
  std::vector<int> decade;
  for (int k = 0; k < n; ++k) {
    decade.push_back(static_cast<int>(std::floor(scale * std::pow(10.0, double(k) / n) + 0.5)));
  }
  return decade;
}

std::vector<int> every(const std::vector<int>& finest, int step) {
  std::vector<int> decade;
  for (std::size_t i = 0; i < finest.size(); i += step) decade.push_back(finest[i]);
  return decade;
}

std::vector<int> e24() {
  std::vector<int> decade = by_rule(24, 10);
  // IEC 60063 keeps these historic members: 2.7 3.0 3.3 3.6 3.9 4.3 4.7 against the rule's 2.6 2.9 3.2 3.5
  // 3.8 4.2 4.6, and 8.2 against 8.3.
  for (int k = 10; k <= 16; ++k) ++decade[k];
  --decade[22];
  return decade;
}

std::vector<int> e192() {
  std::vector<int> decade = by_rule(192, 100);
  decade[185] = 920;  // the one exception: the rule gives 9.19
  return decade;
}

/// Index of a member counted through all decades: member(i) ascends with i.
double member(Series series, long index) {
  const std::vector<int>& decade = series_decade(series);
  const long n = static_cast<long>(decade.size());
  const long power = index >= 0 ? index / n : -((-index + n - 1) / n);
  const int digits = series <= Series::E24 ? 1 : 2;
  // Through decimal text, so that the double is the one nearest to the written value.
  return parse_number(fmt::format("{}e{}", decade[index - power * n], power - digits)).value_or(0);
}

/// Index of the greatest member not above `value` (a value within `same` counts as the member).
long floor_index(Series series, double value) {
  const int n = members_per_decade[static_cast<int>(series)];
  // The rounding and the exceptions move a member by less than one place from k = n·log10(value).
  long index = static_cast<long>(std::floor(n * std::log10(value))) - 2;
  while (member(series, index + 1) <= value * (1 + same)) ++index;
  return index;
}

}  // namespace

const std::vector<std::string>& series_names() {
  static const std::vector<std::string> names = {"E3", "E6", "E12", "E24", "E48", "E96", "E192"};
  return names;
}

std::optional<Series> series_named(std::string_view name) {
  if (name.empty() || std::toupper(static_cast<unsigned char>(name[0])) != 'E') return std::nullopt;
  for (std::size_t i = 0; i < series_names().size(); ++i) {
    if (name.substr(1) == std::string_view(series_names()[i]).substr(1)) return static_cast<Series>(i);
  }
  return std::nullopt;
}

std::string_view series_name(Series series) { return series_names()[static_cast<int>(series)]; }

const std::vector<int>& series_decade(Series series) {
  static const std::array<std::vector<int>, 7> decades = {
      every(e24(), 8), every(e24(), 4), every(e24(), 2), e24(), every(e192(), 4), every(e192(), 2), e192()};
  return decades[static_cast<int>(series)];
}

double nearest_preferred(Series series, double value) {
  if (!in_range(value)) return 0;
  const long index = floor_index(series, value);
  const double below = member(series, index);
  const double above = member(series, index + 1);
  return above - value < value - below ? above : below;
}

double next_lower_preferred(Series series, double value) {
  if (!in_range(value)) return 0;
  const long index = floor_index(series, value);
  const double at_or_below = member(series, index);
  return at_or_below >= value * (1 - same) ? member(series, index - 1) : at_or_below;
}

double next_higher_preferred(Series series, double value) {
  if (!in_range(value)) return 0;
  return member(series, floor_index(series, value) + 1);
}

std::vector<double> preferred_between(Series series, double from, double to) {
  std::vector<double> values;
  if (!in_range(from) || !in_range(to)) return values;
  long index = floor_index(series, from);
  if (member(series, index) < from * (1 - same)) ++index;
  for (double value = member(series, index); value <= to * (1 + same); value = member(series, ++index)) {
    values.push_back(value);
  }
  return values;
}

}  // namespace dropfront::values
