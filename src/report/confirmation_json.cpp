#include "dropfront/report/confirmation_json.hpp"

namespace dropfront::report {

namespace {

constexpr auto kFlat = JsonWriter::Layout::flat;

void write_finding(JsonWriter& json, const problem::BoxFinding& finding) {
  json.begin_object();
  json.member("quantity", scoring::box_quantity_name(finding.quantity));
  json.member("unit", scoring::box_quantity_unit(finding.quantity));
  if (!finding.supply.empty()) json.member("supply", finding.supply);
  json.member("corner", finding.corner);
  json.member("inside", finding.inside);
  json.member("corner_exceeded", finding.corner_exceeded);
  json.member("limit", finding.limit);
  json.member("headroom", finding.headroom());
  json.member("pass", finding.pass);
  json.key("at");
  json.begin_object(kFlat);
  for (const auto& term : finding.where) json.member(term.name, term.value);
  json.end_object();
  json.end_object();
}

void write_quantiles(JsonWriter& json, const std::optional<problem::Quantiles>& quantiles) {
  if (!quantiles) return json.null();
  json.begin_object(kFlat);
  json.member("least", quantiles->least);
  json.member("one_percent", quantiles->one_percent);
  json.member("median", quantiles->median);
  json.member("ninety_nine_percent", quantiles->ninety_nine_percent);
  json.member("greatest", quantiles->greatest);
  json.end_object();
}

void write_sample(JsonWriter& json, const std::optional<problem::BuildSample>& sample) {
  if (!sample) return json.null();
  json.begin_object();
  json.member("scrambles", problem::kScrambles);
  json.member("builds", problem::kScrambles * problem::kBuildsAScramble);
  json.key("yields");
  json.begin_array();
  for (const auto& yield : sample->yields) {
    json.begin_object(kFlat);
    json.member("check", yield.check);
    json.member("passed", yield.passed);
    json.member("share", yield.share);
    json.member("low", yield.low);
    json.member("high", yield.high);
    json.end_object();
  }
  json.end_array();
  json.key("current_margin_A");
  write_quantiles(json, sample->margin_A);
  json.key("standby_loss_W");
  write_quantiles(json, sample->standby_W);
  json.end_object();
}

}  // namespace

void write_confirmation(JsonWriter& json, const std::optional<problem::Confirmation>& confirmation) {
  json.key("confirmation");
  if (!confirmation) return json.null();
  json.begin_object();
  json.member("corners_hold", confirmation->corners_hold());
  json.member("limits_hold", confirmation->limits_hold());
  json.member("evaluations", confirmation->evaluations);
  json.key("tolerance_box");
  json.begin_array();
  for (const auto& finding : confirmation->box) write_finding(json, finding);
  json.end_array();
  json.key("sample");
  write_sample(json, confirmation->sample);
  json.key("margin_costs");
  json.begin_array();
  for (const auto& cost : confirmation->costs) {
    json.begin_object(kFlat);
    json.member("slot", cost.slot);
    json.member("what", cost.what);
    json.member("margin_A", cost.margin_A);
    json.end_object();
  }
  json.end_array();
  json.end_object();
}

}  // namespace dropfront::report
