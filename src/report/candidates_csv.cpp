#include "dropfront/report/candidates_csv.hpp"

#include <algorithm>
#include <string_view>

#include "dropfront/report/csv_writer.hpp"
#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/for_people.hpp"

namespace dropfront::report {

namespace {

void write_row(CsvWriter& csv, const Entry& entry, bool several_supplies) {
  csv.cell(entry.number).cell(entry.on_front ? "true" : "false");
  const auto parts = design_slots(entry.design);
  for (const auto slot : slot_names()) {
    if (slot == "arrangement") {
      csv.cell(entry.design.arrangement ? entry.design.arrangement->name : std::string_view());
      continue;
    }
    const auto part =
        std::find_if(parts.begin(), parts.end(), [slot](const auto& p) { return p.slot == slot; });
    const bool filled = part != parts.end();
    csv.cell(filled ? std::string_view(part->info->name) : std::string_view());
    if (slot == "discharge") csv.cell(filled ? part->counted : 0);
  }
  csv.cell(cost_units(entry.objectives))
      .cell(entry.objectives.standby_loss_W)
      .cell(area_mm2(entry.objectives))
      .cell(entry.objectives.current_margin_A)
      .cell(entry.tightest_check)
      .cell(entry.tightest_headroom);
  if (several_supplies) csv.cell(entry.tightest_supply).cell(entry.standby_supply).cell(entry.margin_supply);
  csv.end_row();
}

std::optional<double> millimetres(const std::optional<std::int64_t>& um) {
  if (!um) return std::nullopt;
  return static_cast<double>(*um) / 1000;
}

void write_bill(CsvWriter& csv, const std::string& set, const Entry& entry, std::int64_t volume) {
  for (const SlotPart& part : design_slots(entry.design)) {
    if (part.placed == 0) continue;
    csv.cell(set).cell(entry.number).cell(part.slot).cell(part.info->name).cell(part.value).cell(part.placed);
    if (const auto price_micro = price_micro_at(*part.info, volume)) {
      csv.cell(static_cast<double>(*price_micro) / 1e6);
      csv.cell(static_cast<double>(*price_micro * part.placed) / 1e6);
    } else {
      csv.cell("").cell("");
    }
    csv.cell(millimetres(part.info->length_um))
        .cell(millimetres(part.info->width_um))
        .cell(millimetres(part.info->height_um))
        .cell(part.info->source);
    csv.end_row();
  }
}

}  // namespace

std::string candidates_csv(const Result& result) {
  std::vector<std::string> header{"number", "on_front"};
  for (const auto slot : slot_names()) {
    header.emplace_back(slot);
    if (slot == "discharge") header.emplace_back("discharge_count");
  }
  header.push_back("cost_" + result.problem->requirement.currency);
  for (const char* name :
       {"standby_loss_W", "board_area_mm2", "current_margin_A", "tightest_check", "tightest_headroom"})
    header.emplace_back(name);
  const bool several = result.problem->requirement.supplies.size() > 1;
  if (several) header.insert(header.end(), {"tightest_supply", "standby_supply", "margin_supply"});
  CsvWriter csv(header);
  for (const auto& entry : result.front) write_row(csv, entry, several);
  for (const auto& entry : result.extras) write_row(csv, entry, several);
  return csv.take();
}

std::string bom_csv(const Result& result) {
  const auto& requirement = result.problem->requirement;
  CsvWriter csv({"set", "number", "slot", "part", "value", "quantity", "unit_price_" + requirement.currency,
                 "price_" + requirement.currency, "length_mm", "width_mm", "height_mm", "source"});
  for (const auto& list : result.ranked) {
    const Entry* first = list.numbers.empty() ? nullptr : find_entry(result, list.numbers.front());
    if (first != nullptr) write_bill(csv, list.name, *first, requirement.volume);
  }
  return csv.take();
}

}  // namespace dropfront::report
