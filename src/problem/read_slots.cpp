#include <fmt/format.h>

#include <cmath>
#include <set>

#include "dropfront/problem/defaults.hpp"
#include "dropfront/problem/sections.hpp"
#include "dropfront/problem/slot_parts.hpp"
#include "dropfront/problem/support.hpp"
#include "dropfront/problem/varistor_rule.hpp"
#include "dropfront/values/quantity.hpp"

namespace dropfront::problem {
namespace {

template <class Part>
bool any(const Part&) {
  return true;
}

/// Whether the row's column `slots` lets it serve this slot (absent: all).
bool serves(const parts::Resistor& part, const char* slot) {
  return part.slots.empty() || std::find(part.slots.begin(), part.slots.end(), slot) != part.slots.end();
}

/// One slot of the file, or an empty object where it is left out.
template <class Part, class More>
std::vector<const Part*> slot(ObjectReader& slots, const char* name, Problem& problem,
                              bool (*usable)(const Part&), More more) {
  if (!slots.has(name)) note_default(problem, slots.object(), name, "all rows", "no filter given");
  const Cursor cursor = slots.take_object(name);
  ObjectReader reader(cursor, *keys::slot(name));
  more(reader);
  auto offered = read_slot_parts<Part>(reader, problem, usable);
  reader.finish();
  if (offered.empty()) {
    throw cursor.error(fmt::format("the parts lists offer no row for this slot: {} is empty or not there",
                                   parts::list_file_name(kTraits<Part>.kind)));
  }
  return offered;
}

template <class Part>
std::vector<const Part*> slot(ObjectReader& slots, const char* name, Problem& problem,
                              bool (*usable)(const Part&) = any<Part>) {
  return slot<Part>(slots, name, problem, usable, [](ObjectReader&) {});
}

bool read_optional(ObjectReader& reader) {
  const auto given = reader.take("optional");
  return given && read_truth(*given);
}

/// A slot that stays empty unless the file names it; with "optional" the empty slot is an option, the first.
template <class Part, class More>
std::vector<const Part*> extra_slot(ObjectReader& slots, const char* name, Problem& problem, More more) {
  if (!slots.has(name)) {
    note_default(problem, slots.object(), name, "none", "only where the problem asks for it");
    return {};
  }
  bool optional = false;
  auto offered = slot<Part>(slots, name, problem, any<Part>, [&](ObjectReader& reader) {
    optional = read_optional(reader);
    more(reader);
  });
  if (optional) offered.insert(offered.begin(), nullptr);
  return offered;
}

int read_pieces(ObjectReader& reader, const char* key) {
  const auto given = reader.take(key);
  return given ? static_cast<int>(read_whole(*given, 1, 2)) : 1;
}

void read_arrangements(ObjectReader& slots, Problem& problem) {
  auto& offered = problem.offers.arrangements;
  const auto given = slots.take("arrangement");
  if (!given) {
    // A shunt is another part to buy and a source of emission: only where the problem asks for one.
    const bool shunts = slots.has("thyristor");
    for (const circuit::Arrangement& arrangement : circuit::arrangements()) {
      if (arrangement.dropper && (shunts || !arrangement.thyristor_shunt)) offered.push_back(&arrangement);
    }
    note_default(
        problem, slots.object(), "arrangement",
        shunts ? "all arrangements with a dropper" : "all arrangements with a dropper and no thyristor",
        shunts ? "no filter given" : "the slot thyristor is not named");
    return;
  }
  std::set<const circuit::Arrangement*> asked;
  for (const Cursor& entry : read_one_or_list(*given, "arrangement names")) {
    if (!asked.insert(read_arrangement(entry)).second)
      throw entry.error("found twice; allowed: each arrangement once");
  }
  for (const circuit::Arrangement& arrangement : circuit::arrangements()) {
    if (asked.count(&arrangement) == 0) continue;
    if (!arrangement.dropper && asked.size() > 1) {
      throw given->error(
          fmt::format("{} has neither dropper nor discharge chain and is searched alone: give it a "
                      "problem of its own, or one entry of \"vary\"",
                      arrangement.name));
    }
    offered.push_back(&arrangement);
  }
}

void read_discharges(ObjectReader& slots, Problem& problem) {
  std::set<int> counts;
  bool optional = false;
  const auto more = [&](ObjectReader& reader) {
    optional = read_optional(reader);
    const auto given = reader.take("count");
    if (!given) {
      counts = {1, 2, 3};
      note_default(problem, reader.object(), "count", "1, 2, 3", "elements in series share the voltage");
      return;
    }
    for (const Cursor& entry : read_one_or_list(*given, "whole numbers")) {
      if (!counts.insert(static_cast<int>(read_whole(entry, 1, 20))).second) {
        throw entry.error("found twice; allowed: each count once");
      }
    }
  };
  const auto elements = slot<parts::Resistor>(
      slots, "discharge", problem, [](const parts::Resistor& part) { return serves(part, "discharge"); },
      more);
  if (optional) problem.offers.discharges.push_back({nullptr, 0});
  for (const parts::Resistor* element : elements) {
    for (const int count : counts) problem.offers.discharges.push_back({element, count});
  }
}

/// A stage is offered when the whole of its output band lies inside the wanted band.
void keep_stages_in_band(const Cursor& slots, Problem& problem) {
  auto& stages = problem.offers.output_stages;
  const scoring::OutputNeed& need = problem.requirement.output;
  const auto low = need.voltage_V * (1 - need.tolerance), high = need.voltage_V * (1 + need.tolerance);
  std::set<double> seen;
  const auto outside = [&](const parts::OutputStage* stage) {
    seen.insert(stage->output_voltage_V);
    const double slack = 1e-9 * stage->output_voltage_V;  // a decimal sum may miss its end by a rounding
    return !(stage->output_voltage_V * (1 - stage->tolerance) >= low - slack) ||
           !(stage->output_voltage_V * (1 + stage->tolerance) <= high + slack);
  };
  stages.erase(std::remove_if(stages.begin(), stages.end(), outside), stages.end());
  if (!stages.empty()) return;
  std::vector<std::string> outputs;
  for (const double voltage : seen) outputs.push_back(values::format_quantity(voltage, values::Unit::volt));
  throw slots.error(
      fmt::format("no output stage stays with its tolerance inside {} +/- {}; offered are stages of {}",
                  values::format_quantity(need.voltage_V, values::Unit::volt),
                  values::format_quantity(need.tolerance, values::Unit::share), either(outputs)));
}

void note_unused(const char* name, Problem& problem) {
  problem.cautions.push_back(fmt::format("slots.{} is not used by the arrangements asked for", name));
}

/// Rows for another mains stand in the same list: they are left out and said so, unless none remains.
void keep_high_varistors(const Cursor& slot, Problem& problem) {
  auto& offered = problem.offers.varistors;
  std::vector<std::string> left_out;
  std::string fault;
  const auto low = [&](const parts::Varistor* part) {
    const auto why = part ? low_varistor(*part, problem.requirement) : std::nullopt;
    if (!why) return false;
    fault = *why;
    left_out.push_back(part->info.name);
    return true;
  };
  offered.erase(std::remove_if(offered.begin(), offered.end(), low), offered.end());
  if (left_out.empty()) return;
  const bool any_left = std::any_of(offered.begin(), offered.end(),
                                    [](const parts::Varistor* part) { return part != nullptr; });
  if (!any_left) throw slot.error(fault);
  problem.cautions.push_back(
      fmt::format("slots.varistor: {} clamp below the crest of the highest line and are "
                  "left out",
                  fmt::join(left_out, ", ")));
}

/// Slots that no arrangement asked for uses: read in full, offered to nobody, said so.
template <class Part>
void unused_slot(ObjectReader& slots, const char* name, Problem& problem, bool (*usable)(const Part&)) {
  if (!slots.has(name)) return;
  slot<Part>(slots, name, problem, usable);
  note_unused(name, problem);
}

}  // namespace

void read_slots(const Cursor& cursor, Problem& problem) {
  using parts::Resistor;
  ObjectReader slots(cursor, keys::slots);
  Offers& offers = problem.offers;
  read_arrangements(slots, problem);
  offers.output_stages = slot<parts::OutputStage>(slots, "output_stage", problem);
  keep_stages_in_band(slots.has("output_stage") ? slots.require("output_stage") : cursor, problem);
  const bool dropping = offers.arrangements.front()->dropper;
  if (dropping || slots.has("dropper")) {
    offers.droppers = slot<parts::Dropper>(
        slots, "dropper", problem, any<parts::Dropper>,
        [&](ObjectReader& reader) { offers.dropper_parallel = read_pieces(reader, "parallel"); });
  }
  offers.series_resistors = slot<Resistor>(
      slots, "series_resistor", problem, [](const Resistor& part) { return serves(part, "series_resistor"); },
      [&](ObjectReader& reader) { offers.series_resistor_split = read_pieces(reader, "split"); });
  offers.clamps = slot<parts::Clamp>(slots, "clamp", problem);
  offers.reservoirs = slot<parts::Reservoir>(slots, "reservoir", problem);
  if (dropping || slots.has("discharge")) read_discharges(slots, problem);
  if (!dropping) {
    for (const char* name : {"dropper", "discharge"}) {
      if (slots.has(name)) note_unused(name, problem);
    }
    offers.droppers.clear();
    offers.discharges.clear();
    offers.dropper_parallel = 1;
  }
  offers.rectifiers = slot<parts::Rectifier>(slots, "rectifier", problem);
  offers.varistors = extra_slot<parts::Varistor>(slots, "varistor", problem, [&](ObjectReader& reader) {
    const auto place = reader.take("place");
    if (place) offers.varistor_before_resistor = read_word(*place, kVaristorPlaces) == 0;
    if (!place)
      note_default(problem, reader.object(), "place", "before", "on the line side of the series resistor");
  });
  if (slots.has("varistor")) keep_high_varistors(slots.require("varistor"), problem);
  const auto nothing = [](ObjectReader&) {};
  offers.fuses = extra_slot<parts::Fuse>(slots, "fuse", problem, nothing);
  offers.ceramics = extra_slot<parts::Ceramic>(slots, "ceramic", problem, nothing);
  const bool shunted = std::any_of(offers.arrangements.begin(), offers.arrangements.end(),
                                   [](const circuit::Arrangement* a) { return a->thyristor_shunt; });
  const auto gates = [](const Resistor& part) { return serves(part, "gate_resistor"); };
  if (shunted) {
    offers.thyristors = slot<parts::Thyristor>(slots, "thyristor", problem);
    offers.gate_resistors = slot<Resistor>(slots, "gate_resistor", problem, gates);
  } else {
    unused_slot<parts::Thyristor>(slots, "thyristor", problem, any<parts::Thyristor>);
    unused_slot<Resistor>(slots, "gate_resistor", problem, gates);
  }
  slots.finish();
  caution_unchecked("slots.varistor", !offers.varistors.empty(), checks("varistor."), problem.cautions);
  caution_unchecked("slots.fuse", !offers.fuses.empty(), checks("fuse."), problem.cautions);
  caution_unchecked("slots.ceramic", !offers.ceramics.empty(), checks("ceramic."), problem.cautions);
}

}  // namespace dropfront::problem
