#include "dropfront/report/design_slots.hpp"

#include "dropfront/report/for_people.hpp"

namespace dropfront::report {

namespace {

template <typename Part>
void add(std::vector<SlotPart>& slots, std::string_view name, const Part* part, int placed = 1) {
  if (part == nullptr) return;
  slots.push_back({name, &part->info, 1, placed, short_value(*part), electrical_columns(*part)});
}

/// Equal parts that act as one, as the last slot.
void count_last(std::vector<SlotPart>& slots, int count) {
  slots.back().counted = count;
  slots.back().placed = count;
  if (count > 1) slots.back().value = std::to_string(count) + " x " + slots.back().value;
}

}  // namespace

const std::vector<std::string_view>& slot_names() {
  static const std::vector<std::string_view> names{
      "arrangement", "dropper",   "series_resistor", "clamp",    "reservoir",
      "discharge",   "rectifier", "output_stage",    "varistor", "fuse",
      "ceramic",     "thyristor", "gate_resistor"};
  return names;
}

std::vector<SlotPart> design_slots(const scoring::Design& d) {
  std::vector<SlotPart> slots;
  add(slots, "dropper", d.dropper);
  if (d.dropper) count_last(slots, d.dropper_count);
  add(slots, "series_resistor", d.series_resistor);
  if (d.series_resistor) count_last(slots, d.series_resistor_count);
  add(slots, "clamp", d.clamp, d.arrangement ? d.arrangement->clamp_count : 1);
  add(slots, "reservoir", d.reservoir);
  if (d.discharge_count > 0 && d.discharge != nullptr) {
    add(slots, "discharge", d.discharge);
    count_last(slots, d.discharge_count);
  }
  add(slots, "rectifier", d.rectifier, d.arrangement ? d.arrangement->rectifier_count : 1);
  const bool stage_placed = d.output_stage && d.output_stage->kind != parts::StageKind::direct;
  add(slots, "output_stage", d.output_stage, stage_placed ? 1 : 0);
  add(slots, "varistor", d.varistor);
  add(slots, "fuse", d.fuse);
  add(slots, "ceramic", d.ceramic);
  add(slots, "thyristor", d.thyristor);
  add(slots, "gate_resistor", d.gate_resistor);
  return slots;
}

std::string short_value(const parts::Dropper& p) {
  return with_unit(p.capacitance_F, "F") + " " + with_unit(p.rated_voltage_Vrms, "V");
}
std::string short_value(const parts::Resistor& p) { return with_unit(p.resistance_ohm, "ohm"); }
std::string short_value(const parts::Clamp& p) { return with_unit(p.voltage_V, "V"); }
std::string short_value(const parts::Reservoir& p) {
  return with_unit(p.capacitance_F, "F") + " " + with_unit(p.rated_voltage_V, "V");
}
std::string short_value(const parts::Rectifier& p) {
  return p.reverse_voltage_V ? with_unit(*p.reverse_voltage_V, "V") : p.info.name;
}
std::string short_value(const parts::OutputStage& p) {
  return std::string(kind_name(p.kind)) + " " + with_unit(p.output_voltage_V, "V");
}
std::string short_value(const parts::Varistor& p) { return with_unit(p.continuous_voltage_Vrms, "V"); }
std::string short_value(const parts::Fuse& p) { return with_unit(p.rated_current_A, "A"); }
std::string short_value(const parts::Thyristor& p) { return with_unit(p.on_voltage_V, "V"); }
std::string short_value(const parts::Ceramic& p) { return with_unit(p.capacitance_F, "F"); }

}  // namespace dropfront::report
