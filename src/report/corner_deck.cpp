#include "dropfront/report/corner_deck.hpp"

#include <fmt/core.h>

#include "dropfront/report/deck.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/scoring/evidence.hpp"

namespace dropfront::report {

namespace {

using scoring::Evidence;

struct Corner {
  const char* name;
  const scoring::OperatingPoint& (Evidence::*point)();
};

constexpr Corner kCorners[] = {{"nominal", &Evidence::nominal},
                               {"lean_cold", &Evidence::lean_cold},
                               {"lean_hot", &Evidence::lean_hot},
                               {"rich_empty", &Evidence::rich_empty},
                               {"rich_loaded", &Evidence::rich_loaded},
                               {"standby", &Evidence::standby},
                               {"standby_worst", &Evidence::standby_worst}};

std::vector<std::string> notes_of(const scoring::OperatingPoint& point) {
  const auto& state = point.state;
  std::vector<std::string> notes{
      fmt::format("Corner {}: {} degC, load {} ({} from the rail), {}", point.corner,
                  rounded(point.ambient_degC, 0), point.load, with_unit(point.rail_current_A, "A"),
                  point.ends.empty() ? "no free ends" : point.ends),
      fmt::format("Calculated here: rail_min {}, rail_mean {}, rail_max {}", with_unit(state.rail_min_V, "V"),
                  with_unit(state.rail_mean_V, "V"), with_unit(state.rail_max_V, "V")),
      fmt::format("input_power {}, input_current {}", with_unit(state.input_power_W, "W"),
                  with_unit(state.input_current_Arms, "A"))};
  return notes;
}

/// What does nothing in running and is left out of the network.
void note_protection(const scoring::Design& design, std::vector<std::string>& notes) {
  if (design.varistor != nullptr) {
    notes.push_back(fmt::format("Left out: a varistor of {} {} the series resistor; it does not conduct here",
                                with_unit(design.varistor->continuous_voltage_Vrms, "V"),
                                design.varistor_before ? "in front of" : "behind"));
  }
  if (design.fuse != nullptr) {
    notes.push_back(fmt::format("Left out: a fuse of {}, first in the line",
                                with_unit(design.fuse->rated_current_A, "A")));
  }
}

}  // namespace

const std::vector<std::string>& deck_corners() {
  static const std::vector<std::string> names = [] {
    std::vector<std::string> all;
    for (const Corner& corner : kCorners) all.emplace_back(corner.name);
    return all;
  }();
  return names;
}

CornerDeck corner_deck(const std::string& title, const scoring::Design& design,
                       const scoring::Requirement& requirement, const scoring::Supply& supply,
                       std::string_view corner) {
  Evidence evidence(design, requirement, supply);
  for (const Corner& known : kCorners) {
    if (known.name != corner) continue;
    const scoring::OperatingPoint& point = (evidence.*known.point)();
    if (!point.state.usable()) return {false, point.state.reason, ""};
    const circuit::Network network = design.arrangement->build(point.values);
    DeckOptions options;
    options.initial_V.assign(point.state.start.begin(),
                             point.state.start.begin() + network.capacitors.size());
    options.notes = notes_of(point);
    note_protection(design, options.notes);
    return {true, "", make_deck(network, title, options)};
  }
  return {false, fmt::format("no corner '{}'", corner), ""};
}

}  // namespace dropfront::report
