#include "dropfront/report/proof_json.hpp"

#include <cmath>

#include "dropfront/report/design_json.hpp"

namespace dropfront::report {

namespace {

constexpr auto kFlat = JsonWriter::Layout::flat;

void write_discard(JsonWriter& json, std::string_view why, search::BoundKind kind, double designs) {
  if (!(designs > 0)) return;
  json.begin_object(kFlat);
  json.member("why", why);
  json.member("class", bound_kind_name(kind));
  json.member("designs", designs);
  json.end_object();
}

void write_discards(JsonWriter& json, std::string_view why, const search::ByKind& designs) {
  for (std::size_t k = 0; k < designs.size(); ++k)
    write_discard(json, why, static_cast<search::BoundKind>(k), designs[k]);
}

/// The best of each objective that the open boxes could hold; unset where nothing is known.
scoring::Objectives at_best(const Result& result) {
  scoring::Objectives best;
  const auto& objectives = result.problem->requirement.objectives;
  const std::vector<double>& bounds = result.proof->open_bounds;
  for (std::size_t k = 0; k < objectives.size() && k < bounds.size(); ++k) {
    if (!std::isfinite(bounds[k])) continue;
    switch (objectives[k]) {
      case scoring::Objective::cost:
        best.cost_micro = std::llround(bounds[k] * 1e6);
        break;
      case scoring::Objective::standby_loss:
        best.standby_loss_W = bounds[k];
        break;
      case scoring::Objective::board_area:
        best.board_area_um2 = std::llround(bounds[k] * 1e6);
        break;
      case scoring::Objective::current_margin:
        best.current_margin_A = -bounds[k];
        break;
    }
  }
  return best;
}

void write_open(JsonWriter& json, const Result& result) {
  json.begin_object();
  json.member("designs", result.proof->left);
  json.member("boxes", result.proof->open_boxes);
  json.key("at_best");
  write_objectives(json, at_best(result));
  json.end_object();
}

}  // namespace

std::string_view bound_kind_name(search::BoundKind kind) {
  switch (kind) {
    case search::BoundKind::exact:
      return "exact";
    case search::BoundKind::theorem:
      return "theorem";
    case search::BoundKind::monotone:
      break;
  }
  return "monotone by test";
}

void write_proof(JsonWriter& json, const Result& result) {
  if (!result.proof) {
    json.null();
    return;
  }
  const search::Proof& proof = *result.proof;
  json.begin_object();
  json.member("complete", proof.complete);
  json.member("method", proof.enumerated ? "enumeration" : "branch and bound");
  json.member("weakest_class", bound_kind_name(proof.weakest()));
  json.member("space", proof.space);
  json.key("discarded");
  json.begin_array();
  for (std::size_t c = 0; c < proof.broken.size() && c < result.check_names.size(); ++c)
    write_discards(json, result.check_names[c], proof.broken[c]);
  write_discard(json, "not given", search::BoundKind::exact, proof.undefined);
  write_discards(json, "dominated", proof.dominated);
  write_discards(json, "replaced", proof.reduced);
  json.end_array();
  json.member("scored", proof.scored);
  json.member("boxes", proof.boxes);
  json.key("open");
  if (proof.complete)
    json.null();
  else
    write_open(json, result);
  json.end_object();
}

}  // namespace dropfront::report
