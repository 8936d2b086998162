#include "dropfront/scoring/faults.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <utility>

#include "dropfront/circuit/owner_name.hpp"
#include "dropfront/circuit/transient.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/fault_stress.hpp"

namespace dropfront::scoring {

namespace {

using circuit::FaultKind;
using circuit::FaultPlace;
using circuit::Owner;

constexpr double kLongest_s = 10;  // a rail that creeps is followed this long

/// The design at the high line, unloaded and hot, ready to have one part spoilt.
struct Whole {
  const Design* design;
  circuit::ElementValues values;
  circuit::StateVector state{};
  double weakest_rail_V = INFINITY;  ///< least of reservoir rating and stage input
};

/// From the whole supply's steady state until the rail passes its weakest part.
std::optional<double> rail_over_s(const Whole& whole, const circuit::Network& faulty) {
  circuit::TransientOptions options;
  options.energies = false;
  options.start_time_s = faulty.period_start_s;
  options.duration_s = whole.values.mains.period_s();
  circuit::StateVector state = whole.state;
  for (double passed_s = 0; passed_s < kLongest_s; passed_s += options.duration_s) {
    const auto run = circuit::run_transient(faulty, state, options);
    if (!run.usable) return std::nullopt;
    if (run.rail_max_V > whole.weakest_rail_V) return passed_s + run.rail_max_at_s;
    state = run.end;
    options.start_time_s += options.duration_s;
    options.latched = run.latched;
  }
  return std::nullopt;
}

/// Where the faulty supply ends up: its steady state, else what it does after some seconds.
std::optional<circuit::StateVector> settled(const Whole& whole, const circuit::Network& faulty,
                                            std::string& reason) {
  circuit::SteadyOptions options;
  options.powers = false;
  options.multipliers = false;
  const auto state = circuit::solve_steady_state(faulty, options);
  if (state.status == circuit::SteadyStatus::converged) return state.start;
  circuit::TransientOptions run_options;
  run_options.energies = false;
  run_options.start_time_s = faulty.period_start_s;
  run_options.duration_s = 100 * whole.values.mains.period_s();
  const auto run = circuit::run_transient(faulty, whole.state, run_options);
  if (run.usable) return run.end;
  reason = run.reason;
  return std::nullopt;
}

FaultRow solve(const Whole& whole, const circuit::Network& faulty, std::string part, FaultKind kind) {
  FaultRow row;
  row.part = std::move(part);
  row.kind = kind;
  const auto start = settled(whole, faulty, row.reason);
  if (!start) return row;
  FaultFigures figures(faulty);
  circuit::TransientOptions options;
  options.start_time_s = faulty.period_start_s;
  options.duration_s = whole.values.mains.period_s();
  options.observer = [&](const circuit::Moment& moment) { figures.add(moment); };
  const auto period = circuit::run_transient(faulty, *start, options);
  if (!period.usable) {
    row.reason = period.reason;
    return row;
  }
  row.rail_min_V = period.rail_min_V;
  row.rail_max_V = period.rail_max_V;
  row.input_power_W = period.input_energy_J / options.duration_s;
  row.input_current_Arms = figures.input_current_Arms();
  row.stresses = fault_stresses(*whole.design, faulty, period, figures, options.duration_s);
  row.opens = opening_parts(*whole.design, row);
  if (row.rail_max_V > whole.weakest_rail_V) row.rail_over_s = rail_over_s(whole, faulty);
  return row;
}

/// One element of the chain shorted: the others share its voltage.
void add_discharge_short(const Whole& whole, std::vector<FaultRow>& rows) {
  const int count = whole.design->discharge_count;
  if (whole.design->discharge == nullptr || count < 1) return;
  auto network = whole.design->arrangement->build(whole.values);
  Design shorter = *whole.design;
  shorter.discharge_count = count - 1;
  for (auto& r : network.resistors) {
    if (r.owner != Owner::discharge) continue;
    r.resistance_ohm = count > 1 ? r.resistance_ohm * (count - 1) / count : circuit::kShort_ohm;
  }
  Whole with_shorter = whole;
  with_shorter.design = &shorter;
  rows.push_back(solve(with_shorter, network, "discharge element", FaultKind::shorted));
}

void add_varistor_short(const Design& design, std::vector<FaultRow>& rows) {
  if (design.varistor == nullptr) return;
  FaultRow row;
  row.part = "varistor";
  row.kind = FaultKind::shorted;
  row.reason = design.fuse != nullptr ? "the line is shorted and only the fuse clears it"
                                      : "the line is shorted and no fuse of the design clears it";
  rows.push_back(std::move(row));
}

}  // namespace

bool FaultRow::exceeds() const {
  return std::any_of(stresses.begin(), stresses.end(), [](const FaultStress& s) { return s.exceeded(); });
}

std::vector<FaultRow> faults_of(const Design& design, const Requirement& requirement) {
  std::vector<FaultRow> rows;
  if (requirement.supplies.empty()) return rows;
  const auto& supply = *std::max_element(
      requirement.supplies.begin(), requirement.supplies.end(),
      [](const Supply& a, const Supply& b) { return a.voltage_Vrms.high < b.voltage_Vrms.high; });
  Evidence evidence(design, requirement, supply);
  const OperatingPoint& rest = evidence.rich_empty_hot();
  if (!rest.state.usable()) return rows;
  Whole whole;
  whole.design = &design;
  whole.values = rest.values;
  whole.values.dropper_esr_ohm = 0;  // a shorted film has none
  whole.state = rest.state.start;
  const double input_max_V = design.output_stage->input_max_V.value_or(INFINITY);
  whole.weakest_rail_V = std::min(design.reservoir->rated_voltage_V, input_max_V);
  const auto network = design.arrangement->build(whole.values);
  auto low_end = whole.values;
  low_end.series_resistor_ohm = series_resistor_ohm(design, End::low);
  const auto at_low_end = design.arrangement->build(low_end);  // for a shorted dropper
  const auto places = circuit::fault_places(network);
  for (const auto& place : places) {
    if (place.owner == Owner::varistor) continue;  // a row of its own below
    const auto alike = [&](const FaultPlace& p) { return p.owner == place.owner; };
    std::string part(circuit::owner_name(place.owner));
    if (std::count_if(places.begin(), places.end(), alike) > 1) {
      part += fmt::format(" {}", 1 + std::count_if(places.data(), &place, alike));
    }
    for (const auto kind : {FaultKind::open, FaultKind::shorted}) {
      if (place.owner == Owner::discharge && kind == FaultKind::shorted) continue;
      const bool film_short = place.owner == Owner::dropper && kind == FaultKind::shorted;
      const auto faulty = circuit::with_fault(film_short ? at_low_end : network, place, kind);
      rows.push_back(solve(whole, faulty, part, kind));
    }
  }
  add_discharge_short(whole, rows);
  add_varistor_short(design, rows);
  return rows;
}

}  // namespace dropfront::scoring
