#include "dropfront/parts/defaults.hpp"

#include <algorithm>
#include <iterator>
#include <numbers>

namespace dropfront::parts {
namespace {

struct Point {
  double x, y;
};

constexpr Point zener_percent_per_K[] = {
    {3.3, -0.065}, {3.6, -0.065}, {3.9, -0.045}, {4.3, -0.04}, {4.7, 0.005}, {5.1, 0.015},
    {5.6, 0.0225}, {6.2, 0.0325}, {6.8, 0.050},  {7.5, 0.058}, {8.2, 0.062}, {9.1, 0.068},
    {10, 0.075},   {11, 0.076},   {12, 0.077},   {13, 0.079},  {15, 0.082},  {16, 0.083},
    {18, 0.085},   {20, 0.086},   {22, 0.087},   {24, 0.088},  {27, 0.090},  {30, 0.091},
    {33, 0.092},   {36, 0.093},   {39, 0.094},   {43, 0.095},  {47, 0.095},  {51, 0.096}};

constexpr Point loss_tangent_by_rating[] = {{100, 0.08}, {63, 0.09}, {50, 0.10}, {35, 0.12},
                                            {25, 0.14},  {16, 0.16}, {10, 0.20}, {0, 0.23}};

}  // namespace

double zener_temperature_coefficient_per_K(double voltage_V) {
  const auto above = std::find_if(std::begin(zener_percent_per_K), std::end(zener_percent_per_K),
                                  [&](const Point& point) { return point.x >= voltage_V; });
  if (above == std::begin(zener_percent_per_K)) return above->y / 100;
  if (above == std::end(zener_percent_per_K)) return std::prev(above)->y / 100;
  const Point& a = *std::prev(above);
  return (a.y + (above->y - a.y) * (voltage_V - a.x) / (above->x - a.x)) / 100;
}

double electrolytic_loss_tangent(double rated_voltage_V, double capacitance_F) {
  double loss = 0.20;
  if (rated_voltage_V <= 100) {
    for (const Point& row : loss_tangent_by_rating) {
      if (rated_voltage_V >= row.x) {
        loss = row.y;
        break;
      }
    }
  }
  return loss + 0.02 * std::max(0.0, capacitance_F / 1000e-6 - 1);
}

double electrolytic_esr_ohm(double rated_voltage_V, double capacitance_F) {
  return electrolytic_loss_tangent(rated_voltage_V, capacitance_F) /
         (2 * std::numbers::pi * 120 * capacitance_F);
}

double electrolytic_cold_factor(double rated_voltage_V) { return rated_voltage_V < 25 ? 3 : 2; }

double electrolytic_leakage_A(double rated_voltage_V, double capacitance_F) {
  return std::max(0.01 * capacitance_F * rated_voltage_V, 3e-6);
}

}  // namespace dropfront::parts
