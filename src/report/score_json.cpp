#include "dropfront/report/score_json.hpp"

#include "dropfront/circuit/owner_name.hpp"
#include "dropfront/report/cautions.hpp"
#include "dropfront/report/design_json.hpp"
#include "dropfront/report/faults_report.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/scoring/check_formulas.hpp"

namespace dropfront::report {

namespace {

constexpr auto kFlat = JsonWriter::Layout::flat;

void write_losses(JsonWriter& json, const circuit::SteadyState& state) {
  json.begin_object(kFlat);
  for (int i = 0; i < static_cast<int>(circuit::Owner::count); ++i) {
    const double loss_W = state.loss_W[i];
    if (loss_W != 0) json.member(circuit::owner_name(static_cast<circuit::Owner>(i)), loss_W);
  }
  json.end_object();
}

void write_operation(JsonWriter& json, const scoring::Operation& operation, const scoring::Supply& supply) {
  const auto& state = operation.state;
  const bool usable = state.usable();
  const auto figure = [&](std::string_view name, double number) {
    json.key(name);
    usable ? json.value(number) : json.null();
  };
  const double apparent_VA = corner_voltage_Vrms(supply, operation.corner) * state.input_current_Arms;
  json.begin_object(kFlat);
  json.member("ambient_degC", operation.ambient_degC);
  json.member("load_current_A", operation.load_current_A);
  json.member("rail_current_A", operation.rail_current_A);
  json.member("ends", operation.ends);
  figure("rail_min_V", state.rail_min_V);
  figure("rail_max_V", state.rail_max_V);
  figure("rail_mean_V", state.rail_mean_V);
  figure("ripple_Vpp", state.ripple_Vpp());
  figure("input_power_W", state.input_power_W);
  figure("input_current_Arms", state.input_current_Arms);
  figure("apparent_power_VA", apparent_VA);
  json.key("power_factor");
  usable&& apparent_VA > 0 ? json.value(state.input_power_W / apparent_VA) : json.null();
  json.member("available_current_A", operation.available_current_A);
  json.key("losses_W");
  if (usable)
    write_losses(json, state);
  else
    json.null();
  if (!operation.note.empty()) json.member("note", operation.note);
  if (!state.reason.empty()) json.member("reason", state.reason);
  json.end_object();
}

void write_operations(JsonWriter& json, const std::vector<scoring::Operation>& operations,
                      const scoring::Supply& supply) {
  json.begin_object();
  for (const auto& operation : operations) {
    json.key(operation.corner);
    write_operation(json, operation, supply);
  }
  json.end_object();
}

void write_figures(JsonWriter& json, std::string_view name, const std::vector<scoring::Term>& figures) {
  if (figures.empty()) return;
  json.key(name);
  json.begin_object(kFlat);
  for (const auto& figure : figures) json.member(figure.name, figure.value);
  json.end_object();
}

void write_check(JsonWriter& json, const scoring::Check& check) {
  json.begin_object(kFlat);
  json.member("id", check.id);
  json.member("value", check.value);
  json.member("limit", check.limit);
  json.member("unit", check.unit);
  json.member("side", check.at_most ? "<=" : ">=");
  json.member("headroom", check.headroom());
  json.member("pass", check.pass);
  json.key("at");
  json.begin_object(kFlat);
  const auto& at = check.at;
  if (!at.supply.empty()) json.member("supply", at.supply);
  if (!at.corner.empty()) json.member("corner", at.corner);
  if (at.ambient_degC) json.member("ambient_degC", *at.ambient_degC);
  if (!at.load.empty()) json.member("load", at.load);
  if (at.phase_deg) json.member("phase_deg", *at.phase_deg);
  if (!at.ends.empty()) json.member("ends", at.ends);
  write_figures(json, "values", at.values);
  json.end_object();
  json.member("basis", check.basis);
  json.member("formula", scoring::check_formula(check.id));
  write_figures(json, "figures", check.figures);
  json.end_object();
}

}  // namespace

double corner_voltage_Vrms(const scoring::Supply& supply, std::string_view corner) {
  if (corner.starts_with("lean")) return supply.voltage_Vrms.low;
  if (corner.starts_with("rich")) return supply.voltage_Vrms.high;
  return supply.voltage_Vrms.nominal;
}

void write_texts(JsonWriter& json, const std::vector<std::string>& texts) {
  json.begin_array();
  for (const auto& text : texts) json.value(text);
  json.end_array();
}

void write_score(JsonWriter& json, const scoring::Design& design, const scoring::Requirement& requirement,
                 const scoring::Score& score, const std::function<void(JsonWriter&)>& more) {
  json.begin_object();
  json.key("design");
  write_design(json, design);
  json.member("verdict", verdict_name(score.verdict));
  json.key("objectives");
  write_objectives(json, score.objectives);
  if (requirement.supplies.size() > 1) {
    json.key("decided_by");
    json.begin_object(kFlat);
    json.member("standby_loss_W", score.standby_supply);
    json.member("current_margin_A", score.margin_supply);
    json.end_object();
  }
  json.member("current_margin_new_A", score.current_margin_new_A);
  json.member("current_margin_zero_year", score.current_margin_zero_year);
  json.member("current_margin_horizon_years", score.current_margin_horizon_years);
  json.key("operation");
  const auto& supplies = requirement.supplies;
  if (supplies.size() == 1) {
    write_operations(
        json,
        score.operations.empty() ? std::vector<scoring::Operation>{} : score.operations.front().operations,
        supplies.front());
  } else {
    json.begin_object();
    for (std::size_t i = 0; i < score.operations.size() && i < supplies.size(); ++i) {
      json.key(score.operations[i].supply);
      write_operations(json, score.operations[i].operations, supplies[i]);
    }
    json.end_object();
  }
  json.key("checks");
  json.begin_array();
  for (const auto& check : score.checks) write_check(json, check);
  json.end_array();
  json.key("faults");
  write_faults(json, score.faults);
  json.key("cautions");
  write_texts(json, with_standing_cautions(score.cautions));
  if (more) more(json);
  json.end_object();
}

std::string score_document(const scoring::Design& design, const scoring::Requirement& requirement,
                           const scoring::Score& score) {
  JsonWriter json;
  write_score(json, design, requirement, score);
  return json.take();
}

}  // namespace dropfront::report
