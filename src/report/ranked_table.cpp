#include "dropfront/report/ranked_table.hpp"

#include <fmt/core.h>

#include <array>

#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

std::string tightest_words(const Entry& entry) {
  if (entry.tightest_check.empty()) return "";
  std::string text = fmt::format("; tightest {} {}", entry.tightest_check, percent(entry.tightest_headroom));
  if (!entry.tightest_supply.empty()) text += " on " + entry.tightest_supply;
  if (entry.tightest_inside) text += " inside the tolerances";
  if (entry.standby_supply.empty()) return text;
  return text +
         fmt::format("; standby decided by {}, margin by {}", entry.standby_supply, entry.margin_supply);
}

/// Arrangement, output stage, discharge chain and optional parts: what the columns leave out.
std::string rest_of_design(const Entry& entry) {
  std::string text(entry.design.arrangement ? entry.design.arrangement->name : std::string_view());
  for (const SlotPart& part : design_slots(entry.design)) {
    if (part.slot == "output_stage" || part.slot == "discharge") text += ", " + part.value;
    if (part.slot == "varistor" || part.slot == "fuse" || part.slot == "thyristor")
      text += fmt::format(", {}", part.slot);
    if (part.slot == "varistor" && !entry.design.varistor_before) text += " after";
  }
  return text + tightest_words(entry);
}

}  // namespace

std::string part_names(const scoring::Design& design) {
  std::string text;
  for (const SlotPart& part : design_slots(design)) {
    if (part.placed == 0) continue;
    if (!text.empty()) text += ", ";
    if (part.placed > 1) text += fmt::format("{} x ", part.placed);
    text += part.info->name;
  }
  return text;
}

std::string design_table(const std::string& heading, const std::vector<Line>& lines,
                         const std::string& currency) {
  TextTable table({heading, ">dropper", ">resistor", ">clamp", ">reservoir",
                   fmt::format(">cost {}", currency), ">standby mW", ">area mm2", ">margin mA"},
                  1);
  for (const Line& line : lines) {
    const auto& design = line.entry->design;
    const auto& objectives = line.entry->objectives;
    table.row(
        {line.label,
         design.dropper ? times(design.dropper_count) + with_unit(design.dropper->capacitance_F, "F") : "-",
         design.series_resistor ? times(design.series_resistor_count) + short_value(*design.series_resistor)
                                : "-",
         design.clamp ? short_value(*design.clamp) : "-",
         design.reservoir ? short_value(*design.reservoir) : "-", rounded(cost_units(objectives), 3),
         rounded(thousandfold(objectives.standby_loss_W), 0), rounded(area_mm2(objectives), 0),
         rounded(thousandfold(objectives.current_margin_A), 2)});
    if (!line.describe) continue;
    table.note(rest_of_design(*line.entry), 6);
    table.note(part_names(line.entry->design), 6);
  }
  return table.text();
}

std::string ranked_table(const Result& result, const RankedList& list, std::set<int>& described) {
  std::vector<Line> lines;
  for (const int number : list.numbers)
    if (const Entry* entry = find_entry(result, number))
      lines.push_back(
          {std::to_string(number) + (entry->on_front ? "" : "*"), entry, described.insert(number).second});
  return design_table(">no", lines, result.problem->requirement.currency);
}

std::string ranked_heading(const std::string& name) {
  static constexpr std::array<std::pair<std::string_view, std::string_view>, 5> kHeadings{
      {{"cheapest", "Cheapest"},
       {"lowest_standby", "Lowest standby loss"},
       {"smallest", "Smallest board area"},
       {"most_margin", "Most current margin"},
       {"balanced", "Balanced (least worst regret)"}}};
  for (const auto& [key, heading] : kHeadings)
    if (key == name) return std::string(heading);
  return name;
}

}  // namespace dropfront::report
