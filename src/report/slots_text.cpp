#include <algorithm>

#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/problem_text.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

template <typename Part>
Option option_of(const Part* part) {
  if (part == nullptr) return {"none", "", nullptr};
  return {part->info.name, short_value(*part), &part->info};
}

template <typename Part>
std::vector<Option> options_of(const std::vector<const Part*>& list) {
  std::vector<Option> options;
  for (const Part* part : list) options.push_back(option_of(part));
  return options;
}

std::vector<Option> chain_options(const std::vector<problem::Offers::Chain>& chains) {
  std::vector<Option> options;
  for (const auto& chain : chains) {
    Option option = option_of(chain.count > 0 ? chain.element : nullptr);
    if (chain.count > 1) {
      option.name = std::to_string(chain.count) + " x " + option.name;
      option.value = std::to_string(chain.count) + " x " + option.value;
    }
    options.push_back(std::move(option));
  }
  return options;
}

std::vector<Option> arrangement_options(const std::vector<const circuit::Arrangement*>& list) {
  std::vector<Option> options;
  for (const auto* arrangement : list) options.push_back({std::string(arrangement->name), "", nullptr});
  return options;
}

/// Positions of the least and the greatest value; the first and the last option where values have no order.
std::pair<std::size_t, std::size_t> ends_of(const search::Slot& slot, std::size_t options) {
  const auto& values = slot.coordinate;
  if (values.size() != options || values.empty()) return {0, options > 0 ? options - 1 : 0};
  const auto [least, greatest] = std::minmax_element(values.begin(), values.end());
  return {static_cast<std::size_t>(least - values.begin()),
          static_cast<std::size_t>(greatest - values.begin())};
}

std::string size_text(const parts::PartInfo& info) {
  const auto side = [](const std::optional<std::int64_t>& um) {
    return um ? rounded(static_cast<double>(*um) / 1000, 1) : std::string("?");
  };
  return side(info.length_um) + " x " + side(info.width_um) + " x " + side(info.height_um);
}

}  // namespace

std::vector<Option> slot_options(const problem::Problem& problem, std::string_view slot) {
  const auto& offers = problem.offers;
  if (slot == "arrangement") return arrangement_options(offers.arrangements);
  if (slot == "output_stage") return options_of(offers.output_stages);
  if (slot == "dropper") return options_of(offers.droppers);
  if (slot == "series_resistor") return options_of(offers.series_resistors);
  if (slot == "clamp") return options_of(offers.clamps);
  if (slot == "reservoir") return options_of(offers.reservoirs);
  if (slot == "discharge") return chain_options(offers.discharges);
  if (slot == "rectifier") return options_of(offers.rectifiers);
  if (slot == "varistor") return options_of(offers.varistors);
  if (slot == "fuse") return options_of(offers.fuses);
  if (slot == "ceramic") return options_of(offers.ceramics);
  if (slot == "thyristor") return options_of(offers.thyristors);
  if (slot == "gate_resistor") return options_of(offers.gate_resistors);
  return {};
}

std::string slots_text(const problem::Problem& problem, const search::Space& space) {
  TextTable table({"slot", ">options", "from", "to"});
  for (const auto& slot : space.slots) {
    const auto options = slot_options(problem, slot.name);
    const auto words = [](const Option& option) {
      return option.value.empty() || option.value == option.name ? option.name
                                                                 : option.name + " (" + option.value + ")";
    };
    const auto [least, greatest] = ends_of(slot, options.size());
    table.row({slot.name, counted(slot.size), options.empty() ? "" : words(options[least]),
               options.size() < 2 ? "" : words(options[greatest])});
  }
  return table.text() + "  " + counted(space.size()) + " possible designs\n";
}

std::string slot_text(const problem::Problem& problem, std::string_view slot) {
  TextTable table({"part", "value", "size mm", ">" + problem.requirement.currency + " each", "source"});
  for (const auto& option : slot_options(problem, slot)) {
    if (option.info == nullptr) {
      table.row({option.name, option.value, "", "", ""});
      continue;
    }
    const auto price_micro = price_micro_at(*option.info, problem.requirement.volume);
    const auto price = price_micro ? std::optional(static_cast<double>(*price_micro) / 1e6) : std::nullopt;
    table.row({option.name, option.value, size_text(*option.info), rounded(price, 4), option.info->source});
  }
  return table.text();
}

}  // namespace dropfront::report
