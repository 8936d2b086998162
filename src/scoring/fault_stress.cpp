#include "dropfront/scoring/fault_stress.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <utility>

#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

namespace {

using circuit::Owner;

double branch_loss_J(const circuit::Network& network, const circuit::Transient& period, std::size_t b) {
  return b < period.branch_energy_J.size() && b < network.branches.size() ? period.branch_energy_J[b] : 0;
}

/// Clamps, the forward direction of a zener ahead of the diodes included (a diode against the clamp).
double clamp_J(const circuit::Network& network, const circuit::Transient& period) {
  double sum_J = period.loss_J[static_cast<std::size_t>(Owner::clamp)];
  for (std::size_t b = 0; b < network.branches.size(); ++b) {
    const auto& d = network.branches[b];
    if (d.owner != Owner::rectifier) continue;
    const auto against = [&](const circuit::BranchElement& c) {
      return c.owner == Owner::clamp && c.a == d.b && c.b == d.a;
    };
    if (std::any_of(network.branches.begin(), network.branches.end(), against)) {
      sum_J += branch_loss_J(network, period, b);
    }
  }
  return sum_J;
}

double chain_ohm(const circuit::Network& network) {
  for (const auto& r : network.resistors) {
    if (r.owner == Owner::discharge) return r.resistance_ohm;
  }
  return INFINITY;
}

}  // namespace

FaultFigures::FaultFigures(const circuit::Network& network) : reverse_V_(network.branches.size(), 0.0) {
  for (const auto& d : network.branches) legs_.push_back(d.paired() ? 2 : 1);
}

void FaultFigures::add(const circuit::Moment& moment) {
  for (std::size_t b = 0; b < reverse_V_.size(); ++b) {
    reverse_V_[b] = std::max(reverse_V_[b], -moment.branch_V[b] / legs_[b]);
  }
  square_A2s_ += moment.source_current_A * moment.source_current_A * moment.step_s;
  time_s_ += moment.step_s;
}

double FaultFigures::input_current_Arms() const { return time_s_ > 0 ? std::sqrt(square_A2s_ / time_s_) : 0; }

std::vector<FaultStress> fault_stresses(const Design& design, const circuit::Network& network,
                                        const circuit::Transient& period, const FaultFigures& figures,
                                        double duration_s) {
  std::vector<FaultStress> list;
  const auto mean_W = [&](Owner owner) {
    return period.loss_J[static_cast<std::size_t>(owner)] / duration_s;
  };
  const double resistor_W = mean_W(Owner::series_resistor) * series_resistor_share(design);
  list.push_back({"series_resistor", "power", resistor_W, design.series_resistor->rated_power_W, "W"});
  if (design.discharge != nullptr && design.discharge_count > 0) {
    const auto& part = *design.discharge;
    const double share = circuit::greatest_voltage_share(design.discharge_count, part.tolerance);
    const double chain_Vrms = std::sqrt(mean_W(Owner::discharge) * chain_ohm(network));
    if (design.dropper != nullptr) {
      list.push_back({"dropper", "voltage r.m.s.", chain_Vrms, design.dropper->rated_voltage_Vrms, "V"});
    }
    list.push_back(
        {"discharge", "power of an element", mean_W(Owner::discharge) * share, part.rated_power_W, "W"});
    list.push_back(
        {"discharge", "voltage r.m.s. of an element", chain_Vrms * share, part.rated_voltage_Vrms, "V"});
  }
  const double clamp_W = clamp_J(network, period) / duration_s / std::max(1, design.arrangement->clamp_count);
  list.push_back({"clamp", "power", clamp_W, design.clamp->rated_power_W, "W"});
  double reverse_V = 0;
  for (std::size_t b = 0; b < network.branches.size(); ++b) {
    if (network.branches[b].owner == Owner::rectifier) reverse_V = std::max(reverse_V, figures.reverse_V(b));
  }
  list.push_back({"rectifier", "reverse voltage", reverse_V, design.rectifier->reverse_voltage_V, "V"});
  list.push_back({"reservoir", "voltage", period.rail_max_V, design.reservoir->rated_voltage_V, "V"});
  // Electrolytics take no more than about a volt the wrong way round (from memory).
  if (period.rail_min_V < 0) list.push_back({"reservoir", "reverse voltage", -period.rail_min_V, 1.0, "V"});
  list.push_back({"output_stage", "input voltage", period.rail_max_V, design.output_stage->input_max_V, "V"});
  if (design.gate_resistor != nullptr) {
    list.push_back(
        {"gate_resistor", "power", mean_W(Owner::gate_resistor), design.gate_resistor->rated_power_W, "W"});
  }
  return list;
}

std::vector<std::string> opening_parts(const Design& design, const FaultRow& row) {
  std::vector<std::pair<double, std::string>> found;
  const auto& resistor = *design.series_resistor;
  if (resistor.opens_at && resistor.rated_power_W) {
    const double level_W = *resistor.opens_at * *resistor.rated_power_W;
    for (const auto& stress : row.stresses) {
      if (stress.part != "series_resistor" || !(stress.value >= level_W)) continue;
      found.emplace_back(
          stress.value / level_W,
          fmt::format("series_resistor ({:.3g} times the power at which it opens)", stress.value / level_W));
    }
  }
  if (design.fuse != nullptr) {
    constexpr double kOpening = 2.1;
    const double multiple = row.input_current_Arms / (kOpening * design.fuse->rated_current_A);
    if (multiple >= 1) {
      found.emplace_back(multiple,
                         fmt::format("fuse ({:.3g} times the current at which it opens)", multiple));
    }
  }
  std::stable_sort(found.begin(), found.end(),
                   [](const auto& a, const auto& b) { return a.first > b.first; });
  std::vector<std::string> opens;
  for (auto& [multiple, text] : found) opens.push_back(std::move(text));
  return opens;
}

}  // namespace dropfront::scoring
