#include "dropfront/report/second_sources.hpp"

#include <algorithm>

#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/json_writer.hpp"

namespace dropfront::report {

namespace {

/// One text for equal electrical values: exact numbers, so equal text means equal bits.
std::string group_key(std::string_view slot, const Columns& columns) {
  std::string key(slot);
  for (const auto& [name, column] : columns) {
    key += '|' + name + '=';
    if (const auto* number = std::get_if<double>(&column))
      key += exact_text(*number);
    else if (const auto* truth = std::get_if<bool>(&column))
      key += *truth ? "true" : "false";
    else
      key += std::get<std::string>(column);
  }
  return key;
}

bool not_better(const parts::PartInfo& other, const parts::PartInfo& chosen, std::int64_t volume) {
  const auto price = [volume](const parts::PartInfo& part) { return price_micro_at(part, volume); };
  if (price(chosen) && price(other) && *price(other) < *price(chosen)) return false;
  const auto smaller = [](const auto& a, const auto& b) { return a && b && *a < *b; };
  return !smaller(other.length_um, chosen.length_um) && !smaller(other.width_um, chosen.width_um);
}

}  // namespace

template <typename Part>
void SecondSources::offer(const std::string& slot, const Part* part) {
  if (part == nullptr) return;
  auto& group = groups_[group_key(slot, electrical_columns(*part))];
  if (std::find(group.begin(), group.end(), &part->info) == group.end()) group.push_back(&part->info);
}

SecondSources::SecondSources(const problem::Problem& problem) : volume_(problem.requirement.volume) {
  const auto& offers = problem.offers;
  const auto all = [this](const char* slot, const auto& list) {
    for (const auto* part : list) offer(slot, part);
  };
  all("dropper", offers.droppers);
  all("series_resistor", offers.series_resistors);
  all("clamp", offers.clamps);
  all("reservoir", offers.reservoirs);
  all("rectifier", offers.rectifiers);
  all("output_stage", offers.output_stages);
  all("varistor", offers.varistors);
  all("fuse", offers.fuses);
  all("ceramic", offers.ceramics);
  all("thyristor", offers.thyristors);
  all("gate_resistor", offers.gate_resistors);
  for (const auto& chain : offers.discharges) offer("discharge", chain.element);
}

std::vector<Entry::Alternative> SecondSources::of(const scoring::Design& design) const {
  std::vector<Entry::Alternative> found;
  for (const SlotPart& chosen : design_slots(design)) {
    const auto group = groups_.find(group_key(chosen.slot, chosen.electrical));
    if (group == groups_.end()) continue;
    Entry::Alternative alternative{std::string(chosen.slot), {}};
    for (const parts::PartInfo* other : group->second)
      if (other != chosen.info && other->name != chosen.info->name &&
          not_better(*other, *chosen.info, volume_))
        alternative.parts.push_back(other->name);
    if (!alternative.parts.empty()) found.push_back(std::move(alternative));
  }
  return found;
}

}  // namespace dropfront::report
