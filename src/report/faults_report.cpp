#include "dropfront/report/faults_report.hpp"

#include <fmt/format.h>

#include "dropfront/report/for_people.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

std::string_view kind_word(circuit::FaultKind kind) {
  return kind == circuit::FaultKind::open ? "open" : "short";
}

/// Exceeded ratings in words.
std::string exceeded_text(const scoring::FaultRow& row) {
  std::string text;
  for (const auto& stress : row.stresses) {
    if (!stress.exceeded()) continue;
    text += fmt::format("{}{}: {} {} (rated {})", text.empty() ? "" : "; ", stress.part, stress.quantity,
                        with_unit(stress.value, stress.unit), with_unit(*stress.rating, stress.unit));
  }
  return text;
}

std::string opens_text(const scoring::FaultRow& row) {
  std::string text;
  for (const auto& part : row.opens) text += (text.empty() ? "opens: " : ", then ") + part;
  return text;
}

}  // namespace

std::string faults_text(const std::vector<scoring::FaultRow>& faults) {
  std::string text =
      "One part failed at a time, at the high line, hot, without load: ratings exceeded, what opens\n";
  TextTable table({"part", "fault", ">rail V min", ">max", ">input W", "beyond its rating"});
  for (const auto& row : faults) {
    if (!row.reason.empty()) {
      table.row({row.part, std::string(kind_word(row.kind)), "-", "-", "-", row.reason});
      continue;
    }
    table.row({row.part, std::string(kind_word(row.kind)), rounded(row.rail_min_V, 1),
               rounded(row.rail_max_V, 1), rounded(row.input_power_W, 2),
               row.exceeds() ? "" : "nothing that is rated"});
    if (row.exceeds()) table.note(exceeded_text(row), 6);
    if (row.rail_over_s) {
      table.note(fmt::format("the rail passes the first of these ratings after {}",
                             with_unit(*row.rail_over_s, "s")),
                 6);
    }
    if (!row.opens.empty()) table.note(opens_text(row), 6);
    if (row.exceeds() && row.opens.empty()) table.note("nothing is known to open", 6);
  }
  return text + table.text();
}

void write_faults(JsonWriter& json, const std::vector<scoring::FaultRow>& faults) {
  constexpr auto kFlat = JsonWriter::Layout::flat;
  json.begin_array();
  for (const auto& row : faults) {
    json.begin_object();
    json.member("part", row.part);
    json.member("fault", kind_word(row.kind));
    if (!row.reason.empty()) {
      json.member("reason", row.reason);
      json.end_object();
      continue;
    }
    json.member("rail_min_V", row.rail_min_V);
    json.member("rail_max_V", row.rail_max_V);
    json.member("input_power_W", row.input_power_W);
    json.member("input_current_Arms", row.input_current_Arms);
    json.member("rail_over_rating_after_s", row.rail_over_s);
    json.key("stresses");
    json.begin_array();
    for (const auto& stress : row.stresses) {
      json.begin_object(kFlat);
      json.member("part", stress.part);
      json.member("quantity", stress.quantity);
      json.member("value", stress.value);
      json.member("rating", stress.rating);
      json.member("unit", stress.unit);
      json.member("exceeded", stress.exceeded());
      json.end_object();
    }
    json.end_array();
    json.key("opens");
    json.begin_array();
    for (const auto& part : row.opens) json.value(part);
    json.end_array();
    json.end_object();
  }
  json.end_array();
}

}  // namespace dropfront::report
