#include <fmt/format.h>

#include <filesystem>

#include "dropfront/problem/input_hash.hpp"
#include "dropfront/problem/named_part.hpp"
#include "dropfront/problem/problem.hpp"
#include "dropfront/problem/scalars.hpp"
#include "dropfront/problem/sections.hpp"
#include "dropfront/problem/support.hpp"
#include "dropfront/problem/varistor_rule.hpp"
#include "dropfront/values/text_file.hpp"

namespace dropfront::problem {
namespace {

template <class Part>
const Part* optional_part(ObjectReader& reader, const char* slot, Problem& problem) {
  const auto cursor = reader.take(slot);
  return cursor ? read_part<Part>(*cursor, problem) : nullptr;
}

/// A part with one key of its own beside the columns: its name alone, {"part": name, key: ...} or an inline
/// object with the key. `read_key` is called where the key stands.
template <class Part, class ReadKey>
const Part* read_with(const Cursor& cursor, Problem& problem, const char* key, ReadKey read_key) {
  const Node& node = cursor.node();
  if (node.kind == Node::Kind::object) {
    const Node* part = node.find("part");
    for (std::size_t i = 0; i < node.keys.size(); ++i) {
      if (node.keys[i].name != key) continue;
      read_key(cursor.member(i));
      if (part && part->kind == Node::Kind::text && node.keys.size() == 2)
        return require_part<Part>(cursor.member(1 - i), part->text, problem);
    }
  }
  return read_part<Part>(cursor, problem, {key});
}

/// Equal parts that act as one: "count" of them, else one piece.
template <class Part>
const Part* read_counted(const Cursor& cursor, Problem& problem, int& count) {
  count = 1;
  return read_with<Part>(cursor, problem, "count", [&count](const Cursor& given) {
    count = static_cast<int>(read_whole(given, 1, 20));
  });
}

const parts::Varistor* read_varistor(const Cursor& cursor, Problem& problem, bool& before) {
  const auto* part = read_with<parts::Varistor>(cursor, problem, "place", [&before](const Cursor& given) {
    before = read_word(given, kVaristorPlaces) == 0;
  });
  if (const auto fault = low_varistor(*part, problem.requirement)) throw cursor.error(*fault);
  return part;
}

void refuse_unused(ObjectReader& reader, const char* slot, const scoring::Design& design) {
  const auto cursor = reader.take(slot);
  if (cursor)
    throw cursor->error(fmt::format("the arrangement {} has no {}", design.arrangement->name, slot));
}

}  // namespace

scoring::Design read_design(const Cursor& cursor, Problem& problem) {
  ObjectReader reader(cursor, keys::design);
  scoring::Design design;
  design.arrangement = read_arrangement(reader.require("arrangement"));
  using parts::Resistor;
  if (design.arrangement->dropper) {
    design.dropper = read_counted<parts::Dropper>(reader.require("dropper"), problem, design.dropper_count);
  } else {
    refuse_unused(reader, "dropper", design);
    refuse_unused(reader, "discharge", design);
  }
  design.series_resistor =
      read_counted<Resistor>(reader.require("series_resistor"), problem, design.series_resistor_count);
  design.clamp = read_part<parts::Clamp>(reader.require("clamp"), problem);
  design.reservoir = read_part<parts::Reservoir>(reader.require("reservoir"), problem);
  design.rectifier = read_part<parts::Rectifier>(reader.require("rectifier"), problem);
  design.output_stage = read_part<parts::OutputStage>(reader.require("output_stage"), problem);
  if (const auto chain = reader.take("discharge"))
    design.discharge = read_counted<Resistor>(*chain, problem, design.discharge_count);
  if (const auto varistor = reader.take("varistor"))
    design.varistor = read_varistor(*varistor, problem, design.varistor_before);
  design.fuse = optional_part<parts::Fuse>(reader, "fuse", problem);
  design.ceramic = optional_part<parts::Ceramic>(reader, "ceramic", problem);
  if (design.arrangement->thyristor_shunt) {
    design.thyristor = read_part<parts::Thyristor>(reader.require("thyristor"), problem);
    design.gate_resistor = read_part<parts::Resistor>(reader.require("gate_resistor"), problem);
  } else {
    refuse_unused(reader, "thyristor", design);
    refuse_unused(reader, "gate_resistor", design);
  }
  reader.finish();
  caution_unchecked("design.varistor", design.varistor != nullptr, checks("varistor."), problem.cautions);
  caution_unchecked("design.fuse", design.fuse != nullptr, checks("fuse."), problem.cautions);
  caution_unchecked("design.ceramic", design.ceramic != nullptr, checks("ceramic."), problem.cautions);
  return design;
}

scoring::Design read_design_file(const std::string& path, Problem& problem) {
  const std::string text = values::read_text_file(path);
  const Node root = parse_document(text, path);
  const scoring::Design design = read_design(Cursor(root, path), problem);
  problem.inputs.push_back({std::filesystem::path(path).filename().string(), hash_of_file(path)});
  return design;
}

}  // namespace dropfront::problem
