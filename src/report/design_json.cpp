#include "dropfront/report/design_json.hpp"

#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/for_people.hpp"

namespace dropfront::report {

namespace {

void write_columns(JsonWriter& json, const Columns& columns) {
  for (const auto& [name, column] : columns) {
    json.key(name);
    std::visit([&json](const auto& v) { json.value(v); }, column);
  }
}

}  // namespace

void write_design(JsonWriter& json, const scoring::Design& design) {
  json.begin_object();
  if (design.arrangement) json.member("arrangement", design.arrangement->name);
  for (const SlotPart& part : design_slots(design)) {
    json.key(part.slot);
    json.begin_object(JsonWriter::Layout::flat);
    if (!part.info->name.empty()) json.member("part", part.info->name);
    if (part.slot == "discharge" || part.counted > 1) json.member("count", part.counted);
    if (part.slot == "varistor") json.member("place", design.varistor_before ? "before" : "after");
    write_columns(json, part.electrical);
    write_columns(json, common_columns(*part.info));
    json.end_object();
  }
  json.end_object();
}

void write_objectives(JsonWriter& json, const scoring::Objectives& objectives) {
  json.begin_object(JsonWriter::Layout::flat);
  json.member("cost", cost_units(objectives));
  json.member("standby_loss_W", objectives.standby_loss_W);
  json.member("board_area_mm2", area_mm2(objectives));
  json.member("current_margin_A", objectives.current_margin_A);
  json.end_object();
}

}  // namespace dropfront::report
