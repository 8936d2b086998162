#include "dropfront/scoring/creepage.hpp"

#include <algorithm>
#include <array>
#include <cmath>

namespace dropfront::scoring {

namespace {

/// Millimetres x 1000: pollution degree 1 (all groups), then degree 2 and degree 3 by groups I, II, III.
struct Row {
  double voltage_Vrms;
  std::int64_t degree_1;
  std::array<std::int64_t, 3> degree_2;
  std::array<std::int64_t, 3> degree_3;
};

constexpr std::array<Row, 11> kRows{{
    {50, 180, {600, 850, 1200}, {1500, 1700, 1900}},
    {63, 200, {630, 900, 1250}, {1600, 1800, 2000}},
    {80, 220, {670, 950, 1300}, {1700, 1900, 2100}},
    {100, 250, {710, 1000, 1400}, {1800, 2000, 2200}},
    {125, 280, {750, 1050, 1500}, {1900, 2100, 2400}},
    {160, 320, {800, 1100, 1600}, {2000, 2200, 2500}},
    {200, 420, {1000, 1400, 2000}, {2500, 2800, 3200}},
    {250, 560, {1250, 1800, 2500}, {3200, 3600, 4000}},
    {320, 750, {1600, 2200, 3200}, {4000, 4500, 5000}},
    {400, 1000, {2000, 2800, 4000}, {5000, 5600, 6300}},
    {500, 1300, {2500, 3600, 5000}, {6300, 7100, 8000}},
}};

std::int64_t entry(const Row& row, int pollution_degree, std::string_view group) {
  if (pollution_degree <= 1) return row.degree_1;
  const std::size_t column = group == "I" ? 0 : group == "II" ? 1 : 2;
  return pollution_degree == 2 ? row.degree_2[column] : row.degree_3[column];
}

}  // namespace

std::int64_t creepage_um(double voltage_Vrms, int pollution_degree, std::string_view material_group) {
  for (const auto& row : kRows) {
    if (voltage_Vrms <= row.voltage_Vrms) return entry(row, pollution_degree, material_group);
  }
  const auto last = static_cast<double>(entry(kRows.back(), pollution_degree, material_group));
  const double longer = std::ceil(last * voltage_Vrms / kRows.back().voltage_Vrms);
  return std::isfinite(longer) ? static_cast<std::int64_t>(std::min(longer, 1e9)) : 1'000'000'000;
}

}  // namespace dropfront::scoring
