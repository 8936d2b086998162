#include "dropfront/report/study.hpp"

#include <fmt/core.h>

#include "dropfront/report/candidates_json.hpp"
#include "dropfront/report/csv_writer.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/json_writer.hpp"
#include "dropfront/report/make_result.hpp"
#include "dropfront/report/score_json.hpp"

namespace dropfront::report {

namespace {

using scoring::Objective;

std::optional<double> objective_value(const scoring::Objectives& objectives, Objective objective) {
  switch (objective) {
    case Objective::cost:
      return cost_units(objectives);
    case Objective::standby_loss:
      return objectives.standby_loss_W;
    case Objective::board_area:
      return area_mm2(objectives);
    case Objective::current_margin:
      break;
  }
  return objectives.current_margin_A;
}

std::string status_text(const Combination& combination) {
  return combination.result ? std::string(status_name(combination.result->status)) : "not searched";
}

std::string currency_of(const Combination& combination) {
  return combination.result ? combination.result->problem->requirement.currency : "";
}

std::optional<double> best_of(const Combination& combination, Objective objective) {
  if (!combination.result) return std::nullopt;
  return best_on_front(*combination.result, objective);
}

}  // namespace

std::string combination_folder(int number, const problem::Variation& values) {
  std::string text = fmt::format("{:02}", number);
  for (const auto& [key, value] : values) text += '-' + value;
  constexpr std::string_view kSafe = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789._-";
  for (char& c : text)
    if (kSafe.find(c) == std::string_view::npos) c = '-';
  return text;
}

std::optional<double> best_on_front(const Result& result, Objective objective) {
  const bool more_is_better = objective == Objective::current_margin;
  std::optional<double> best;
  for (const auto& entry : result.front) {
    const auto value = objective_value(entry.objectives, objective);
    if (value && (!best || (more_is_better ? *value > *best : *value < *best))) best = value;
  }
  return best;
}

std::string study_json(const Study& study) {
  JsonWriter json;
  json.begin_object();
  json.member("format", kStudyFormat);
  json.member("title", study.title);
  json.member("name", study.name);
  json.member("version", study.version);
  json.key("combinations");
  json.begin_array();
  for (const auto& combination : study.combinations) {
    json.begin_object();
    json.member("folder", combination.folder);
    json.key("values");
    json.begin_object(JsonWriter::Layout::flat);
    for (const auto& [key, value] : combination.values) json.member(key, value);
    json.end_object();
    json.member("status", status_text(combination));
    json.member("front", combination.result ? combination.result->front.size() : 0);
    json.member("currency", currency_of(combination));
    json.key("best");
    json.begin_object(JsonWriter::Layout::flat);
    json.member("cost", best_of(combination, Objective::cost));
    json.member("standby_loss_W", best_of(combination, Objective::standby_loss));
    json.member("board_area_mm2", best_of(combination, Objective::board_area));
    json.member("current_margin_A", best_of(combination, Objective::current_margin));
    json.end_object();
    json.end_object();
  }
  json.end_array();
  json.key("cautions");
  write_texts(json, study.cautions);
  json.end_object();
  return json.take();
}

std::string study_csv(const Study& study) {
  std::vector<std::string> header{"folder"};
  if (!study.combinations.empty())
    for (const auto& [key, value] : study.combinations.front().values) header.push_back(key);
  for (const char* name : {"status", "front", "currency", "least_cost", "least_standby_loss_W",
                           "least_board_area_mm2", "most_current_margin_A"})
    header.emplace_back(name);
  CsvWriter csv(header);
  for (const auto& combination : study.combinations) {
    csv.cell(combination.folder);
    for (const auto& [key, value] : combination.values) csv.cell(value);
    csv.cell(status_text(combination));
    csv.cell(combination.result ? static_cast<double>(combination.result->front.size()) : 0.0);
    csv.cell(currency_of(combination));
    for (const auto objective :
         {Objective::cost, Objective::standby_loss, Objective::board_area, Objective::current_margin})
      csv.cell(best_of(combination, objective));
    csv.end_row();
  }
  return csv.take();
}

}  // namespace dropfront::report
