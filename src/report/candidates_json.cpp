#include "dropfront/report/candidates_json.hpp"

#include <algorithm>
#include <nlohmann/json.hpp>

#include "dropfront/report/arrangements.hpp"
#include "dropfront/report/confirmation_json.hpp"
#include "dropfront/report/conflict_json.hpp"
#include "dropfront/report/design_json.hpp"
#include "dropfront/report/json_writer.hpp"
#include "dropfront/report/make_result.hpp"
#include "dropfront/report/prices_text.hpp"
#include "dropfront/report/proof_json.hpp"
#include "dropfront/report/score_json.hpp"

namespace dropfront::report {

namespace {

constexpr auto kFlat = JsonWriter::Layout::flat;

void write_provenance(JsonWriter& json, const Result& result) {
  json.begin_object();
  json.member("version", result.version);
  json.member("seed", result.seed);
  json.member("effort", result.effort);
  json.key("inputs");
  json.begin_array();
  for (const auto& input : result.problem->inputs) {
    json.begin_object(kFlat);
    json.member("name", input.name);
    json.member("fnv1a64", input.hash);
    json.end_object();
  }
  json.end_array();
  json.end_object();
}

void write_counts(JsonWriter& json, const Result& result) {
  json.begin_object(kFlat);
  json.member("space", result.counts.space);
  json.member("relaxed", result.counts.relaxed);
  json.member("looked", result.counts.looked);
  json.member("scored", result.counts.scored);
  json.member("compliant", result.counts.compliant);
  json.member("front", result.front.size());
  json.end_object();
}

void write_entries(JsonWriter& json, const std::vector<Entry>& entries) {
  json.begin_array();
  for (const auto& entry : entries) {
    json.begin_object();
    json.member("number", entry.number);
    json.member("on_front", entry.on_front);
    json.key("design");
    write_design(json, entry.design);
    json.key("objectives");
    write_objectives(json, entry.objectives);
    json.key("tightest");
    if (entry.tightest_check.empty()) {
      json.null();
    } else {
      json.begin_object(kFlat);
      json.member("check", entry.tightest_check);
      json.member("headroom", entry.tightest_headroom);
      if (entry.tightest_inside) json.member("inside_tolerances", true);
      if (!entry.tightest_supply.empty()) json.member("supply", entry.tightest_supply);
      json.end_object();
    }
    json.key("alternatives");
    json.begin_object(kFlat);
    for (const auto& alternative : entry.alternatives) {
      json.key(alternative.slot);
      json.begin_array();
      for (const auto& part : alternative.parts) json.value(part);
      json.end_array();
    }
    json.end_object();
    json.end_object();
  }
  json.end_array();
}

void write_ranked(JsonWriter& json, const Result& result) {
  json.begin_object();
  for (const auto& list : result.ranked) {
    json.key(list.name);
    json.begin_array(kFlat);
    for (const int number : list.numbers) json.value(number);
    json.end_array();
  }
  json.end_object();
}

void write_evidence(JsonWriter& json, const Result& result) {
  json.begin_object();
  for (const auto* list : {&result.front, &result.extras})
    for (const auto& entry : *list)
      if (entry.evidence) {
        json.key(std::to_string(entry.number));
        write_score(json, entry.design, result.problem->requirement, *entry.evidence,
                    [&entry](JsonWriter& more) { write_confirmation(more, entry.confirmation); });
      }
  json.end_object();
}

void write_near_misses(JsonWriter& json, const Result& result) {
  json.begin_array();
  for (const auto& miss : result.near_misses) {
    json.begin_object();
    json.member("check", miss.check);
    json.member("shortfall", miss.shortfall);
    write_side(json, miss.broken);
    json.key("design");
    write_design(json, miss.design);
    json.end_object();
  }
  json.end_array();
}

}  // namespace

std::string candidates_json(const Result& result) {
  const problem::Problem& problem = *result.problem;
  JsonWriter json;
  json.begin_object();
  json.member("format", kCandidatesFormat);
  json.member("title", problem.title);
  json.member("name", problem.name);
  json.member("status", status_name(result.status));
  json.key("problem");
  json.document(nlohmann::ordered_json::parse(problem.text, nullptr, true, true).dump(2));
  json.key("provenance");
  write_provenance(json, result);
  json.key("counts");
  write_counts(json, result);
  json.key("proof");
  write_proof(json, result);
  json.key("front");
  write_entries(json, result.front);
  json.key("ranked");
  write_ranked(json, result);
  json.key("extras");
  write_entries(json, result.extras);
  json.key("arrangements");
  write_arrangements(json, result.arrangements);
  json.key("evidence");
  write_evidence(json, result);
  json.key("near_misses");
  write_near_misses(json, result);
  json.key("prices");
  write_prices(json, result);
  json.key("conflict");
  write_conflict(json, result);
  json.key("cautions");
  write_texts(json, result.cautions);
  json.end_object();
  return json.take();
}

std::string problems_json(const std::vector<std::string>& candidates_documents) {
  JsonWriter json;
  json.begin_object();
  json.key("problems");
  json.begin_array();
  for (const auto& document : candidates_documents) json.document(document);
  json.end_array();
  json.end_object();
  return json.take();
}

}  // namespace dropfront::report
