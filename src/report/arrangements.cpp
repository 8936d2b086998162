#include "dropfront/report/arrangements.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include "dropfront/report/for_people.hpp"
#include "dropfront/report/text_table.hpp"
#include "dropfront/scoring/evidence.hpp"

namespace dropfront::report {

namespace {

/// Of one front member; absent when a corner has no steady state.
std::optional<ArrangementBest> at_work(const Entry& entry, const scoring::Requirement& requirement) {
  scoring::Evidence evidence(entry.design, requirement, requirement.supplies.front());
  const auto& asleep = evidence.standby().state;
  const auto& awake = evidence.nominal().state;
  if (!asleep.usable() || !awake.usable()) return std::nullopt;
  ArrangementBest best;
  best.arrangement = entry.design.arrangement->name;
  best.number = entry.number;
  best.standby_loss_W = entry.objectives.standby_loss_W;
  best.asleep_input_W = asleep.input_power_W;
  best.awake_input_W = awake.input_power_W;
  best.awake_ripple_Vpp = awake.ripple_Vpp();
  for (const double spike_A : awake.thyristor_peak_A) {
    best.firing_spike_A = std::max(best.firing_spike_A.value_or(0), spike_A);
  }
  return best;
}

}  // namespace

std::vector<ArrangementBest> arrangements_of(const Result& result) {
  const auto less = [](const Entry* a, const Entry* b) {
    const auto standby = [](const Entry* e) { return e->objectives.standby_loss_W.value_or(INFINITY); };
    return standby(a) < standby(b);
  };
  std::vector<const Entry*> bests;
  for (const auto& arrangement : circuit::arrangements()) {
    std::vector<const Entry*> of;
    for (const auto& entry : result.front) {
      if (entry.design.arrangement == &arrangement) of.push_back(&entry);
    }
    if (!of.empty()) bests.push_back(*std::min_element(of.begin(), of.end(), less));
  }
  std::vector<ArrangementBest> rows;
  if (bests.size() < 2) return rows;
  for (const Entry* best : bests) {
    if (auto row = at_work(*best, result.problem->requirement)) rows.push_back(std::move(*row));
  }
  return rows.size() > 1 ? rows : std::vector<ArrangementBest>{};
}

std::string arrangements_text(const std::vector<ArrangementBest>& rows) {
  if (rows.empty()) return {};
  TextTable table(
      {"arrangement", ">no.", ">standby mW", ">asleep mW", ">awake mW", ">ripple V", ">firing spike A"});
  for (const auto& row : rows) {
    table.row({row.arrangement, std::to_string(row.number), rounded(thousandfold(row.standby_loss_W), 0),
               rounded(thousandfold(row.asleep_input_W), 0), rounded(thousandfold(row.awake_input_W), 0),
               rounded(row.awake_ripple_Vpp, 2), rounded(row.firing_spike_A, 2)});
  }
  return "Least standby loss of each arrangement (asleep, awake, ripple: nominal parts)\n" + table.text();
}

void write_arrangements(JsonWriter& json, const std::vector<ArrangementBest>& rows) {
  json.begin_array();
  for (const auto& row : rows) {
    json.begin_object(JsonWriter::Layout::flat);
    json.member("arrangement", row.arrangement);
    json.member("number", row.number);
    json.member("standby_loss_W", row.standby_loss_W);
    json.member("asleep_input_W", row.asleep_input_W);
    json.member("awake_input_W", row.awake_input_W);
    json.member("awake_ripple_Vpp", row.awake_ripple_Vpp);
    json.member("firing_spike_A", row.firing_spike_A);
    json.end_object();
  }
  json.end_array();
}

}  // namespace dropfront::report
