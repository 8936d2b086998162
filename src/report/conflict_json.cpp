#include "dropfront/report/conflict_json.hpp"

#include "dropfront/report/design_json.hpp"

namespace dropfront::report {

namespace {

constexpr auto kFlat = JsonWriter::Layout::flat;

void write_limits(JsonWriter& json, const Result::Explained& explained) {
  json.begin_array();
  for (std::size_t i = 0; i < explained.set.limits.size(); ++i) {
    const auto& limit = explained.set.limits[i];
    json.begin_object();
    json.member("limit", limit.knob->key);
    json.member("unit", limit.knob->unit);
    json.member("side", limit.knob->at_most ? "<=" : ">=");
    json.member("asked", limit.asked);
    json.member("needed", limit.needed);
    json.member("enough_alone", limit.droppable);
    json.member("proven", limit.proven);
    json.key("design");
    if (i < explained.designs.size() && explained.designs[i])
      write_design(json, *explained.designs[i]);
    else
      json.null();
    json.end_object();
  }
  json.end_array();
}

}  // namespace

void write_side(JsonWriter& json, const std::optional<scoring::Check>& check) {
  if (!check) return;
  json.member("value", check->value);
  json.member("limit", check->limit);
  json.member("unit", check->unit);
  json.member("side", check->at_most ? "<=" : ">=");
}

void write_conflict(JsonWriter& json, const Result& result) {
  if (!result.front.empty()) return json.null();
  json.begin_object();
  json.key("limits");
  if (result.explained)
    write_limits(json, *result.explained);
  else
    json.null();
  json.member("proven", result.explained && result.explained->set.proven);
  json.key("checks");
  json.begin_array();
  for (const auto& conflict : result.conflict) {
    json.begin_object(kFlat);
    json.member("check", conflict.check);
    json.member("failed", conflict.failed);
    json.member("least_shortfall", conflict.least_shortfall);
    write_side(json, conflict.closest);
    json.end_object();
  }
  json.end_array();
  json.end_object();
}

}  // namespace dropfront::report
