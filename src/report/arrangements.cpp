#include "dropfront/report/arrangements.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/report/for_people.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

/// Of one front member; absent when a corner has no steady state.
std::optional<ArrangementBest> at_work(const Entry& entry, const scoring::Score& evidence) {
  ArrangementBest best;
  best.arrangement = entry.design.arrangement->name;
  best.number = entry.number;
  best.standby_loss_W = entry.objectives.standby_loss_W;
  if (evidence.operations.empty()) return std::nullopt;
  int found = 0;
  for (const auto& row : evidence.operations.front().operations) {
    const bool asleep = row.corner == "standby";
    if ((!asleep && row.corner != "nominal") || !row.state.usable()) continue;
    ++found;
    (asleep ? best.asleep_input_W : best.awake_input_W) = row.state.input_power_W;
    if (asleep) continue;
    best.awake_ripple_Vpp = row.state.ripple_Vpp();
    for (const double spike_A : row.state.thyristor_peak_A) {
      best.firing_spike_A = std::max(best.firing_spike_A.value_or(0), spike_A);
    }
  }
  return found == 2 ? std::optional(best) : std::nullopt;
}

}  // namespace

std::vector<ArrangementBest> arrangements_of(const Result& result, const scoring::Scorer& scorer) {
  std::vector<ArrangementBest> rows;
  const auto less = [](const Entry* a, const Entry* b) {
    const auto standby = [](const Entry* e) { return e->objectives.standby_loss_W.value_or(INFINITY); };
    return standby(a) < standby(b);
  };
  for (const auto& arrangement : circuit::arrangements()) {
    std::vector<const Entry*> of;
    for (const auto& entry : result.front) {
      if (entry.design.arrangement == &arrangement) of.push_back(&entry);
    }
    if (of.empty()) continue;
    const Entry& best = **std::min_element(of.begin(), of.end(), less);
    const auto row =
        at_work(best, best.evidence ? *best.evidence : scorer.score(best.design, scoring::Depth::full));
    if (row) rows.push_back(*row);
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
